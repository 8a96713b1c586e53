package fringekeep.instrument;

import java.util.Locale;
import java.util.Optional;

/** Sorts of gratings. */
public enum GratingSort {
    /** Slits in a membrane. */
    MATERIAL,
    /** Phase grating of a standing light wave. */
    STANDING_WAVE,
    /** Light that removes particles at its antinodes. */
    DEPLETION;

    /** The code that stands in records. */
    public String code() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /** Words for people. */
    public String words() {
        return switch (this) {
            case MATERIAL -> "material";
            case STANDING_WAVE -> "standing light wave";
            case DEPLETION -> "depletion by light";
        };
    }

    static Optional<GratingSort> of(String code) {
        for (GratingSort sort : values()) {
            if (sort.code().equals(code)) {
                return Optional.of(sort);
            }
        }
        return Optional.empty();
    }
}
