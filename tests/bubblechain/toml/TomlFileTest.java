package bubblechain.toml;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class TomlFileTest {
    private static final int MILLION = 1_000_000;

    private static TomlSection parse(String text) {
        return TomlFile.parse(text, "my.toml");
    }

    private static void assertMessage(ThrowingCallable call, String message) {
        assertThatThrownBy(call).isInstanceOf(TomlException.class).hasMessage(message);
    }

    @Test
    void entriesAreHandedOutAsTextsRationalsAndLists() {
        TomlSection top = parse("""
                name = "x"
                half = "-1/2"
                decimal = "0.125"
                n = "7"
                words = ["a", "b"]
                [inner]
                key = "value"
                [[entry]]
                k = "1"
                [[entry]]
                k = "2"
                """);
        assertThat(top.text("name")).isEqualTo("x");
        assertThat(top.rational("half")).hasToString("-1/2");
        assertThat(top.rational("decimal")).hasToString("1/8");
        assertThat(top.integer("n")).isEqualTo(7);
        assertThat(top.texts("words")).containsExactly("a", "b");
        assertThat(top.texts("nothing")).isEmpty();
        assertThat(top.optionalTable("inner")).hasValueSatisfying(t -> assertThat(t.text("key")).isEqualTo("value"));
        assertThat(top.tables("entry")).extracting(t -> t.integer("k")).containsExactly(1, 2);
        assertThat(top.optionalText("nothing")).isEmpty();
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "this is not toml         | my.toml, line 1, column 6: not TOML: Unexpected 'is', expected . or =",
        "a = \"1\";a = \"2\"      | my.toml, line 2, column 1: not TOML: a previously defined at line 1, column 1"
    })
    void aTextThatIsNotTomlIsRefusedWithItsPlace(String text, String message) {
        assertMessage(() -> parse(text.replace(";", "\n") + "\n"), message);
    }

    @ParameterizedTest
    @ValueSource(strings = {"a = \"1", "a =", "[a", "a = '''", "= 3", "a = [1,", "\u0000"})
    void anUnfinishedTextIsRefusedInOneLineWithItsPlace(String text) {
        assertThatThrownBy(() -> parse(text))
                .isInstanceOf(TomlException.class)
                .hasMessageMatching("my\\.toml, line 1, column \\d+: not TOML: .*");
    }

    @Test
    void entriesOfTheWrongKindAreRefusedWithTheirPlace() {
        TomlSection top = parse("""
                number = 3
                flag = true
                list = "one"
                mixed = ["a", 1]
                table = "x"
                half = "1/2"
                """);
        assertMessage(() -> top.text("number"), "my.toml, line 1, column 1: numbers are written as strings so that they stay"
                + " exact: number = \"3\"");
        assertMessage(() -> top.text("flag"), "my.toml, line 2, column 1: 'flag' must be a string");
        assertMessage(() -> top.texts("list"), "my.toml, line 3, column 1: 'list' must be a list of strings: list = [\"...\"]");
        assertMessage(() -> top.texts("mixed"), "my.toml, line 4, column 1: numbers are written as strings so that they stay"
                + " exact: mixed = \"1\"");
        assertMessage(() -> top.optionalTable("table"), "my.toml, line 5, column 1: 'table' must be a table: [table]");
        assertMessage(() -> top.tables("table"), "my.toml, line 5, column 1: 'table' must be a list of tables: [[table]]");
        assertMessage(() -> top.integer("half"), "my.toml, line 6, column 1: 'half' must be a small integer, got 1/2");
        assertMessage(() -> top.rational("list"), "my.toml, line 3, column 1: 'one' is not a rational number such as 3, -3/4"
                + " or 1.25");
        assertMessage(() -> top.text("missing"), "my.toml, line 1, column 1: the key 'missing' is missing at the top of the"
                + " file");
        assertMessage(() -> top.requireKnown(List.of("numbers", "flag", "list", "mixed", "table", "half")),
                "my.toml, line 1, column 1: unknown key 'number' at the top of the file; did you mean numbers?");
    }

    @Test
    void aFileLargerThanTheLimitIsRefusedWithoutReadingItAll() {
        long[] served = {0};
        InputStream endless = new InputStream() {
            @Override
            public int read() {
                served[0]++;
                return '#';
            }
        };
        assertMessage(() -> TomlFile.read(endless, "endless"), "endless: larger than the limit of 1000000 bytes");
        assertThat(served[0]).isEqualTo(MILLION + 1);
    }

    @Test
    void aFileOfExactlyTheLimitIsRead() throws IOException {
        byte[] bytes = ("#" + "x".repeat(MILLION - 1)).getBytes(StandardCharsets.UTF_8);
        assertThat(TomlFile.read(new ByteArrayInputStream(bytes), "full").keys()).isEmpty();
    }

    @Test
    void binaryMissingAndFolderAreRefused(@TempDir Path folder) throws IOException {
        Path binary = Files.write(folder.resolve("binary.toml"), new byte[] {0, 1, (byte) 0xff, (byte) 0xfe, (byte) 0x80});
        assertMessage(() -> TomlFile.read(binary), binary + ", line 1, column 3: not a text in UTF-8");
        Path missing = folder.resolve("missing.toml");
        assertMessage(() -> TomlFile.read(missing), "cannot read the file " + missing + "; check that it exists and is readable");
        assertMessage(() -> TomlFile.read(folder), folder + " is a directory; name a file in it");
        assertMessage(() -> TomlFile.path("a\0b.toml"), "'a\0b.toml' cannot be the name of a file");
    }

    @ParameterizedTest
    @CsvSource({"[, 1, 55", "{a=, 1, 155", "[{a=[, 1, 89", "'\n[\n', 102, 1"})
    void deepNestingIsRefusedBeforeParsing(String bracket, int line, int column) {
        assertMessage(
                () -> parse("x = " + bracket.repeat(100_000)),
                "my.toml, line " + line + ", column " + column + ": brackets nested deeper than 50 levels");
    }

    @Test
    void aLongFileMustBePlain() {
        String number = "a = 1\n";
        String comment = "#" + "x".repeat(100_000 - number.length() - 2) + "\n";
        assertThat(parse(comment + number).keys()).containsExactly("a");
        assertMessage(() -> parse("# one more" + comment + number), "my.toml, line 2, column 5: not plain TOML (names, strings in"
                + " double quotes, lists of strings, tables), which a file of more than 100000 characters must be");
    }

    @Test
    void aLongMessageIsCutInTheMiddle() {
        assertThatThrownBy(() -> parse("k".repeat(5_000) + " = \"1\"").requireKnown(List.of("name")))
                .hasMessageMatching("(?s)my.toml, line 1, column 1: unknown key 'k{200,} [.]{3} k*' at the top of the file; allowed are"
                        + " name");
    }

    @Test
    void aLongDottedKeyIsRefusedWithoutExhaustingTheStack() {
        assertThatThrownBy(() -> parse("a.".repeat(40_000) + "a = \"1\""))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("Nesting is too deep");
    }

    @Test
    void bracketsInCommentsAndStringsAreNoNesting() {
        String lines = """
                # the interval [0, 1)
                t%1$d = "[0, 1)" # and {
                u%1$d = '["['
                v%1$d = \"""[ " [
                [\"""
                w%1$d = '''[ ' ['''
                e%1$d = "\\"[\\\\"
                """;
        StringBuilder file = new StringBuilder();
        for (int k = 0; k < 60; k++) {
            file.append(lines.formatted(k));
        }
        TomlSection top = parse(file.toString());
        assertThat(top.text("t59")).isEqualTo("[0, 1)");
        assertThat(top.text("u59")).isEqualTo("[\"[");
        assertThat(top.text("w59")).isEqualTo("[ ' [");
        assertThat(top.text("e59")).isEqualTo("\"[\\");
    }

    @Test
    void nestingWithinTheLimitIsRead() {
        assertThat(parse("x = " + "[".repeat(50) + "]".repeat(50)).keys()).containsExactly("x");
    }
}
