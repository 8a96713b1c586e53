package fringekeep.archive.graph;

/** A long list of longs, kept as pairs of ints. */
final class LongVector {
    private final IntVector high;
    private final IntVector low;

    LongVector() {
        this(new IntVector(0), new IntVector(0));
    }

    private LongVector(IntVector high, IntVector low) {
        this.high = high;
        this.low = low;
    }

    long get(int index) {
        return ((long) high.get(index) << 32) | (low.get(index) & 0xffffffffL);
    }

    void set(int index, long value) {
        high.set(index, (int) (value >>> 32));
        low.set(index, (int) value);
    }

    LongVector frozen() {
        return new LongVector(high.frozen(), low.frozen());
    }
}
