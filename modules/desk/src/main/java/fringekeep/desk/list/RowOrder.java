package fringekeep.desk.list;

import fringekeep.archive.record.Hash;
import fringekeep.desk.session.Register;
import java.util.Arrays;
import java.util.stream.IntStream;

/** What stands in each row, as one number: the place of a record, or minus the number of a group less one. */
final class RowOrder {
    private final Register register;
    private final String kind;
    private final int[] rows;

    RowOrder(Register register, String kind, int[] rows) {
        this.register = register;
        this.kind = kind;
        this.rows = rows;
    }

    /**
     * Records in order, gathered by group with a head before each; groups stand in the order of their first record.
     *
     * @param places places of records
     * @param groupOf number of each record's group, from 0
     * @param groups how many groups there are
     */
    static int[] gathered(int[] places, int[] groupOf, int groups) {
        int[] next = new int[groups + 1];
        for (int group : groupOf) {
            next[group + 1]++;
        }
        for (int group = 1; group <= groups; group++) {
            next[group] += next[group - 1] + 1;
        }
        int[] rows = new int[places.length + groups];
        for (int group = 0; group < groups; group++) {
            rows[next[group]] = -1 - group;
        }
        for (int i = 0; i < places.length; i++) {
            rows[++next[groupOf[i]]] = places[i];
        }
        return rows;
    }

    int size() {
        return rows.length;
    }

    boolean group(int row) {
        return rows[row] < 0;
    }

    int groupNumber(int row) {
        return -1 - rows[row];
    }

    Hash record(int row) {
        return register.record(kind, rows[row]);
    }

    int place(int row) {
        return rows[row];
    }

    int rowOf(Hash record) {
        int place = register.kind(record).filter(kind::equals).isPresent() ? register.place(record) : -1;
        return place < 0
                ? -1
                : IntStream.range(0, rows.length)
                        .filter(row -> rows[row] == place)
                        .findFirst()
                        .orElse(-1);
    }

    int[] groups() {
        return IntStream.range(0, rows.length).filter(row -> rows[row] < 0).toArray();
    }

    /** Places of the records from a row to another, heads left out. */
    int[] places(int from, int to) {
        return Arrays.stream(rows, from, to).filter(place -> place >= 0).toArray();
    }
}
