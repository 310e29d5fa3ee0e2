package bubblechain.assessment;

import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.List;

/** Shows what a validation found. */
public final class ValidationReport {
    private ValidationReport() {}

    /** @param path what was validated, "library" for all built-in files */
    public static Report of(String path, List<Validation.Finding> findings) {
        Table.Builder table = Table.builder("checks", "Checks")
                .column("file", "file")
                .column("check", "check")
                .column("passed", "passed")
                .column("detail", "found");
        findings.forEach(f -> table.row(
                Value.text(f.file()), Value.text(f.check()), Value.flag(f.passed()), Value.text(f.detail())));
        return Report.builder("validate")
                .request("path", path)
                .add(Facts.titled("", "")
                        .with("passed", "passed", Value.count(count(findings, true)))
                        .with("failed", "failed", Value.count(count(findings, false))))
                .add(table.build())
                .build();
    }

    /** True if the report of a validation counts no failure. */
    public static boolean allPassed(Report report) {
        return report.blocks().stream()
                .filter(Facts.class::isInstance)
                .flatMap(block -> ((Facts) block).facts().stream())
                .noneMatch(fact -> fact.key().equals("failed") && !fact.value().equals(Value.count(0)));
    }

    private static long count(List<Validation.Finding> findings, boolean passed) {
        return findings.stream().filter(f -> f.passed() == passed).count();
    }
}
