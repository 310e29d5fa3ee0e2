package bubblechain.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class NearestNamesTest {
    private static final List<String> COMMANDS =
            List.of("assess", "coefficients", "crosscheck", "kernels", "poles", "residue", "validate");

    @Test
    void slipsOfTheFingerFindTheName() {
        assertThat(NearestNames.of("pole", COMMANDS)).containsExactly("poles");
        assertThat(NearestNames.of("plose", COMMANDS)).isEmpty();
        assertThat(NearestNames.of("ploes", COMMANDS)).containsExactly("poles");
        assertThat(NearestNames.of("coeficients", COMMANDS)).containsExactly("coefficients");
        assertThat(NearestNames.of("RESIDUES", COMMANDS)).containsExactly("residue");
    }

    @Test
    void theBeginningOfANameFindsIt() {
        assertThat(NearestNames.of("coeff", COMMANDS)).containsExactly("coefficients");
        assertThat(NearestNames.of("co", COMMANDS)).isEmpty();
    }

    @Test
    void somethingElseFindsNothing() {
        assertThat(NearestNames.of("banana", COMMANDS)).isEmpty();
        assertThat(NearestNames.of("", COMMANDS)).isEmpty();
    }

    @Test
    void nearestComeFirstThenTheAlphabetAndAtMostThree() {
        assertThat(NearestNames.of("mass", List.of("masses", "mast", "bass", "mass1", "mass", "lass")))
                .containsExactly("mass", "bass", "lass");
    }

    @Test
    void distancesOfKnownPairs() {
        assertThat(NearestNames.distance("kitten", "sitting")).as("two substitutions, one insertion").isEqualTo(3);
        assertThat(NearestNames.distance("ab", "ba")).as("one swap").isEqualTo(1);
        assertThat(NearestNames.distance("", "abc")).isEqualTo(3);
    }

    @Test
    void distanceIsSymmetricAndBoundedByTheEditsMadeSeed17() {
        Random random = new Random(17);
        for (int trial = 0; trial < 200; trial++) {
            StringBuilder word = new StringBuilder();
            for (int i = 0; i < 8; i++) {
                word.append((char) ('a' + random.nextInt(4)));
            }
            String original = word.toString();
            int edits = random.nextInt(4);
            for (int i = 0; i < edits; i++) {
                int at = random.nextInt(word.length());
                if (random.nextBoolean()) {
                    word.deleteCharAt(at);
                } else {
                    word.insert(at, (char) ('a' + random.nextInt(4)));
                }
            }
            int distance = NearestNames.distance(original, word.toString());
            assertThat(distance).isEqualTo(NearestNames.distance(word.toString(), original));
            assertThat(distance).isLessThanOrEqualTo(edits);
            assertThat(distance == 0).isEqualTo(original.contentEquals(word));
        }
    }
}
