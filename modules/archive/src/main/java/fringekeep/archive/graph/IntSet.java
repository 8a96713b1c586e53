package fringekeep.archive.graph;

import java.util.Arrays;

/** A growing set of numbers from 0, in the order they came. */
final class IntSet {
    private int[] slots = new int[64];
    private int[] items = new int[32];
    private int size;

    boolean add(int value) {
        int slot = slot(value);
        if (slots[slot] != 0) {
            return false;
        }
        slots[slot] = value + 1;
        if (size == items.length) {
            items = Arrays.copyOf(items, 2 * size);
        }
        items[size++] = value;
        if (2 * size > slots.length) {
            grow();
        }
        return true;
    }

    boolean contains(int value) {
        return slots[slot(value)] != 0;
    }

    int size() {
        return size;
    }

    int get(int index) {
        return items[index];
    }

    private int slot(int value) {
        int slot = (value * 0x9E3779B9) >>> (Integer.numberOfLeadingZeros(slots.length) + 1);
        while (slots[slot] != 0 && slots[slot] != value + 1) {
            slot = (slot + 1) & (slots.length - 1);
        }
        return slot;
    }

    private void grow() {
        slots = new int[2 * slots.length];
        for (int i = 0; i < size; i++) {
            slots[slot(items[i])] = items[i] + 1;
        }
    }
}
