package bubblechain.exact;

import java.util.Optional;

/**
 * Elementary and special functions of exact constants: canonical at the rational arguments where {@link ExactFunctions}
 * has a closed form, opaque (known by their balls) elsewhere.
 */
public final class ConstantFunctions {
    /** Largest rational argument of gamma and its relatives, and largest integer exponent, in absolute value. */
    public static final int LARGEST_ARGUMENT = 10_000;

    /** Largest order of polygamma and polylog, and largest argument of zeta. */
    public static final int LARGEST_ORDER = 1_000;
    private static final int GUARD_BITS = 32;

    /** Order times argument of a polygamma: the size of the rational number its recurrence leaves. */
    private static final int LARGEST_RECURRENCE = 20_000;

    /** Terms of a power of a sum. */
    private static final int LARGEST_SUM = 2_000;

    private interface BallFunction {
        Ball apply(Ball argument, int bits);
    }

    private ConstantFunctions() {}

    /** base^exponent. @throws DomainException for a fractional power of a number that is not positive */
    public static ExactConstant power(ExactConstant base, ExactConstant exponent) {
        Optional<Rational> q = exponent.asRational();
        if (q.isPresent() && q.get().isInteger()) {
            return integerPower(base, limited(q.get()).intValueExact());
        }
        if (q.isPresent() && base.asRational().isPresent()) {
            return ExactFunctions.power(base.asRational().get(), limited(q.get()));
        }
        Optional<ExactConstant> closed = q.flatMap(r -> base.rationalPower(limited(r)));
        return closed.orElseGet(() -> base.ln().multiply(exponent).exp());
    }

    private static ExactConstant integerPower(ExactConstant base, int n) {
        if (base.asRational().isPresent()) {
            return ExactFunctions.power(base.asRational().get(), Rational.of(n));
        }
        // a sum of t terms to the power n has up to (n+1)(n+2)...(n+t-1)/(t-1)! terms
        double terms = 1;
        for (int t = 1; t < base.size() && n > 0; t++) {
            terms *= (n + t) / (double) t;
        }
        if (terms > LARGEST_SUM) {
            throw new DomainException("the power " + n + " of a sum of " + base.size() + " terms has more than "
                    + LARGEST_SUM + " terms");
        }
        return base.power(n);
    }

    /** zeta(k). @throws DomainException at the pole k = 1 and beyond |k| = 1000 */
    public static ExactConstant zeta(int k) {
        if (Math.abs(k) > LARGEST_ORDER) {
            throw new DomainException("the argument of zeta lies between -" + LARGEST_ORDER + " and " + LARGEST_ORDER
                    + ", got " + k);
        }
        return ExactFunctions.zeta(k);
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
        Optional<Rational> argument = z.asRational();
        if (argument.isPresent()
                && argument.get().abs().multiply(n + 1).compareTo(Rational.of(LARGEST_RECURRENCE)) > 0) {
            throw new DomainException("the " + n + "-th derivative of psi at " + argument.get()
                    + " is too long a number; order plus one times argument may reach " + LARGEST_RECURRENCE);
        }
        return argument.map(q -> ExactFunctions.polygamma(n, limited(q))).orElseGet(() -> n == 0
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
        if (x.get().isZero()) {
            return ExactConstant.ZERO;
        }
        if (s == 1) {
            return ExactFunctions.ln(Rational.ONE.subtract(x.get())).negate();
        }
        return ExactConstant.opaque(
                "polylog(" + s + "," + x.get() + ")", bits -> BallFunctions.polylog(s, x.get(), bits));
    }

    /** The n-th derivative of {@link UnitHypergeometric}. @throws DomainException at a pole, or for a number not rational */
    public static ExactConstant unit3f2(int n, ExactConstant z) {
        Rational q = z.asRational()
                .orElseThrow(() -> new DomainException("unit_3f2(n, z) of a constant needs a rational z, got " + z));
        if (q.abs().compareTo(Rational.of(UnitHypergeometric.LARGEST_ARGUMENT)) > 0) {
            throw new DomainException("the argument of unit_3f2 lies between -" + UnitHypergeometric.LARGEST_ARGUMENT + " and "
                    + UnitHypergeometric.LARGEST_ARGUMENT + ", got " + q);
        }
        return UnitHypergeometric.value(n, q);
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
