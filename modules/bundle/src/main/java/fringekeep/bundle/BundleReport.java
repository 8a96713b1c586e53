package fringekeep.bundle;

import fringekeep.archive.problem.Problem;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * What a check found.
 *
 * @param level the highest level at which the bundle holds
 * @param faults what is wrong, by the level it belongs to; empty when all that was asked holds
 * @param records records found
 * @param recomputed verdict counts of the records that were recomputed, by verdict
 * @param notes what is as it should be but worth knowing, such as records that can only be carried
 */
public record BundleReport(
        Level level,
        SortedMap<Level, List<Problem>> faults,
        int records,
        SortedMap<String, Integer> recomputed,
        List<String> notes) {
    /** Copies. */
    public BundleReport {
        SortedMap<Level, List<Problem>> copy = new TreeMap<>();
        faults.forEach((key, list) -> copy.put(key, List.copyOf(list)));
        faults = java.util.Collections.unmodifiableSortedMap(copy);
        recomputed = java.util.Collections.unmodifiableSortedMap(new TreeMap<>(recomputed));
        notes = List.copyOf(notes);
    }

    /** All faults in the order of their levels. */
    public List<Problem> allFaults() {
        return faults.values().stream().flatMap(List::stream).toList();
    }
}
