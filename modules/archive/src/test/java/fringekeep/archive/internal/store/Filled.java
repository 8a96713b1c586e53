package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Archives.Founding;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.internal.records.StoredPart;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Archives with content for tests. Everything in them is invented. */
final class Filled {
    static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    static final List<Hash> GOLDEN = List.of(
            RecordVectors.COMPOUND,
            RecordVectors.BATCH,
            RecordVectors.SETUP,
            RecordVectors.RUN,
            RecordVectors.PROFILE,
            RecordVectors.SCAN,
            RecordVectors.PLACEMENT,
            RecordVectors.FIT,
            RecordVectors.MASK,
            RecordVectors.SETUP2);

    private Filled() {}

    static Founding founding() {
        return new Founding(
                "demo lab",
                "06:00",
                "Etc/GMT-2",
                true,
                List.of(new Person(PERSON, Optional.of("Demo Person"), Optional.empty(), Optional.empty())),
                Optional.empty());
    }

    static Archive found(Path folder, Script script) throws ProblemException {
        return Archives.found(folder, founding(), OpenKind.all(), script.circumstances());
    }

    /** The archive of record format 1, section 17, made through the archive's own verbs. */
    static Archive golden(Path folder) throws ProblemException {
        Script script = new Script();
        script.draw("d9baf236e10ad5bd745fb8001fe97479");
        script.at("2031-05-14T09:03:11.251Z");
        Archive archive = found(folder, script);
        archive.takeIn(RecordVectors.bytes(RecordVectors.RAW));
        for (Hash record : GOLDEN) {
            golden(archive, script, record);
        }
        return archive;
    }

    private static void golden(Archive archive, Script script, Hash record) throws ProblemException {
        Head head = HeadCodec.read(RecordVectors.bytes(record));
        if (head.corrects().isEmpty()) {
            script.draw(head.thing().hex());
        }
        Map<PartName, JsonObject> values = new EnumMap<>(PartName.class);
        Optional<PersonId> person = Optional.empty();
        for (PartName name : PartName.values()) {
            Hash hash = (name.salted() ? head.sealed() : head.parts()).get(name.text());
            if (hash == null || name == PartName.MADE) {
                continue;
            }
            // The other parts "who" are the shown one with salts of their own, drawn from "salt <record> who".
            StoredPart part = PartCodec.read(RecordVectors.bytes(hash));
            part.salt().ifPresent(salt -> script.draw(salt.hex()));
            if (name == PartName.WHO) {
                person = part.value().text("person").map(PersonId::new);
            } else {
                values.put(name, part.value());
            }
        }
        List<NewPayload> payloads = new ArrayList<>();
        head.payloads()
                .forEach(payload -> payloads.add(
                        new NewPayload(payload.name(), payload.form(), RecordVectors.bytes(payload.sha256()))));
        script.at("2031-05-14T09:03:11.250Z");
        var prepared = archive.prepare(
                new NewRecord(
                        head.kind(),
                        head.inputs(),
                        head.about(),
                        values,
                        payloads,
                        head.corrects(),
                        head.after(),
                        person),
                List.of());
        script.at("2031-05-14T09:03:11.251Z");
        archive.record(List.of(prepared));
    }

    static NewRecord content(String kind, JsonObject content, AboutReference... about) {
        return new NewRecord(
                new KindName(kind),
                List.of(),
                List.of(about),
                Map.of(PartName.CONTENT, content),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.of(PERSON));
    }

    static NewRecord labelled(String kind, String label, AboutReference... about) {
        return content(kind, JsonObject.EMPTY.with("label", label), about);
    }

    static NewRecord correcting(NewRecord record, Hash old) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                record.payloads(),
                Optional.of(old),
                record.after(),
                record.person());
    }

    static NewRecord following(NewRecord record, Hash old, String from) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                record.payloads(),
                record.corrects(),
                Optional.of(new After(old, Instant.parse(from))),
                record.person());
    }

    static NewRecord madeFrom(NewRecord record, InputReference... inputs) {
        return new NewRecord(
                record.kind(),
                List.of(inputs),
                record.about(),
                record.parts(),
                record.payloads(),
                record.corrects(),
                record.after(),
                record.person());
    }

    static NewRecord with(NewRecord record, PartName part, JsonObject value) {
        Map<PartName, JsonObject> parts = new EnumMap<>(PartName.class);
        parts.putAll(record.parts());
        parts.put(part, value);
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                parts,
                record.payloads(),
                record.corrects(),
                record.after(),
                record.person());
    }

    static NewRecord carrying(NewRecord record, byte[] table) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                List.of(new NewPayload("table", "csv/1", table)),
                record.corrects(),
                record.after(),
                record.person());
    }

    static AboutReference thing(String role, Hash record) {
        return new AboutReference(role, record, AboutReference.Reach.THING);
    }

    static AboutReference only(String role, Hash record) {
        return new AboutReference(role, record, AboutReference.Reach.RECORD);
    }
}
