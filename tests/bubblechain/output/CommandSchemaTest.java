package bubblechain.output;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.cli.Main;
import bubblechain.kernel.KernelText;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.io.StringReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.apache.commons.csv.CSVFormat;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What the commands print in the formats for machines. */
class CommandSchemaTest {
    @TempDir
    private static Path folder;

    private static String output(String format, String... words) {
        List<String> arguments = new ArrayList<>(List.of(words));
        arguments.addAll(List.of("--format", format));
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        int status = Main.run(
                new PrintStream(out, false, StandardCharsets.UTF_8), new PrintStream(err, false, StandardCharsets.UTF_8),
                arguments.toArray(new String[0]));
        assertThat(err.toString(StandardCharsets.UTF_8)).isEmpty();
        assertThat(status).isZero();
        return out.toString(StandardCharsets.UTF_8);
    }

    private static final String COMMANDS = """
            kernels
            kernels --search mass
            kernels --search nothing-of-the-kind
            kernels heavy-light current
            kernels nosuch
            kernels dis-f2 --parameter moment=4
            kernels pole-mass
            kernels cusp
            kernels static-potential-r
            coefficients pole-mass --loops 3
            coefficients pole-mass --loops 3 --exact --nf-terms --mu-over-scale sqrt(8) --operator-mu-over-scale 2
            coefficients pole-mass --loops 3 --nf 3 --coupling-nf 4 --coupling alpha/pi --normalise full --scheme v
            coefficients pole-mass --anomalous-dimension --exact --loops 3
            coefficients lepton-g2 --loops 3 --nf 1 --coupling alpha --normalise first
            coefficients cusp --loops 4 --digits 1
            poles pole-mass --from -4 --to 6
            poles adler --from -1 --to 3 --share-of 0
            poles cusp
            poles static-potential-r --from 1 --to 1
            residue pole-mass --nf 3
            residue pole-mass --power 3
            residue pole-mass --power -2
            residue pole-mass --power 2 --exponent-shift 1/3 --beta-loops 2 --loops 2
            residue pole-mass --chain --power 3 --remove-nearer --loops 7
            residue adler --chain --loops 4
            crosscheck pole-mass --nf 4
            crosscheck pole-mass --power 2
            crosscheck --all
            crosscheck cusp
            crosscheck chromomag --nf 4
            residue static-potential-r
            crosscheck --kernel static-potential-r --series pole-mass
            assess pole-mass
            assess adler --loops 3 --range 1
            assess cusp
            assess lepton-g2
            validate
            validate pole-mass
            """;

    static List<String> commands() {
        return COMMANDS.lines().toList();
    }

    /** One of each command. */
    static List<String> oneOfEach() {
        return List.of(
                "kernels", "kernels pole-mass", "coefficients pole-mass --loops 3 --exact --nf-terms",
                "poles pole-mass --from -4 --to 6", "poles cusp", "residue pole-mass --power 3",
                "crosscheck pole-mass --nf 4", "crosscheck --all", "assess pole-mass", "validate pole-mass");
    }

    @ParameterizedTest
    @MethodSource("commands")
    void jsonFollowsItsSchema(String command) {
        assertThat(JsonSchema.complaints(output("json", command.split(" ")))).as(command).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "1/(u^2-2)", "1/(u^2+u+1)", "gamma(1/4-u)", "u/2", "0*u", "gamma(1/4)*gamma(3/4)-pi*sqrt(2)+u", "1/(1-u)^3"
    })
    void jsonOfUserKernelsFollowsItsSchema(String transform) {
        String path = KernelText.of(transform).in(folder);
        for (String command : new String[] {"coefficients", "poles", "assess", "validate", "kernels"}) {
            assertThat(JsonSchema.complaints(output("json", command, path))).as(command).isEmpty();
        }
    }

    @Test
    void aFailedValidationFollowsTheSchemaToo() throws IOException {
        String path = KernelText.of("2u").in(folder);
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        int status = Main.run(
                new PrintStream(out, false, StandardCharsets.UTF_8), System.err, "validate", path, "--format", "json");
        String json = out.toString(StandardCharsets.UTF_8);
        assertThat(status).isEqualTo(1);
        assertThat(JsonSchema.complaints(json)).isEmpty();
        Map<String, Object> result = JsonTree.object(JsonTree.object(json).get("result"));
        assertThat(result).containsEntry("passed", 0L).containsEntry("failed", 1L);
    }

    @Test
    void theSchemaCatchesWhatItShould() {
        String good = output("json", "coefficients", "pole-mass", "--loops", "2");
        assertThat(JsonSchema.complaints(good.replace("\"n\": 0", "\"n\": -1"))).hasSize(1);
        assertThat(JsonSchema.complaints(good.replace("\"n\": 0", "\"m\": 0"))).hasSize(2);
        assertThat(JsonSchema.complaints(good.replaceFirst("\"value\": \"[^\"]*\"", "\"value\": \"NaN\""))).hasSize(1);
        assertThat(JsonSchema.complaints(good.replaceFirst("\"value\": \"[^\"]*\"", "\"value\": 4"))).hasSize(1);
        assertThat(JsonSchema.complaints(good.replace("\"cautions\"", "\"warnings\""))).hasSize(2);
        String list = output("json", "kernels", "adler");
        assertThat(JsonSchema.complaints(list.replace("\"pole_status\": \"exact\"", "\"pole_status\": \"proved\""))).isNotEmpty();
        assertThat(JsonSchema.complaints(output("json", "kernels", "tau", "decay").replace("\"ir\": \"3\"", "\"ir\": \"u\"")))
                .isNotEmpty();
        String poles = output("json", "poles", "pole-mass");
        assertThat(JsonSchema.complaints(poles.replace("\"kind\": \"UV\"", "\"kind\": \"UW\""))).isNotEmpty();
        String residue = output("json", "residue", "pole-mass");
        assertThat(JsonSchema.complaints(residue.replace("\"verdict\": \"present\"", "\"verdict\": \"yes\""))).hasSize(1);
    }

    @ParameterizedTest
    @MethodSource("oneOfEach")
    void csvHasRowsAsLongAsTheirHeader(String command) throws IOException {
        String csv = output("csv", command.split(" "));
        for (String section : csv.split("\n\n")) {
            String table = section.lines().filter(line -> !line.startsWith("#")).reduce("", (a, b) -> a + b + "\n");
            if (!table.isBlank()) {
                var records = CSVFormat.DEFAULT.parse(new StringReader(table)).getRecords();
                assertThat(records).as("%s: %s", command, section)
                        .allSatisfy(row -> assertThat(row.size()).isEqualTo(records.get(0).size()));
            }
        }
        assertThat(csv).startsWith("# bubblechain ").doesNotContain("NaN", "Infinity");
    }

    @ParameterizedTest
    @MethodSource("oneOfEach")
    void latexIsBalanced(String command) {
        String latex = output("latex", command.split(" "));
        String text = latex.replace("\\{", "").replace("\\}", "").replaceAll("(?m)%.*$", "");
        assertThat(text.chars().filter(c -> c == '{').count()).isEqualTo(text.chars().filter(c -> c == '}').count());
        assertThat(text.replace("\\$", "").chars().filter(c -> c == '$').count()).as("dollar signs").matches(n -> n % 2 == 0);
        assertThat(count(latex, "\\begin{")).isEqualTo(count(latex, "\\end{"));
        assertThat(latex).doesNotContain("NaN", "Infinity");
    }

    private static int count(String text, String part) {
        return text.split(java.util.regex.Pattern.quote(part), -1).length - 1;
    }
}
