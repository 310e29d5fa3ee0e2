package bubblechain.assessment;

import bubblechain.report.Block;
import bubblechain.report.Facts;
import bubblechain.report.Table;

/** The keys of the parts of a report, where parts of several reports come together. */
final class Keys {
    private Keys() {}

    static String of(Block block) {
        if (block instanceof Table table) {
            return table.key();
        }
        return block instanceof Facts facts ? facts.key() : "";
    }

    static Block renamed(Block block, String key) {
        if (block instanceof Table table) {
            return new Table(key, table.title(), table.columns(), table.rows());
        }
        return block instanceof Facts facts ? new Facts(key, facts.title(), facts.facts()) : block;
    }
}
