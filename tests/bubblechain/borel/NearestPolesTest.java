package bubblechain.borel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.analytic.PoleStatus;
import bubblechain.chain.Scales;
import bubblechain.exact.Rational;
import bubblechain.formula.FormulaException;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import bubblechain.kernel.SingularityNote.Kind;
import bubblechain.report.Value;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** The search in growing ranges finds what a full list of poles shows. */
class NearestPolesTest {
    private static final Rational LIMIT = Rational.of(BorelPlane.SEARCH_LIMIT);

    @TempDir
    private Path folder;

    static List<String> library() {
        return KernelLibrary.names();
    }

    private static Optional<NearestPoles.Nearest> nearest(List<BorelPole> poles, Kind kind) {
        return poles.stream()
                .filter(pole -> pole.kind() == kind)
                .min(Comparator.comparing(pole -> pole.u().abs()))
                .map(p -> new NearestPoles.Nearest(Value.exact(p.u().toString()), p.pole().order(), p.pole().status()));
    }

    @ParameterizedTest
    @MethodSource("library")
    void theNearestPolesOfTheLibraryAreTheFirstOfTheFullList(String name) {
        List<BorelPole> all = BorelPlane.of(KernelLibrary.load(name), Scales.NATURAL).poles(LIMIT.negate(), LIMIT);
        NearestPoles found = NearestPoles.of(KernelLibrary.load(name));
        assertThat(found.infrared()).isEqualTo(nearest(all, Kind.IR));
        assertThat(found.ultraviolet()).isEqualTo(nearest(all, Kind.UV));
    }

    private NearestPoles of(String transform) {
        return NearestPoles.of(KernelText.of(transform).kernel(folder));
    }

    private static String words(Optional<NearestPoles.Nearest> pole) {
        return pole.map(NearestPoles.Nearest::inWords).orElse("none");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "1/(1-u)^2                  | 1 double    | none",
        "1/((3+u)^3*(11-u)^4)       | 11 of order 4 | -3 triple",
        "exp(5*u/3)                 | none        | none",
        "1/(13-u)                   | none        | none",
        "1/(12-u)                   | 12          | none",
        "1/((u^2-2)*(1+u))          | 1.414213562 | -1",
        "1/((u^2-2)*(u-7/5))        | 7/5         | -1.414213562",
        "1/((u^2-2)^2*(u-3/2))      | 1.414213562 double | -1.414213562 double",
        "1/(u^2+1)                  | none        | none",
        "gamma(1-100*u)             | 1/100       | none",
        "gamma(1-1000*u)/(2+u)      | 1/1000      | -2",
        "gamma(1-u)/gamma(1-2*u)    | none        | none"
    })
    void polesOfEveryKindOfPlaceAndOrderAreFound(String transform, String infrared, String ultraviolet) {
        NearestPoles found = of(transform);
        assertThat(words(found.infrared())).isEqualTo(infrared);
        assertThat(words(found.ultraviolet())).isEqualTo(ultraviolet);
    }

    @Test
    void aDeclaredKindCountsForMoreThanTheSign() {
        NearestPoles found = NearestPoles.of(KernelText.of("1/((1-u)*(2-u))")
                .and("[[singularity]]\nu = \"1\"\nkind = \"UV\"\nsource = \"invented\"")
                .kernel(folder));
        assertThat(words(found.ultraviolet())).isEqualTo("1");
        assertThat(words(found.infrared())).isEqualTo("2");
    }

    @Test
    void theStatusIsTheWeakerOfTheTwo() {
        assertThat(of("1/(1-u^2)").status()).contains(PoleStatus.EXACT);
        assertThat(of("gamma(1/4)/(1-u) + 1/(1+u)").status()).contains(PoleStatus.CERTIFIED);
        assertThat(of("1+u").status()).isEmpty();
    }

    @Test
    void itIsSaidHowFarWasLooked() {
        assertThat(of("1/(1-4*u)+1/(1+4*u)").searchedTo()).isEqualTo(Rational.of(1, 4));
        assertThat(of("1/(1-4*u)").searchedTo()).isEqualTo(LIMIT);
        // 12000 candidates up to the limit are too many to look through; 3000 up to 3 are not
        assertThat(of("gamma(1-1000*u)").searchedTo()).isEqualTo(Rational.of(3));
    }

    @Test
    void formulasOutsideTheClassAreRefused() {
        assertThatThrownBy(() -> of("u/(exp(u)-1)")).isInstanceOf(FormulaException.class).hasMessageContaining("cannot be listed");
    }
}
