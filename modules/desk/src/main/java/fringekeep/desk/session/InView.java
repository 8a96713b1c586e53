package fringekeep.desk.session;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import java.util.BitSet;
import java.util.Map;
import java.util.Optional;

/**
 * Which records are in view at one register.
 *
 * @param view the view
 * @param register the register whose places are meant
 * @param places places in view by kind; empty when everything is
 * @param name what is in view, such as {@code Thu 13 Mar 2031}
 * @param detail a line below it, such as {@code 06:00 to 06:00}
 */
public record InView(View view, Register register, Optional<Map<String, BitSet>> places, String name, String detail) {
    /** Copies. */
    public InView {
        places = places.map(Map::copyOf);
    }

    /** Whether the record of a kind at a place is in view. */
    public boolean contains(String kind, int place) {
        return places.isEmpty() || places.get().getOrDefault(kind, new BitSet()).get(place);
    }

    /** Whether a record is in view. */
    public boolean contains(Hash record) {
        return places.isEmpty()
                || register.kind(record)
                        .filter(kind -> contains(kind, register.place(record)))
                        .isPresent();
    }

    /** Current records of a kind in view. */
    public int current(String kind) {
        int count = 0;
        for (int place = 0; place < register.size(kind); place++) {
            if (contains(kind, place) && !register.is(kind, place, StateName.CORRECTED)) {
                count++;
            }
        }
        return count;
    }

    /** Current records of a kind in view that are in a state. */
    public int count(String kind, StateName state) {
        int count = 0;
        for (int place = 0; place < register.size(kind); place++) {
            if (contains(kind, place)
                    && register.is(kind, place, state)
                    && !register.is(kind, place, StateName.CORRECTED)) {
                count++;
            }
        }
        return count;
    }
}
