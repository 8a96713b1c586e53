package fringekeep.desk.list;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * A list as it is shown.
 *
 * @param heading such as "142 scans"
 * @param words filter words with their counts
 * @param heads columns between number and marks
 * @param plot scale of the plot column, if there is one
 * @param rows group heads and records
 * @param more whether there are more rows than were asked for
 */
public record ListContent(
        String heading, List<Word> words, List<Head> heads, Optional<Plot> plot, List<Line> rows, boolean more) {
    /** Copies. */
    public ListContent {
        words = List.copyOf(words);
        heads = List.copyOf(heads);
        rows = List.copyOf(rows);
    }

    /** Nothing yet. */
    public static final ListContent NOTHING =
            new ListContent("", List.of(), List.of(), Optional.empty(), List.of(), false);

    /** A filter word; the chosen one is underlined. */
    public record Word(String text, int count, Question question, boolean chosen) {}

    /** Head of a column. */
    public record Head(String text, boolean right) {}

    /** Scale of the plot column: from 0 to its end. */
    public record Plot(int column, double to, double step) {}

    /** A row. */
    public sealed interface Line {}

    /** Head of a group. */
    public record Group(String text, String right) implements Line {}

    /**
     * A record.
     *
     * @param record fingerprint
     * @param number what people call it, without its kind
     * @param cells one per head
     * @param value value of the plot column, NaN if none
     * @param deviation its standard uncertainty, NaN if none
     * @param state the state shown at the right
     */
    public record Entry(
            Hash record, String number, List<String> cells, double value, double deviation, Optional<StateName> state)
            implements Line {
        /** Copies. */
        public Entry {
            cells = List.copyOf(cells);
        }

        /** Whether its text is struck through. */
        public boolean struck() {
            return state.filter(StateName.WITHDRAWN::equals).isPresent();
        }
    }
}
