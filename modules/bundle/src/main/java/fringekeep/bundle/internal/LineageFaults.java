package fringekeep.bundle.internal;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.Resolver;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;

/**
 * Whether the lineage of a bundle follows from its files alone: every file is named by its hash, every head and part is
 * canonical, everything a head was made from is there, and no record rests on itself. A record's hash names its inputs, so a
 * circle would need a collision of SHA-256; it is looked for all the same, for that costs nothing.
 */
public final class LineageFaults {
    private static final String MEND = "Get the bundle again from where it came, or export it anew.";

    private final Path data;
    private final FolderSource source;
    private final Resolver resolver;
    private final Kinds kinds;
    private final List<Problem> faults = new ArrayList<>();
    private final List<String> notes = new ArrayList<>();
    private final TreeSet<Hash> heads = new TreeSet<>();
    private final Set<Hash> parts = new HashSet<>();
    private final Set<Hash> absent = new TreeSet<>();
    private final Set<Hash> withheld = new TreeSet<>();

    private LineageFaults(Path data, Kinds kinds) {
        this.data = data;
        this.kinds = kinds;
        this.source = new FolderSource(data);
        this.resolver = new Resolver(kinds, source);
    }

    /** Checks the folder {@code data} of a bundle. */
    public static LineageFaults of(Path data, Kinds kinds, Work work) throws IOException, StoppedException {
        LineageFaults check = new LineageFaults(data, kinds);
        check.names(work);
        for (Hash head : check.heads) {
            work.check();
            check.head(head);
        }
        check.conclude();
        return check;
    }

    /** What is wrong. */
    public List<Problem> faults() {
        return List.copyOf(faults);
    }

    /** What is worth knowing. */
    public List<String> notes() {
        return List.copyOf(notes);
    }

    /** Fingerprints of all records, in ascending order. */
    public List<Hash> heads() {
        return List.copyOf(heads);
    }

    private void fault(String code, String what, String where) {
        faults.add(new Problem(code, what, where, MEND));
    }

    private void names(Work work) throws IOException, StoppedException {
        for (String folder : List.of(Layout.RECORDS, Layout.PAYLOADS, Layout.RAW)) {
            for (Path file : Bag.filesBelow(data, data.resolve(folder))) {
                work.check();
                String path = Bag.relative(data, file);
                byte[] bytes = Files.readAllBytes(file);
                if (!path.equals(folder + "/" + Hash.of(bytes).hex())) {
                    fault("bundle.name-is-not-hash", "A file is not named by the hash of its bytes.", path);
                } else if (folder.equals(Layout.RECORDS)) {
                    record(path, bytes);
                }
            }
        }
    }

    private void record(String path, byte[] bytes) {
        try {
            Json value = CanonicalJson.read(bytes);
            String form = value instanceof JsonObject object
                    ? object.text("fringekeep").orElse("")
                    : "";
            switch (form) {
                case "head/1" -> heads.add(Hash.of(bytes));
                case "part/1" -> parts.add(Hash.of(bytes));
                default -> fault("bundle.no-record", "A file is neither head nor part.", path);
            }
        } catch (ProblemException e) {
            e.problems().forEach(problem -> faults.add(problem.at(path + ", " + problem.where())));
        }
    }

    private void head(Hash fingerprint) {
        String where = Layout.record(fingerprint);
        RecordView view = resolver.record(fingerprint).orElseThrow();
        Head head = view.head();
        for (Map.Entry<String, Hash> part : head.parts().entrySet()) {
            if (!parts.contains(part.getValue())) {
                fault("bundle.part-missing", "Part " + part.getKey() + " of a record is missing.", where);
            }
        }
        head.sealed().values().stream().filter(part -> !parts.contains(part)).forEach(withheld::add);
        for (PayloadReference payload : head.payloads()) {
            payload(payload, where);
        }
        for (InputReference input : head.inputs()) {
            input(input, where);
        }
        for (AboutReference about : head.about()) {
            if (!heads.contains(about.record())) {
                absent.add(about.record());
            }
        }
        if (kinds.get(head.kind()).isEmpty()) {
            notes.add("kind " + head.kind() + " is not known to this program; the record is carried: " + where);
        }
    }

    private void payload(PayloadReference payload, String where) {
        long bytes = source.payload(payload.sha256())
                .map(found -> (long) found.length)
                .orElse(-1L);
        if (bytes != payload.bytes()) {
            fault("bundle.payload-missing", "Payload " + payload.name() + " of a record is missing.", where);
        }
    }

    private void input(InputReference input, String where) {
        if (input instanceof InputReference.OfRecord of) {
            if (!heads.contains(of.record())) {
                fault(
                        "bundle.input-missing",
                        "A record was made from one that is not there: " + of.record() + ".",
                        where);
            }
        } else if (input instanceof InputReference.OfRaw raw
                && source.rawLength(raw.raw()).orElse(-1) != raw.bytes()) {
            fault(
                    "bundle.raw-missing",
                    "A record was made from a raw file that is not there: " + raw.raw() + ".",
                    where);
        }
    }

    private void conclude() {
        if (heads.isEmpty()) {
            fault("bundle.no-records", "The bundle holds no record.", Layout.RECORDS);
        }
        if (!absent.isEmpty()) {
            notes.add(absent.size() + " records are spoken of but not in the bundle; nothing was made from them");
        }
        if (!withheld.isEmpty()) {
            notes.add(withheld.size() + " sealed parts are withheld; the fingerprints hold all the same");
        }
    }
}
