package bubblechain.sumrule;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.fixedorder.Singularity;
import bubblechain.report.Block;
import bubblechain.report.CertainDigits;
import bubblechain.report.Column;
import bubblechain.report.Fact;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ResidueReportTest {
    private static Report poleMass() {
        return ResidueReport.of(SumRule.evaluate(SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), 3).build()));
    }

    private static Table table(Report report, String key) {
        return report.blocks().stream()
                .filter(b -> b instanceof Table t && t.key().equals(key))
                .map(Table.class::cast)
                .findFirst()
                .orElseThrow();
    }

    private static Facts facts(Report report, String key) {
        return report.blocks().stream()
                .filter(b -> b instanceof Facts f && f.key().equals(key))
                .map(Facts.class::cast)
                .findFirst()
                .orElseThrow();
    }

    private static List<String> keys(Table table) {
        return table.columns().stream().map(Column::key).toList();
    }

    @Test
    void ordersCarryTheDigitsTheirInputAllows() {
        Table orders = table(poleMass(), "orders");
        assertThat(keys(orders)).containsExactly("loops", "K", "N", "P");
        // N of sum-rule.md section 3, nl = 3; the four-loop error 0.0005 allows five decimals
        assertThat(orders.rows().get(2).get(2)).isEqualTo(Value.numeral("0.56900615"));
        assertThat(orders.rows().get(3).get(2)).isEqualTo(Value.numeral("0.53737"));
    }

    @Test
    void everyPartOfTheContractIsThere() {
        Report report = poleMass();
        assertThat(report.command()).isEqualTo("residue");
        assertThat(report.normalisation()).isEqualTo("M/mbar(mbar) - 1 in alpha_s^(3)(mbar)/pi");
        assertThat(facts(report, "value").facts()).extracting(Fact::key).containsExactly("K", "N", "P");
        assertThat(facts(report, "errors").facts())
                .extracting(Fact::key)
                .containsExactly("scale", "last_step", "input", "beta", "combined");
        assertThat(facts(report, "").facts()).contains(new Fact("verdict", "Singularity at u = 1/2", Value.text("present"), ""));
        assertThat(keys(table(report, "scan"))).containsExactly("lambda", "K", "N");
        assertThat(table(report, "scan").rows()).hasSize(5);
        assertThat(table(report, "blocked_by").rows()).isEmpty();
        assertThat(facts(report, "formulas").facts()).extracting(Fact::key).containsExactly("K", "N", "P", "b", "u0");
        assertThat(report.sources()).contains("Marquard:2016dcn", "Herzog:2017ohr", "Hoang:2008yj");
    }

    @Test
    void chainReportsItsLaurentResidueAndThePrefactor() {
        Report report = ResidueReport.of(SumRule.evaluate(SampleSeries.chainRequest("pole-mass", 7, 1).build()));
        Table orders = table(report, "orders");
        assertThat(keys(orders)).containsExactly("loops", "K", "K_bare", "R_u", "N", "P");
        // sum-rule.md section 2.1: bare K_1 = 9.3723022, R_u = -K/2, K = CF/beta0 K_bare with beta0 = 25/3
        assertThat(orders.rows().get(1).get(2)).isEqualTo(Value.numeral("9.3723022"));
        assertThat(orders.rows().get(1).get(3)).isEqualTo(Value.numeral("-4.6861511"));
        assertThat(orders.rows().get(0).get(1)).isEqualTo(Value.numeral("0.64000000"));
        assertThat(report.sources()).doesNotContain("Herzog:2017ohr");
    }

    @Test
    void blockingSingularitiesAreListedWithTheReason() {
        Report report = ResidueReport.of(SumRule.evaluate(SampleSeries.adler(3, 2)
                .obstacle(Obstacle.unknown(Rational.of(-1), Singularity.Kind.UV, "dimension six"))
                .build()));
        List<Value> row = table(report, "blocked_by").rows().get(0);
        assertThat(row.subList(0, 3)).containsExactly(Value.exact("-1"), Value.text("UV"), Value.text("dimension six"));
        assertThat(row.get(3)).isEqualTo(Value.absent());
        assertThat(facts(report, "").facts()).extracting(Fact::value).contains(Value.text("cannot tell"));
    }

    @Test
    void unknownExponentAndUnknownRunningAreSaid() {
        SumRuleResult uv = SumRule.evaluate(
                SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), 3).power(Rational.of(-2)).build());
        List<String> cautions = ResidueReport.cautions(uv);
        assertThat(cautions).anyMatch(c -> c.startsWith("The exponent shift delta of this singularity is unknown"));
        assertThat(cautions).anyMatch(c -> c.startsWith("An ultraviolet singularity gives no ambiguity"));
        assertThat(keys(table(ResidueReport.of(uv), "orders"))).containsExactly("loops", "K", "N");
        SumRuleResult many = SumRule.evaluate(SampleSeries.convergent(1, 6).build());
        assertThat(ResidueReport.cautions(many))
                .contains("With 6 terms the sum rule uses beta_0 to beta_6; those beyond beta_4 are set to zero.");
    }

    @Test
    void blocksCanBeUsedInsideAnotherReport() {
        SumRuleResult result =
                SumRule.evaluate(SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), 4).build());
        Report.Builder other = Report.builder("assess");
        List<Block> blocks = ResidueReport.blocks(result);
        blocks.forEach(other::add);
        assertThat(other.build().blocks()).isEqualTo(blocks);
    }

    @ParameterizedTest
    @CsvSource({
        "1/3, 0, 0.33333333", "1/3, 0.0123, 0.333", "1/3, 0.00999, 0.333", "123456, 1200, 1.235e+5", "1/3, 12, 0", "5, 12, 5",
        "2/3000, 0.0000001, 0.00066667", "-7/3, 0.05, -2.333", "0, 0, 0",
    })
    void valuesEndWhereTheirErrorBegins(String value, double error, String printed) {
        assertThat(CertainDigits.withError(Ball.of(Rational.parse(value), 200), error)).isEqualTo(Value.numeral(printed));
    }

    @ParameterizedTest
    @CsvSource({"0, 0", "0.04417, 0.044", "0.0999, 0.10", "1234, 1.2e+3", "0.000000123, 1.2e-7"})
    void errorsHaveTwoDigits(double error, String printed) {
        assertThat(CertainDigits.error(error)).isEqualTo(Value.numeral(printed));
    }
}
