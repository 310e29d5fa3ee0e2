package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Constants;
import bubblechain.formula.Definitions;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.qcd.Theory;
import bubblechain.toml.TomlSection;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/**
 * Reads a kernel from TOML.
 *
 * <p>Keys: {@code name}, {@code title}, {@code quantity}, {@code scale}, {@code theory} (QCD or QED, default QCD),
 * {@code prefactor} (formula in CF, CA, TF, nf, beta0, default CF/beta0), {@code prefactor_words},
 * {@code mass_dimension}, {@code form}, {@code T} (form borel), {@code G} and {@code subtraction} ("single" or "double",
 * form d-dimensional), {@code result} ("series" or "anomalous-dimension"), {@code [[part]]} (form combination),
 * {@code anomalous_dimension} with {@code defining_equation}, {@code heavy_quark} ("yes" or "no"), {@code series},
 * {@code sources}, {@code cautions}, {@code [definitions]}, {@code [parameters]}, {@code [[singularity]]} (u, kind,
 * operator, power, anomalous_dimension, source) and {@code [[check]]} (kind, n, u, power, value, kernel, source).
 */
final class KernelFile {
    private static final List<String> TOP_KEYS = List.of(
            "name", "title", "quantity", "scale", "theory", "prefactor", "prefactor_words", "mass_dimension", "form",
            "T", "G", "subtraction", "result", "part", "anomalous_dimension", "defining_equation", "heavy_quark", "series", "sources", "cautions",
            "definitions", "parameters", "singularity", "check");
    private static final List<String> SINGULARITY_KEYS =
            List.of("u", "kind", "operator", "power", "anomalous_dimension", "source");
    private static final Set<String> PREFACTOR_NAMES = Set.of("CF", "CA", "TF", "nf", "beta0", "pi", "euler_gamma");

    private static final int LONGEST_NAME = 100;

    private final TomlSection top;
    private final ParameterValues parameters;
    private final Definitions definitions;
    private final Combination.Parts loader;

    private KernelFile(TomlSection top, Map<String, Rational> parameterValues, Combination.Parts loader) {
        this.top = top;
        this.loader = loader;
        top.requireKnown(TOP_KEYS);
        this.parameters = ParameterValues.read(top, parameterValues);
        this.definitions = readDefinitions();
    }

    /**
     * The kernel of a file.
     *
     * @param parameterValues values for the parameters of a family
     * @param loader          finds the parts of a combination
     * @throws bubblechain.toml.TomlException with file, line, column and reason
     */
    static Kernel read(TomlSection top, Map<String, Rational> parameterValues, Combination.Parts loader) {
        return new KernelFile(top, parameterValues, loader).kernel();
    }

    private Definitions readDefinitions() {
        Definitions found = parameters.asDefinitions();
        Optional<TomlSection> section = top.optionalTable("definitions");
        if (section.isEmpty()) {
            return found;
        }
        Set<String> taken = new HashSet<>(Set.of("u", "eps", "a", "x", "tau"));
        for (String key : section.get().keys()) {
            if (!Constants.isFreeName(key) || !taken.add(key) || found.contains(key)) {
                throw section.get().error(key, "'" + key + "' cannot be the name of a definition");
            }
            Formula formula = section.get().formula(key, section.get().text(key));
            try {
                found = found.with(key, formula);
            } catch (FormulaException e) {
                throw section.get().rethrown(key, e);
            }
        }
        return found;
    }

    private Kernel kernel() {
        KernelForm form = oneOf("form", KernelForm::parse);
        Theory theory = top.optionalText("theory").isPresent() ? oneOf("theory", Theory::parse) : Theory.QCD;
        refuseForeignKeys(form);
        Optional<Combination> combination = form == KernelForm.COMBINATION
                ? Optional.of(Combination.read(top, definitions, theory, loader))
                : Optional.empty();
        KernelFunctions functions = combination
                .map(Combination::functions)
                .orElseGet(() -> form == KernelForm.BOREL ? borel() : dDimensional());
        Kernel kernel = new Kernel(
                name(), parameters.titled(top.text("title")), parameters.titled(top.text("quantity")),
                top.text("scale"), theory, prefactor(), top.rational("mass_dimension"), form, origin(form, combination), functions.transform(),
                functions.anomalousDimension(), functions.sudakov(), definingEquation(), flag("heavy_quark"), series(), singularities(),
                combination.map(Combination::sources).orElseGet(() -> top.texts("sources")),
                combination.map(Combination::cautions).orElseGet(() -> top.texts("cautions")),
                new CheckEntries(top).read());
        requireFinite(kernel, form == KernelForm.BOREL ? "T" : form == KernelForm.COMBINATION ? "form" : "G");
        return kernel;
    }

