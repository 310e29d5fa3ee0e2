package bubblechain.bibliography;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/**
 * A publication in the language of BibTeX.
 *
 * <p>A doubtful field is left out, and an entry that was not verified in all its fields says so in its {@code note}. Every
 * character prints as itself; the title stands in a second pair of braces, so that no style changes its capitals.
 */
public final class BibtexEntry {
    private static final Pattern JOURNAL = Pattern.compile("(?:.*; )?([^0-9;,]+?) ([0-9-]+) \\((\\d{4})\\) (\\S+)");
    private static final Pattern COLLABORATION = Pattern.compile("(.*) \\((?:the )?(.*?)(?: Collaboration)?\\)");
    private static final int LONGEST_FIELD = "archivePrefix".length();

    private final Publication publication;
    private final List<String> lines = new ArrayList<>();

    private BibtexEntry(Publication publication) {
        this.publication = publication;
    }

    /** The entry, several lines without a line feed at the end. */
    public static String of(Publication publication) {
        return new BibtexEntry(publication).text();
    }

    /** A line that BibTeX passes over, for a source the bibliography does not know. */
    public static String unknown(String source) {
        return "% " + source.replaceAll("[^ -~]|@", "?") + ": not in the bibliography of this program";
    }

    private String text() {
        Matcher journal = JOURNAL.matcher(publication.confirmedJournal().orElse(""));
        boolean article = journal.matches();
        authors();
        publication.confirmedTitle().ifPresent(title -> field("title", "{" + escaped(title) + "}"));
        field("year", article ? journal.group(3) : publication.year());
        if (article) {
            field("journal", escaped(journal.group(1)));
            field("volume", ranges(journal.group(2)));
            field("pages", ranges(escaped(journal.group(4))));
        } else {
            publication.confirmedJournal().ifPresent(words -> field("howpublished", escaped(words)));
        }
        if (!publication.doi().isEmpty()) {
            field("doi", publication.doi());
        }
        if (!publication.arxiv().isEmpty()) {
            field("eprint", publication.arxiv());
            field("archivePrefix", "arXiv");
        }
        if (!publication.isVerified()) {
            field("note", escaped("entry not fully verified; " + publication.status()));
        }
        return "@" + (article ? "article" : "misc") + "{" + publication.key() + ",\n" + String.join(",\n", lines) + "\n}";
    }

    private void field(String name, String value) {
        lines.add("  " + name + " ".repeat(LONGEST_FIELD - name.length()) + " = {" + value + "}");
    }

    private void authors() {
        Matcher matcher = COLLABORATION.matcher(publication.authors());
        String people = matcher.matches() ? matcher.group(1) : publication.authors();
        field("author", Arrays.stream(people.replace(" et al.", " and others").split(", | and "))
                .map(BibtexEntry::lastNameFirst)
                .collect(Collectors.joining(" and ")));
        if (matcher.matches()) {
            field("collaboration", escaped(matcher.group(2)));
        }
    }

    /** "T. van Ritbergen" as "van Ritbergen, T.", so that a name of two words is not cut; "others" stays. */
    private static String lastNameFirst(String name) {
        String[] words = name.split(" ");
        int initials = 0;
        while (initials < words.length - 1 && words[initials].contains(".")) {
            initials++;
        }
        String last = escaped(String.join(" ", Arrays.asList(words).subList(initials, words.length)));
        String first = String.join(" ", Arrays.asList(words).subList(0, initials)).replaceAll("\\.(?=\\p{L})", ". ");
        return initials == 0 ? last : last + ", " + escaped(first);
    }

    private static String ranges(String numbers) {
        return numbers.replace("-", "--");
    }

    /** Text for a field in braces; braces are named, because BibTeX counts also those behind a backslash. */
    private static String escaped(String text) {
        StringBuilder escaped = new StringBuilder();
        text.chars().forEach(c -> {
            switch (c) {
                case '#', '$', '%', '&', '_' -> escaped.append('\\').append((char) c);
                case '\\' -> escaped.append("\\textbackslash{}");
                case '{' -> escaped.append("\\textbraceleft{}");
                case '}' -> escaped.append("\\textbraceright{}");
                case '^' -> escaped.append("\\textasciicircum{}");
                case '~' -> escaped.append("\\textasciitilde{}");
                case '<' -> escaped.append("\\textless{}");
                case '>' -> escaped.append("\\textgreater{}");
                case '|' -> escaped.append("\\textbar{}");
                default -> escaped.append((char) c);
            }
        });
        return escaped.toString();
    }
}
