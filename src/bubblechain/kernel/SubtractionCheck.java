package bubblechain.kernel;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.LaurentSeries;
import java.util.Optional;

/** B(u) = T(u) - Gtilde(u)/u must be finite at u = 0. */
final class SubtractionCheck {
    private SubtractionCheck() {}

    /** @throws KernelException if a pole of B(u) at u = 0 is left, with its residue */
    static void require(Kernel kernel) {
        if (kernel.transform().isEmpty()) {
            // the anomalous dimension is the quantity: it only has to have a value at a = 0
            kernel.anomalousDimension().ifPresent(gamma -> gamma.valueAt(Rational.ZERO));
            return;
        }
        LaurentSeries<ExactConstant> principal = kernel.transform().get().exact(Rational.ZERO, 0);
        if (principal.length() > 0 && principal.lowest() < -1) {
            throw new KernelException("T(u) has a pole of order " + -principal.lowest()
                    + " at u = 0, leading coefficient " + shown(principal.coefficients().get(0))
                    + "; one subtraction takes away a simple pole only");
        }
        ExactConstant residue = principal.length() == 0 || principal.lowest() > -1
                ? ExactConstant.ZERO
                : principal.coefficients().get(-1 - principal.lowest());
        Optional<ExactConstant> half = kernel.anomalousDimension()
                .map(gamma -> gamma.valueAt(Rational.ZERO).divide(Rational.TWO));
        ExactConstant left = residue.subtract(half.orElse(ExactConstant.ZERO));
        if (!left.isZero()) {
            String reason = half.isEmpty()
                    ? "and no anomalous_dimension is given that would subtract it"
                    : "of which the anomalous dimension takes away gamma(0)/2 = " + shown(half.get()) + ", leaving "
                            + shown(left);
            throw new KernelException(
                    "the 1/u pole does not cancel: T(u) has residue " + shown(residue) + " at u = 0, " + reason);
        }
    }

    private static String shown(ExactConstant value) {
        return value + (value.asRational().isPresent() ? "" : " = " + value.toBall(64));
    }
}