    private Optional<String> origin(KernelForm form, Optional<Combination> combination) {
        return form == KernelForm.D_DIMENSIONAL
                ? Optional.of("G(eps,u) = " + resolved("G").print() + ", " + top.optionalText("subtraction").orElse("single")
                        + " subtraction")
                : combination.map(Combination::words);
    }

    private Optional<String> definingEquation() {
        Optional<String> equation = top.optionalText("defining_equation");
        if (equation.isPresent() && equation.get().indexOf('=') < 1) {
            throw top.error("defining_equation", "the defining equation has the form \"d ln O/d ln mu = CF/beta0 * a *"
                    + " anomalous_dimension(a)\", got \"" + equation.get() + "\"");
        }
        return equation;
    }

    private Optional<String> series() {
        Optional<String> series = top.optionalText("series");
        if (series.isPresent() && !isName(series.get())) {
            throw top.error("series", "series is the name of a built-in series, got '" + series.get()
                    + "'; one of your own is given to a command by --series");
        }
        return series;
    }

    private static boolean isName(String text) {
        return text.length() <= LONGEST_NAME && text.matches("[a-z0-9]+(-[a-z0-9]+)*");
    }

    private String name() {
        String name = top.text("name");
        if (!isName(name)) {
            throw top.error("name", "a kernel name has lower-case letters, digits and hyphens"
                    + (name.length() > LONGEST_NAME ? ", at most " + LONGEST_NAME : "") + ", got '" + name + "'");
        }
        return name;
    }

    private <V> V oneOf(String key, java.util.function.Function<String, V> parse) {
        String text = top.text(key);
        try {
            return parse.apply(text);
        } catch (DomainException e) {
            throw top.rethrown(key, String.valueOf(e.getMessage()), e);
        }
    }

    private boolean flag(String key) {
        String text = top.optionalText(key).orElse("no");
        return switch (text) {
            case "yes" -> true;
            case "no" -> false;
            default -> throw top.error(key, key + " is \"yes\" or \"no\", got \"" + text + "\"");
        };
    }

    /** Keys that belong to other forms. */
    private void refuseForeignKeys(KernelForm form) {
        if (form != KernelForm.BOREL) {
            refuse("T", "form \"" + form.text() + "\" takes " + (form == KernelForm.COMBINATION ? "[[part]]" : "G") + ", not T");
            refuse("anomalous_dimension", form == KernelForm.COMBINATION
                    ? "the anomalous dimension of a combination follows from its parts"
                    : "form \"d-dimensional\" derives the anomalous dimension from G");
        }
        if (form != KernelForm.D_DIMENSIONAL) {
            refuse("G", "form \"" + form.text() + "\" takes " + (form == KernelForm.COMBINATION ? "[[part]]" : "T") + ", not G");
            refuse("subtraction", "subtraction belongs to form \"d-dimensional\"");
            refuse("result", "result belongs to form \"d-dimensional\"; form \"borel\" without T is an anomalous dimension");
        }
        if (form != KernelForm.COMBINATION) {
            refuse("part", "[[part]] belongs to form \"combination\"");
        }
    }

    private KernelFunctions borel() {
        Optional<AnalyticFunction> transform = optionalFunction("T", "u");
        Optional<AnalyticFunction> anomalous = optionalFunction("anomalous_dimension", "a");
        if (transform.isEmpty() && anomalous.isEmpty()) {
            throw top.error("form", "form \"borel\" needs T(u), an anomalous_dimension in a, or both");
        }
        if (anomalous.isPresent()) {
            top.text("defining_equation");
        }
        return new KernelFunctions(transform, anomalous, Optional.empty());
    }

