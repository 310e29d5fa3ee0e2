package bubblechain.bibliography;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;

/** The publications by their keys, which are those of INSPIRE unless an entry says otherwise. */
public final class Bibliography {
    private static final String RESOURCE = "/reference-values/bibliography.csv";
    private static final Pattern KEY = Pattern.compile("[A-Za-z][A-Za-z'-]*:[A-Za-z0-9]+");

    private final Map<String, Publication> entries;

    private Bibliography(Map<String, Publication> entries) {
        this.entries = Collections.unmodifiableMap(entries);
    }

    /** The bibliography of the program, read when it is first asked for. */
    public static Bibliography shipped() {
        return Shipped.BIBLIOGRAPHY;
    }

    private static final class Shipped {
        private static final Bibliography BIBLIOGRAPHY = read();
    }

    private static Bibliography read() {
        try (InputStream stream = Bibliography.class.getResourceAsStream(RESOURCE)) {
            if (stream == null) {
                throw new IllegalStateException("the built-in file " + RESOURCE + " is missing from this build");
            }
            return parse(new String(stream.readAllBytes(), StandardCharsets.UTF_8));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /**
     * A bibliography from its table: comment lines with #, a header, then one publication per line.
     *
     * @throws IllegalArgumentException if a line has not the fields of the header, or a key appears twice
     */
    static Bibliography parse(String table) {
        Map<String, Publication> entries = new LinkedHashMap<>();
        List<String> lines = table.lines().filter(line -> !line.isBlank() && !line.startsWith("#")).toList();
        List<String> header = CsvLine.fields(lines.get(0));
        if (!header.equals(Publication.FIELDS)) {
            throw new IllegalArgumentException("the bibliography has the columns " + header + ", not " + Publication.FIELDS);
        }
        for (String line : lines.subList(1, lines.size())) {
            Publication publication = Publication.of(CsvLine.fields(line));
            if (entries.put(publication.key(), publication) != null) {
                throw new IllegalArgumentException("the key " + publication.key() + " appears twice in the bibliography");
            }
        }
        return new Bibliography(entries);
    }

    /** The publication of a key, if it is known. */
    public Optional<Publication> find(String key) {
        return Optional.ofNullable(entries.get(key));
    }

    /** All keys in the order of the table. */
    public Set<String> keys() {
        return entries.keySet();
    }

    /** What has the form of a key in a text such as "Gray:1990yh, light-flavour term", known or not, in its order. */
    public static List<String> keysIn(String text) {
        return KEY.matcher(text).results().map(MatchResult::group).distinct().toList();
    }
}
