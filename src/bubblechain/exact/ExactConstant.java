package bubblechain.exact;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntFunction;
import org.jspecify.annotations.Nullable;

/**
 * An exact real constant: a finite sum of rational multiples of products of pi^(1/2), e^(r + s gammaE), p^q, gammaE,
 * zeta(3), zeta(5), ..., ln p, in canonical form. Immutable.
 *
 * <p>Canonical rules: zeta(2k) is a rational times pi^(2k), logarithms and roots of integers are split into primes,
 * fractional powers of a prime lie in (0,1). {@link #isZero} is therefore decided formally: a formal zero is zero. A
 * formal non-zero is no proof; use {@link #toBall} and look whether it excludes zero.
 *
 * <p>A constant may contain <em>opaque</em> numbers (gamma(1/4), sin(1), ...) known only by their balls; it is then
 * not {@link #isClosedForm}. {@code equals} means the same canonical form.
 */
public final class ExactConstant {
    public static final ExactConstant ZERO = new ExactConstant(Map.of());
    public static final ExactConstant ONE = of(Rational.ONE);
    public static final ExactConstant EULER_GAMMA = of(Monomial.of(Generator.EULER), Rational.ONE);
    public static final ExactConstant PI = of(Monomial.piPower(2), Rational.ONE);
    public static final ExactConstant SQRT_PI = of(Monomial.piPower(1), Rational.ONE);

    private static final Generator LN_PI =
            Generator.opaque("ln(pi)", bits -> BallFunctions.ln(BallFunctions.pi(bits + 8), bits));

    private final Map<Monomial, Rational> terms;

    private ExactConstant(Map<Monomial, Rational> terms) {
        this.terms = terms;
    }

    public static ExactConstant of(Rational value) {
        return of(Monomial.ONE, value);
    }

    public static ExactConstant of(long value) {
        return of(Rational.of(value));
    }

    static ExactConstant of(Monomial monomial, Rational coefficient) {
        return coefficient.isZero() ? ZERO : new ExactConstant(Map.of(monomial, coefficient));
    }

    /** The sum of the terms of a map that nobody changes any more; no coefficient is zero. */
    static ExactConstant ofTerms(Map<Monomial, Rational> terms) {
        return wrap(terms);
    }

    Map<Monomial, Rational> terms() {
        return terms;
    }

    /**
     * A number known only by its balls.
     *
     * @param text  its expression in the formula language; equal texts are taken as equal numbers
     * @param value a ball that encloses the number, for any working precision in bits
     */
    public static ExactConstant opaque(String text, IntFunction<Ball> value) {
        return of(Monomial.of(Generator.opaque(text, value)), Rational.ONE);
    }

    public boolean isZero() {
        return terms.isEmpty();
    }

    /** The value if this constant is a rational number, formally. */
    public Optional<Rational> asRational() {
        if (terms.isEmpty()) {
            return Optional.of(Rational.ZERO);
        }
        return terms.size() == 1 ? Optional.ofNullable(terms.get(Monomial.ONE)) : Optional.empty();
    }

    /** The rational term of the canonical form. */
    public Rational rationalPart() {
        return terms.getOrDefault(Monomial.ONE, Rational.ZERO);
    }

    /** True if no opaque number occurs, so that {@link #toString} is a closed form. */
    public boolean isClosedForm() {
        return terms.keySet().stream().noneMatch(Monomial::isOpaque);
    }

    /** Number of terms of the canonical form. */
    public int size() {
        return terms.size();
    }

    public ExactConstant add(ExactConstant other) {
        if (isZero()) {
            return other;
        }
        if (other.isZero()) {
            return this;
        }
        Map<Monomial, Rational> sum = new HashMap<>(terms);
        for (Map.Entry<Monomial, Rational> term : other.terms.entrySet()) {
            accumulate(sum, term.getKey(), term.getValue());
        }
        return wrap(sum);
    }

    public ExactConstant subtract(ExactConstant other) {
        return add(other.negate());
    }

    public ExactConstant negate() {
        return multiply(Rational.of(-1));
    }

    public ExactConstant multiply(Rational factor) {
        if (factor.isZero()) {
            return ZERO;
        }
        if (factor.equals(Rational.ONE)) {
            return this;
        }
        Map<Monomial, Rational> product = new HashMap<>();
        for (Map.Entry<Monomial, Rational> term : terms.entrySet()) {
            product.put(term.getKey(), term.getValue().multiply(factor));
        }
        return new ExactConstant(product);
    }

