package bubblechain.cli;

import bubblechain.output.ProgramVersion;
import picocli.CommandLine.Command;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** The program without a command: help and version. */
@Command(
        name = "bubblechain",
        synopsisSubcommandLabel = "COMMAND",
        versionProvider = RootCommand.Version.class,
        description = {
            "All-order bubble-chain coefficients, exact Borel poles, and residues from known series.",
            "",
            "Results go to standard output, everything else to standard error. 'bubblechain COMMAND --help'",
            "shows the options of a command with worked examples."
        })
final class RootCommand implements Runnable {
    @Option(names = {"-h", "--help"}, usageHelp = true, description = "show this help and exit")
    private boolean help;

    @Option(names = {"-V", "--version"}, versionHelp = true, description = "print the version and exit")
    private boolean version;

    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Override
    public void run() {
        throw new ParameterException(spec.commandLine(), "a command is missing");
    }

    /** The version of the jar. */
    static final class Version implements IVersionProvider {
        @Override
        public String[] getVersion() {
            return new String[] {"bubblechain " + ProgramVersion.text()};
        }
    }
}
