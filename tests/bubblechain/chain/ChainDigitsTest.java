package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Every printed digit is right, whatever else is asked for with it. */
class ChainDigitsTest {
    @TempDir
    private static Path folder;

    private static List<String> texts(Chain chain, int loops, int digits) {
        return chain.certified(loops, digits).stream().map(CertifiedNumber::text).toList();
    }

    private static Kernel kernel(String transform) {
        return KernelText.of(transform).kernel(folder);
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "adler", "bjorken-gls", "cusp", "gamma-m", "lepton-g2", "static-potential-r"})
    void digitsAreTheRoundedDigitsOfThirtyMoreSeed11(String name) {
        Random random = new Random(11);
        Scales scales = Scales.of(ConstantValue.of(Formula.parse("sqrt(2)")), ExactConstant.ONE);
        Chain chain = Chain.of(KernelLibrary.load(name), scales);
        for (int trial = 0; trial < 4; trial++) {
            int digits = 1 + random.nextInt(40);
            int loops = 1 + random.nextInt(25);
            List<String> few = texts(chain, loops, digits);
            List<String> many = texts(chain, loops, digits + 30);
            for (int n = 0; n < loops; n++) {
                BigDecimal rounded =
                        new BigDecimal(many.get(n)).round(new MathContext(digits, RoundingMode.HALF_EVEN));
                assertThat(new BigDecimal(few.get(n)))
                        .as("%s, n = %d, %d digits", name, n, digits)
                        .isEqualByComparingTo(rounded);
            }
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "cos(pi*u)", "sin(pi*u)/(pi*u)", "1/8+u/2", "1/(1-u^2)", "exp(5*u/3)*gamma(1-u)", "3/20+u/8", "1/3-u^7",
        "gamma(1/4+u)"
    })
    void anOrderHasTheSameDigitsInAnyListSeed12(String transform) {
        Chain chain = Chain.of(kernel(transform));
        Random random = new Random(12);
        for (int digits : new int[] {1, 2, 1 + random.nextInt(30)}) {
            List<String> longest = texts(chain, 48, digits);
            for (int loops : new int[] {1, 2, 3 + random.nextInt(10), 40, 41}) {
                assertThat(texts(chain, loops, digits)).isEqualTo(longest.subList(0, loops));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"cos(pi*u)", "sin(pi*u)/(pi*u)", "cos(pi*u/3)*gamma(1+u)*gamma(1-u)"})
    void oddCoefficientsOfAnEvenFunctionPrintZero(String transform) {
        Chain chain = Chain.of(kernel(transform));
        List<CertifiedNumber> numbers = chain.certified(26, 15);
        for (int n = 0; n < 26; n++) {
            assertThat(numbers.get(n).isZero()).as("n = %d", n).isEqualTo(n % 2 == 1);
            assertThat(numbers.get(n).text().equals("0")).isEqualTo(n % 2 == 1);
        }
    }

    @Test
    void zerosFarOutAreProvedToo() {
        List<CertifiedNumber> numbers = Chain.of(kernel("cos(pi*u)")).certified(120, 10);
        for (int n = 1; n < 120; n += 2) {
            assertThat(numbers.get(n)).isEqualTo(new CertifiedNumber("0", true, true));
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        // exactly half-way: to even
        "1/8          | 1 | 0.1", "1/8          | 2 | 0.12", "1/8   | 3 | 0.125", "3/8 | 2 | 0.38",
        "3/20         | 1 | 0.2", "1/20         | 1 | 0.05", "9/20  | 1 | 0.4",   "19/20 | 1 | 1",
        "199/200      | 2 | 1.0", "25           | 1 | 2e+1", "35    | 1 | 4e+1",  "-1/8 | 2 | -0.12",
        "3/20000000   | 1 | 2e-7", "3/200000    | 1 | 0.00002", "1/3 | 3 | 0.333", "2/3 | 1 | 0.7",
        "1000000      | 7 | 1000000", "1000000  | 3 | 1.00e+6"
    })
    void tiesAreSettledExactly(String constant, int digits, String printed) {
        assertThat(texts(Chain.of(kernel(constant)), 1, digits)).containsExactly(printed);
        assertThat(texts(Chain.of(kernel(constant)), 45, digits).get(0)).isEqualTo(printed);
        ExactConstant exact = ConstantValue.of(Formula.parse(constant));
        assertThat(CertifiedNumber.of(exact, digits).text()).isEqualTo(printed);
    }

    @Test
    void aZeroThatCannotBeProvedSaysHowSmallItIs() {
        // reflection: gamma(1/4) gamma(3/4) = pi sqrt(2), which the constants of the program do not know
        List<CertifiedNumber> numbers = Chain.of(kernel("gamma(1/4)*gamma(3/4)-pi*sqrt(2)+u")).certified(2, 30);
        assertThat(numbers.get(0).isZero()).isFalse();
        assertThat(numbers.get(0).isDecimal()).isFalse();
        assertThat(numbers.get(0).text()).matches("0 within 10\\^-[0-9]{3} \\(not proved zero\\)");
        assertThat(numbers.get(1).text()).isEqualTo("1.00000000000000000000000000000");
        // a difference that is small but not zero: 10^-80
        String tiny = "gamma(1/4)*gamma(3/4)-pi*sqrt(2)+1/10^80";
        assertThat(texts(Chain.of(kernel(tiny)), 1, 5)).containsExactly("1.0000e-80");
    }

    @Test
    void theBoundOfAZeroFollowsTheDigitsAskedFor() {
        String text = Chain.of(kernel("gamma(1/4)*gamma(3/4)-pi*sqrt(2)+u")).certified(1, 400).get(0).text();
        int power = Integer.parseInt(text.replaceAll("0 within 10\\^-([0-9]+) .*", "$1"));
        assertThat(power).as("beyond the range of a double: %s", text).isGreaterThan(400);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "0     | 20     | the number of loops lies between 1 and 10000, got 0",
        "-5    | 20     | the number of loops lies between 1 and 10000, got -5",
        "10001 | 20     | the number of loops lies between 1 and 10000, got 10001",
        "3     | 0      | the number of digits lies between 1 and 10000, got 0",
        "3     | 10001  | the number of digits lies between 1 and 10000, got 10001"
    })
    void requestsBeyondTheLimitsAreRefused(int loops, int digits, String message) {
        Chain chain = Chain.of(KernelLibrary.load("pole-mass"));
        assertThatThrownBy(() -> chain.certified(loops, digits)).isInstanceOf(DomainException.class).hasMessage(message);
    }
}
