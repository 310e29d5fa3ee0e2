package bubblechain.analytic;

import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import java.util.Map;

/**
 * The work of bringing a formula to its normal form, estimated before each step from the sizes of what it joins, so that a
 * short formula that stands for an enormous one is refused at once and on every machine alike.
 *
 * <p>One unit is about the time of four operations on two small integers; the constants are fitted to formulas that take
 * from a millisecond to ten seconds, and good to a factor of a few.
 */
final class CompileWork {
    /** Less than a second. No built-in kernel takes a hundredth of it. */
    static final long LIMIT = 2_000_000;

    private static final int NODE = 4;
    private static final int WORD = 64;
    /** A word of a denominator counts so much more: fractions are reduced after every operation. */
    private static final int FRACTION = 4;

    private double spent;

    /** Coefficients of a polynomial that are not zero, and their machine words. */
    private record Length(double count, double words) {
        static Length of(Polynomial polynomial) {
            double count = 0;
            double words = 0;
            for (Rational c : polynomial.coefficients()) {
                if (!c.isZero()) {
                    count++;
                    words += 1 + (c.numerator().bitLength() + (double) FRACTION * (c.denominator().bitLength() - 1)) / WORD;
                }
            }
            return new Length(count, words);
        }

        double times(Length other) {
            return words * other.words / FRACTION;
        }

        /** To see that there is no common factor, which a constant never has. */
        double common(Length other) {
            return count <= 1 || other.count <= 1 ? 0 : times(other);
        }
    }

    /** The sizes of a rational function. */
    private record Size(Length above, Length below) {
        static Size of(RationalFunction function) {
            return new Size(Length.of(function.numerator()), Length.of(function.denominator()));
        }

        double times(Size other) {
            return above.times(other.above) + below.times(other.below) + above.common(other.below) + other.above.common(below);
        }

        double plus(Size other, boolean sameDenominator) {
            return sameDenominator
                    ? above.words + other.above.words + above.common(below)
                    : above.times(other.below) + other.above.times(below) + below.times(other.below)
                            + below.common(other.below);
        }
    }

    /** One node of the tree, visited once for each term of the sums around it. */
    void node(Formula place) {
        spend(NODE, place);
    }

    void sum(NormalForm left, NormalForm right, Formula place) {
        double work = left.size() + right.size();
        for (Map.Entry<TermKey, RationalFunction> term : right.terms().entrySet()) {
            RationalFunction other = left.terms().get(term.getKey());
            if (other != null) {
                boolean same = other.denominator().equals(term.getValue().denominator());
                work += Size.of(other).plus(Size.of(term.getValue()), same);
            }
        }
        spend(work, place);
    }

    void product(NormalForm left, NormalForm right, Formula place) {
        spend((double) left.size() * right.size(), place);
        Size[] sizes = right.terms().values().stream().map(Size::of).toArray(Size[]::new);
        double work = 0;
        for (RationalFunction factor : left.terms().values()) {
            Size size = Size.of(factor);
            for (Size other : sizes) {
                work += NODE * NODE + size.times(other);
            }
        }
        spend(work, place);
    }

    /** Gamma(constant + slope u) is brought to a constant in (0, 1] by a product of that many linear factors. */
    void shiftOfGamma(Rational constant, Formula place) {
        double steps = Math.abs(constant.toDouble());
        spend(steps * steps * (1 + steps / WORD) / (FRACTION * FRACTION), place);
    }

    /** So is a polygamma, by a sum of that many powers of linear factors, brought to a common denominator one by one. */
    void shiftOfPolygamma(Rational constant, int order, Formula place) {
        double steps = Math.abs(constant.toDouble());
        double degree = steps * (order + 1);
        spend(degree * degree * (1 + steps / (WORD + FRACTION * FRACTION)), place);
    }

    private void spend(double work, Formula place) {
        spent += work;
        if (spent > LIMIT) {
            throw FormulaException.at(
                    place.span(),
                    "written out as one sum of products this formula is too large; use fewer terms or a smaller power");
        }
    }
}
