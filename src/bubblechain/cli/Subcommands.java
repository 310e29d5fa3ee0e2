package bubblechain.cli;

import java.util.List;

/** The commands of the program, in the order of the help: name, description and options come from their annotations. */
final class Subcommands {
    private Subcommands() {}

    /**
     * The command that the first argument names, alone: to read the annotations of one command takes a fraction of the
     * time. All of them if it names none, because help and error lines list them.
     */
    static List<ReportCommand> named(String... arguments) {
        return switch (arguments.length == 0 ? "" : arguments[0]) {
            case "kernels" -> List.of(new KernelsCommand());
            case "coefficients" -> List.of(new CoefficientsCommand());
            case "poles" -> List.of(new PolesCommand());
            case "residue" -> List.of(new ResidueCommand());
            case "crosscheck" -> List.of(new CrosscheckCommand());
            case "assess" -> List.of(new AssessCommand());
            case "validate" -> List.of(new ValidateCommand());
            default -> all();
        };
    }

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
