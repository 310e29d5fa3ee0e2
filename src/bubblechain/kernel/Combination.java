package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Definitions;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.qcd.Theory;
import bubblechain.toml.TomlSection;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * A sum of other kernels, B(u) = sum weight x ratio^(2u) B_part(u), in units of the combination's own prefactor. The ratio
 * is the scale of the combination over that of the part, so that all parts share one coupling; a part that is
 * renormalised has the scale of the combination, ratio 1.
 *
 * <p>The parts are joined as formulas and brought to one normal form, so that residues add exactly and a pole that
 * cancels is gone.
 */
final class Combination {
    private static final List<String> KEYS = List.of("kernel", "weight", "scale_ratio", "cautions", "parameters");
    private static final int LARGEST = 32;
    private static final int POSITIVE_BITS = 128;
    private static final Formula TWICE_U = Formula.parse("2*u");

    /** Finds the kernel of a part. */
    interface Parts {
        Kernel load(String nameOrPath, Map<String, Rational> parameters);
    }

    private record Part(
            String name, Kernel kernel, Formula weight, Optional<Formula> ratio, boolean cautions) {}

    private final TomlSection top;
    private final Definitions definitions;
    private final Theory theory;
    private final List<Part> parts = new ArrayList<>();

    private Combination(TomlSection top, Definitions definitions, Theory theory) {
        this.top = top;
        this.definitions = definitions;
        this.theory = theory;
    }

    /** @throws bubblechain.toml.TomlException if a part does not exist, fits badly, or contains this file */
    static Combination read(TomlSection top, Definitions definitions, Theory theory, Parts loader) {
        Combination result = new Combination(top, definitions, theory);
        List<TomlSection> entries = top.tables("part");
        if (entries.isEmpty()) {
            throw top.error("form", "form \"combination\" needs entries [[part]] with kernel and weight");
        }
        if (entries.size() > LARGEST) {
            throw top.error("part", "a combination has at most " + LARGEST + " parts, got " + entries.size());
        }
        entries.forEach(entry -> result.parts.add(result.part(entry, loader)));
        return result;
    }

    private Part part(TomlSection entry, Parts loader) {
        entry.requireKnown(KEYS);
        Kernel kernel = loaded(entry, loader);
        if (kernel.theory() != theory) {
            throw entry.error("kernel", "the kernel " + kernel.name() + " belongs to " + kernel.theory()
                    + ", this combination to " + theory);
        }
        if (kernel.transform().isEmpty()) {
            throw entry.error("kernel", "the kernel " + kernel.name() + " is an anomalous dimension; it has no Borel"
                    + " transform to combine");
        }
        Optional<Formula> ratio = entry.optionalText("scale_ratio").map(text -> constant(entry, "scale_ratio"));
        if (ratio.isPresent() && kernel.isRenormalised()) {
            throw entry.error("scale_ratio", "the kernel " + kernel.name()
                    + " is renormalised; it can be combined at its own scale only, without scale_ratio");
        }
        String cautions = entry.optionalText("cautions").orElse("yes");
        if (!cautions.equals("yes") && !cautions.equals("no")) {
            throw entry.error("cautions", "cautions is \"yes\" or \"no\", got \"" + cautions + "\"");
        }
        return new Part(
                described(kernel, entry), kernel, constant(entry, "weight"), ratio, cautions.equals("yes"));
    }

    private static String factor(String weight) {
        return weight.equals("1") ? "" : weight.matches("[\\w.]+") ? weight + " " : "(" + weight + ") ";
    }

    private String described(Kernel kernel, TomlSection entry) {
        return parameters(entry).entrySet().stream()
                .map(e -> e.getKey() + " = " + e.getValue())
                .reduce((left, right) -> left + ", " + right)
                .map(values -> kernel.name() + " (" + values + ")")
                .orElse(kernel.name());
    }

    private Kernel loaded(TomlSection entry, Parts loader) {
        Map<String, Rational> values = parameters(entry);
        try {
            return loader.load(entry.text("kernel"), values);
        } catch (KernelException e) {
            throw entry.rethrown("kernel", String.valueOf(e.getMessage()), e);
        }
    }

    private Map<String, Rational> parameters(TomlSection entry) {
        Map<String, Rational> values = new TreeMap<>();
        Optional<TomlSection> section = entry.optionalTable("parameters");
        if (section.isPresent()) {
            for (String name : section.get().keys()) {
                Optional<Rational> value = ConstantValue.of(constant(section.get(), name)).asRational();
                values.put(name, value.orElseThrow(
                        () -> section.get().error(name, "a parameter of a part is a rational number")));
            }
        }
        return values;
    }

