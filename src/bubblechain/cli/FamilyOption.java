package bubblechain.cli;

import java.util.LinkedHashMap;
import java.util.Map;
import picocli.CommandLine.Option;

/** The option {@code --parameter} of every command that takes a kernel. */
final class FamilyOption {
    @Option(
            names = "--parameter",
            paramLabel = "NAME=VALUE",
            description = "value of a parameter of a family, such as moment=4; may be repeated")
    Map<String, String> parameters = new LinkedHashMap<>();
}
