package fringekeep.desk.session;

import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Fingerprints of records by kind and place, in plain arrays of about fifty bytes a record, so that hundreds of thousands fit.
 * Grows at its end only: registers share one and each looks at its own beginning of it. Thread-safe.
 */
final class Catalogue {
    private static final int BYTES = 32;
    private final List<String> kinds = new ArrayList<>();
    private final Map<String, int[]> ofKind = new LinkedHashMap<>();
    private final Map<String, Integer> counts = new LinkedHashMap<>();
    private byte[] hashes = new byte[BYTES * 64];
    private short[] kindOf = new short[64];
    private int[] places = new int[64];
    private int[] table = new int[256];
    private int size;

    /** Adds records of a kind behind those it has; known ones are passed over. */
    synchronized void add(String kind, List<Hash> records) {
        int code = kinds.indexOf(kind);
        if (code < 0) {
            code = kinds.size();
            kinds.add(kind);
            ofKind.put(kind, new int[16]);
            counts.put(kind, 0);
        }
        for (Hash record : records) {
            byte[] bytes = record.bytes();
            if (find(bytes) < 0) {
                append(kind, (short) code, bytes);
            }
        }
    }

    private void append(String kind, short code, byte[] bytes) {
        if (size == kindOf.length) {
            int wider = size + size / 2;
            hashes = Arrays.copyOf(hashes, BYTES * wider);
            kindOf = Arrays.copyOf(kindOf, wider);
            places = Arrays.copyOf(places, wider);
        }
        int place = counts.getOrDefault(kind, 0);
        int[] ids = ofKind.getOrDefault(kind, new int[16]);
        if (place == ids.length) {
            ids = Arrays.copyOf(ids, place + place / 2);
        }
        ids[place] = size;
        ofKind.put(kind, ids);
        counts.put(kind, place + 1);
        System.arraycopy(bytes, 0, hashes, BYTES * size, BYTES);
        kindOf[size] = code;
        places[size] = place;
        size++;
        if (2 * size > table.length) {
            table = new int[4 * table.length];
            for (int id = 0; id < size; id++) {
                enter(id);
            }
        } else {
            enter(size - 1);
        }
    }

    private void enter(int id) {
        int slot = slot(hashes, BYTES * id);
        while (table[slot] != 0) {
            slot = (slot + 1) & (table.length - 1);
        }
        table[slot] = id + 1;
    }

    private int slot(byte[] bytes, int from) {
        int key = (bytes[from] & 0xFF) << 24
                | (bytes[from + 1] & 0xFF) << 16
                | (bytes[from + 2] & 0xFF) << 8
                | (bytes[from + 3] & 0xFF);
        return key & (table.length - 1);
    }

    private int find(byte[] bytes) {
        int slot = slot(bytes, 0);
        while (table[slot] != 0) {
            int from = BYTES * (table[slot] - 1);
            if (Arrays.equals(hashes, from, from + BYTES, bytes, 0, BYTES)) {
                return table[slot] - 1;
            }
            slot = (slot + 1) & (table.length - 1);
        }
        return -1;
    }

    /** Position of a record among all; -1 if it is not at hand. */
    synchronized int id(Hash record) {
        return find(record.bytes());
    }

    /** Kind of the record at a position. */
    synchronized String kind(int id) {
        return kinds.get(kindOf[id]);
    }

    /** Its place among those of its kind. */
    synchronized int place(int id) {
        return places[id];
    }

    /** Fingerprint of the record of a kind at a place. */
    synchronized Hash hash(String kind, int place) {
        int id = ofKind.getOrDefault(kind, new int[0])[place];
        return Hash.fromBytes(Arrays.copyOfRange(hashes, BYTES * id, BYTES * (id + 1)));
    }

    /** How many of each kind. */
    synchronized Map<String, Integer> counts() {
        return Map.copyOf(counts);
    }

    /** How many in all. */
    synchronized int size() {
        return size;
    }
}
