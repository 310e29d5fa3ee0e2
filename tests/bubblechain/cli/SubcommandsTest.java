package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import picocli.CommandLine.Command;

/** The first argument decides which commands are made. */
class SubcommandsTest {
    @Test
    void aNamedCommandIsMadeAlone() {
        for (ReportCommand command : Subcommands.all()) {
            String name = command.getClass().getAnnotation(Command.class).name();
            assertThat(Subcommands.named(name, "--help")).hasSize(1).first().hasSameClassAs(command);
        }
    }

    @Test
    void everythingElseNeedsAllOfThem() {
        int all = Subcommands.all().size();
        assertThat(Subcommands.named()).hasSize(all);
        assertThat(Subcommands.named("--help")).hasSize(all);
        assertThat(Subcommands.named("coefficient")).hasSize(all);
    }
}
