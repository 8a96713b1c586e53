package fringekeep.desk.lineage;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.session.States.Sentence;
import java.util.List;
import java.util.Optional;

/**
 * The lineage of one record as a ruled sheet.
 *
 * @param root whose lineage
 * @param label what it is called
 * @param summary such as "rests on 1 181 204 counts in 51 scans"
 * @param where behind the summary: "of 2 measurement days"
 * @param states sentences about the root
 * @param bands days with their rows, in order
 * @param steps links within the sheet: from user to input
 */
public record Sheet(
        Hash root,
        String label,
        String summary,
        String where,
        List<Sentence> states,
        List<Band> bands,
        List<Step> steps) {
    /** Copies. */
    public Sheet {
        states = List.copyOf(states);
        bands = List.copyOf(bands);
        steps = List.copyOf(steps);
    }

    /** A day, or what was before. */
    public record Band(String heading, List<Row> rows) {
        /** Copies. */
        public Band {
            rows = List.copyOf(rows);
        }
    }

    /**
     * A row: what happened at one time.
     *
     * @param time its time or date
     * @param words what it was
     * @param items its records, at most one per column unless gathered
     */
    public record Row(String time, String words, List<Item> items) {
        /** Copies. */
        public Row {
            items = List.copyOf(items);
        }
    }

    /**
     * A record in a cell.
     *
     * @param record fingerprint
     * @param column stop
     * @param number what people call it
     * @param title its words
     * @param state state shown
     * @param counts its counts, 0 where it has none
     */
    public record Item(
            Hash record, int column, String number, String title, Optional<StateName> state, double counts) {}

    /** A link from a user to an input, and the role it plays. */
    public record Step(Hash user, Hash input, String role) {}
}
