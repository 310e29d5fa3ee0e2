package bubblechain.output;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class WrappingTest {
    @Test
    void wordsBreakAtSpacesAndLongOnesAreCut() {
        assertThat(Wrapping.words("the quick brown fox", 10)).containsExactly("the quick", "brown fox");
        assertThat(Wrapping.words("abcdefghijkl mno", 5)).containsExactly("abcde", "fghij", "kl", "mno");
        assertThat(Wrapping.words("", 5)).containsExactly("");
    }

    @Test
    void formulasBreakBeforeTermsAndAfterFactors() {
        assertThat(Wrapping.formula("71/8+pi^2+2*pi^2*ln(2)/3", 12)).containsExactly("71/8+pi^2", "+2*pi^2*", "ln(2)/3");
        assertThat(Wrapping.formula("a + b - c", 5)).containsExactly("a + b", "- c");
        assertThat(Wrapping.formula("1.5e-12+x", 8)).containsExactly("1.5e-12", "+x");
    }

    @Test
    void digitsBreakAnywhereButInTheExponent() {
        assertThat(Wrapping.digits("1.23456789", 5, 4)).containsExactly("1.234", "5678", "9");
        assertThat(Wrapping.digits("1.23456789e-12", 10, 10)).containsExactly("1.23456", "789e-12");
    }

    @Test
    void nothingIsLostAndNothingIsTooWideSeed11() {
        Random random = new Random(11);
        String alphabet = "ab1+-*(),. \ud835\udc65";
        List<Integer> letters = alphabet.codePoints().boxed().toList();
        for (int trial = 0; trial < 500; trial++) {
            StringBuilder text = new StringBuilder();
            for (int i = random.nextInt(60); i > 0; i--) {
                text.appendCodePoint(letters.get(random.nextInt(letters.size())));
            }
            String line = PlainText.oneLine(text.toString());
            int width = 1 + random.nextInt(20);
            for (List<String> pieces : List.of(Wrapping.words(line, width), Wrapping.formula(line, width))) {
                assertThat(String.join("", pieces).replace(" ", "")).isEqualTo(line.replace(" ", ""));
                assertThat(pieces.stream().mapToInt(Wrapping::width)).allMatch(w -> w <= width);
            }
        }
    }
}
