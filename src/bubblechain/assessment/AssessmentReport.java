package bubblechain.assessment;

import bubblechain.borel.BorelPlane;
import bubblechain.borel.BorelPole;
import bubblechain.borel.PoleShares;
import bubblechain.borel.PolesReport;
import bubblechain.chain.ChainOptions;
import bubblechain.chain.CoefficientReport;
import bubblechain.chain.Scales;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.kernel.Kernel;
import bubblechain.report.Block;
import bubblechain.report.Facts;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Value;
import bubblechain.sumrule.ResidueReport;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * One quantity on one page: how the chain grows, which power corrections it implies, what the published series says about
 * the leading one, and how far the two agree.
 */
public final class AssessmentReport {
    /** Most terms of the chain that are shown. */
    public static final int LARGEST_LOOPS = PoleShares.LARGEST_INDEX;

    private static final int DIGITS = 12;
    private static final int POLE_DIGITS = 10;
    /** Parts of a cross-check that stand at the top of the page or in the part on the sum rule. */
    private static final Set<String> SHOWN_ELSEWHERE = Set.of("comparison", "published_orders");

    private AssessmentReport() {}

    /**
     * @param series the published series; without one only the chain is assessed
     * @param nf     massless flavours
     * @param loops  terms of the chain that are shown
     * @param range  poles are shown for -range &lt;= u &lt;= range
     */
    public static Report of(Kernel kernel, Optional<PerturbativeSeries> series, int nf, int loops, Rational range) {
        if (range.signum() <= 0) {
            throw new DomainException("--range must be positive, got " + range);
        }
        if (loops < 1 || loops > LARGEST_LOOPS) {
            throw new DomainException("the number of loops lies between 1 and " + LARGEST_LOOPS + ", got " + loops);
        }
        ChainOptions options = ChainOptions.DEFAULT.withFlavours(nf);
        Report.Builder report = Report.builder("assess")
                .request("kernel", kernel.name())
                .request("series", series.map(PerturbativeSeries::name).orElse("none"))
                .request("nf", Integer.toString(nf))
                .request("loops", Integer.toString(loops))
                .request("range", range.toString());
        report.normalisation(options.words(kernel));
        report.add(defaults(kernel, series, nf));
        Optional<CrossCheck> check = series.map(s -> CrossCheck.of(kernel, s, nf, Optional.empty()));
        // the result comes first, how it came about afterwards
        check.ifPresent(c -> report.add(CrossCheckReport.comparison(c)));
        add(report, CoefficientReport.of(kernel, options, loops, DIGITS, false, false), "chain_coefficients");
        addPoles(report, kernel, options, range, loops);
        kernel.sources().forEach(report::source);
        kernel.cautions().forEach(report::caution);
        report.caution(CoefficientReport.MODEL_CAUTION);
        if (check.isPresent()) {
            addSeries(report, check.get());
        } else {
            report.add(new Note("No published series of this quantity is at hand: the chain stands alone, and nothing"
                    + " here is measured."));
        }
        return report.build();
    }

    private static Facts defaults(Kernel kernel, Optional<PerturbativeSeries> series, int nf) {
        Facts facts = Facts.titled("defaults", kernel.title())
                .with("quantity", "quantity", Value.text(kernel.quantity()))
                .with("nf", "massless flavours (--nf)", Value.count(nf))
                .with("scale", "scale of the coupling", Value.text(kernel.scale()))
                .with("scheme", "scheme", Value.text("MS-bar"))
                .with("prefactor", "prefactor taken out of c_n", Value.text(kernel.prefactor().words()));
        return series.map(s -> facts.with("series", "published series", Value.text(s.inWords(nf) + ", " + s.loops() + " loops")))
                .orElse(facts);
    }

    private static void addPoles(
            Report.Builder report, Kernel kernel, ChainOptions options, Rational range, int loops) {
        add(
                report,
                PolesReport.of(kernel, options, range.negate(), range, POLE_DIGITS, loops - 1),
                "poles");
        BorelPlane plane = BorelPlane.of(kernel, Scales.NATURAL);
        Facts leading = Facts.titled("leading", "Nearest singularities");
        Optional<BorelPole> infrared = plane.leadingInfrared();
        Optional<BorelPole> ultraviolet = plane.leadingUltraviolet();
        leading = leading.with(
                "ir", "infrared", Value.text(infrared.map(p -> words(p, kernel)).orElse(none(kernel))));
        leading = leading.with(
                "uv", "ultraviolet", Value.text(ultraviolet.map(p -> words(p, kernel)).orElse(none(kernel))));
        report.add(leading);
    }

    private static String none(Kernel kernel) {
        return kernel.isAnomalousDimension() ? "none" : "none with |u| up to " + BorelPlane.SEARCH_LIMIT;
    }

    private static String words(BorelPole pole, Kernel kernel) {
        String kind = pole.pole().order() == 1 ? "simple pole" : "pole of order " + pole.pole().order();
        return "u = " + pole.u() + ", " + kind + ", power correction: " + pole.power(kernel.scale());
    }

    private static void addSeries(Report.Builder report, CrossCheck check) {
        report.add(new Note("Now the published series: " + check.series().inWords(check.nf()) + "."));
        for (Block block : ResidueReport.blocks(check.measured())) {
            report.add(block);
        }
        CrossCheckReport.blocks(check).stream()
                .filter(block -> !SHOWN_ELSEWHERE.contains(Keys.of(block)))
                .forEach(report::add);
        CrossCheckReport.sourcesOf(check).forEach(report::source);
        CrossCheckReport.cautionsOf(check).forEach(report::caution);
    }

    /** The first block of another report under a key of this one, and the tables that follow it. */
    private static void add(Report.Builder report, Report part, String key) {
        List<Block> blocks = part.blocks();
        for (int k = 0; k < blocks.size(); k++) {
            report.add(k == 0 ? Keys.renamed(blocks.get(0), key) : blocks.get(k));
        }
    }
}
