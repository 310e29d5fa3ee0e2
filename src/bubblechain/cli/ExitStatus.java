package bubblechain.cli;

import java.util.LinkedHashMap;
import java.util.Map;

/** Exit statuses of the program. */
final class ExitStatus {
    /** The result was computed and written. */
    static final int DONE = 0;
    /** The request made sense, its result could not be computed or written. */
    static final int NOT_COMPUTED = 1;
    /** The request was wrong. */
    static final int WRONG_USAGE = 2;

    private ExitStatus() {}

    /** The list for the help texts. */
    static Map<String, String> list() {
        Map<String, String> list = new LinkedHashMap<>();
        list.put(Integer.toString(DONE), "done");
        list.put(Integer.toString(NOT_COMPUTED), "the result could not be computed or written");
        list.put(Integer.toString(WRONG_USAGE), "wrong usage: an option, a name, a value or a file is not what it should be");
        return list;
    }
}