    /** A constant in the parameters and definitions of the file and the colour factors. */
    private Formula constant(TomlSection section, String key) {
        Formula formula = section.formula(key, section.text(key));
        try {
            Formula resolved = definitions.resolve(formula).substitute(Map.of(
                    "CF", literal(theory.cf(), formula), "CA", literal(theory.ca(), formula),
                    "TF", literal(theory.tf(), formula)));
            ExactConstant value = ConstantValue.of(resolved);
            if (key.equals("scale_ratio") && !value.toBall(POSITIVE_BITS).isPositive()) {
                throw FormulaException.at(formula.span(), "a ratio of scales must be positive");
            }
            // the value, not how it was written: 1/(1/2) is 2
            return Formula.parse(value.toString());
        } catch (FormulaException e) {
            throw section.rethrown(key, e);
        }
    }

    /** T(u) and the subtraction of the sum. */
    KernelFunctions functions() {
        List<Formula> transforms = new ArrayList<>();
        List<Formula> anomalous = new ArrayList<>();
        List<Formula> cusps = new ArrayList<>();
        List<Formula> slopes = new ArrayList<>();
        boolean doubleLogarithms = parts.stream().anyMatch(p -> p.kernel().sudakov().isPresent());
        for (Part part : parts) {
            Formula transform = part.kernel().transform().orElseThrow().formula();
            transforms.add(weighted(part, part.ratio().map(r -> times(transform, power(r))).orElse(transform)));
            part.kernel().anomalousDimension().ifPresent(gamma -> {
                // half of gamma stands where a double logarithm has its slope
                Formula weighted = weighted(part, gamma.formula());
                anomalous.add(doubleLogarithms ? times(literal(Rational.HALF, weighted), weighted) : weighted);
            });
            part.kernel().sudakov().ifPresent(sudakov -> {
                cusps.add(weighted(part, sudakov.cusp().formula()));
                slopes.add(weighted(part, sudakov.slope().formula()));
            });
        }
        Optional<AnalyticFunction> transform = Optional.of(AnalyticFunction.of(sum(transforms), "u"));
        if (!doubleLogarithms) {
            return new KernelFunctions(transform, anomalousDimension(anomalous), Optional.empty());
        }
        slopes.addAll(anomalous);
        return new KernelFunctions(transform, Optional.empty(), Optional.of(new SudakovSubtraction(
                AnalyticFunction.of(sum(cusps), "a"), AnalyticFunction.of(sum(slopes), "a"))));
    }

    /** Empty if the anomalous dimensions of the parts cancel identically. */
    private static Optional<AnalyticFunction> anomalousDimension(List<Formula> parts) {
        return parts.isEmpty()
                ? Optional.empty()
                : Optional.of(AnalyticFunction.of(sum(parts), "a"))
                        .filter(f -> f.normalForm().isEmpty() || !f.normalForm().get().isZero());
    }

    private static Formula weighted(Part part, Formula formula) {
        return times(part.weight(), formula);
    }

    /** ratio^(2u). */
    private static Formula power(Formula ratio) {
        return new Formula.Binary(Formula.Operator.POWER, ratio, TWICE_U, ratio.span());
    }

    private static Formula times(Formula left, Formula right) {
        return new Formula.Binary(Formula.Operator.MULTIPLY, left, right, left.span());
    }

    private static Formula sum(List<Formula> formulas) {
        return formulas.stream()
                .reduce((left, right) -> new Formula.Binary(Formula.Operator.ADD, left, right, left.span()))
                .orElseThrow()
                .simplified();
    }

    private static Formula literal(Rational value, Formula place) {
        return new Formula.Literal(value, place.span());
    }

    /** The sum in words: weight, kernel with its parameters in the title, and the ratio of scales. */
    String words() {
        return parts.stream()
                .map(p -> factor(p.weight().simplified().print()) + p.name()
                        + p.ratio().map(r -> " at scale ratio " + r.print()).orElse(""))
                .collect(Collectors.joining(" + "));
    }

    /** The sources of the file and of all parts. */
    List<String> sources() {
        Set<String> all = new LinkedHashSet<>(top.texts("sources"));
        parts.forEach(part -> all.addAll(part.kernel().sources()));
        return List.copyOf(all);
    }

    /** The cautions of the file, and of the parts unless these say what does not hold for the sum. */
    List<String> cautions() {
        Set<String> all = new LinkedHashSet<>(top.texts("cautions"));
        parts.stream().filter(Part::cautions).forEach(part -> all.addAll(part.kernel().cautions()));
        return List.copyOf(all);
    }
}
