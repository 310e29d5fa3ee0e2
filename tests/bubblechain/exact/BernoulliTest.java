package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BernoulliTest {
    /** Numerators and denominators as in DLMF Table 24.2.3 (typed from memory, each confirmed with PARI/GP bernfrac). */
    @ParameterizedTest
    @CsvSource({
        "0, 1", "1, -1/2", "2, 1/6", "4, -1/30", "6, 1/42", "8, -1/30", "10, 5/66", "12, -691/2730", "14, 7/6",
        "16, -3617/510", "18, 43867/798", "20, -174611/330", "22, 854513/138", "24, -236364091/2730", "26, 8553103/6",
        "28, -23749461029/870", "30, 8615841276005/14322"
    })
    void numbersAgreeWithDlmfTable2423(int n, String value) {
        assertThat(Bernoulli.number(n)).hasToString(value);
    }

    @Test
    void oddNumbersAboveOneVanish() {
        for (int n = 3; n < 60; n += 2) {
            assertThat(Bernoulli.number(n)).isEqualTo(Rational.ZERO);
        }
    }

    @Test
    void theRecurrenceHoldsUpToTwoHundred() {
        // sum_{k=0}^{n-1} binomial(n,k) B_k = 0 for n >= 2, DLMF 24.5.3
        for (int n = 2; n <= 200; n += 11) {
            Rational sum = Rational.ZERO;
            Rational binomial = Rational.ONE;
            for (int k = 0; k < n; k++) {
                sum = sum.add(Bernoulli.number(k).multiply(binomial));
                binomial = binomial.multiply(n - k).divide(k + 1);
            }
            assertThat(sum).as("n = %d", n).isEqualTo(Rational.ZERO);
        }
    }

    @Test
    void aNegativeIndexIsRefused() {
        assertThatThrownBy(() -> Bernoulli.number(-2))
                .isInstanceOf(DomainException.class)
                .hasMessage("Bernoulli numbers B_n begin at n = 0, got n = -2");
    }
}
