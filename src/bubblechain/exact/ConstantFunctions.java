package bubblechain.exact;

import java.util.Optional;

/**
 * Elementary and special functions of exact constants: canonical at the rational arguments where {@link ExactFunctions}
 * has a closed form, opaque (known by their balls) elsewhere.
 */
public final class ConstantFunctions {
    /** Largest rational argument of gamma and its relatives, and largest integer exponent, in absolute value. */
    public static final int LARGEST_ARGUMENT = 10_000;

    private static final int LARGEST_ORDER = 1_000;
    private static final int GUARD_BITS = 32;

    private interface BallFunction {
        Ball apply(Ball argument, int bits);
    }

    private ConstantFunctions() {}

    /** base^exponent. @throws DomainException for a fractional power of a number that is not positive */
    public static ExactConstant power(ExactConstant base, ExactConstant exponent) {
        Optional<Rational> q = exponent.asRational();
        if (q.isPresent() && q.get().isInteger()) {
            return base.power(limited(q.get()).intValueExact());
        }
        Optional<ExactConstant> closed = q.flatMap(r -> base.rationalPower(limited(r)));
        return closed.orElseGet(() -> base.ln().multiply(exponent).exp());
    }

    /** Gamma(z). @throws DomainException at a pole */
    public static ExactConstant gamma(ExactConstant z) {
        return z.asRational()
                .map(q -> ExactFunctions.gamma(limited(q)))
                .orElseGet(() -> opaque("gamma(" + z + ")", z, BallFunctions::gamma));
    }

    /** The n-th derivative of psi, n of at least 0. @throws DomainException at a pole or for n out of range */
    public static ExactConstant polygamma(int n, ExactConstant z) {
        if (n < 0 || n > LARGEST_ORDER) {
            throw new DomainException("the order of a polygamma lies between 0 and " + LARGEST_ORDER + ", got " + n);
        }
        return z.asRational().map(q -> ExactFunctions.polygamma(n, limited(q))).orElseGet(() -> n == 0
                ? opaque("digamma(" + z + ")", z, BallFunctions::digamma)
                : opaque("polygamma(" + n + "," + z + ")", z, (x, bits) -> BallFunctions.polygamma(n, x, bits)));
    }

    /** sin(z + pi r). */
    public static ExactConstant sine(ExactConstant z, Rational r) {
        Optional<Rational> turns = z.multiply(ExactConstant.PI.inverse()).asRational();
        if (turns.isPresent()) {
            return ExactFunctions.sinPi(turns.get().add(r));
        }
        ExactConstant angle = z.add(ExactConstant.PI.multiply(r));
        return r.equals(Rational.HALF)
                ? opaque("cos(" + z + ")", z, BallFunctions::cos)
                : opaque("sin(" + angle + ")", angle, BallFunctions::sin);
    }

    /** Li_s(x) for an integer s of at least 1 and a rational x with |x| of at most 1/2. */
    public static ExactConstant polylog(int s, ExactConstant argument) {
        Optional<Rational> x = argument.asRational();
        if (s < 1 || s > LARGEST_ORDER || x.isEmpty() || x.get().abs().compareTo(Rational.HALF) > 0) {
            throw new DomainException("polylog(s, x) needs an integer s >= 1 and a rational x with |x| <= 1/2");
        }
        if (s == 1) {
            return ExactFunctions.ln(Rational.ONE.subtract(x.get())).negate();
        }
        return ExactConstant.opaque(
                "polylog(" + s + "," + x.get() + ")", bits -> BallFunctions.polylog(s, x.get(), bits));
    }

    private static Rational limited(Rational q) {
        if (q.abs().compareTo(Rational.of(LARGEST_ARGUMENT)) > 0) {
            throw new DomainException("the number " + q + " is larger than the limit " + LARGEST_ARGUMENT);
        }
        return q;
    }

    private static ExactConstant opaque(String text, ExactConstant argument, BallFunction function) {
        return ExactConstant.opaque(text, bits -> function.apply(argument.toBall(bits + GUARD_BITS), bits));
    }
}
