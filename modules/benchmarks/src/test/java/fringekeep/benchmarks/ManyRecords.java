package fringekeep.benchmarks;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A real archive of many records, recorded a hundred a transaction: for every hundred scans a setup, a fit of each scan and a
 * property of the fits, 202 records; ten setups are corrected at the end.
 */
final class ManyRecords {
    /** Scans that one property rests on. */
    static final int BLOCK = 100;

    /** Setups that are corrected. */
    static final int CORRECTED = 10;

    private static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    private final Archive archive;
    private final List<Prepared> waiting = new ArrayList<>();
    private final List<Hash> setups = new ArrayList<>();

    private ManyRecords(Archive archive) {
        this.archive = archive;
    }

    /**
     * Makes one and closes it.
     *
     * @return how many records it has
     */
    static long make(Path folder, int scans) throws ProblemException {
        Archives.Founding founding = new Archives.Founding(
                "benchmark (invented)",
                "06:00",
                "Etc/UTC",
                true,
                List.of(new Person(PERSON, Optional.of("N. N."), Optional.empty(), Optional.empty())),
                Optional.empty());
        try (Archive archive = Archives.found(folder, founding, PlainKind.all(), Circumstances.real("benchmark"))) {
            ManyRecords many = new ManyRecords(archive);
            for (int block = 0; block < scans / BLOCK; block++) {
                many.block(block);
            }
            many.correct();
            return archive.facts().watermark() - 1;
        }
    }

    private void block(int number) throws ProblemException {
        Hash setup = add("setup", number, List.of(), Optional.empty());
        setups.add(setup);
        flush();
        List<Hash> scans = new ArrayList<>();
        for (int i = 0; i < BLOCK; i++) {
            scans.add(add("scan", number * BLOCK + i, List.of(), Optional.empty()));
        }
        flush();
        List<InputReference> fits = new ArrayList<>();
        for (Hash scan : scans) {
            List<InputReference> inputs =
                    List.of(new InputReference.OfRecord("scan", scan), new InputReference.OfRecord("setup", setup));
            fits.add(new InputReference.OfRecord("fit", add("fit", number, inputs, Optional.empty())));
        }
        flush();
        add("property", number, fits, Optional.empty());
        flush();
    }

    private void correct() throws ProblemException {
        int corrected = Math.min(CORRECTED, setups.size());
        for (int i = 0; i < corrected; i++) {
            add("setup", -i - 1, List.of(), Optional.of(setups.get(i * setups.size() / corrected)));
        }
        flush();
    }

    private Hash add(String kind, int number, List<InputReference> inputs, Optional<Hash> corrects)
            throws ProblemException {
        Prepared prepared = archive.prepare(
                new NewRecord(
                        new KindName(kind),
                        inputs,
                        List.of(),
                        Map.of(
                                PartName.CONTENT,
                                JsonObject.EMPTY
                                        .with("label", kind + " " + number)
                                        .with("value", number * 1e-9)),
                        List.of(),
                        corrects,
                        Optional.empty(),
                        Optional.of(PERSON)),
                List.of());
        waiting.add(prepared);
        return prepared.fingerprint();
    }

    private void flush() throws ProblemException {
        archive.record(List.copyOf(waiting));
        waiting.clear();
    }
}
