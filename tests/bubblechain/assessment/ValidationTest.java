package bubblechain.assessment;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.kernel.KernelText;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ValidationTest {
    @TempDir
    private Path folder;

    @Test
    void everyFileOfTheLibraryKeepsItsPromises() {
        List<Validation.Finding> findings = Validation.library();
        assertThat(findings).isNotEmpty().allMatch(Validation.Finding::passed);
        assertThat(findings).anyMatch(f -> f.check().equals("the same as pole-mass"));
        assertThat(findings).noneMatch(f -> f.detail().contains("not proved equal"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "kind = 'coefficient'; n = '1'; value = '5'  | computed 2, promised 5, difference -3",
        "kind = 'nf-term'; n = '1'; value = '1'      | computed -1/18, promised 1, difference -1.0555555555555555556",
        "kind = 'laurent'; u = '1'; power = '-1'; value = '1' | computed -1, promised 1, difference -2",
        "kind = 'laurent'; u = '1'; power = '-2'; value = '1' | computed 0, promised 1, difference -1",
        "kind = 'laurent'; u = '3'; power = '-1'; value = '1' | computed 0, promised 1, difference -1",
        "kind = 'absent'; u = '1'                    | there is a pole",
        "kind = 'same-as'; kernel = 'adler'          | the normal forms differ"
    })
    void aBrokenPromiseIsFound(String check, String detail) {
        String path = KernelText.of("(1+u)/(1-u)/2+1/2-u/2+u/2").and("[[check]]\nsource = \"test\"\n"
                        + check.replace("; ", "\n").replace('\'', '"'))
                .replacing("(1+u)/(1-u)/2+1/2-u/2+u/2", check.contains("coefficient") ? "1+2*u" : "1/(1-u)")
                .in(folder);
        Validation.Finding last = Validation.of(path).get(1);
        assertThat(last.passed()).isFalse();
        assertThat(last.detail()).isEqualTo(detail);
    }

    /** c_1 = 1 with CF/beta0: CF (-4 TF/3)/16 = -1/18; any other prefactor shows. */
    @ParameterizedTest
    @CsvSource({"CF/beta0, true", "1/beta0, false", "4*CF/beta0, false", "pi*CF/beta0, false"})
    void aWrongPrefactorIsFoundByTheFlavourTerm(String prefactor, boolean passed) {
        String path = KernelText.of("1/(1-u)")
                .and("prefactor = \"" + prefactor + "\"\n[[check]]\nsource = \"test\"\nkind = \"nf-term\"\nn = \"1\"\nvalue = \"-1/18\"")
                .in(folder);
        assertThat(Validation.of(path).get(1).passed()).isEqualTo(passed);
    }

    @Test
    void aFileNamedByItsNeighbourIsFoundFromAnyFolder() throws IOException {
        Files.writeString(folder.resolve("other.toml"), KernelText.of("1/(1-u)").text());
        String path = KernelText.of("(1+u)/(1-u^2)")
                .and("[[check]]\nsource = \"test\"\nkind = \"same-as\"\nkernel = \"other.toml\"")
                .in(folder);
        assertThat(Validation.of(path)).contains(
                new Validation.Finding(path, "the same as other.toml", true, "identical normal forms"));
    }

    @Test
    void equalityThatOnlyBallsShowIsSaidToBeUnproved() {
        String path = KernelText.of("gamma(1/4)*gamma(3/4)")
                .and("[[check]]\nsource = \"reflection\"\nkind = \"coefficient\"\nn = \"0\"\nvalue = \"pi*sqrt(2)\"")
                .in(folder);
        Validation.Finding last = Validation.of(path).get(1);
        assertThat(last.passed()).isTrue();
        assertThat(last.detail()).startsWith("equal within ").endsWith(", not proved equal");
    }

    @Test
    void aDeclaredSingularityMustBeThere() {
        String path = KernelText.of("1/(1-u)").and("[[singularity]]\nu = \"2\"\nkind = \"IR\"").in(folder);
        assertThat(Validation.of(path)).contains(
                new Validation.Finding(path, "declared singularity at u = 2", false, "no pole there"));
    }

    @Test
    void aFolderIsReadToItsEndWhateverItHolds() throws IOException {
        Files.writeString(folder.resolve("a-good.toml"), KernelText.of("1/(1-u)").text());
        Files.writeString(folder.resolve("b-formula.toml"), KernelText.of("2u").text());
        Files.writeString(folder.resolve("c-vanishes.toml"), KernelText.of("1/(exp(2*u^2)-exp(u^2)^2)").text());
        Files.writeString(folder.resolve("d-text.toml"), "no toml");
        Files.writeString(folder.resolve("e-series.toml"), "name = \"x\"");
        Files.createDirectory(folder.resolve("f-folder.toml"));
        Files.writeString(folder.resolve("g-outside.toml"), KernelText.of("u/(exp(u)-1)")
                .and("[[singularity]]\nu = \"2\"\nkind = \"IR\"").text());
        Files.writeString(folder.resolve("notes.txt"), "not looked at");
        List<Validation.Finding> findings = Validation.of(folder.toString());
        assertThat(findings.stream().map(f -> Path.of(f.file()).getFileName() + " " + f.check() + " " + f.passed()))
                .containsExactly(
                        "a-good.toml kernel true", "b-formula.toml kernel false", "c-vanishes.toml kernel false",
                        "d-text.toml TOML false", "e-series.toml series false", "f-folder.toml TOML false",
                        "g-outside.toml kernel true", "g-outside.toml kernel false");
        assertThat(findings).allSatisfy(f -> assertThat(f.detail().lines()).hasSize(1));
    }

    @Test
    void whatIsNotThereIsRefused() throws IOException {
        assertThatThrownBy(() -> Validation.of("nosuch"))
                .isInstanceOf(DomainException.class)
                .hasMessage("'nosuch' is neither a file, nor a folder, nor a built-in name");
        Path empty = Files.createDirectory(folder.resolve("empty"));
        assertThatThrownBy(() -> Validation.of(empty.toString())).hasMessage("there is no .toml file below " + empty);
        assertThatThrownBy(() -> Validation.of("a\0b")).hasMessage("'a\0b' cannot be the name of a file");
    }
}
