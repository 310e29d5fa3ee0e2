package bubblechain.formula;

import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * Named sub-expressions, each of which may use those before it. Written out they may not exceed
 * {@link FormulaLimits#NODES}, so that a short file cannot stand for an enormous formula.
 */
public final class Definitions {
    public static final Definitions NONE = new Definitions(Map.of(), Map.of(), Map.of());

    private final Map<String, Formula> values;
    private final Map<String, Long> sizes;
    private final Map<String, Integer> heights;

    private Definitions(Map<String, Formula> values, Map<String, Long> sizes, Map<String, Integer> heights) {
        this.values = values;
        this.sizes = sizes;
        this.heights = heights;
    }

    /**
     * These definitions and one more.
     *
     * @throws FormulaException if the written-out formula would be too large, or there are too many
     */
    public Definitions with(String name, Formula formula) {
        if (values.size() >= FormulaLimits.DEFINITIONS) {
            throw FormulaException.at(formula.span(), "more than " + FormulaLimits.DEFINITIONS + " definitions");
        }
        Map<String, Long> moreSizes = new HashMap<>(sizes);
        moreSizes.put(name, checkedSize(formula));
        Map<String, Integer> moreHeights = new HashMap<>(heights);
        moreHeights.put(name, Substitution.requireShallow(formula, heights));
        Map<String, Formula> more = new LinkedHashMap<>(values);
        more.put(name, Substitution.apply(formula, values));
        return new Definitions(more, moreSizes, moreHeights);
    }

    /** A formula with all definitions written out. @throws FormulaException if that is too large */
    public Formula resolve(Formula formula) {
        checkedSize(formula);
        Substitution.requireShallow(formula, heights);
        return Substitution.apply(formula, values);
    }

    public boolean contains(String name) {
        return values.containsKey(name);
    }

    private long checkedSize(Formula formula) {
        long size = Substitution.size(formula, sizes);
        if (size > FormulaLimits.NODES) {
            throw FormulaException.at(
                    formula.span(),
                    "with its definitions written out the formula is too large; the limit is "
                            + FormulaLimits.NODES + " operations");
        }
        return size;
    }
}
