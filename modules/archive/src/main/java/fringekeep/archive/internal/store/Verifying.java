package fringekeep.archive.internal.store;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.internal.records.StoredPart;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.RecordSource;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;

/** Verifies offered records before any of them is stored: every hash, every form; what is absent is no fault. */
final class Verifying {
    private static final int MOST_PROBLEMS = 100;
    private final RecordSource source;
    private final List<Problem> problems = new ArrayList<>();

    Verifying(RecordSource source) {
        this.source = source;
    }

    /** All heads by fingerprint, in the given order. */
    Map<Hash, Head> heads(List<Hash> records, Work work) throws ProblemException, StoppedException {
        Map<Hash, Head> heads = new LinkedHashMap<>();
        for (Hash record : records) {
            work.check();
            work.progress(heads.size(), records.size(), "verifying");
            verify(record).ifPresent(head -> heads.put(record, head));
            if (problems.size() >= MOST_PROBLEMS) {
                break;
            }
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return heads;
    }

    private Optional<Head> verify(Hash record) throws ProblemException {
        Optional<byte[]> bytes = source.head(record);
        if (bytes.isEmpty()) {
            add("receive.head", "The head of a record is not there.", "record " + record);
            return Optional.empty();
        }
        if (!Hash.of(bytes.get()).equals(record)) {
            add("receive.hash", "The bytes of a head are not those of its hash.", "record " + record);
            return Optional.empty();
        }
        try {
            Head head = HeadCodec.read(bytes.get());
            parts(record, head.parts());
            parts(record, head.sealed());
            files(record, head);
            return Optional.of(head);
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at("record " + record + " " + problem.where())));
            return Optional.empty();
        }
    }

    private void parts(Hash record, SortedMap<String, Hash> parts) throws ProblemException {
        for (Map.Entry<String, Hash> part : parts.entrySet()) {
            String where = "record " + record + ", part " + part.getKey() + " " + part.getValue();
            Optional<byte[]> bytes = source.part(part.getValue());
            if (bytes.isEmpty()) {
                continue;
            }
            if (!Hash.of(bytes.get()).equals(part.getValue())) {
                add("receive.hash", "The bytes of a part are not those of its hash.", where);
                continue;
            }
            StoredPart stored = PartCodec.read(bytes.get());
            if (!stored.name().text().equals(part.getKey())) {
                add("receive.part", "The part calls itself \"" + stored.name().text() + "\".", where);
            }
        }
    }

    private void files(Hash record, Head head) throws ProblemException {
        for (PayloadReference payload : head.payloads()) {
            file(source.payload(payload.sha256()), payload.sha256(), payload.bytes(), record, "payload");
        }
        for (InputReference input : head.inputs()) {
            if (input instanceof InputReference.OfRaw raw) {
                file(source.raw(raw.raw()), raw.raw(), raw.bytes(), record, "raw file");
            }
        }
    }

    private void file(Optional<byte[]> bytes, Hash hash, long size, Hash record, String sort) {
        if (bytes.isPresent()
                && (bytes.get().length != size || !Hash.of(bytes.get()).equals(hash))) {
            add(
                    "receive.hash",
                    "The bytes of a " + sort + " are not those of its hash and length.",
                    "record " + record + ", " + sort + " " + hash);
        }
    }

    private void add(String code, String what, String where) {
        problems.add(new Problem(
                code, what, where, "Fetch it again from where it is whole. Nothing was stored or changed."));
    }
}
