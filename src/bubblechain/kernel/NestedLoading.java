package bubblechain.kernel;

import bubblechain.exact.Rational;
import bubblechain.toml.TomlSection;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Map;

/** Loading of one kernel with all the kernels it is combined of, which may not contain it again. */
final class NestedLoading {
    /** Files that one combination may read in all, so that a few short files cannot ask for millions. */
    private static final int LARGEST_COUNT = 100;

    private final Deque<String> open = new ArrayDeque<>();
    private int count;

    /** @throws KernelException if there is no such kernel, or it contains itself */
    Kernel load(String nameOrPath, Map<String, Rational> parameters) {
        String place = open.isEmpty() ? nameOrPath : place(nameOrPath, open.getFirst());
        if (open.contains(place)) {
            throw new KernelException("the combination " + open.getLast() + " contains itself: " + open.getFirst()
                    + " has the part " + nameOrPath);
        }
        if (++count > LARGEST_COUNT) {
            throw new KernelException("the combination " + open.getLast() + " has more than " + LARGEST_COUNT + " parts in all");
        }
        if (!open.isEmpty() && KernelLibrary.isPath(place) && !Files.isReadable(Path.of(place))) {
            throw new KernelException("the part " + nameOrPath + " cannot be read: there is no readable file " + place);
        }
        TomlSection file = KernelLibrary.open(place);
        open.push(place);
        Kernel kernel = KernelFile.read(file, parameters, this::load);
        open.pop();
        return kernel;
    }

    /** A built-in name, or a path, relative ones from the folder of the file that mentions it. */
    static String place(String nameOrPath, String file) {
        if (!KernelLibrary.isPath(nameOrPath) || !KernelLibrary.isPath(file)) {
            return nameOrPath;
        }
        try {
            String path = Path.of(file).resolveSibling(nameOrPath).normalize().toString();
            return KernelLibrary.isPath(path) ? path : "./" + path;
        } catch (InvalidPathException e) {
            throw new KernelException("'" + nameOrPath + "' is not a path");
        }
    }
}
