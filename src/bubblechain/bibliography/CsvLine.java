package bubblechain.bibliography;

import java.util.ArrayList;
import java.util.List;

/**
 * One line of the shipped table. It is read without a library, which would take longer to load than the table to read;
 * no field has a line break.
 */
final class CsvLine {
    private CsvLine() {}

    /** The fields between commas; one in double quotes may hold commas, and quotes written twice. */
    static List<String> fields(String line) {
        List<String> fields = new ArrayList<>();
        StringBuilder field = new StringBuilder();
        boolean quoted = false;
        for (int k = 0; k < line.length(); k++) {
            char c = line.charAt(k);
            if (c == '"' && quoted && k + 1 < line.length() && line.charAt(k + 1) == '"') {
                field.append('"');
                k++;
            } else if (c == '"') {
                quoted = !quoted;
            } else if (c == ',' && !quoted) {
                fields.add(field.toString());
                field.setLength(0);
            } else {
                field.append(c);
            }
        }
        fields.add(field.toString());
        return fields;
    }
}
