package bubblechain.cli;

import bubblechain.report.Report;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code kernels [NAME|WORD...]}. */
@Command(
        name = "kernels",
        description = "Lists the built-in kernels with their nearest poles, describes one, or gives its papers as BibTeX.")
final class KernelsCommand extends ReportCommand {
    @Parameters(
            index = "0..*",
            arity = "0..*",
            paramLabel = "NAME|WORD",
            description = "a built-in name or the path of a kernel file to describe it; else words, all of which must be the"
                    + " field or occur in name, title, quantity, operators, sources or authors; without any all are listed")
    List<String> words = new ArrayList<>();

    @Option(
            names = "--search",
            paramLabel = "WORDS",
            defaultValue = "",
            description = "list the kernels with these words, also if they are the name of one")
    String search = "";

    @Option(
            names = "--bibtex",
            description = "BibTeX entries of the papers behind the kernels, in place of the report")
    boolean bibtex;

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(
                new Example("kernels", "the library"),
                new Example("kernels heavy-light current", "those in which both words occur"),
                new Example("kernels adler", "formula, poles and sources of one"));
    }

    @Override
    Report report() {
        return Answers.kernels(this);
    }

    @Override
    public Integer call() throws IOException {
        if (!bibtex) {
            return super.call();
        }
        print(Answers.bibtex(this, isGiven("--format")));
        return ExitStatus.DONE;
    }
}
