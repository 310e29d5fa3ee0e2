package bubblechain.report;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * The answer to one command, ready for any writer.
 *
 * @param command       name of the command, "poles"
 * @param request       the options that produced the answer, defaults included, in the order given
 * @param normalisation what is expanded in what, in words: "M/mbar(mbar) - 1 in alpha_s^(4)(2 mbar)/pi"; may be empty
 * @param blocks        what is shown; all keys of the result unique
 * @param sources       references of everything used, without duplicates
 * @param cautions      what the reader must know before quoting a number, without duplicates
 */
public record Report(
        String command,
        Map<String, String> request,
        String normalisation,
        List<Block> blocks,
        List<String> sources,
        List<String> cautions) {
    public Report {
        if (command.isBlank()) {
            throw new IllegalArgumentException("a report needs the name of its command");
        }
        request = Collections.unmodifiableMap(new LinkedHashMap<>(request));
        blocks = List.copyOf(blocks);
        sources = List.copyOf(new LinkedHashSet<>(sources));
        cautions = List.copyOf(new LinkedHashSet<>(cautions));
        Keys.checkUnique(resultKeys(blocks), "the result of '" + command + "'");
    }

    private static List<String> resultKeys(List<Block> blocks) {
        List<String> keys = new ArrayList<>();
        for (Block block : blocks) {
            if (block instanceof Table table) {
                Keys.check(table.key());
                keys.add(table.key());
            } else if (block instanceof Facts facts && facts.key().isEmpty()) {
                facts.facts().forEach(fact -> keys.addAll(fact.keys()));
            } else if (block instanceof Facts facts) {
                keys.add(facts.key());
            }
        }
        return keys;
    }

    /** A report under construction. */
    public static Builder builder(String command) {
        return new Builder(command);
    }

    /** Collects the parts of a report in the order in which they are shown. */
    public static final class Builder {
        private final String command;
        private final Map<String, String> request = new LinkedHashMap<>();
        private final List<Block> blocks = new ArrayList<>();
        private final Set<String> sources = new LinkedHashSet<>();
        private final Set<String> cautions = new LinkedHashSet<>();
        private String normalisation = "";

        private Builder(String command) {
            this.command = command;
        }

        /** Records one option of the request; a second value for the same key replaces the first. */
        public Builder request(String key, String value) {
            request.put(key, value);
            return this;
        }

        /** Says in words what is expanded in what. */
        public Builder normalisation(String words) {
            normalisation = words;
            return this;
        }

        public Builder add(Block block) {
            blocks.add(block);
            return this;
        }

        /** Adds a reference; one already there is not repeated. */
        public Builder source(String text) {
            sources.add(text);
            return this;
        }

        /** Adds a caution; one already there is not repeated. */
        public Builder caution(String text) {
            cautions.add(text);
            return this;
        }

        /** @throws IllegalArgumentException if two blocks use the same key of the result */
        public Report build() {
            return new Report(
                    command, request, normalisation, blocks, List.copyOf(sources), List.copyOf(cautions));
        }
    }
}
