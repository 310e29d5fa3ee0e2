package bubblechain.report;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/** The names a mistyped word may have meant. */
public final class NearestNames {
    private static final int MOST = 3;

    private NearestNames() {}

    /**
     * At most three names close to the word, nearest first, equally near ones in alphabetical order. Close means: by
     * no more single-letter insertions, deletions, substitutions or swaps of neighbours than a third of the word's
     * letters (at least one), or one begins with the other and the shorter has at least three letters. Case is ignored.
     *
     * @param word  what was typed
     * @param names what exists
     * @return      empty if nothing is close
     */
    public static List<String> of(String word, Collection<String> names) {
        String wanted = word.toLowerCase(Locale.ROOT);
        return names.stream()
                .distinct()
                .filter(name -> isClose(wanted, name.toLowerCase(Locale.ROOT)))
                .sorted(Comparator.comparingInt((String name) -> distance(wanted, name.toLowerCase(Locale.ROOT)))
                        .thenComparing(Comparator.naturalOrder()))
                .limit(MOST)
                .toList();
    }

    private static boolean isClose(String word, String name) {
        int shorter = Math.min(word.length(), name.length());
        boolean begins = shorter >= 3 && (name.startsWith(word) || word.startsWith(name));
        int allowed = Math.max(1, word.length() / 3);
        return begins || Math.abs(word.length() - name.length()) <= allowed && distance(word, name) <= allowed;
    }

    /** Optimal string alignment distance: Levenshtein's with swaps of neighbouring letters counted once. */
    static int distance(String a, String b) {
        int[][] d = new int[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            for (int j = 0; j <= b.length(); j++) {
                d[i][j] = i == 0 || j == 0 ? i + j : step(d, a, b, i, j);
            }
        }
        return d[a.length()][b.length()];
    }

    private static int step(int[][] d, String a, String b, int i, int j) {
        int substitution = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        int best = Math.min(d[i - 1][j - 1] + substitution, 1 + Math.min(d[i - 1][j], d[i][j - 1]));
        boolean swapped = i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1);
        return swapped ? Math.min(best, d[i - 2][j - 2] + 1) : best;
    }
}
