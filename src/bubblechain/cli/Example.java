package bubblechain.cli;

import java.util.List;

/**
 * A worked example of a command, shown in its help and run by the tests.
 *
 * @param arguments what is typed after the program's name; words separated by single spaces, without quotes
 * @param says      what it shows, one line
 */
record Example(String arguments, String says) {
    /** The arguments as the program receives them. */
    List<String> words() {
        return List.of(arguments.split(" "));
    }
}
