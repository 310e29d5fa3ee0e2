package bubblechain.analytic;

import bubblechain.analytic.TermKey.PolygammaFactor;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.GradedSeries;
import bubblechain.exact.GradedSum;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A function C R(x) sum_w H_w x^w with a constant C, a Laurent series R over Q and homogeneous polynomials H_w of weight w
 * in pi, zeta values, Euler's constant and logarithms.
 *
 * <p>A product of gamma functions and an exponential is one such term: every coefficient of ln Gamma(s + b x) but the
 * first is a multiple of zeta(k, s), of weight k; rational factors and the rational part of the exponent go to R.
 * psi^(n)(s + b x) x^(n+1) is linear in constants of weight k at x^k, and what the recurrence adds is rational, so a
 * product with polygammas is a few such terms. Monomials need not be multiplied as series: the coefficient of one of
 * weight w in [x^n] is C [x^(n-w)] R times its coefficient in H_w.
 */
public final class GradedTerm {
    /** Terms one product of polygammas may be split into. */
    private static final int LARGEST_SPLIT = 64;

    private final GradedSum.Summand summand;
    private final RationalSeries rational;

    private GradedTerm(GradedSum.Summand summand, RationalSeries rational) {
        this.summand = summand;
        this.rational = rational;
    }

    /** C and H. */
    public GradedSum.Summand summand() {
        return summand;
    }

    /** The coefficient of x^power in R, zero below its lowest power. */
    public Rational factor(int power) {
        return rational.coefficient(power);
    }

    /** H and R without C. */
    private record Piece(GradedSeries series, RationalSeries rational) {}

    /**
     * The terms of one term of a normal form, with all powers of x below {@code end}.
     *
     * @return empty if there is a sine of rational slope, a hypergeometric function, a slope that is not rational plus multiples of single constants
     *     of weight one, or a large product of polygammas
     */
    static Optional<List<GradedTerm>> of(LocalTerm term, int end) {
        TermKey key = term.key();
        int pieces = 1;
        int start = term.valuation();
        int lowered = 0;
        for (Map.Entry<PolygammaFactor, Integer> factor : key.polygammas().entrySet()) {
            pieces *= Math.min(LARGEST_SPLIT, factor.getValue()) + 1;
            lowered += (factor.getKey().n() + 1) * factor.getValue();
            start += term.isPole(factor.getKey()) ? (factor.getKey().n() + 1) * factor.getValue() : 0;
            if (pieces > LARGEST_SPLIT) {
                return Optional.empty();
            }
        }
        if (!key.sines().isEmpty() || !key.units().isEmpty()) {
            return Optional.empty();
        }
        int length = Math.max(1, end - start + lowered);
        return exponential(term, start, length).flatMap(first -> polygammas(term, first, length)).map(list -> list.stream()
                .map(piece -> new GradedTerm(
                        new GradedSum.Summand(term.constant(), piece.series()), piece.rational()))
                .toList());
    }

    /** The exponential and the gamma functions with the rational function. */
    private static Optional<Piece> exponential(LocalTerm term, int start, int length) {
        List<ExactConstant> exponent = new ArrayList<>();
        exponent.add(ExactConstant.ZERO);
        for (int k = 1; k < length; k++) {
            exponent.add(k == 1 ? term.key().slope() : ExactConstant.ZERO);
        }
        addGammas(term.gammas(), exponent);
        Rational slope = length > 1 ? exponent.get(1).rationalPart() : Rational.ZERO;
        if (!slope.isZero()) {
            exponent.set(1, exponent.get(1).subtract(ExactConstant.of(slope)));
        }
        return GradedSeries.exp(exponent).map(series -> {
            RationalSeries rational = RationalSeries.exponential(slope, length).shifted(start);
            for (Polynomial p : term.above()) {
                rational = rational.times(p.coefficients());
            }
            for (Polynomial p : term.below()) {
                rational = rational.over(p.coefficients());
            }
            return new Piece(series, rational);
        });
    }

