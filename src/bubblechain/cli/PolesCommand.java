package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code poles KERNEL}. */
@Command(
        name = "poles",
        description = "The poles of the Borel transform in a range of u: exact order and Laurent coefficients, power"
                + " correction, and their share in one coefficient with the exact remainder.")
final class PolesCommand extends ReportCommand {
    @Parameters(index = "0", paramLabel = "KERNEL", description = "built-in name, or path of a kernel file")
    String name = "";

    @Option(
            names = "--from",
            paramLabel = "U",
            defaultValue = "-3",
            description = "lower end, inclusive; a rational such as -5/2; default ${DEFAULT-VALUE}")
    String from = "-3";

    @Option(
            names = "--to",
            paramLabel = "U",
            defaultValue = "3",
            description = "upper end, inclusive; default ${DEFAULT-VALUE}")
    String to = "3";

    @Option(
            names = "--digits",
            paramLabel = "P",
            defaultValue = "20",
            description = "significant digits of the values; default ${DEFAULT-VALUE}")
    int digits;

    @Option(
            names = "--share-of",
            paramLabel = "n",
            defaultValue = "10",
            description = "the coefficient c_n whose make-up is shown; default ${DEFAULT-VALUE}")
    int shareOf;

    @Mixin
    ScaleOptions scales = new ScaleOptions();

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(new Example("poles pole-mass --from -4 --to 6", "all poles from u = -4 to u = 6"));
    }

    @Override
    Report report() {
        return Answers.poles(this);
    }
}
