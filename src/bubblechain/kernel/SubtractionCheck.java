package bubblechain.kernel;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.LaurentSeries;
import java.util.List;
import java.util.Optional;

/** B(u) = T(u) - Gtilde(u)/u must be finite at u = 0. */
final class SubtractionCheck {
    /** ln D(eps)/eps at eps = 0, D the massless bubble. */
    private static final Rational FIVE_THIRDS = Rational.of(5, 3);

    private SubtractionCheck() {}

    /** @throws KernelException if a pole of B(u) at u = 0 is left, with its residue */
    static void require(Kernel kernel) {
        if (kernel.transform().isEmpty()) {
            // the anomalous dimension is the quantity: it only has to have a value at a = 0
            kernel.anomalousDimension().ifPresent(gamma -> gamma.valueAt(Rational.ZERO));
            kernel.sudakov().ifPresent(SubtractionCheck::start);
            return;
        }
        if (kernel.sudakov().isPresent()) {
            requireDoublePole(kernel.transform().get().exact(Rational.ZERO, 0), start(kernel.sudakov().get()));
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
        Optional<ExactConstant> half = kernel.anomalousDimension().isPresent()
                ? Optional.of(kernel.anomalousDimension().get().valueAt(Rational.ZERO).divide(Rational.TWO))
                : Optional.empty();
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

    /** g_0 and s_0 = h_0 = F_01. */
    private static List<ExactConstant> start(SudakovSubtraction sudakov) {
        ExactConstant cusp = sudakov.cusp().valueAt(Rational.ZERO);
        return List.of(cusp, sudakov.slope().valueAt(Rational.ZERO).add(cusp.multiply(FIVE_THIRDS)));
    }

    private static void requireDoublePole(LaurentSeries<ExactConstant> principal, List<ExactConstant> subtracted) {
        for (int order = Math.max(2, -principal.lowest()); order >= 1; order--) {
            int index = -order - principal.lowest();
            ExactConstant found = index < 0 || index >= principal.length() ? ExactConstant.ZERO : principal.coefficients().get(index);
            ExactConstant expected = order > 2 ? ExactConstant.ZERO : subtracted.get(2 - order);
            if (!found.subtract(expected).isZero()) {
                throw new KernelException("the pole of T(u) at u = 0 does not cancel: its part u^-" + order + " is "
                        + shown(found) + ", the subtraction takes away " + shown(expected));
            }
        }
    }

    private static String shown(ExactConstant value) {
        return value + (value.asRational().isPresent() ? "" : " = " + value.toBall(64));
    }
}
