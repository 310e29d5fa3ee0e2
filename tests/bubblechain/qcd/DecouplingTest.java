package bubblechain.qcd;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.numbers;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.CouplingSubstitution;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class DecouplingTest {
    private static final String ROW = "alpha_s^(nl)/alpha_s^(nl+1) at mu=mbar(mbar)";

    @Test
    void decimalsOfTheReferenceTable() {
        // fixed-order.csv, rows of the decoupling at mu = mbar(mbar)
        List<String> third = numbers(value(ROW, "3-loop"));
        List<String> fourth = numbers(value(ROW, "4-loop"));
        assertPrinted(Decoupling.atMass(0, 4).get(1), "0.152777777778", "d2");
        assertPrinted(Decoupling.atMass(0, 4).get(2), third.get(0), "d3 at nl = 0");
        assertPrinted(difference(3, 1, 0), third.get(1), "nl^1 of d3");
        // second difference / 2 and slope of the quadratic d4
        ExactConstant second = difference(4, 2, 1).subtract(difference(4, 1, 0)).divide(Rational.TWO);
        assertPrinted(second, fourth.get(2), "nl^2 of d4");
        assertPrinted(difference(4, 1, 0).subtract(second), fourth.get(1), "nl^1 of d4");
    }

    private static ExactConstant difference(int order, int high, int low) {
        return Decoupling.atMass(high, order).get(order - 1).subtract(Decoupling.atMass(low, order).get(order - 1));
    }

    @Test
    void thereAndBackIsTheIdentity() {
        List<ExactConstant> there = Decoupling.atMass(4, 4);
        List<ExactConstant> back = Decoupling.atMassInverse(4, 4);
        List<ExactConstant> heavy = new ArrayList<>(back);
        heavy.add(0, ExactConstant.ONE); // alpha^(nl+1) as a series in alpha^(nl)
        List<ExactConstant> identity = CouplingSubstitution.apply(heavy, there);
        assertThat(identity.get(0)).isEqualTo(ExactConstant.ONE);
        assertThat(identity.subList(1, 5)).allMatch(ExactConstant::isZero);
    }

    @Test
    void requestsOutsideTheKnownRangeAreRefused() {
        assertThatThrownBy(() -> Decoupling.atMass(3, 5))
                .isInstanceOf(DomainException.class)
                .hasMessage("decoupling is known to order 4 in alpha_s/pi, got 5");
        assertThatThrownBy(() -> Decoupling.atMass(16, 2)).isInstanceOf(DomainException.class);
    }
}
