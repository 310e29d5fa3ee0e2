package bubblechain;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.net.URI;
import java.net.URISyntaxException;
import java.net.URL;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** The directions of imports between packages and the packages that may use each library. */
class ArchitectureTest {
    /** A package may use those before it. */
    private static final List<String> ORDER = List.of(
            "exact", "series", "report", "bibliography", "formula", "toml", "analytic", "numeric", "qcd", "kernel", "chain", "borel",
            "fixedorder", "sumrule", "forecast", "assessment", "output", "cli");

    private static JavaClasses classes = new ClassFileImporter().importClasses(Set.of());

    @BeforeAll
    static void readTheClasses() {
        classes = new ClassFileImporter()
                .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
                .importPackages("bubblechain");
    }

    private static String packageOf(JavaClass type) {
        String name = type.getPackageName();
        return name.equals("bubblechain") ? "" : name.substring("bubblechain.".length());
    }

    /** The packages, as patterns, that come after one in the order. */
    private static String[] after(int position) {
        return patterns(ORDER.subList(position + 1, ORDER.size()));
    }

    private static String[] allBut(String... allowed) {
        return patterns(ORDER.stream().filter(name -> !Arrays.asList(allowed).contains(name)).toList());
    }

    private static String[] patterns(List<String> names) {
        return names.stream().map(name -> "bubblechain." + name + "..").toArray(String[]::new);
    }

    @Test
    void everyPackageHasItsPlaceInTheOrder() {
        Set<String> found = new TreeSet<>();
        classes.forEach(type -> found.add(packageOf(type)));
        assertThat(found).isNotEmpty();
        assertThat(ORDER).containsAll(found);
    }

    @Test
    void packagesUseOnlyThoseBeforeThem() {
        for (int i = 0; i < ORDER.size() - 1; i++) {
            noClasses()
                    .that()
                    .resideInAPackage("bubblechain." + ORDER.get(i) + "..")
                    .should()
                    .dependOnClassesThat()
                    .resideInAnyPackage(after(i))
                    .allowEmptyShould(true)
                    .check(classes);
        }
    }

    @Test
    void packagesFormNoCycles() {
        slices().matching("bubblechain.(*)..").should().beFreeOfCycles().check(classes);
    }

    @Test
    void onlyTheCommandLineUsesPicocli() {
        checkLibrary("picocli..", "cli");
    }

    @Test
    void onlyNumericalPackagesUseApfloat() {
        checkLibrary("org.apfloat..", "numeric", "qcd", "forecast");
    }

    @Test
    void onlyNumericalPackagesUseCommonsMath() {
        checkLibrary("org.apache.commons.math3..", "numeric", "qcd", "forecast");
    }

    @Test
    void onlyReadersOfFilesUseToml() {
        checkLibrary("org.tomlj..", "toml");
    }

    @Test
    void onlyWritersUseJackson() {
        checkLibrary("com.fasterxml.jackson..", "output");
    }

    @Test
    void onlyWritersAndReadersOfTablesUseCommonsCsv() {
        checkLibrary("org.apache.commons.csv..", "fixedorder", "output");
    }

    private static void checkLibrary(String library, String... allowed) {
        noClasses()
                .that()
                .resideInAnyPackage(allBut(allowed))
                .should()
                .dependOnClassesThat()
                .resideInAPackage(library)
                .allowEmptyShould(true)
                .check(classes);
    }

    @Test
    void nothingUsesWindowsTheNetworkOrChance() {
        noClasses()
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("java.awt..", "javax.swing..")
                .check(classes);
        // an address only names the program's own jar, where the built-in kernels are listed
        noClasses()
                .should()
                .dependOnClassesThat(JavaClass.Predicates.resideInAPackage("java.net..")
                        .and(DescribedPredicate.not(JavaClass.Predicates.belongToAnyOf(
                                URL.class, URI.class, URISyntaxException.class))))
                .check(classes);
        noClasses().should().dependOnClassesThat().haveFullyQualifiedName("java.util.Random").check(classes);
        noClasses().should().callMethod(Math.class, "random").check(classes);
    }

    @Test
    void theCheckItselfSeesAForbiddenImport() {
        JavaClasses withTests = new ClassFileImporter().importPackages("bubblechain.report");
        assertThat(noClasses()
                        .should()
                        .dependOnClassesThat()
                        .haveFullyQualifiedName("java.util.Random")
                        .evaluate(withTests)
                        .hasViolation())
                .isTrue();
    }
}
