package fringekeep.desk.list;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Mark;
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
 * @param marks whether any row has a mark at its right
 * @param question what was asked
 */
public record ListContent(
        String heading,
        List<Word> words,
        List<Head> heads,
        Optional<Plot> plot,
        ListRows rows,
        boolean marks,
        Optional<Question> question) {
    /** Copies. */
    public ListContent {
        words = List.copyOf(words);
        heads = List.copyOf(heads);
    }

    /** Nothing yet. */
    public static final ListContent NOTHING = new ListContent(
            "", List.of(), List.of(), Optional.empty(), ListRows.of(List.of()), false, Optional.empty());

    /** The same with other filter words. */
    ListContent with(List<Word> others) {
        return new ListContent(heading, others, heads, plot, rows, marks, question);
    }

    /** A filter word; the chosen one is underlined. */
    public record Word(String text, int count, Question question, boolean chosen) {}

    /**
     * Head of a column.
     *
     * @param text words and unit
     * @param right whether its cells stand at the right
     * @param column name, or {@code kind:column} of a linked record
     */
    public record Head(String text, boolean right, String column) {}

    /** Scale of the plot column: from 0 to its end. */
    public record Plot(int column, double to, double step) {}

    /** A row. */
    public sealed interface Line {}

    /** A record whose row is still being read. */
    public record Waiting(Hash record) implements Line {}

    /** What a row says at its right: a shape and a word. */
    public record RowMark(Mark mark, String word) {}

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
     * @param state the state shown first
     * @param mark what is said at the right
     */
    public record Entry(
            Hash record,
            String number,
            List<String> cells,
            double value,
            double deviation,
            Optional<StateName> state,
            Optional<RowMark> mark)
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
