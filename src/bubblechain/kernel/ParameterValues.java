package bubblechain.kernel;

import bubblechain.exact.Rational;
import bubblechain.formula.Constants;
import bubblechain.formula.Definitions;
import bubblechain.formula.Formula;
import bubblechain.toml.TomlSection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * The parameters of a family of kernels and their values. Each is a table {@code [parameters.NAME]} with {@code from},
 * {@code to}, {@code default} and {@code integer} ("yes" or "no").
 */
final class ParameterValues {
    private static final List<String> KEYS = List.of("from", "to", "default", "integer", "meaning");

    private static final int LARGEST_COUNT = 20;

    private final Map<String, Rational> values;

    private ParameterValues(Map<String, Rational> values) {
        this.values = values;
    }

    static ParameterValues read(TomlSection top, Map<String, Rational> given) {
        Map<String, Rational> values = new TreeMap<>();
        Optional<TomlSection> section = top.optionalTable("parameters");
        if (section.isPresent()) {
            if (section.get().keys().size() > LARGEST_COUNT) {
                throw top.error("parameters", "a kernel has at most " + LARGEST_COUNT + " parameters, got "
                        + section.get().keys().size());
            }
            for (String name : section.get().keys()) {
                if (!Constants.isFreeName(name) || name.equals("u") || name.equals("eps") || name.equals("a")) {
                    throw section.get().error(name, "'" + name + "' cannot be the name of a parameter");
                }
                values.put(name, value(section.get(), name, given));
            }
        }
        for (String name : given.keySet()) {
            if (!values.containsKey(name)) {
                String known = values.isEmpty() ? "it has none" : "it has " + String.join(", ", values.keySet());
                throw new KernelException(top.file() + ": the kernel has no parameter '" + name + "'; " + known);
            }
        }
        return new ParameterValues(values);
    }

    private static Rational value(TomlSection section, String name, Map<String, Rational> given) {
        TomlSection entry = section.optionalTable(name)
                .orElseThrow(() -> section.error(name, "a parameter is a table [parameters." + name + "]"));
        entry.requireKnown(KEYS);
        Rational from = entry.rational("from");
        Rational to = entry.rational("to");
        Rational value = given.containsKey(name) ? given.get(name) : entry.rational("default");
        boolean integer = entry.optionalText("integer").orElse("no").equals("yes");
        if (value.compareTo(from) < 0 || value.compareTo(to) > 0 || integer && !value.isInteger()) {
            String reason = "the parameter " + name + " is " + (integer ? "an integer " : "") + "between " + from + " and " + to
                    + ", got " + value;
            throw given.containsKey(name) ? new KernelException(reason) : entry.error("default", reason);
        }
        return value;
    }

    Definitions asDefinitions() {
        Definitions definitions = Definitions.NONE;
        for (Map.Entry<String, Rational> entry : values.entrySet()) {
            definitions = definitions.with(entry.getKey(), Formula.parse("(" + entry.getValue() + ")"));
        }
        return definitions;
    }

    /** The title with the values behind it. */
    String titled(String title) {
        if (values.isEmpty()) {
            return title;
        }
        return title + values.entrySet().stream()
                .map(e -> e.getKey() + " = " + e.getValue())
                .collect(Collectors.joining(", ", " (", ")"));
    }
}
