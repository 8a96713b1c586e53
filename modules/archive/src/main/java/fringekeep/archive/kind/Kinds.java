package fringekeep.archive.kind;

import fringekeep.archive.record.KindName;
import java.util.Collection;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.ServiceLoader;
import java.util.SortedMap;
import java.util.TreeMap;

/** The kinds this program knows, collected once at start and passed on. */
public final class Kinds {
    private final SortedMap<KindName, RecordKind> byName;

    /** Exactly these. */
    public Kinds(Collection<? extends RecordKind> kinds) {
        SortedMap<KindName, RecordKind> map = new TreeMap<>();
        for (RecordKind kind : kinds) {
            RecordKind before = map.put(kind.kind(), kind);
            if (before != null) {
                throw new IllegalArgumentException("kind " + kind.kind() + " is announced twice: "
                        + before.getClass().getName() + " and "
                        + kind.getClass().getName());
            }
        }
        this.byName = Collections.unmodifiableSortedMap(map);
    }

    /** All that are announced to a class loader. */
    public static Kinds announced(ClassLoader loader) {
        return new Kinds(ServiceLoader.load(RecordKind.class, loader).stream()
                .map(ServiceLoader.Provider::get)
                .toList());
    }

    /** The kind of that name. */
    public Optional<RecordKind> get(KindName name) {
        return Optional.ofNullable(byName.get(name));
    }

    /** All kinds, by name. */
    public List<RecordKind> all() {
        return List.copyOf(byName.values());
    }
}
