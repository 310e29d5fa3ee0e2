package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.File;
import java.io.IOException;
import java.io.PrintStream;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The help must appear at once: it may not load the libraries that only some command needs. */
class StartUpTest {
    /** Loads the program afresh and remembers the names of all its classes and those of its libraries. */
    private static final class Recording extends URLClassLoader {
        private final List<String> loaded = new ArrayList<>();

        Recording(List<URL> places) {
            super(places.toArray(new URL[0]), ClassLoader.getPlatformClassLoader());
        }

        @Override
        protected Class<?> findClass(String name) throws ClassNotFoundException {
            loaded.add(name);
            return super.findClass(name);
        }
    }

    private static List<String> loadedBy(String... arguments) throws ReflectiveOperationException, IOException {
        List<URL> places = new ArrayList<>();
        for (String entry : System.getProperty("java.class.path").split(File.pathSeparator)) {
            places.add(new File(entry).toURI().toURL());
        }
        try (Recording loader = new Recording(places)) {
            PrintStream out = new PrintStream(new ByteArrayOutputStream(), false, StandardCharsets.UTF_8);
            Object status = loader.loadClass("bubblechain.cli.Main")
                    .getMethod("run", PrintStream.class, PrintStream.class, String[].class)
                    .invoke(null, out, out, arguments);
            assertThat(status).isEqualTo(0);
            return loader.loaded;
        }
    }

    @Test
    void theHelpLoadsNoNumericsAndNoFileFormats() throws ReflectiveOperationException, IOException {
        List<String> loaded = loadedBy("--help");
        assertThat(loaded).contains("bubblechain.cli.RootCommand", "picocli.CommandLine");
        assertThat(loaded).noneMatch(name -> name.startsWith("org.") || name.startsWith("com.") || name.startsWith("net."));
        assertThat(loaded.stream().filter(name -> name.startsWith("bubblechain.")))
                .allMatch(name -> name.matches("bubblechain\\.(cli|output|report)\\..*"));
    }
}
