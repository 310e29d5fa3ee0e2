package bubblechain.assessment;

import bubblechain.analytic.PoleStatus;
import bubblechain.bibliography.Bibliography;
import bubblechain.bibliography.BibtexEntry;
import bubblechain.borel.NearestPoles;
import bubblechain.exact.DomainException;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.SingularityNote;
import bubblechain.report.Column;
import bubblechain.report.NearestNames;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;

/** The library, or the part of it in which given words occur, with its nearest poles and its papers. */
public final class KernelList {
    /** Status of the poles of a kernel that has none. */
    private static final String NO_POLES = "none";

    private final List<String> words;
    private final Map<String, Kernel> kernels = new LinkedHashMap<>();

    private KernelList(List<String> words) {
        this.words = words.stream().filter(word -> !word.isBlank()).toList();
    }

    /**
     * The built-in kernels in which all of the words occur, in name, title, quantity, operators of the declared
     * singularities, or sources (keys, authors, arXiv numbers), or are their field; capitals do not matter. All of them
     * without words.
     */
    public static KernelList matching(List<String> words) {
        KernelList list = new KernelList(words);
        List<String> wanted = list.words.stream().map(word -> word.toLowerCase(Locale.ROOT)).toList();
        for (String name : KernelLibrary.names()) {
            Kernel kernel = KernelLibrary.load(name);
            String text = wanted.isEmpty() ? "" : searchText(name, kernel);
            String field = KernelLibrary.field(name).orElse("");
            if (wanted.stream().allMatch(word -> word.equals(field) || text.contains(word))) {
                list.kernels.put(name, kernel);
            }
        }
        return list;
    }

    /** The field is not among them: the word "mass" does not mean all of "massless". */
    private static String searchText(String name, Kernel kernel) {
        List<String> parts = new ArrayList<>(List.of(name, kernel.title(), kernel.quantity()));
        kernel.singularities().forEach(s -> s.operator().ifPresent(parts::add));
        for (String source : sources(kernel)) {
            parts.add(source);
            Bibliography.shipped().find(source).ifPresent(p -> parts.add(p.authors() + " " + p.arxiv()));
        }
        return String.join("\n", parts).toLowerCase(Locale.ROOT);
    }

    /** The sources of a kernel and of its declared singularities, without duplicates. */
    private static Set<String> sources(Kernel kernel) {
        Set<String> sources = new LinkedHashSet<>(kernel.sources());
        kernel.singularities().stream()
                .map(SingularityNote::source)
                .forEach(text -> text.ifPresent(words -> sources.addAll(Bibliography.keysIn(words))));
        return sources;
    }

    /** The list as a report; if nothing was found a note says what may have been meant. */
    public Report report() {
        List<List<Value>> rows = new ArrayList<>();
        kernels.forEach((name, kernel) -> rows.add(row(name, kernel)));
        Report.Builder report = Report.builder("kernels")
                .request("search", String.join(" ", words))
                .normalisation("f = prefactor x sum_{n>=0} c_n a^(n+1), a = beta0 alpha/(4 pi)");
        if (kernels.isEmpty()) {
            report.add(new Note(nothingFound()));
        }
        return report.add(new Table("kernels", "Kernels with their first IR and UV pole in u (simple if nothing is said) and how far both are proved", COLUMNS, rows)).build();
    }

    private static final List<Column> COLUMNS = List.of(
            Column.of("name", "name"), Column.of("field", "field"), Column.of("quantity", "").dataOnly(),
            Column.of("scale", "").dataOnly(), Column.of("form", "").dataOnly(),
            Column.of("ir_pole", "IR").textOnly(), Column.of("uv_pole", "UV").textOnly(),
            Column.of("ir", "").dataOnly(), Column.of("ir_order", "").dataOnly(), Column.of("uv", "").dataOnly(),
            Column.of("uv_order", "").dataOnly(), Column.of("pole_status", "poles"), Column.of("title", "title"));

    private static List<Value> row(String name, Kernel kernel) {
        NearestPoles poles = NearestPoles.of(kernel);
        return List.of(
                Value.text(name), Value.text(KernelLibrary.field(name).orElse("")), Value.text(kernel.quantity()),
                Value.text(kernel.scale()), Value.text(kernel.form().text()),
                Value.orAbsent(poles.infrared().map(p -> Value.text(p.inWords()))),
                Value.orAbsent(poles.ultraviolet().map(p -> Value.text(p.inWords()))),
                Value.orAbsent(poles.infrared().map(NearestPoles.Nearest::u)),
                Value.orAbsent(poles.infrared().map(p -> Value.count(p.order()))),
                Value.orAbsent(poles.ultraviolet().map(NearestPoles.Nearest::u)),
                Value.orAbsent(poles.ultraviolet().map(p -> Value.count(p.order()))),
                Value.text(status(poles)), Value.text(kernel.title()));
    }

    static String status(NearestPoles poles) {
        return poles.status().map(PoleStatus::text).orElse(NO_POLES);
    }

    private String nothingFound() {
        Set<String> near = new LinkedHashSet<>(NearestNames.of(String.join("-", words), KernelLibrary.names()));
        words.forEach(word -> near.addAll(NearestNames.of(word, KernelLibrary.names())));
        return "No built-in kernel has " + (words.size() == 1 ? "the word '" : "all of the words '") + String.join(" ", words)
                + "'; "
                + (near.isEmpty() ? "'bubblechain kernels' lists them all" : "near in name: " + String.join(", ", near))
                + ". A file of your own is given by its path, ending in .toml.";
    }

    /**
     * The papers of these kernels as BibTeX entries, ordered by their keys.
     *
     * @throws DomainException if no kernel was found
     */
    public String bibtex() {
        if (kernels.isEmpty()) {
            throw new DomainException(nothingFound());
        }
        return bibtex(kernels.values());
    }

    /** The papers behind one kernel as BibTeX entries: its sources and those of its declared singularities. */
    public static String bibtex(Kernel kernel) {
        return bibtex(List.of(kernel));
    }

    private static String bibtex(Collection<Kernel> kernels) {
        Set<String> keys = new TreeSet<>();
        kernels.forEach(kernel -> keys.addAll(sources(kernel)));
        StringBuilder text = new StringBuilder();
        for (String key : keys) {
            text.append(Bibliography.shipped().find(key).map(BibtexEntry::of).orElseGet(() -> BibtexEntry.unknown(key)))
                    .append("\n\n");
        }
        return text.isEmpty() ? "% no source is named\n" : text.substring(0, text.length() - 1);
    }
}
