package fringekeep.archive.graph;

import java.util.Arrays;

/**
 * A long list of ints in chunks. Copies share chunks; a chunk is copied before it is changed while shared. Chunks that hold
 * nothing but the default are not there at all, so rare facts cost next to nothing.
 */
final class IntVector {
    private static final int BITS = 11;
    private static final int SIZE = 1 << BITS;
    private static final int MASK = SIZE - 1;
    private final int absent;
    private int[][] chunks;
    private boolean[] own;

    IntVector(int absent) {
        this(absent, new int[0][], new boolean[0]);
    }

    private IntVector(int absent, int[][] chunks, boolean[] own) {
        this.absent = absent;
        this.chunks = chunks;
        this.own = own;
    }

    int get(int index) {
        int at = index >>> BITS;
        if (at >= chunks.length || chunks[at] == null) {
            return absent;
        }
        return chunks[at][index & MASK];
    }

    void set(int index, int value) {
        if (value != get(index)) {
            chunk(index >>> BITS)[index & MASK] = value;
        }
    }

    private int[] chunk(int at) {
        if (at >= chunks.length) {
            int length = Math.max(at + 1, chunks.length + (chunks.length >> 1));
            chunks = Arrays.copyOf(chunks, length);
            own = Arrays.copyOf(own, length);
        }
        if (chunks[at] == null) {
            chunks[at] = new int[SIZE];
            Arrays.fill(chunks[at], absent);
            own[at] = true;
        } else if (!own[at]) {
            chunks[at] = chunks[at].clone();
            own[at] = true;
        }
        return chunks[at];
    }

    /** A copy that never changes, whatever happens to this one. */
    IntVector frozen() {
        Arrays.fill(own, false);
        return new IntVector(absent, chunks.clone(), new boolean[chunks.length]);
    }
}