    public ExactConstant multiply(ExactConstant other) {
        Map<Monomial, Rational> product = new HashMap<>();
        for (Map.Entry<Monomial, Rational> left : terms.entrySet()) {
            for (Map.Entry<Monomial, Rational> right : other.terms.entrySet()) {
                Monomial.Product p = left.getKey().multiply(right.getKey());
                Rational coefficient = left.getValue().multiply(right.getValue());
                accumulate(
                        product,
                        p.monomial(),
                        p.factor().equals(Rational.ONE) ? coefficient : coefficient.multiply(p.factor()));
            }
        }
        return wrap(product);
    }

    static void accumulate(Map<Monomial, Rational> sum, Monomial monomial, Rational coefficient) {
        Rational total = sum.containsKey(monomial) ? sum.get(monomial).add(coefficient) : coefficient;
        if (total.isZero()) {
            sum.remove(monomial);
        } else {
            sum.put(monomial, total);
        }
    }

    private static ExactConstant wrap(Map<Monomial, Rational> sum) {
        return sum.isEmpty() ? ZERO : new ExactConstant(sum);
    }

    public ExactConstant divide(Rational divisor) {
        return multiply(divisor.inverse());
    }

    /** @throws ArithmeticException if the exponent is negative and this is formally zero */
    public ExactConstant power(int exponent) {
        if (exponent < 0) {
            return inverse().power(-exponent);
        }
        ExactConstant result = ONE;
        ExactConstant square = this;
        for (int e = exponent; e > 0; e >>= 1) {
            if ((e & 1) == 1) {
                result = result.multiply(square);
            }
            if (e > 1) {
                square = square.multiply(square);
            }
        }
        return result;
    }

    /**
     * 1/this: canonical if this is a single product without gammaE, zeta values and logarithms, else opaque.
     *
     * @throws ArithmeticException if this is formally zero
     */
    public ExactConstant inverse() {
        if (isZero()) {
            throw new ArithmeticException("division by zero");
        }
        if (terms.size() == 1) {
            Map.Entry<Monomial, Rational> only = terms.entrySet().iterator().next();
            if (only.getKey().isUnit()) {
                Monomial.Product p = only.getKey().inverse();
                return of(p.monomial(), p.factor().divide(only.getValue()));
            }
        }
        return opaque("(1/(" + this + "))", bits -> Ball.ONE.divide(refinedBall(bits), bits));
    }

    /** A ball for this constant whose relative accuracy is close to {@code bits}, however much cancels. */
    private Ball refinedBall(int bits) {
        for (int working = bits + 16; ; working *= 2) {
            Ball ball = toBall(working);
            if (ball.accuracyBits() >= bits || working > 8 * bits + 4096) {
                return ball;
            }
        }
    }

    /** e^this; a part of the exponent that is not r + s gammaE + sum q ln p + (k/2) ln(pi) gives an opaque factor. */
    public ExactConstant exp() {
        Rational plain = Rational.ZERO;
        Rational euler = Rational.ZERO;
        ExactConstant result = ONE;
        ExactConstant rest = ZERO;
        for (Map.Entry<Monomial, Rational> term : terms.entrySet()) {
            @Nullable Generator generator = term.getKey().asGenerator();
            if (term.getKey().isOne()) {
                plain = term.getValue();
            } else if (generator != null && generator.isEuler()) {
                euler = term.getValue();
            } else if (generator != null && generator.isLog()) {
                result = result.multiply(ExactFunctions.primePower(generator.index(), term.getValue()));
            } else if (generator != null && generator.equals(LN_PI)) {
                // pi^q: the half-integer part of q is canonical
                Rational half = Rational.of(term.getValue().multiply(2).floor(), BigInteger.TWO);
                result = result.multiply(of(Monomial.piPower(half.multiply(2).intValueExact()), Rational.ONE));
                rest = rest.add(of(term.getKey(), term.getValue().subtract(half)));
            } else {
                rest = rest.add(of(term.getKey(), term.getValue()));
            }
        }
        if (!plain.isZero() || !euler.isZero()) {
            result = result.multiply(of(Monomial.exp(plain, euler), Rational.ONE));
        }
        if (!rest.isZero()) {
            ExactConstant exponent = rest;
            result = result.multiply(opaque(
                    "exp(" + exponent + ")", bits -> BallFunctions.exp(exponent.toBall(bits + 16), bits)));
        }
        return result;
    }

