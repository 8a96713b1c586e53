package fringekeep.fit;

import fringekeep.archive.record.Hash;
import java.util.NavigableSet;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * What a person changes about the masked points of one scan while fitting it by hand. Nothing is judged until the fit is
 * recorded; then each reason becomes one judgement.
 *
 * @param scan the scan
 * @param channel channel whose points are masked
 * @param masked rows masked now, from 0, each with the code of its reason; empty where none was given yet
 * @param shown rows that earlier judgements mask and that are to be used after all
 * @param undoing code of the reason why earlier masks do not hold; empty where none was given yet
 * @param words words that go with it; may be empty
 */
public record MaskChange(
        Hash scan,
        String channel,
        SortedMap<Integer, String> masked,
        NavigableSet<Integer> shown,
        String undoing,
        String words) {
    /** Copies. */
    public MaskChange {
        masked = new TreeMap<>(masked);
        shown = new TreeSet<>(shown);
    }

    /** Whether nothing is changed. */
    public boolean empty() {
        return masked.isEmpty() && shown.isEmpty();
    }
}
