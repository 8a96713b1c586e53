package fringekeep.archive.internal.store;

import fringekeep.archive.Circumstances;
import fringekeep.archive.Prepared;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.Computing;
import fringekeep.archive.making.MemorySource;
import fringekeep.archive.making.Preparing;
import fringekeep.archive.making.Resolver;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/** Records as kinds see them. Thread-safe if its source is. */
final class Views {
    private final Kinds kinds;
    private final RecordSource source;
    private volatile Seen seen;

    /** A resolver, and what works on it and keeps compiled schemas. */
    private record Seen(
            Resolver resolver,
            Computing computing,
            @Nullable Preparing preparing) {}

    Views(RecordSource source, Kinds kinds) {
        this.kinds = kinds;
        this.source = source;
        this.seen = fresh();
    }

    private Seen fresh() {
        Resolver resolver = new Resolver(kinds, source);
        return new Seen(resolver, new Computing(resolver), null);
    }

    /** Also those that are prepared and not stored yet. */
    static Views of(List<Prepared> prepared, RecordSource stored, Kinds kinds) {
        return new Views(MemorySource.of(prepared).or(stored), kinds);
    }

    Computing computing() {
        return seen.computing();
    }

    Preparing preparing(Circumstances circumstances) {
        Seen now = seen;
        if (now.preparing() == null) {
            now = new Seen(now.resolver(), now.computing(), new Preparing(now.resolver(), circumstances));
            seen = now;
        }
        return Objects.requireNonNull(now.preparing());
    }

    /** What was read before may hold parts that are gone now, or lack some that came. */
    void forget() {
        seen = fresh();
    }

    Optional<RecordView> view(Hash fingerprint) {
        return seen.resolver().record(fingerprint);
    }

    Inputs inputs(Hash fingerprint) {
        return seen.resolver().inputs(fingerprint);
    }
}
