package bubblechain.kernel;

import bubblechain.toml.TomlSection;
import java.util.ArrayList;
import java.util.List;

/** The {@code [[check]]} entries of a kernel file. */
final class CheckEntries {
    private static final List<String> KEYS = List.of("kind", "n", "u", "power", "value", "kernel", "source");
    private static final int LARGEST_INDEX = 60;

    private final TomlSection top;

    CheckEntries(TomlSection top) {
        this.top = top;
    }

    List<KernelCheck> read() {
        List<KernelCheck> checks = new ArrayList<>();
        for (TomlSection entry : top.tables("check")) {
            entry.requireKnown(KEYS);
            checks.add(read(entry));
        }
        return checks;
    }

    private static KernelCheck read(TomlSection entry) {
        String source = entry.text("source");
        String kind = entry.text("kind");
        return switch (kind) {
            case "coefficient" -> new KernelCheck.Coefficient(
                    index(entry), KernelFile.constant(entry, "value"), source);
            case "nf-term" -> new KernelCheck.FlavourTerm(index(entry), KernelFile.constant(entry, "value"), source);
            case "laurent" -> {
                int power = entry.integer("power");
                if (power > -1) {
                    throw entry.error("power", "a checked Laurent coefficient belongs to a negative power, got " + power);
                }
                yield new KernelCheck.Laurent(entry.rational("u"), power, KernelFile.constant(entry, "value"), source);
            }
            case "absent" -> new KernelCheck.Absent(entry.rational("u"), source);
            case "same-as" -> new KernelCheck.SameAs(entry.text("kernel"), source);
            default -> throw entry.error(
                    "kind", "a check is \"coefficient\", \"nf-term\", \"laurent\", \"absent\" or \"same-as\", got \"" + kind + "\"");
        };
    }

    private static int index(TomlSection entry) {
        int n = entry.integer("n");
        if (n < 0 || n > LARGEST_INDEX) {
            throw entry.error("n", "a checked coefficient has n between 0 and " + LARGEST_INDEX + ", got " + n);
        }
        return n;
    }
}