    private KernelFunctions dDimensional() {
        boolean twice = choice("subtraction", "single", "double");
        boolean alone = choice("result", "series", "anomalous-dimension");
        Formula diagram = resolved("G");
        requireNames("G", diagram, Set.of("u", "eps"));
        try {
            KernelFunctions functions = twice
                    ? KernelFunctions.ofDoubleLogarithms(diagram)
                    : KernelFunctions.ofDiagram(diagram);
            return alone ? functions.withoutTransform() : functions;
        } catch (FormulaException e) {
            throw top.rethrown("G", e);
        }
    }

    /** True for the second of two words, false for the first or if the key is absent. */
    private boolean choice(String key, String first, String second) {
        String word = top.optionalText(key).orElse(first);
        if (!word.equals(first) && !word.equals(second)) {
            throw top.error(key, key + " is \"" + first + "\" or \"" + second + "\", got \"" + word + "\"");
        }
        return word.equals(second);
    }

    private void refuse(String key, String reason) {
        if (top.keys().contains(key)) {
            throw top.error(key, reason);
        }
    }

    private Optional<AnalyticFunction> optionalFunction(String key, String variable) {
        if (top.optionalText(key).isEmpty()) {
            return Optional.empty();
        }
        Formula formula = resolved(key);
        requireNames(key, formula, Set.of(variable));
        try {
            return Optional.of(AnalyticFunction.of(formula, variable));
        } catch (FormulaException e) {
            throw top.rethrown(key, e);
        }
    }

    private Formula resolved(String key) {
        Formula formula = top.formula(key, top.text(key));
        try {
            return definitions.resolve(formula);
        } catch (FormulaException e) {
            throw top.rethrown(key, e);
        }
    }

    private void requireNames(String key, Formula formula, Set<String> variables) {
        for (String name : formula.names()) {
            if (!variables.contains(name) && !Constants.isConstant(name)) {
                String variable = variables.size() == 1 ? "the variable is " : "the variables are ";
                throw top.rethrown(key, FormulaException.at(
                        NamePlace.of(name, formula).orElse(formula.span()),
                        "the name '" + name + "' has no meaning; " + variable
                                + String.join(" and ", new TreeSet<>(variables))
                                + ", other names are set in [definitions] or [parameters]"));
            }
        }
    }

    /** B(u) must be regular at u = 0: no pole but a simple one, and that one taken away by the anomalous dimension. */
    private void requireFinite(Kernel kernel, String key) {
        try {
            SubtractionCheck.require(kernel);
        } catch (FormulaException e) {
            throw top.rethrown(key, e);
        } catch (DomainException e) {
            throw top.rethrown(key, String.valueOf(e.getMessage()), e);
        }
    }

    private Prefactor prefactor() {
        String text = top.optionalText("prefactor").orElse("CF/beta0");
        Formula formula = top.formula("prefactor", text);
        if (!PREFACTOR_NAMES.containsAll(formula.names())) {
            throw top.error("prefactor", "a prefactor uses the names CF, CA, TF, nf, beta0 and pi only");
        }
        return new Prefactor(formula, top.optionalText("prefactor_words").orElse(text));
    }

    private List<SingularityNote> singularities() {
        List<SingularityNote> notes = new ArrayList<>();
        for (TomlSection entry : top.tables("singularity")) {
            entry.requireKnown(SINGULARITY_KEYS);
            String kind = entry.text("kind");
            if (!kind.equals("IR") && !kind.equals("UV")) {
                throw entry.error("kind", "a singularity is \"IR\" or \"UV\", got \"" + kind + "\"");
            }
            Optional<Rational> delta = entry.optionalText("anomalous_dimension").isPresent()
                    ? Optional.of(entry.rational("anomalous_dimension"))
                    : Optional.empty();
            notes.add(new SingularityNote(
                    entry.rational("u"), SingularityNote.Kind.valueOf(kind), entry.optionalText("operator"),
                    entry.optionalText("power"), delta, entry.optionalText("source")));
        }
        return notes;
    }

    /** The constant an entry of a section stands for. */
    static ExactConstant constant(TomlSection section, String key) {
        Formula formula = section.formula(key, section.text(key));
        try {
            return ConstantValue.of(formula);
        } catch (FormulaException e) {
            throw section.rethrown(key, e);
        }
    }
}
