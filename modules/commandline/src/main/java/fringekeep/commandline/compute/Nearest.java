package fringekeep.commandline.compute;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;

/** Names that may have been meant: those with the fewest changed, added or left-out letters. */
final class Nearest {
    private Nearest() {}

    /** Up to three names, the nearest first; those that share no more than chance are left out. */
    static List<String> to(String typed, Collection<String> names) {
        return names.stream()
                .filter(name -> distance(typed, name) <= Math.max(2, name.length() / 2)
                        || typed.length() > 2 && name.contains(typed))
                .sorted(Comparator.comparingInt((String name) -> name.contains(typed) ? 0 : distance(typed, name))
                        .thenComparing(Comparator.naturalOrder()))
                .limit(3)
                .toList();
    }

    private static int distance(String a, String b) {
        int[] row = new int[b.length() + 1];
        for (int j = 0; j <= b.length(); j++) {
            row[j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int changed = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                diagonal = row[j];
                row[j] = Math.min(changed, 1 + Math.min(row[j], row[j - 1]));
            }
        }
        return row[b.length()];
    }
}
