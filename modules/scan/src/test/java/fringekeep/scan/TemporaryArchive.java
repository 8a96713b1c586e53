package fringekeep.scan;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.making.ScriptedCircumstances;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.instrument.SetupKind;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** An archive in a temporary folder with one person, a clock and ids that are the same at every run. */
final class TemporaryArchive implements AutoCloseable {
    static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");

    final Archive archive;

    TemporaryArchive(Path folder) throws ProblemException {
        Kinds kinds = new Kinds(List.of(
                new ReadingProfileKind(), new ScanKind(), new SeriesKind(), new PlacementKind(), new SetupKind()));
        Person person = new Person(PERSON, Optional.of("N. N."), Optional.empty(), Optional.empty());
        this.archive = Archives.found(
                folder.resolve("lab"),
                new Archives.Founding("test", "06:00", "Etc/GMT-2", true, List.of(person), Optional.empty()),
                kinds,
                ScriptedCircumstances.stepping(
                        "scan verbs", Instant.parse("2031-05-14T09:00:00Z"), ZoneId.of("Etc/GMT-2"), "1.0.0"));
    }

    Hash enter(String kind, JsonObject content, AboutReference... about) throws ProblemException {
        return record(kind, content, Optional.empty(), about);
    }

    Hash correct(Hash corrected, String kind, JsonObject content) throws ProblemException {
        return record(kind, content, Optional.of(corrected));
    }

    private Hash record(String kind, JsonObject content, Optional<Hash> corrects, AboutReference... about)
            throws ProblemException {
        return archive.record(new NewRecord(
                        new KindName(kind),
                        List.of(),
                        List.of(about),
                        Map.of(PartName.CONTENT, content),
                        List.of(),
                        corrects,
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
    }

    @Override
    public void close() {
        archive.close();
    }
}
