package bubblechain.formula;

import bubblechain.exact.Rational;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;

/**
 * A formula as a tree. Nodes know where they stand in the source so that an error can underline them; two formulas
 * mean the same text when their {@link #print} is the same.
 */
public sealed interface Formula {
    Span span();

    /** A rational number as written: an integer or an exact decimal. */
    record Literal(Rational value, Span span) implements Formula {}

    /** A variable, parameter, definition, index of a sum, or one of the constants pi and euler_gamma. */
    record Name(String name, Span span) implements Formula {}

    /** Minus an operand. */
    record Negation(Formula operand, Span span) implements Formula {}

    /** Two operands joined by + - * / or ^. */
    record Binary(Operator operator, Formula left, Formula right, Span span) implements Formula {}

    /** A function of one argument, or of an integer order and an argument. */
    record Call(Function function, List<Formula> arguments, Span span) implements Formula {
        public Call {
            arguments = List.copyOf(arguments);
        }
    }

    /** sum(index, from, to, body): empty if {@code to} is below {@code from}. */
    record FiniteSum(String index, Formula from, Formula to, Formula body, Span span) implements Formula {}

    /** The operators with their text and binding strength. */
    enum Operator {
        ADD("+", 1),
        SUBTRACT("-", 1),
        MULTIPLY("*", 2),
        DIVIDE("/", 2),
        POWER("^", 4);

        private final String text;
        private final int strength;

        Operator(String text, int strength) {
            this.text = text;
            this.strength = strength;
        }

        public String text() {
            return text;
        }

        int strength() {
            return strength;
        }
    }

    /** Reads a formula. @throws FormulaException with line, column and the place underlined */
    static Formula parse(String text) {
        return new FormulaParser(text).parse();
    }

    /** The formula as text that parses to the same tree, with no more parentheses than needed. */
    default String print() {
        return FormulaPrinter.print(this);
    }

    /** This formula with names replaced by formulas; the index of a sum hides an outer name. */
    default Formula substitute(Map<String, Formula> values) {
        return Substitution.apply(this, values);
    }

    /** The partial derivative, unsimplified. @throws FormulaException if zeta or polylog contain the variable */
    default Formula derivative(String variable) {
        return Derivative.of(this, variable);
    }

    /** The same function with the zeros and ones of a substitution taken out. */
    default Formula simplified() {
        return Simplification.of(this);
    }

    /** The names that occur free, constants included, in alphabetical order. */
    default Set<String> names() {
        Set<String> found = new TreeSet<>();
        Substitution.collectNames(this, Set.of(), found);
        return found;
    }
}
