package bubblechain.kernel;

import bubblechain.exact.Rational;
import bubblechain.report.NearestNames;
import bubblechain.toml.TomlFile;
import bubblechain.toml.TomlSection;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;
import java.util.zip.ZipFile;

/** Finds kernels: the built-in ones by name, those of the user by the path of their file. */
public final class KernelLibrary {
    private static final String FOLDER = "kernels/";
    private static final String ENDING = ".toml";

    private KernelLibrary() {}

    /** Looked for once: the program does not change while it runs. */
    private static final class Shipped {
        private static final SortedMap<String, String> RESOURCES = Collections.unmodifiableSortedMap(find());
    }

    /** The built-in names in alphabetical order. */
    public static List<String> names() {
        return List.copyOf(resources().keySet());
    }

    /** The kernel of a built-in name or of a file. @throws KernelException if there is none, naming the nearest */
    public static Kernel load(String nameOrPath) {
        return load(nameOrPath, Map.of());
    }

    /**
     * The kernel of a built-in name or of a file.
     *
     * @param nameOrPath a path if it has a slash or ends in .toml, else a built-in name
     * @param parameters values for the parameters of a family
     * @throws KernelException if there is no such kernel
     * @throws bubblechain.toml.TomlException if the file is malformed
     */
    public static Kernel load(String nameOrPath, Map<String, Rational> parameters) {
        return new NestedLoading().load(nameOrPath, parameters);
    }

    /**
     * The kernel a file mentions: a built-in name, or a path, a relative one from the folder of that file.
     *
     * @param nameOrPath what the file says
     * @param file       the path or the built-in name of the file
     * @throws KernelException if there is no such kernel
     */
    public static Kernel loadMentioned(String nameOrPath, String file) {
        return load(NestedLoading.place(nameOrPath, file));
    }

    /** True if this is the name of a built-in kernel. */
    public static boolean contains(String name) {
        return resources().containsKey(name);
    }

    /** True for a built-in name and for what can only be a file: it ends in .toml, or has a slash and is there. */
    public static boolean isNameOrFile(String text) {
        return contains(text) || text.endsWith(ENDING) || isPath(text) && Files.exists(TomlFile.path(text));
    }

    /** The field of a built-in kernel, which is its folder: "heavy-quark"; empty for any other name. */
    public static Optional<String> field(String name) {
        return Optional.ofNullable(resources().get(name))
                .filter(resource -> resource.lastIndexOf('/') > FOLDER.length())
                .map(resource -> resource.substring(FOLDER.length(), resource.lastIndexOf('/')));
    }

    static TomlSection open(String nameOrPath) {
        if (isPath(nameOrPath)) {
            return TomlFile.read(TomlFile.path(nameOrPath));
        }
        SortedMap<String, String> resources = resources();
        String resource = resources.get(nameOrPath);
        if (resource == null) {
            List<String> nearest = NearestNames.of(nameOrPath, resources.keySet());
            String hint = nearest.isEmpty() ? "'bubblechain kernels' lists them" : "did you mean " + String.join(", ", nearest) + "?";
            throw new KernelException("no kernel is named '" + nameOrPath + "'; " + hint
                    + " (a file of your own is given by its path, ending in .toml)");
        }
        try (InputStream stream = KernelLibrary.class.getResourceAsStream("/" + resource)) {
            if (stream == null) {
                throw new KernelException("the built-in kernel '" + nameOrPath + "' is missing from the program");
            }
            return TomlFile.read(stream, resource);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** True if this is the path of a file and not a built-in name. */
    static boolean isPath(String nameOrPath) {
        return nameOrPath.endsWith(ENDING) || nameOrPath.contains("/") || nameOrPath.contains("\\");
    }

    /** Name to resource: the file name without its ending, in any folder below kernels/. */
    private static SortedMap<String, String> resources() {
        return Shipped.RESOURCES;
    }

    private static SortedMap<String, String> find() {
        SortedMap<String, String> found = new TreeMap<>();
        try {
            Path home = Path.of(KernelLibrary.class.getProtectionDomain().getCodeSource().getLocation().toURI());
            if (Files.isDirectory(home)) {
                try (Stream<Path> files = Files.walk(home.resolve(FOLDER))) {
                    files.forEach(file -> add(home.relativize(file).toString().replace('\\', '/'), found));
                }
            } else {
                try (ZipFile jar = new ZipFile(home.toFile())) {
                    jar.stream().forEach(entry -> add(entry.getName(), found));
                }
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (URISyntaxException e) {
            throw new IllegalStateException("the program does not know where it is", e);
        }
        return found;
    }

    private static void add(String resource, Map<String, String> found) {
        if (resource.startsWith(FOLDER) && resource.endsWith(ENDING)) {
            String name = resource.substring(resource.lastIndexOf('/') + 1, resource.length() - ENDING.length());
            found.put(name, resource);
        }
    }
}