    /**
     * This to a rational power in canonical form: for a positive rational times powers of pi, primes and exponentials whose
     * power of pi stays a multiple of 1/2.
     */
    Optional<ExactConstant> rationalPower(Rational q) {
        if (terms.size() != 1) {
            return Optional.empty();
        }
        Map.Entry<Monomial, Rational> only = terms.entrySet().iterator().next();
        Monomial monomial = only.getKey();
        Rational halfPi = q.multiply(monomial.halfPi());
        if (monomial.hasGenerators() || only.getValue().signum() <= 0 || !halfPi.isInteger()) {
            return Optional.empty();
        }
        ExactConstant result = ExactFunctions.power(only.getValue(), q)
                .multiply(of(Monomial.piPower(halfPi.intValueExact()), Rational.ONE))
                .multiply(of(
                        Monomial.exp(monomial.exponent().multiply(q), monomial.eulerExponent().multiply(q)),
                        Rational.ONE));
        for (Map.Entry<BigInteger, Rational> root : monomial.roots().entrySet()) {
            result = result.multiply(ExactFunctions.primePower(root.getKey(), root.getValue().multiply(q)));
        }
        return Optional.of(result);
    }

    /**
     * The natural logarithm: split into the logarithms of the factors if this is a single positive product.
     *
     * @throws DomainException if the constant is not positive
     */
    public ExactConstant ln() {
        Ball ball = refinedBall(64);
        if (!ball.isPositive()) {
            throw new DomainException("the logarithm needs a positive number, got " + this);
        }
        if (terms.size() == 1) {
            Map.Entry<Monomial, Rational> only = terms.entrySet().iterator().next();
            Monomial monomial = only.getKey();
            if (!monomial.hasGenerators()) {
                ExactConstant sum = ExactFunctions.ln(only.getValue())
                        .add(of(monomial.exponent()))
                        .add(EULER_GAMMA.multiply(monomial.eulerExponent()));
                for (Map.Entry<BigInteger, Rational> root : monomial.roots().entrySet()) {
                    sum = sum.add(ExactFunctions.ln(Rational.of(root.getKey())).multiply(root.getValue()));
                }
                if (monomial.halfPi() != 0) {
                    sum = sum.add(of(Monomial.of(LN_PI), Rational.of(monomial.halfPi(), 2)));
                }
                return sum;
            }
        }
        return opaque("ln(" + this + ")", bits -> BallFunctions.ln(refinedBall(bits + 8), bits));
    }

    /**
     * A ball that encloses this constant. The working precision is {@code bits} for each term; cancellation between
     * terms widens the relative radius, and the caller asks again with more bits if that matters.
     */
    public Ball toBall(int bits) {
        Ball sum = Ball.ZERO;
        for (Map.Entry<Monomial, Rational> term : terms.entrySet()) {
            Ball value = term.getKey().isOne()
                    ? Ball.of(term.getValue(), bits)
                    : term.getKey().toBall(bits).multiply(term.getValue(), bits);
            sum = sum.add(value, bits);
        }
        return sum;
    }

    /** The products of this sum: each a coefficient times a constant of one term with coefficient one. */
    public Map<ExactConstant, Rational> products() {
        Map<ExactConstant, Rational> parts = new HashMap<>();
        for (Map.Entry<Monomial, Rational> term : terms.entrySet()) {
            parts.put(of(term.getKey(), Rational.ONE), term.getValue());
        }
        return parts;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof ExactConstant c && terms.equals(c.terms);
    }

    @Override
    public int hashCode() {
        return terms.hashCode();
    }

    /** The constant in the formula language, highest weight first: "14*zeta(3)+13*pi^2/3+2353/216". */
    @Override
    public String toString() {
        if (isZero()) {
            return "0";
        }
        List<Printed> printed = new ArrayList<>(terms.size());
        terms.forEach((monomial, coefficient) ->
                printed.add(new Printed(monomial.doubledWeight(), termText(monomial, coefficient))));
        printed.sort(Comparator.comparingInt(Printed::weight).reversed().thenComparing(Printed::text));
        StringBuilder result = new StringBuilder();
        for (Printed term : printed) {
            if (result.length() > 0 && term.text().charAt(0) != '-') {
                result.append('+');
            }
            result.append(term.text());
        }
        return result.toString();
    }

    private record Printed(int weight, String text) {}

    private static String termText(Monomial monomial, Rational coefficient) {
        List<String> above = new ArrayList<>();
        List<String> below = new ArrayList<>();
        monomial.appendFactors(above, below);
        BigInteger numerator = coefficient.numerator().abs();
        if (!numerator.equals(BigInteger.ONE) || above.isEmpty()) {
            above.add(0, numerator.toString());
        }
        if (!coefficient.denominator().equals(BigInteger.ONE)) {
            below.add(0, coefficient.denominator().toString());
        }
        String text = String.join("*", above);
        if (!below.isEmpty()) {
            text += "/" + String.join("/", below);
        }
        return coefficient.signum() < 0 ? "-" + text : text;
    }
}
