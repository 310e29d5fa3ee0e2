package bubblechain.formula;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.ExactConstant;
import java.time.Duration;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;

class DefinitionsTest {
    @Test
    void laterDefinitionsUseEarlierOnes() {
        Definitions definitions = Definitions.NONE
                .with("a", Formula.parse("1 - u"))
                .with("b", Formula.parse("a/(1 + a)"))
                .with("c", Formula.parse("b - a"));
        assertThat(definitions.resolve(Formula.parse("2*c")).print()).isEqualTo("2*((1 - u)/(1 + (1 - u)) - (1 - u))");
        assertThat(definitions.contains("b")).isTrue();
        assertThat(definitions.contains("u")).isFalse();
        assertThat(Definitions.NONE.contains("a")).isFalse();
    }

    @Test
    void aDefinitionDoesNotSeeItselfOrLaterOnes() {
        Definitions definitions = Definitions.NONE.with("a", Formula.parse("a + b")).with("b", Formula.parse("1"));
        assertThat(definitions.resolve(Formula.parse("a")).print()).isEqualTo("a + b");
    }

    @Test
    void theIndexOfASumHidesADefinition() {
        Definitions definitions = Definitions.NONE.with("k", Formula.parse("100"));
        Formula resolved = definitions.resolve(Formula.parse("k + sum(k, 1, 3, k)"));
        assertThat(ConstantValue.of(resolved)).isEqualTo(ExactConstant.of(106));
    }

    @Test
    void anIndexDoesNotCaptureANameInsideADefinition() {
        Definitions definitions = Definitions.NONE.with("x", Formula.parse("k + 1"));
        Formula resolved = definitions.resolve(Formula.parse("sum(k, 1, 3, x)"));
        assertThat(resolved.names()).containsExactly("k");
    }

    @Test
    void definitionsThatGrowExponentiallyAreRefusedFast() {
        Assertions.assertTimeoutPreemptively(Duration.ofSeconds(2), () -> {
            long start = System.nanoTime();
            assertThatThrownBy(() -> {
                        Definitions definitions = Definitions.NONE.with("x0", Formula.parse("u + u"));
                        for (int k = 1; k <= 200; k++) {
                            definitions = definitions.with(
                                    "x" + k, Formula.parse("x" + (k - 1) + "*x" + (k - 1)));
                        }
                    })
                    .isInstanceOf(FormulaException.class)
                    .hasMessageContaining(
                            "with its definitions written out the formula is too large; the limit is 100000 operations");
            assertThat(Duration.ofNanos(System.nanoTime() - start)).isLessThan(Duration.ofMillis(500));
        });
    }

    @Test
    void definitionsThatGrowDeepAreRefused() {
        assertThatThrownBy(() -> {
                    Definitions definitions = Definitions.NONE.with("x0", Formula.parse("u"));
                    for (int k = 1; k <= 50; k++) {
                        definitions = definitions.with("x" + k, Formula.parse("x" + (k - 1) + "+1".repeat(100)));
                    }
                })
                .isInstanceOf(FormulaException.class)
                .hasMessageContaining("too long a chain of operations (1201 levels; the limit is 1200)");
    }

    @Test
    void onlyPlainUnusedWordsMayBeNames() {
        assertThat(new String[] {"a", "N_c", "_x1"}).allMatch(Constants::isFreeName);
        assertThat(new String[] {"pi", "euler_gamma", "gamma", "sum", "1a", "a-b", "", "\u0430"})
                .noneMatch(Constants::isFreeName);
    }
}
