package fringekeep.bundle.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.judgement.JudgementKind;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.making.ScriptedCircumstances;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A real archive of entered numbers and their sums, for tests. */
record SmallArchive(Archive archive) {
    static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");

    static Kinds kinds() {
        return new Kinds(List.of(new SumKind("reading"), new SumKind("total"), new JudgementKind()));
    }

    static SmallArchive found(Path folder) throws ProblemException {
        Archives.Founding founding = new Archives.Founding(
                "invented laboratory",
                "06:00",
                "Etc/UTC",
                true,
                List.of(new Person(PERSON, Optional.of("Invented Person"), Optional.empty(), Optional.empty())),
                Optional.empty());
        return new SmallArchive(Archives.found(
                folder,
                founding,
                kinds(),
                ScriptedCircumstances.stepping(
                        "small archive", Instant.parse("2031-05-14T09:00:00Z"), ZoneOffset.UTC, "1.0.0")));
    }

    Hash reading(double number, Optional<Hash> corrects) throws ProblemException {
        return enter("reading", JsonObject.EMPTY.with("number", number), corrects);
    }

    private Hash enter(String kind, JsonObject content, Optional<Hash> corrects) throws ProblemException {
        return archive.record(new NewRecord(
                        new KindName(kind),
                        List.of(),
                        List.of(),
                        Map.of(PartName.CONTENT, content),
                        List.of(),
                        corrects,
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
    }

    Hash total(List<InputReference> inputs) throws Exception {
        NewRecord request = new NewRecord(
                new KindName("total"),
                inputs,
                List.of(),
                Map.of(PartName.CHOICES, JsonObject.EMPTY),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
        return archive.record(archive.compute(request, List.of(), Work.QUIET)).fingerprint();
    }

    /** A total of two readings and a total, one of them with a raw file. */
    Hash root() throws Exception {
        Hash one = reading(0.1, Optional.empty());
        Hash two = reading(0.2, Optional.empty());
        byte[] counts = "1,2\n".getBytes(java.nio.charset.StandardCharsets.UTF_8);
        Hash raw = archive.takeIn(counts).hash();
        Hash sum = total(List.of(term(one), term(two), new InputReference.OfRaw("raw", raw, counts.length)));
        return total(List.of(term(sum), term(one)));
    }

    static InputReference term(Hash record) {
        return new InputReference.OfRecord("term", record);
    }
}
