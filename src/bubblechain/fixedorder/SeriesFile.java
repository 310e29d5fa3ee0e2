package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Constants;
import bubblechain.formula.Definitions;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.qcd.Coupling;
import bubblechain.toml.TomlException;
import bubblechain.toml.TomlFile;
import bubblechain.toml.TomlSection;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/**
 * Reads a series file: TOML with every number written as a string, so that it stays exact.
 *
 * <p>Keys: {@code name}, {@code title}, {@code quantity}, {@code scale}, {@code coupling} (a, alpha, alpha/pi or
 * alpha/4pi), {@code coupling_flavours} ("nf" or "nf+1"), {@code flavours} (words), {@code flavours_from},
 * {@code flavours_to}, {@code prefactor} (formula in nf, default 1), {@code power}, {@code prescription} (words, where the
 * series is not unique), {@code sources}, {@code cautions};
 * {@code [definitions]} with named formulas, each of which may use those before it; {@code [[coefficient]]} with
 * {@code loops}, {@code value}, {@code errors}, {@code status}, {@code sources}; {@code [[singularity]]} with
 * {@code u}, {@code kind}, {@code operator}, {@code exponent_shift} (a formula or "unknown"), {@code corrections}.
 */
public final class SeriesFile {
    private static final List<String> TOP_KEYS = List.of(
            "name", "title", "quantity", "scale", "coupling", "coupling_flavours", "flavours", "flavours_from",
            "flavours_to", "prefactor", "power", "prescription", "sources", "cautions", "definitions", "coefficient", "singularity");
    private static final List<String> COEFFICIENT_KEYS = List.of("loops", "value", "errors", "status", "sources");
    private static final List<String> SINGULARITY_KEYS =
            List.of("u", "kind", "operator", "exponent_shift", "corrections");
    private static final String UNKNOWN = "unknown";
    private static final Map<String, ExactConstant> TRIAL = Map.of("nf", ExactConstant.ZERO);

    private final TomlSection top;
    private final Definitions definitions;

    private SeriesFile(TomlSection top) {
        this.top = top;
        top.requireKnown(TOP_KEYS);
        this.definitions = top.optionalTable("definitions").map(SeriesFile::definitions).orElse(Definitions.NONE);
    }

    /** Reads a file. @throws TomlException if it cannot be read, is too large, or is not a series */
    public static PerturbativeSeries read(Path path) {
        return new SeriesFile(TomlFile.read(path)).series();
    }

    /** Reads a text; {@code file} names it in messages. @throws TomlException with file, line and column */
    public static PerturbativeSeries parse(String text, String file) {
        return new SeriesFile(TomlFile.parse(text, file)).series();
    }

    private static Definitions definitions(TomlSection section) {
        Definitions found = Definitions.NONE;
        Set<String> known = new HashSet<>(Set.of("nf"));
        for (String key : section.keys()) {
            if (!Constants.isFreeName(key) || !known.add(key)) {
                throw section.error(
                        key, "'" + key + "' cannot be the name of a definition; use a plain word without meaning");
            }
            Formula formula = section.formula(key, section.text(key));
            try {
                found = found.with(key, formula);
                ConstantValue.of(found.resolve(formula), TRIAL);
            } catch (FormulaException e) {
                throw section.rethrown(key, e);
            }
        }
        return found;
    }

    private PerturbativeSeries series() {
        Coupling coupling = named("coupling", Coupling::parse);
        FlavourRange flavours = flavours();
        List<SeriesCoefficient> coefficients = coefficients();
        try {
            return new PerturbativeSeries(
                    top.text("name"), top.text("title"), top.text("quantity"), top.text("scale"), coupling,
                    heavyFlavours(), flavours,
                    formula(top, "prefactor", top.optionalText("prefactor").orElse("1")),
                    top.rational("power"), top.optionalText("prescription"), coefficients, singularities(), top.texts("sources"), top.texts("cautions"));
        } catch (TomlException placed) {
            throw placed;
        } catch (DomainException e) {
            throw top.rethrown("power", String.valueOf(e.getMessage()), e);
        }
    }

    private FlavourRange flavours() {
        int from = top.integer("flavours_from");
        int to = top.integer("flavours_to");
        try {
            return new FlavourRange(from, to, top.text("flavours"));
        } catch (TomlException placed) {
            throw placed;
        } catch (DomainException e) {
            throw top.rethrown("flavours_to", String.valueOf(e.getMessage()), e);
        }
    }

    private int heavyFlavours() {
        return switch (top.text("coupling_flavours")) {
            case "nf" -> 0;
            case "nf+1" -> 1;
            default -> throw top.error("coupling_flavours", "'coupling_flavours' must be \"nf\" or \"nf+1\"");
        };
    }

    private <T> T named(String key, Function<String, T> parser) {
        String text = top.text(key);
        try {
            return parser.apply(text);
        } catch (DomainException e) {
            throw top.rethrown(key, String.valueOf(e.getMessage()), e);
        }
    }

    private List<SeriesCoefficient> coefficients() {
        List<SeriesCoefficient> result = new ArrayList<>();
        for (TomlSection section : top.tables("coefficient")) {
            section.requireKnown(COEFFICIENT_KEYS);
            int loops = section.integer("loops");
            if (loops != result.size() + 1) {
                throw section.error("loops", "coefficients come in order 1, 2, 3, ...; expected loops = \""
                        + (result.size() + 1) + "\", got \"" + loops + "\"");
            }
            SourceStatus status = SourceStatus.named(section.text("status")).orElseThrow(() -> section.error(
                    "status", "'status' must be \"seen in the paper\", \"from memory\" or \"derived here\""));
            List<Formula> errors = section.texts("errors").stream()
                    .map(text -> formula(section, "errors", text))
                    .toList();
            result.add(new SeriesCoefficient(
                    loops, formula(section, "value", section.text("value")), errors, status, section.texts("sources")));
        }
        if (result.isEmpty()) {
            throw top.error("coefficient", "there is no [[coefficient]]; give at least one");
        }
        return result;
    }

    private List<Singularity> singularities() {
        List<Singularity> result = new ArrayList<>();
        for (TomlSection section : top.tables("singularity")) {
            section.requireKnown(SINGULARITY_KEYS);
            String shift = section.text("exponent_shift");
            Optional<Formula> delta =
                    shift.equals(UNKNOWN) ? Optional.empty() : Optional.of(formula(section, "exponent_shift", shift));
            List<Formula> corrections = section.texts("corrections").stream()
                    .map(text -> formula(section, "corrections", text))
                    .toList();
            Rational position = section.rational("u");
            if (position.isZero()) {
                throw section.error("u", "a singularity needs u different from 0");
            }
            result.add(new Singularity(position, kind(section), section.text("operator"), delta, corrections));
        }
        return result;
    }

    private static Singularity.Kind kind(TomlSection section) {
        return switch (section.text("kind")) {
            case "IR" -> Singularity.Kind.IR;
            case "UV" -> Singularity.Kind.UV;
            default -> throw section.error("kind", "'kind' must be \"IR\" or \"UV\"");
        };
    }

    /** A formula with definitions written out, tried at nf = 0 so that a wrong name is found at once. */
    private Formula formula(TomlSection section, String key, String text) {
        Formula parsed = section.formula(key, text);
        try {
            Formula resolved = definitions.resolve(parsed);
            ConstantValue.of(resolved, TRIAL);
            return resolved;
        } catch (FormulaException e) {
            throw section.rethrown(key, e);
        }
    }
}
