package fringekeep.desk.stage;

import fringekeep.archive.record.Hash;
import java.util.AbstractList;
import java.util.RandomAccess;
import java.util.function.IntFunction;

/** Very many records that do not change, each made as it is asked for. */
public final class LazyRecords extends AbstractList<Hash> implements RandomAccess {
    private final int count;
    private final IntFunction<Hash> record;

    /**
     * Records.
     *
     * @param count how many
     * @param record the one at a place, always the same
     */
    public LazyRecords(int count, IntFunction<Hash> record) {
        this.count = count;
        this.record = record;
    }

    @Override
    public Hash get(int place) {
        if (place < 0 || place >= count) {
            throw new IndexOutOfBoundsException(place);
        }
        return record.apply(place);
    }

    @Override
    public int size() {
        return count;
    }
}
