package fringekeep.archive.graph;

/**
 * Finds numbers by keys of a fixed count of longs (a hash: four, a thing: two). Open addressing over vectors, at most two
 * thirds full.
 */
final class KeyIndex {
    static final int NONE = -1;
    private final int width;
    private LongVector keys;
    private IntVector slots;
    private int capacity;
    private int count;

    KeyIndex(int width) {
        this(width, new LongVector(), new IntVector(NONE), 1 << 10, 0);
    }

    private KeyIndex(int width, LongVector keys, IntVector slots, int capacity, int count) {
        this.width = width;
        this.keys = keys;
        this.slots = slots;
        this.capacity = capacity;
        this.count = count;
    }

    int count() {
        return count;
    }

    /** The key of a number. */
    long[] key(int number) {
        long[] key = new long[width];
        for (int i = 0; i < width; i++) {
            key[i] = keys.get(number * width + i);
        }
        return key;
    }

    /** The number of a key, or {@link #NONE}. */
    int find(long[] key) {
        int slot = slot(key);
        return slots.get(slot);
    }

    /** The number of a key, the next free one if it is new. */
    int findOrAdd(long[] key) {
        int slot = slot(key);
        int number = slots.get(slot);
        if (number != NONE) {
            return number;
        }
        number = count++;
        for (int i = 0; i < width; i++) {
            keys.set(number * width + i, key[i]);
        }
        slots.set(slot, number);
        if (3L * count > 2L * capacity) {
            grow();
        }
        return number;
    }

    private int slot(long[] key) {
        int slot = mixed(key) & (capacity - 1);
        while (true) {
            int number = slots.get(slot);
            if (number == NONE || equal(number, key)) {
                return slot;
            }
            slot = (slot + 1) & (capacity - 1);
        }
    }

    /** Every bit of the key counts: ids that another archive chose badly must not fall into one row of slots. */
    private static int mixed(long[] key) {
        long mixed = 0;
        for (long word : key) {
            mixed = (mixed ^ word) * 0x9E3779B97F4A7C15L;
            mixed ^= mixed >>> 29;
        }
        return (int) (mixed ^ (mixed >>> 32));
    }

    private boolean equal(int number, long[] key) {
        for (int i = 0; i < width; i++) {
            if (keys.get(number * width + i) != key[i]) {
                return false;
            }
        }
        return true;
    }

    private void grow() {
        capacity = Math.multiplyExact(capacity, 2);
        slots = new IntVector(NONE);
        for (int number = 0; number < count; number++) {
            slots.set(slot(key(number)), number);
        }
    }

    KeyIndex frozen() {
        return new KeyIndex(width, keys.frozen(), slots.frozen(), capacity, count);
    }
}
