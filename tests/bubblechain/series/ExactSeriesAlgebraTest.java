package bubblechain.series;

import bubblechain.exact.ExactConstant;

class ExactSeriesAlgebraTest extends SeriesAlgebraLaws<ExactConstant> {
    @Override
    CoefficientRing<ExactConstant> ring() {
        return ExactRing.INSTANCE;
    }

    /** Formally equal, or so close that no ball tells them apart: 1/(c) is opaque for a sum c. */
    @Override
    boolean agree(ExactConstant left, ExactConstant right) {
        ExactConstant difference = left.subtract(right);
        return difference.isZero() || !difference.isClosedForm() && difference.toBall(200).containsZero();
    }
}
