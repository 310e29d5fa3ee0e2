package bubblechain.cli;

import java.util.List;

/** The commands of the program, in the order of the help: name, description and options come from their annotations. */
final class Subcommands {
    private Subcommands() {}

    /** A new instance of each command. */
    static List<ReportCommand> all() {
        return List.of(
                new KernelsCommand(),
                new CoefficientsCommand(),
                new PolesCommand(),
                new ResidueCommand(),
                new CrosscheckCommand(),
                new AssessCommand(),
                new ValidateCommand());
    }
}
