package fringekeep.archive.making;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.RecordSource;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Turns stored bytes into what kinds see. Records of unknown kinds and of schemas newer than this program are served with
 * their head and parts as stored, but offer no facets. Keeps what was read last; thread-safe if its source is.
 */
public final class Resolver {
    private static final int KEPT = 4_096;
    private final Kinds kinds;
    private final RecordSource source;
    private final Map<Hash, RecordView> kept = new LinkedHashMap<>(64, 0.75f, true) {
        private static final long serialVersionUID = 1L;

        @Override
        protected boolean removeEldestEntry(Map.Entry<Hash, RecordView> eldest) {
            return size() > KEPT;
        }
    };

    /** Resolves what a source holds, as kinds understand it. */
    public Resolver(Kinds kinds, RecordSource source) {
        this.kinds = kinds;
        this.source = source;
    }

    /** The same kinds, with another source asked first: records not yet stored, or a supposed change. */
    public Resolver before(RecordSource first) {
        return new Resolver(kinds, first.or(source));
    }

    /** The kinds it knows. */
    public Kinds kinds() {
        return kinds;
    }

    /** Where bytes come from. */
    public RecordSource source() {
        return source;
    }

    /**
     * A record, if its head is at hand.
     *
     * @throws IllegalStateException if the head's bytes are broken: {@code check} will name them
     */
    public Optional<RecordView> record(Hash fingerprint) {
        synchronized (kept) {
            RecordView view = kept.get(fingerprint);
            if (view != null) {
                return Optional.of(view);
            }
        }
        Optional<RecordView> read = source.head(fingerprint).map(bytes -> view(fingerprint, bytes));
        read.ifPresent(view -> {
            synchronized (kept) {
                kept.put(fingerprint, view);
            }
        });
        return read;
    }

    private RecordView view(Hash fingerprint, byte[] bytes) {
        try {
            Head head = HeadCodec.read(bytes);
            return new ResolvedRecord(fingerprint, head, kinds.get(head.kind()), source);
        } catch (ProblemException e) {
            throw new IllegalStateException("the stored head " + fingerprint + " is broken", e);
        }
    }

    /** The kind that understands a record: none for unknown kinds and newer schemas. */
    public Optional<RecordKind> kind(RecordView record) {
        return kinds.get(record.head().kind()).filter(kind -> record.head().schema() <= kind.schema());
    }

    /** What a record was made from and speaks of; nothing if its head is not at hand. */
    public Inputs inputs(Hash fingerprint) {
        return record(fingerprint).map(this::inputs).orElse(inputs(List.of(), List.of()));
    }

    /** What a record was made from and speaks of. */
    public Inputs inputs(RecordView record) {
        return inputs(record.head().inputs(), record.head().about());
    }

    /** References resolved. */
    public Inputs inputs(List<InputReference> inputs, List<AboutReference> about) {
        return ResolvedInputs.of(this, inputs, about);
    }

    /** A facet that a record offers. */
    public <T> Optional<T> facet(Hash fingerprint, Class<T> facet) {
        return record(fingerprint).flatMap(view -> kind(view).flatMap(kind -> kind.facet(facet, view, inputs(view))));
    }
}
