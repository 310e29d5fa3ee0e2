package bubblechain.qcd;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.ExactConstant;
import bubblechain.fixedorder.ReferenceTable;
import java.util.List;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;

/** Against generated/running.csv, made by tests/referee/running.py with 30 digits. */
class RunningReferenceTest {
    private static final List<CSVRecord> ROWS = ReferenceTable.read("/reference-values/generated/running.csv");

    private static Stream<CSVRecord> rows(String kind) {
        List<CSVRecord> found = ROWS.stream().filter(r -> r.get("kind").equals(kind)).toList();
        assertThat(found).as(kind).hasSizeGreaterThan(10);
        return found.stream();
    }

    private static double number(CSVRecord row, String column) {
        return Double.parseDouble(row.get(column));
    }

    private static int integer(CSVRecord row, String column) {
        return Integer.parseInt(row.get(column));
    }

    private static RunningCoupling coupling(CSVRecord row) {
        return RunningCoupling.of(integer(row, "nf"), integer(row, "loops"), number(row, "mu0"), number(row, "alpha0"));
    }

    private static void agrees(double value, CSVRecord row, double tolerance) {
        double expected = number(row, "value");
        assertThat(value / expected - 1).as("%s", row.toMap()).isCloseTo(0, within(tolerance));
    }

    @Test
    void couplingsAgreeToTheStatedAccuracy() {
        rows("alpha").forEach(r -> agrees(coupling(r).alphaS(number(r, "mu")), r, RunningCoupling.RELATIVE_ACCURACY));
    }

    @Test
    void massesAgreeToTheStatedAccuracy() {
        rows("mass").forEach(r -> agrees(
                RunningMass.of(coupling(r), number(r, "mu0"), 1).mass(number(r, "mu")), r, RunningCoupling.RELATIVE_ACCURACY));
    }

    @Test
    void lambdaAgreesToTheStatedAccuracy() {
        rows("lambda").forEach(r ->
                agrees(LambdaParameter.of(coupling(r)).lambdaMsbar(), r, RunningCoupling.RELATIVE_ACCURACY));
    }

    @Test
    void landauPolesAgreeToTheStatedAccuracy() {
        rows("landau").forEach(r -> agrees(coupling(r).landauPole().orElseThrow(), r, RunningCoupling.RELATIVE_ACCURACY));
    }

    @Test
    void everyCoefficientOfTheCouplingsDecouplingAgrees() {
        rows("z").forEach(r -> coefficientAgrees(r, series(r).coupling(integer(r, "k"))));
    }

    @Test
    void everyCoefficientOfTheMassesDecouplingAgrees() {
        rows("m").forEach(r -> coefficientAgrees(r, series(r).mass(integer(r, "k"))));
    }

    private static DecouplingSeries series(CSVRecord row) {
        HeavyMass mass = row.get("from").equals("pole") ? HeavyMass.POLE : HeavyMass.MSBAR;
        return DecouplingSeries.of(integer(row, "nf"), mass, Decoupling.LARGEST_ORDER);
    }

    private static void coefficientAgrees(CSVRecord row, List<ExactConstant> coefficients) {
        int j = integer(row, "j");
        ExactConstant found = j < coefficients.size() ? coefficients.get(j) : ExactConstant.ZERO;
        ReferenceTable.assertPrinted(found, row.get("value"), row.toMap().toString());
    }

    @Test
    void couplingsCarriedOverThresholdsAgree() {
        rows("chain-alpha").forEach(r ->
                agrees(thresholds(r).alphaS(coupling5(r), number(r, "mu"), integer(r, "nf")), r, RunningCoupling.RELATIVE_ACCURACY));
    }

    @Test
    void lightMassesCarriedOverThresholdsAgree() {
        rows("chain-mass").forEach(r -> {
            double small = 1e-3; // lighter than all three heavy quarks; the ratio does not depend on it
            RunningMass start = RunningMass.of(coupling5(r), number(r, "mu0"), small);
            agrees(thresholds(r).mass(start, number(r, "mu"), integer(r, "nf")) / small, r, RunningCoupling.RELATIVE_ACCURACY);
        });
    }

    private static RunningCoupling coupling5(CSVRecord row) {
        return RunningCoupling.of(5, integer(row, "loops"), number(row, "mu0"), number(row, "alpha0"));
    }

    private static FlavourThresholds thresholds(CSVRecord row) {
        double factor = number(row, "from");
        List<Threshold> masses =
                List.of(Threshold.msbar(3, 1.273), Threshold.msbar(4, 4.183), Threshold.pole(5, 172.4)); // the file's header
        return FlavourThresholds.of(
                integer(row, "loops") - 1, masses.stream().map(t -> t.atScale(factor * t.mass())).toList());
    }
}
