package fringekeep.audit;

import fringekeep.archive.record.Hash;
import java.util.Map;
import java.util.Set;

/**
 * Changes that are supposed but not recorded.
 *
 * @param withdrawn records taken as withdrawn
 * @param replaced records taken as corrected by another record at hand
 */
public record Supposed(Set<Hash> withdrawn, Map<Hash, Hash> replaced) {
    /** Nothing is supposed. */
    public static final Supposed NOTHING = new Supposed(Set.of(), Map.of());

    /** Copies. */
    public Supposed {
        withdrawn = Set.copyOf(withdrawn);
        replaced = Map.copyOf(replaced);
    }
}
