package fringekeep.archive.making;

import fringekeep.archive.Circumstances;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Records without an archive: new ones are examined and made into bytes exactly as an archive does and then held in memory,
 * with a clock and ids that are the same at every run. For tests of kinds, and for trying out what is not to be stored. Does
 * not know which record is current; not thread-safe.
 */
public final class DetachedRecords {
    /** Who enters when nobody is named. */
    public static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");

    private final MemorySource source = new MemorySource();
    private final Resolver resolver;
    private final Preparing preparing;
    private final Computing computing;

    /** For these kinds, from 2031-05-14T09:00:00Z on. */
    public DetachedRecords(RecordKind... kinds) {
        this(
                new Kinds(List.of(kinds)),
                ScriptedCircumstances.stepping(
                        "detached records", Instant.parse("2031-05-14T09:00:00Z"), ZoneOffset.UTC, "1.0.0"));
    }

    /** For these kinds under given circumstances. */
    public DetachedRecords(Kinds kinds, Circumstances circumstances) {
        this.resolver = new Resolver(kinds, source);
        this.preparing = new Preparing(resolver, circumstances);
        this.computing = new Computing(resolver);
    }

    /** Records what is complete; {@link #PERSON} enters where none is named and one is needed. */
    public Hash record(NewRecord record) throws ProblemException {
        boolean named = record.person().isPresent() || !record.parts().containsKey(PartName.CONTENT);
        Prepared prepared = preparing.prepare(named ? record : by(record, PERSON), List.of());
        source.add(prepared);
        return prepared.fingerprint();
    }

    private static NewRecord by(NewRecord record, PersonId person) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                record.payloads(),
                record.corrects(),
                record.after(),
                Optional.of(person));
    }

    /** Records entered content. */
    public Hash enter(String kind, JsonObject content, AboutReference... about) throws ProblemException {
        return record(request(kind, PartName.CONTENT, content, List.of(), List.of(about)));
    }

    /** Computes and records. */
    public Hash compute(NewRecord request) throws ProblemException {
        try {
            return record(computing.compute(request, List.of(), Work.QUIET));
        } catch (StoppedException e) {
            throw new IllegalStateException("quiet work is never stopped", e);
        }
    }

    /** Computes from choices (possibly incomplete) and inputs, and records. */
    public Hash compute(String kind, JsonObject choices, List<InputReference> inputs) throws ProblemException {
        return compute(request(kind, PartName.CHOICES, choices, inputs, List.of()));
    }

    private static NewRecord request(
            String kind, PartName part, JsonObject value, List<InputReference> inputs, List<AboutReference> about) {
        return new NewRecord(
                new KindName(kind),
                inputs,
                about,
                Map.of(part, value),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
    }

    /** Takes a raw file in and gives the input that pins it. */
    public InputReference raw(String role, byte[] bytes) {
        return new InputReference.OfRaw(role, source.addRaw(bytes), bytes.length);
    }

    /** The input that pins a record. */
    public static InputReference input(String role, Hash record) {
        return new InputReference.OfRecord(role, record);
    }

    /** A reference to all records of a record's thing. */
    public static AboutReference about(String role, Hash record) {
        return new AboutReference(role, record, AboutReference.Reach.THING);
    }

    /** A record that was recorded here. */
    public RecordView view(Hash fingerprint) {
        return resolver.record(fingerprint)
                .orElseThrow(() -> new IllegalArgumentException("no record " + fingerprint.shortForm()));
    }

    /** What a record was made from and speaks of. */
    public Inputs inputs(Hash fingerprint) {
        return resolver.inputs(fingerprint);
    }

    /** A facet a record offers. */
    public <T> Optional<T> facet(Hash fingerprint, Class<T> facet) {
        return resolver.facet(fingerprint, facet);
    }

    /** The resolver over all that was recorded. */
    public Resolver resolver() {
        return resolver;
    }

    /** Where the bytes are held. */
    public MemorySource source() {
        return source;
    }
}
