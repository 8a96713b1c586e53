package fringekeep.archive.kind;

import fringekeep.archive.record.KindName;
import java.util.Optional;
import java.util.Set;

/**
 * A role that inputs or subjects play.
 *
 * @param name such as {@code scan} or {@code batch}
 * @param kinds kinds that may play it; empty = any kind
 * @param facets facets a record must offer to play it; empty = none asked
 * @param raw whether a raw file plays it instead of a record
 * @param least how many at least
 * @param most how many at most
 * @param timedBy role whose records' start times say which segment of the thing is meant (setup, calibration), if timed
 */
public record Role(
        String name,
        Set<KindName> kinds,
        Set<Class<?>> facets,
        boolean raw,
        int least,
        int most,
        Optional<String> timedBy) {
    /** Copies. */
    public Role {
        kinds = Set.copyOf(kinds);
        facets = Set.copyOf(facets);
    }

    /** A role played by records of one kind. */
    public static Role of(String name, String kind, int least, int most) {
        return new Role(name, Set.of(new KindName(kind)), Set.of(), false, least, most, Optional.empty());
    }

    /** A role played by whatever offers a facet. */
    public static Role offering(String name, Class<?> facet, int least, int most) {
        return new Role(name, Set.of(), Set.of(facet), false, least, most, Optional.empty());
    }

    /** A role played by records of any kind. */
    public static Role anyKind(String name, int least, int most) {
        return new Role(name, Set.of(), Set.of(), false, least, most, Optional.empty());
    }

    /** A role played by raw files. */
    public static Role ofRaw(String name, int least, int most) {
        return new Role(name, Set.of(), Set.of(), true, least, most, Optional.empty());
    }

    /** The same role, timed by the records of another role. */
    public Role timed(String by) {
        return new Role(name, kinds, facets, raw, least, most, Optional.of(by));
    }
}
