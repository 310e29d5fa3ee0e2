package bubblechain.output;

import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Turns a number in the formula language into LaTeX for math mode: {@code -3*zeta(3)/4 + pi^2} becomes
 * {@code -3\,\zeta(3)/4 + \pi^{2}}. The order of the terms and the slashes stay; exp and sqrt lose their brackets.
 */
final class LatexFormula {
    private static final Pattern TOKEN = Pattern.compile("\\s*(?:([A-Za-z]\\w*)|(\\d+(?:\\.\\d+)?)|([-+*/^(),]))\\s*");
    private static final Map<String, String> NAMES = Map.of(
            "pi", "\\pi ",
            "euler_gamma", "\\gamma_E ",
            "zeta", "\\zeta ",
            "ln", "\\ln ",
            "gamma", "\\Gamma ",
            "digamma", "\\psi ",
            "sin", "\\sin ",
            "cos", "\\cos ");

    private final Matcher tokens;
    private final int length;
    private final StringBuilder latex = new StringBuilder();
    private int position;

    private LatexFormula(String formula) {
        tokens = TOKEN.matcher(formula);
        length = formula.length();
    }

    /** The formula for math mode, or empty if the text is not in the formula language. */
    static Optional<String> of(String formula) {
        LatexFormula parser = new LatexFormula(formula);
        boolean whole = parser.until("");
        return whole ? Optional.of(parser.latex.toString().strip()) : Optional.empty();
    }

    /** Translates up to the closing bracket of this level, or to the end; false if the text ends or begins wrongly. */
    private boolean until(String close) {
        boolean good = true;
        while (good && position < length) {
            if (!next()) {
                return false;
            }
            if (")".equals(tokens.group(3))) {
                return ")".equals(close);
            }
            good = token();
        }
        return good && close.isEmpty();
    }

    private boolean next() {
        tokens.region(position, length);
        if (!tokens.lookingAt()) {
            return false;
        }
        position = tokens.end();
        return true;
    }

    private boolean token() {
        if (tokens.group(1) != null) {
            return name(tokens.group(1));
        }
        if (tokens.group(2) != null) {
            latex.append(tokens.group(2));
            return true;
        }
        return switch (tokens.group(3)) {
            case "(" -> enclosed("(", ")");
            case "^" -> exponent();
            case "*" -> product();
            case "+", "-" -> sign(tokens.group(3));
            default -> {
                latex.append(tokens.group(3));
                yield true;
            }
        };
    }

    private boolean name(String name) {
        boolean call = next("(");
        if (call && name.equals("exp")) {
            return exponential();
        }
        if (call && name.equals("sqrt")) {
            latex.append("\\sqrt");
            return enclosed("{", "}");
        }
        latex.append(NAMES.containsKey(name) ? NAMES.get(name) : "\\mathrm{" + name.replace("_", "\\_") + "}");
        return !call || enclosed("(", ")");
    }

    private boolean exponential() {
        int start = latex.length();
        latex.append("e^");
        boolean good = enclosed("{", "}");
        if (isNext("^")) {
            latex.insert(start, '(').append(')');
        }
        return good;
    }

    private boolean isNext(String operator) {
        int before = position;
        boolean found = next(operator);
        position = before;
        return found;
    }

    private boolean next(String operator) {
        int before = position;
        if (position < length && next() && operator.equals(tokens.group(3))) {
            return true;
        }
        position = before;
        return false;
    }

    private boolean enclosed(String open, String close) {
        latex.append(open);
        boolean good = until(")");
        latex.append(close);
        return good;
    }

    /** What follows ^; brackets around it are needed only if it is raised to a power itself. */
    private boolean exponent() {
        latex.append("^{");
        int start = latex.length();
        boolean good;
        if (next("(")) {
            good = until(")");
            if (isNext("^")) {
                latex.insert(start, '(').append(')');
            }
        } else {
            latex.append(next("-") ? "-" : "");
            good = position < length && next() && tokens.group(3) == null && token();
        }
        good = good && (!next("^") || exponent());
        latex.append('}');
        return good;
    }

    private boolean product() {
        boolean digits = latex.length() > 0 && Character.isDigit(latex.charAt(latex.length() - 1));
        int before = position;
        boolean number = position < length && next() && tokens.group(2) != null;
        position = before;
        latex.append(digits && number ? "\\cdot " : "\\,");
        return true;
    }

    private boolean sign(String sign) {
        boolean leading = latex.length() == 0 || "({^".indexOf(latex.charAt(latex.length() - 1)) >= 0;
        latex.append(leading ? sign : " " + sign + " ");
        return true;
    }
}
