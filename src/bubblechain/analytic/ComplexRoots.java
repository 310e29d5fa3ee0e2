package bubblechain.analytic;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Approximate positions of the pairs of complex roots of a squarefree polynomial over Q, by simultaneous iteration in
 * double precision (Weierstrass, Durand, Kerner). For listing only; no certified number rests on them.
 */
public final class ComplexRoots {
    private static final int ITERATIONS = 500;
    private static final double TOLERANCE = 1e-14;

    /** A pair re +- i im of roots, im &gt; 0, good to about ten digits. */
    public record Pair(double re, double im) {}

    private ComplexRoots() {}

    static List<Pair> of(Polynomial squarefree) {
        int n = squarefree.degree();
        int real = RealRoots.of(squarefree).size();
        if (n < 2 || real == n) {
            return List.of();
        }
        Polynomial monic = squarefree.monic();
        double[] re = new double[n];
        double[] im = new double[n];
        double radius = 0;
        for (int k = 0; k < n; k++) {
            radius = Math.max(radius, 1 + Math.abs(monic.coefficient(k).toDouble()));
        }
        double start = Math.pow(radius, 1.0 / n);
        for (int k = 0; k < n; k++) {
            re[k] = start * Math.cos(2 * Math.PI * k / n + 0.4);
            im[k] = start * Math.sin(2 * Math.PI * k / n + 0.4);
        }
        for (int i = 0; i < ITERATIONS && step(monic, re, im) > TOLERANCE; i++) {
            // each step moves every approximation
        }
        // exactly (n - real)/2 pairs exist: those with the largest imaginary parts
        List<Pair> candidates = new ArrayList<>();
        for (int k = 0; k < n; k++) {
            candidates.add(new Pair(re[k], im[k]));
        }
        candidates.sort(Comparator.comparingDouble((Pair p) -> -p.im()));
        List<Pair> pairs = new ArrayList<>(candidates.subList(0, (n - real) / 2));
        pairs.sort(Comparator.comparingDouble(p -> Math.hypot(p.re(), p.im())));
        return pairs;
    }

    /** One round of z_k -= p(z_k)/prod_{j != k}(z_k - z_j); returns the largest relative move. */
    private static double step(Polynomial monic, double[] re, double[] im) {
        double largest = 0;
        for (int k = 0; k < re.length; k++) {
            double valueRe = 0;
            double valueIm = 0;
            for (int j = monic.degree(); j >= 0; j--) {
                double t = valueRe * re[k] - valueIm * im[k] + monic.coefficient(j).toDouble();
                valueIm = valueRe * im[k] + valueIm * re[k];
                valueRe = t;
            }
            for (int j = 0; j < re.length; j++) {
                if (j != k) {
                    double dRe = re[k] - re[j];
                    double dIm = im[k] - im[j];
                    double norm = dRe * dRe + dIm * dIm;
                    double t = (valueRe * dRe + valueIm * dIm) / norm;
                    valueIm = (valueIm * dRe - valueRe * dIm) / norm;
                    valueRe = t;
                }
            }
            re[k] -= valueRe;
            im[k] -= valueIm;
            largest = Math.max(largest, Math.hypot(valueRe, valueIm) / Math.max(1e-300, Math.hypot(re[k], im[k])));
        }
        return largest;
    }
}
