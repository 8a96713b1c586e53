package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.io.IOException;
import java.io.InputStream;
import java.util.Optional;
import java.util.OptionalLong;

/** Exact stored bytes at the present watermark. Shared by threads. */
final class StoredBytes implements RecordSource {
    private final Store store;

    StoredBytes(Store store) {
        this.store = store;
    }

    @Override
    public Optional<byte[]> head(Hash fingerprint) {
        long watermark = store.state().watermark();
        return store.read(c -> Records.head(c, fingerprint, watermark));
    }

    @Override
    public Optional<byte[]> part(Hash part) {
        long watermark = store.state().watermark();
        return store.read(c -> PartsTable.part(c, part, watermark));
    }

    @Override
    public Optional<byte[]> payload(Hash payload) throws ProblemException {
        long watermark = store.state().watermark();
        Optional<PartsTable.Payload> row = store.read(c -> PartsTable.payload(c, payload, watermark));
        if (row.isEmpty() || row.get().bytes().isPresent()) {
            return row.flatMap(PartsTable.Payload::bytes);
        }
        return Optional.of(file(store.payloads(), payload, "payload")
                .orElseThrow(() -> missing(store.payloads(), payload, "payload")));
    }

    @Override
    public Optional<byte[]> raw(Hash raw) throws ProblemException {
        Optional<byte[]> bytes = file(store.raw(), raw, "raw file");
        if (bytes.isEmpty() && store.read(c -> PartsTable.rawSize(c, raw)).isPresent()) {
            throw missing(store.raw(), raw, "raw file");
        }
        return bytes;
    }

    @Override
    public OptionalLong rawLength(Hash raw) {
        try {
            return store.raw().size(raw).map(OptionalLong::of).orElse(OptionalLong.empty());
        } catch (IOException e) {
            throw new StoreFailure("Reading the length of raw file " + raw, e);
        }
    }

    private static Optional<byte[]> file(HashedFiles files, Hash hash, String sort) throws ProblemException {
        try {
            Optional<InputStream> in = files.open(hash);
            if (in.isEmpty()) {
                return Optional.empty();
            }
            try (InputStream open = in.get()) {
                byte[] bytes = open.readAllBytes();
                if (!Hash.of(bytes).equals(hash)) {
                    throw new ProblemException(new Problem(
                            "file.damaged",
                            "The " + sort + "'s bytes are not those that were taken in: their SHA-256 differs.",
                            files.path(hash).toString(),
                            "Put the true file there (from a copy, or take it in again)."));
                }
                return Optional.of(bytes);
            }
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "file.unreadable",
                    "The " + sort + " cannot be read: " + e + ".",
                    files.path(hash).toString(),
                    "Check the disk and the permissions."));
        }
    }

    private static ProblemException missing(HashedFiles files, Hash hash, String sort) {
        return new ProblemException(new Problem(
                "file.missing",
                "The " + sort + " is missing.",
                files.path(hash).toString(),
                "Put it back from a copy, or take the same file in again."));
    }
}
