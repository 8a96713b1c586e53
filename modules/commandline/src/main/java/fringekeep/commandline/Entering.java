package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.entry.Entered;
import fringekeep.archive.entry.EntryDocument;
import fringekeep.archive.entry.EntrySurroundings;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** Records what entry documents say, computing where the kind is computed. */
final class Entering {
    private final Archive archive;
    private final EntrySurroundings.Records records;
    private final EntrySurroundings.Persons persons;
    private final Path rawFolder;

    /**
     * Enters into an archive.
     *
     * @param records how records are found by what a document says
     * @param rawFolder folder against which raw files are named
     */
    Entering(Archive archive, EntrySurroundings.Records records, EntrySurroundings.Persons persons, Path rawFolder) {
        this.archive = archive;
        this.records = records;
        this.persons = persons;
        this.rawFolder = rawFolder;
    }

    /** What was recorded, and what seemed unusual. */
    record Done(Archive.Recorded recorded, List<Problem> questions) {}

    /** Records one document; the person enters where the document names none. */
    Done enter(JsonDocument document, Optional<PersonId> person, Work work) throws ProblemException, StoppedException {
        Entered entered =
                EntryDocument.read(document, new EntrySurroundings(archive.kinds(), records, persons, this::takeRaw));
        NewRecord record = signed(entered.record(), person);
        try {
            NewRecord whole =
                    record.parts().containsKey(PartName.CHOICES) ? archive.compute(record, List.of(), work) : record;
            return new Done(archive.record(whole), entered.questions());
        } catch (ProblemException e) {
            throw new ProblemException(EntryDocument.placed(document, e.problems()));
        }
    }

    private static NewRecord signed(NewRecord record, Optional<PersonId> person) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                record.payloads(),
                record.corrects(),
                record.after(),
                record.person().or(() -> person));
    }

    private EntrySurroundings.TakenRaw takeRaw(String path) throws ProblemException {
        try {
            Hash hash = new Hash(path);
            // 64 digits name a raw file that is there already; anything else is a path
            try (var bytes = archive.raw(hash).orElseThrow(() -> noRaw(path))) {
                return new EntrySurroundings.TakenRaw(hash, bytes.transferTo(java.io.OutputStream.nullOutputStream()));
            } catch (java.io.IOException e) {
                throw noRaw(path);
            }
        } catch (IllegalArgumentException e) {
            Archive.RawTaken taken = archive.takeIn(rawFolder.resolve(path));
            return new EntrySurroundings.TakenRaw(taken.hash(), taken.bytes());
        }
    }

    private static ProblemException noRaw(String hash) {
        return new ProblemException(new Problem(
                "command.no-raw", "No raw file of that hash is at hand.", hash, "Give the path of the file instead."));
    }
}