    /** ln Gamma(s + b x) = ln Gamma(s) + psi(s) b x + sum_{k>=2} zeta(k, s) (-b x)^k/k, DLMF 5.7.3 for s = 1. */
    private static void addGammas(List<LocalTerm.GammaPower> gammas, List<ExactConstant> exponent) {
        Map<Rational, List<LocalTerm.GammaPower>> byShift = new HashMap<>();
        gammas.forEach(g -> byShift.computeIfAbsent(g.shift(), s -> new ArrayList<>()).add(g));
        byShift.forEach((shift, members) -> {
            Rational[] powers = new Rational[members.size()];
            for (int k = 1; k < exponent.size(); k++) {
                Rational sum = Rational.ZERO;
                for (int i = 0; i < powers.length; i++) {
                    Rational step = members.get(i).slope().negate();
                    powers[i] = k == 1 ? step : powers[i].multiply(step);
                    sum = sum.add(powers[i].multiply(members.get(i).power()));
                }
                if (!sum.isZero()) {
                    ExactConstant value = k == 1
                            ? ExactFunctions.digamma(shift).negate()
                            : ExactFunctions.hurwitz(k, shift).divide(Rational.of(k));
                    exponent.set(k, exponent.get(k).add(value.multiply(sum)));
                }
            }
        });
    }

    private static Optional<List<Piece>> polygammas(LocalTerm term, Piece first, int length) {
        List<Piece> pieces = List.of(first);
        for (Map.Entry<PolygammaFactor, Integer> entry : term.key().polygammas().entrySet()) {
            PolygammaFactor factor = entry.getKey();
            LocalTerm.Recurrence recurrence = term.recurrence(factor);
            Optional<GradedSeries> tail = GradedSeries.of(tail(factor, recurrence.s(), length));
            if (tail.isEmpty()) {
                return Optional.empty();
            }
            List<Piece> product = new ArrayList<>();
            for (Piece piece : pieces) {
                if (!addPower(piece, tail.get(), shift(factor, recurrence, length), factor.n(), entry.getValue(), product)) {
                    return Optional.empty();
                }
            }
            pieces = product;
        }
        return Optional.of(pieces);
    }

    /** x^(n+1) psi^(n)(s + b x) = sum_k psi^(n+k)(s) b^k x^(n+1+k)/k!. */
    private static List<ExactConstant> tail(PolygammaFactor factor, Rational s, int length) {
        List<ExactConstant> result = new ArrayList<>();
        int n = factor.n();
        // b^k (n+k)!/k! times the sign of psi^(n+k) = (-1)^(n+k+1) (n+k)! zeta(n+k+1, s)
        Rational weight = Rational.of(ExactFunctions.factorial(n));
        for (int w = 0; w < length; w++) {
            int k = w - n - 1;
            if (k > 0) {
                weight = weight.multiply(factor.slope()).multiply(n + k).divide(k);
            }
            result.add(k < 0
                    ? ExactConstant.ZERO
                    : w == 1
                            ? ExactFunctions.digamma(s)
                            : ExactFunctions.hurwitz(w, s).multiply(w % 2 == 0 ? weight : weight.negate()));
        }
        return result;
    }

    /** What the recurrence adds to the polygamma; empty if it is zero. */
    private static Optional<RationalSeries> shift(PolygammaFactor factor, LocalTerm.Recurrence recurrence, int length) {
        return recurrence.values().stream()
                .map(v -> RationalSeries.inversePower(v, factor.slope(), -factor.n() - 1, length))
                .reduce(RationalSeries::plus)
                .map(sum -> sum.times(recurrence.factor()));
    }

    /** Adds the terms of piece (tail x^(-n-1) + shift)^power; false if the product of the tails is not graded. */
    private static boolean addPower(
            Piece piece, GradedSeries tail, Optional<RationalSeries> shift, int n, int power, List<Piece> product) {
        List<RationalSeries> rationals = new ArrayList<>();
        rationals.add(piece.rational());
        for (int i = 0; i < power && shift.isPresent(); i++) {
            rationals.add(rationals.get(i).times(shift.get()));
        }
        GradedSeries series = piece.series();
        BigInteger binomial = BigInteger.ONE;
        for (int i = 0; i <= power; i++) {
            // the i-th power of the tail with the (power-i)-th of the shift
            if (power - i < rationals.size()) {
                RationalSeries rational = rationals.get(power - i).times(Rational.of(binomial));
                product.add(new Piece(series, rational.shifted(-(n + 1) * i)));
            }
            binomial = binomial.multiply(BigInteger.valueOf(power - i)).divide(BigInteger.valueOf(i + 1L));
            Optional<GradedSeries> next = i < power ? series.multiply(tail) : Optional.of(series);
            if (next.isEmpty()) {
                return false;
            }
            series = next.get();
        }
        return true;
    }
}
