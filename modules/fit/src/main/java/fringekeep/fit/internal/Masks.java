package fringekeep.fit.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.TreeSet;

/** Rows that pinned judgements mask. */
public final class Masks {
    private final List<RecordView> judgements;

    /** The masks among the inputs of a fit. */
    public Masks(Inputs inputs) {
        this.judgements = inputs.role("mask").stream()
                .map(Input::record)
                .flatMap(Optional::stream)
                .toList();
    }

    /**
     * Marks the rows of a scan that are masked in a channel.
     *
     * @param masked one element a row, set to true where masked
     */
    void apply(Hash scan, String channel, boolean[] masked) {
        for (RecordView judgement : judgements) {
            JsonObject content = judgement.content();
            Optional<String> named = content.text("channel");
            if (speaksOf(judgement, scan) && (named.isEmpty() || named.get().equals(channel))) {
                mark(content, masked);
            }
        }
    }

    private static boolean speaksOf(RecordView judgement, Hash scan) {
        return judgement.head().about().stream()
                .filter(reference -> reference.role().equals("target"))
                .map(AboutReference::record)
                .anyMatch(scan::equals);
    }

    /**
     * Rows that a judgement masks.
     *
     * @param content its content
     * @param rows how many rows the scan has
     */
    public static NavigableSet<Integer> rows(JsonObject content, int rows) {
        boolean[] masked = new boolean[rows];
        mark(content, masked);
        NavigableSet<Integer> found = new TreeSet<>();
        for (int row = 0; row < rows; row++) {
            if (masked[row]) {
                found.add(row);
            }
        }
        return found;
    }

    private static void mark(JsonObject content, boolean[] masked) {
        boolean whole = content.get("points").isEmpty();
        for (int row = 0; row < masked.length; row++) {
            masked[row] |= whole || inside(content.array("points"), row);
        }
    }

    private static boolean inside(JsonArray points, int row) {
        for (Json item : points.items()) {
            if (item instanceof JsonArray run) {
                double[] ends = run.numbers();
                if (ends.length == 2 && row >= ends[0] && row <= ends[1]) {
                    return true;
                }
            }
        }
        return false;
    }
}
