package bubblechain.assessment;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.borel.BorelPlane;
import bubblechain.borel.BorelPole;
import bubblechain.chain.Chain;
import bubblechain.chain.FlavourTerm;
import bubblechain.chain.Scales;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelCheck;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.SudakovSubtraction;
import bubblechain.toml.TomlFile;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Recomputes the numbers that kernel files promise, and reads series files through. */
public final class Validation {
    private static final int BITS = 512;

    /**
     * One thing checked.
     *
     * @param file   file or built-in name
     * @param check  what was checked
     * @param passed whether it holds
     * @param detail what was found
     */
    public record Finding(String file, String check, boolean passed, String detail) {}

    private Validation() {}

    /** Every built-in kernel and series. */
    public static List<Finding> library() {
        List<Finding> findings = new ArrayList<>();
        KernelLibrary.names().forEach(name -> findings.addAll(kernel(name)));
        SeriesLibrary.names().forEach(name -> findings.addAll(series(name)));
        return findings;
    }

    /**
     * A file, every .toml file below a folder, or a built-in name.
     *
     * @throws DomainException if there is no such file or name
     */
    public static List<Finding> of(String nameOrPath) {
        Path path = TomlFile.path(nameOrPath);
        if (Files.isDirectory(path)) {
            return folder(path);
        }
        if (Files.exists(path)) {
            return file(nameOrPath);
        }
        boolean known = KernelLibrary.contains(nameOrPath) || SeriesLibrary.names().contains(nameOrPath);
        if (!known) {
            throw new DomainException("'" + nameOrPath + "' is neither a file, nor a folder, nor a built-in name");
        }
        List<Finding> findings = new ArrayList<>();
        if (KernelLibrary.contains(nameOrPath)) {
            findings.addAll(kernel(nameOrPath));
        }
        if (SeriesLibrary.names().contains(nameOrPath)) {
            findings.addAll(series(nameOrPath));
        }
        return findings;
    }

    private static List<Finding> folder(Path folder) {
        List<Path> files;
        try (Stream<Path> walk = Files.walk(folder)) {
            files = walk.filter(p -> p.toString().endsWith(".toml")).sorted().toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        if (files.isEmpty()) {
            throw new DomainException("there is no .toml file below " + folder);
        }
        List<Finding> findings = new ArrayList<>();
        files.forEach(file -> findings.addAll(file(file.toString())));
        return findings;
    }

    private static List<Finding> file(String path) {
        boolean isKernel;
        try {
            isKernel = TomlFile.read(Path.of(path)).keys().contains("form");
        } catch (DomainException e) {
            return List.of(failure(path, "TOML", e));
        }
        return isKernel ? kernel(path) : series(path);
    }

    private static List<Finding> series(String nameOrPath) {
        try {
            PerturbativeSeries series = SeriesLibrary.find(nameOrPath);
            for (int n = 1; n <= series.loops(); n++) {
                series.flavourCoefficients(n);
            }
            return List.of(new Finding(
                    nameOrPath, "series", true, series.loops() + " coefficients, polynomials in nf"));
        } catch (DomainException | PrecisionException e) {
            return List.of(failure(nameOrPath, "series", e));
        }
    }

    private static List<Finding> kernel(String nameOrPath) {
        List<Finding> findings = new ArrayList<>();
        try {
            Kernel kernel = KernelLibrary.load(nameOrPath);
            findings.add(new Finding(nameOrPath, "kernel", true, "finite at u = 0"));
            for (KernelCheck check : kernel.checks()) {
                findings.add(finding(nameOrPath, kernel, check));
            }
            for (var note : kernel.singularities()) {
                boolean present = BorelPlane.of(kernel, Scales.NATURAL).poleAt(note.u()).isPresent();
                findings.add(new Finding(
                        nameOrPath, "declared singularity at u = " + note.u(), present, present ? "a pole" : "no pole there"));
            }
        } catch (DomainException | PrecisionException e) {
            findings.add(failure(nameOrPath, "kernel", e));
        }
        return findings;
    }

    /** The first line of the reason; the underlined formula below it needs lines of its own. */
    private static Finding failure(String file, String check, RuntimeException reason) {
        String detail = String.valueOf(reason.getMessage()).lines().findFirst().orElse("");
        return new Finding(file, check, false, detail);
    }

    private static Finding finding(String file, Kernel kernel, KernelCheck check) {
        if (check instanceof KernelCheck.Coefficient c) {
            ExactConstant found = Chain.of(kernel).exact(c.n() + 1).get(c.n());
            return compared(file, "c_" + c.n(), found, c.value());
        }
        if (check instanceof KernelCheck.FlavourTerm f) {
            ExactConstant coefficient = Chain.of(kernel).exact(f.n() + 1).get(f.n());
            return compared(
                    file, "nf^" + f.n() + " term", FlavourTerm.perAlphaOverPi(kernel, f.n(), coefficient), f.value());
        }
        if (check instanceof KernelCheck.Laurent l) {
            Optional<BorelPole> pole = BorelPlane.of(kernel, Scales.NATURAL).poleAt(l.u());
            String what = "(u-" + l.u() + ")^(" + l.power() + ")";
            if (pole.isEmpty() || l.power() > -1 || l.power() < -pole.get().pole().order()) {
                return compared(file, what, ExactConstant.ZERO, l.value());
            }
            return compared(file, what, pole.get().pole().coefficient(l.power()), l.value());
        }
        if (check instanceof KernelCheck.Absent a) {
            boolean absent = BorelPlane.of(kernel, Scales.NATURAL).poleAt(a.u()).isEmpty();
            return new Finding(file, "no pole at u = " + a.u(), absent, absent ? "none" : "there is a pole");
        }
        KernelCheck.SameAs same = (KernelCheck.SameAs) check;
        Kernel other = KernelLibrary.loadMentioned(same.kernel(), file);
        boolean equal = equal(kernel.transform(), other.transform())
                && equal(kernel.anomalousDimension(), other.anomalousDimension())
                && equal(kernel.sudakov().map(SudakovSubtraction::cusp), other.sudakov().map(SudakovSubtraction::cusp))
                && equal(kernel.sudakov().map(SudakovSubtraction::slope), other.sudakov().map(SudakovSubtraction::slope));
        return new Finding(
                file, "the same as " + same.kernel(), equal, equal ? "identical normal forms" : "the normal forms differ");
    }

    private static boolean equal(Optional<AnalyticFunction> left, Optional<AnalyticFunction> right) {
        if (left.isEmpty() || right.isEmpty()) {
            return left.isEmpty() && right.isEmpty();
        }
        return left.get().requireNormalForm().subtract(right.get().requireNormalForm()).isZero();
    }

    private static Finding compared(String file, String what, ExactConstant found, ExactConstant promised) {
        ExactConstant difference = found.subtract(promised);
        if (difference.isZero()) {
            return new Finding(file, what, true, "exactly " + found);
        }
        Ball size = difference.toBall(BITS);
        boolean undecided = size.containsZero();
        String detail = undecided
                ? "equal within " + size.upperBound().toDouble() + ", not proved equal"
                : "computed " + found + ", promised " + promised + ", difference " + size;
        return new Finding(file, what, undecided, detail);
    }
}
