package bubblechain.formula;

import bubblechain.exact.Rational;
import java.util.Objects;

/** Cuts a formula into numbers, names and operators, one token ahead. */
final class FormulaLexer {
    private enum Kind {
        NUMBER,
        NAME,
        OPERATOR,
        END
    }

    private final String source;
    private Kind kind = Kind.END;
    private int start;
    private int end;
    private int lastEnd;

    FormulaLexer(String source) {
        this.source = source;
        if (source.length() > FormulaLimits.LENGTH) {
            throw FormulaException.at(
                    new Span(source, 0, 1),
                    "the formula has " + source.length() + " characters; the limit is " + FormulaLimits.LENGTH);
        }
        next();
    }

    void next() {
        lastEnd = end;
        start = end;
        while (start < source.length() && Character.isWhitespace(source.charAt(start))) {
            start++;
        }
        end = start;
        if (start == source.length()) {
            kind = Kind.END;
            return;
        }
        char c = source.charAt(start);
        if (isDigit(c) || c == '.' && start + 1 < source.length() && isDigit(source.charAt(start + 1))) {
            kind = Kind.NUMBER;
            readNumber();
        } else if (isLetter(c)) {
            kind = Kind.NAME;
            while (end < source.length() && (isLetter(source.charAt(end)) || isDigit(source.charAt(end)))) {
                end++;
            }
        } else if ("+-*/^(),".indexOf(c) >= 0) {
            kind = Kind.OPERATOR;
            end++;
        } else {
            int point = source.codePointAt(start);
            String name = Objects.requireNonNullElse(Character.getName(point), "unassigned");
            String shown = point < 0x7f && point >= 0x20 ? "'" + c + "'" : String.format("U+%04X (%s)", point, name);
            throw FormulaException.at(
                    new Span(source, start, start + 1), "the character " + shown + " has no meaning in a formula");
        }
    }

    private void readNumber() {
        skipDigits();
        if (end < source.length() && source.charAt(end) == '.') {
            end++;
            skipDigits();
        }
        // "2e3" is a number only if digits follow; "2exp(u)" is a missing operator.
        int mark = end;
        if (end < source.length() && (source.charAt(end) == 'e' || source.charAt(end) == 'E')) {
            end++;
            if (end < source.length() && (source.charAt(end) == '+' || source.charAt(end) == '-')) {
                end++;
            }
            int digits = end;
            skipDigits();
            if (end == digits) {
                end = mark;
            } else if (end - digits > 4) {
                throw FormulaException.at(span(), "the exponent of this number is out of range");
            }
        }
        if (end - start > FormulaLimits.DIGITS) {
            throw FormulaException.at(span(), "a number of more than " + FormulaLimits.DIGITS + " digits");
        }
    }

    private void skipDigits() {
        while (end < source.length() && isDigit(source.charAt(end))) {
            end++;
        }
    }

    private static boolean isDigit(char c) {
        return c >= '0' && c <= '9';
    }

    private static boolean isLetter(char c) {
        return c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z' || c == '_';
    }

    boolean atEnd() {
        return kind == Kind.END;
    }

    boolean isNumber() {
        return kind == Kind.NUMBER;
    }

    boolean isName() {
        return kind == Kind.NAME;
    }

    boolean isOperator(String text) {
        return kind == Kind.OPERATOR && source.startsWith(text, start);
    }

    boolean startsOperand() {
        return kind == Kind.NUMBER || kind == Kind.NAME || isOperator("(");
    }

    Rational number() {
        String text = text();
        return Rational.parse(text.startsWith(".") ? "0" + text : text);
    }

    String text() {
        return source.substring(start, end);
    }

    /** From a token to the one last passed. */
    Span from(Span first) {
        return new Span(source, first.start(), Math.max(lastEnd, first.end()));
    }

    Span span() {
        return new Span(source, start, end);
    }
}
