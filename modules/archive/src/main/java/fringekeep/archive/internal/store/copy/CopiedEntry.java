package fringekeep.archive.internal.store.copy;

import fringekeep.archive.internal.store.journal.Entry;
import fringekeep.archive.record.Hash;
import java.util.List;

/**
 * An entry of a copy.
 *
 * @param entry what it says
 * @param bytes its exact bytes
 * @param brought parts whose bytes stand with it
 */
public record CopiedEntry(Entry entry, byte[] bytes, List<Hash> brought) {
    /** Copies. */
    public CopiedEntry {
        brought = List.copyOf(brought);
    }
}
