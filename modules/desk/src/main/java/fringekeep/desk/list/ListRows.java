package fringekeep.desk.list;

import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.list.ListContent.Line;
import java.util.AbstractList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/** Rows of a list: all at hand, or read by pages as they come in sight. To be used on the window thread. */
public abstract class ListRows extends AbstractList<Line> {
    /** Rows that are all at hand. */
    public static ListRows of(List<? extends Line> lines) {
        return new Whole(List.copyOf(lines));
    }

    /** The record of a row; empty for group heads. Reads nothing. */
    public abstract Optional<Hash> record(int row);

    /** Whether a row is the head of a group. */
    public abstract boolean group(int row);

    /** The row of a record; -1 if it is not listed. */
    public abstract int rowOf(Hash record);

    /** Rows that are group heads. */
    public abstract int[] groups();

    /** Some rows that are at hand, to measure columns by. */
    public abstract List<Line> sample();

    private static final class Whole extends ListRows {
        private final List<Line> lines;

        Whole(List<Line> lines) {
            this.lines = lines;
        }

        @Override
        public Line get(int row) {
            return lines.get(row);
        }

        @Override
        public int size() {
            return lines.size();
        }

        @Override
        public Optional<Hash> record(int row) {
            return lines.get(row) instanceof Entry entry ? Optional.of(entry.record()) : Optional.empty();
        }

        @Override
        public boolean group(int row) {
            return lines.get(row) instanceof Group;
        }

        @Override
        public int rowOf(Hash record) {
            return IntStream.range(0, lines.size())
                    .filter(row -> record(row).filter(record::equals).isPresent())
                    .findFirst()
                    .orElse(-1);
        }

        @Override
        public int[] groups() {
            return IntStream.range(0, lines.size())
                    .filter(row -> lines.get(row) instanceof Group)
                    .toArray();
        }

        @Override
        public List<Line> sample() {
            return lines.subList(0, Math.min(lines.size(), 300));
        }
    }
}
