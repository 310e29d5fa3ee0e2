package bubblechain.formula;

import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Reads a formula by precedence climbing. From loose to tight: {@code + -}, then {@code * /}, then a leading sign, then
 * {@code ^} (right-associative), then numbers, names, calls and parentheses. So -u^2 is -(u^2) and 2^-u is 2^(-u).
 */
final class FormulaParser {
    private final FormulaLexer lexer;
    private int depth;

    FormulaParser(String text) {
        lexer = new FormulaLexer(text);
    }

    Formula parse() {
        Formula formula = sum();
        if (!lexer.atEnd()) {
            throw unexpected("an operator or the end of the formula");
        }
        Substitution.requireShallow(formula, Map.of());
        return formula;
    }

    private Formula sum() {
        Span start = lexer.span();
        Formula left = product();
        while (lexer.isOperator("+") || lexer.isOperator("-")) {
            Formula.Operator operator =
                    lexer.isOperator("+") ? Formula.Operator.ADD : Formula.Operator.SUBTRACT;
            lexer.next();
            left = binary(start, operator, left, product());
        }
        return left;
    }

    private Formula product() {
        Span start = lexer.span();
        Formula left = signed();
        while (true) {
            if (lexer.isOperator("*") || lexer.isOperator("/")) {
                Formula.Operator operator =
                        lexer.isOperator("*") ? Formula.Operator.MULTIPLY : Formula.Operator.DIVIDE;
                lexer.next();
                left = binary(start, operator, left, signed());
            } else if (lexer.startsOperand()) {
                throw FormulaException.at(
                        start.to(lexer.span()),
                        "two factors without an operator; write " + shortText(lexer.from(start)) + "*"
                                + shortText(lexer.span()));
            } else {
                return left;
            }
        }
    }

    private static String shortText(Span span) {
        String text = span.text();
        return text.length() <= 12 ? text : "...";
    }

    private Formula signed() {
        if (lexer.isOperator("-") || lexer.isOperator("+")) {
            boolean negative = lexer.isOperator("-");
            Span sign = lexer.span();
            lexer.next();
            enter();
            Formula operand = signed();
            depth--;
            return negative ? new Formula.Negation(operand, lexer.from(sign)) : operand;
        }
        return power();
    }

    private Formula power() {
        Span start = lexer.span();
        Formula base = atom();
        if (!lexer.isOperator("^")) {
            return base;
        }
        lexer.next();
        enter();
        Formula exponent = signed();
        depth--;
        return binary(start, Formula.Operator.POWER, base, exponent);
    }

    private Formula atom() {
        Span start = lexer.span();
        if (lexer.isNumber()) {
            Rational value = lexer.number();
            lexer.next();
            return new Formula.Literal(value, start);
        }
        if (lexer.isName()) {
            String name = lexer.text();
            lexer.next();
            return lexer.isOperator("(") ? call(name, start) : named(name, start);
        }
        if (lexer.isOperator("(")) {
            lexer.next();
            enter();
            Formula inner = sum();
            depth--;
            expect(")", start);
            return inner;
        }
        throw unexpected("a number, a name or a parenthesis");
    }

    private static Formula named(String name, Span span) {
        if (Function.named(name).isPresent() || name.equals("sum")) {
            throw FormulaException.at(span, "the function " + name + " needs its arguments in parentheses");
        }
        return new Formula.Name(name, span);
    }

    private Formula call(String name, Span start) {
        if (name.equals("sum")) {
            return finiteSum(start);
        }
        Optional<Function> known = Function.named(name);
        if (known.isEmpty()) {
            throw FormulaException.at(start, unknownFunction(name));
        }
        Function function = known.get();
        List<Formula> arguments = new ArrayList<>();
        lexer.next();
        enter();
        do {
            if (!arguments.isEmpty()) {
                lexer.next();
            }
            arguments.add(sum());
        } while (lexer.isOperator(","));
        depth--;
        Span end = expect(")", start);
        if (arguments.size() != function.arity()) {
            throw FormulaException.at(
                    start.to(end),
                    name + " takes " + function.arity() + (function.arity() == 1 ? " argument" : " arguments") + ", got "
                            + arguments.size());
        }
        return new Formula.Call(function, arguments, start.to(end));
    }

    private static String unknownFunction(String name) {
        StringBuilder known = new StringBuilder();
        for (Function function : Function.values()) {
            known.append(function.text()).append(", ");
        }
        return "no function '" + name + "'; known are " + known + "sum (for a product write " + name + "*(...))";
    }

    private Formula finiteSum(Span start) {
        lexer.next();
        if (!lexer.isName()) {
            throw unexpected("the name of the summation index, as in sum(k, 1, 5, 1/k)");
        }
        String index = lexer.text();
        Span indexSpan = lexer.span();
        lexer.next();
        if (!Constants.isFreeName(index)) {
            throw FormulaException.at(indexSpan, "'" + index + "' cannot be a summation index");
        }
        enter();
        expect(",", start);
        Formula from = sum();
        expect(",", start);
        Formula to = sum();
        expect(",", start);
        Formula body = sum();
        depth--;
        Span end = expect(")", start);
        return new Formula.FiniteSum(index, from, to, body, start.to(end));
    }

    private Span expect(String symbol, Span opening) {
        if (!lexer.isOperator(symbol)) {
            String what = symbol.equals(",") ? "a comma" : "the parenthesis that closes column " + opening.column();
            throw unexpected(what);
        }
        Span span = lexer.span();
        lexer.next();
        return span;
    }

    private Formula binary(Span start, Formula.Operator operator, Formula left, Formula right) {
        return new Formula.Binary(operator, left, right, lexer.from(start));
    }

    private void enter() {
        if (++depth > FormulaLimits.NESTING) {
            throw FormulaException.at(lexer.span(), "nested deeper than " + FormulaLimits.NESTING + " levels");
        }
    }

    private FormulaException unexpected(String wanted) {
        String got = lexer.atEnd() ? "the formula ends" : "found '" + lexer.text() + "'";
        return FormulaException.at(lexer.span(), got + " where " + wanted + " was expected");
    }
}
