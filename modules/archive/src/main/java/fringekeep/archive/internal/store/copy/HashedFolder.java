package fringekeep.archive.internal.store.copy;

import fringekeep.archive.Archive.Origin;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * A folder of files by hash: {@code records/} heads and parts, {@code payloads/} and {@code raw/}, each directly or below
 * folders of two digits; {@code archive.json} with members {@code archive} and {@code title} says where they come from.
 */
public final class HashedFolder {
    private static final Pattern HASH = Pattern.compile("[0-9a-f]{64}");
    private final List<Hash> records;
    private final RecordSource source;
    private final Origin origin;

    private HashedFolder(List<Hash> records, RecordSource source, Origin origin) {
        this.records = List.copyOf(records);
        this.source = source;
        this.origin = origin;
    }

    /** Fingerprints of all heads found. */
    public List<Hash> records() {
        return records;
    }

    /** Bytes by hash. */
    public RecordSource source() {
        return source;
    }

    /** Where the records come from. */
    public Origin origin() {
        return origin;
    }

    /** Looks through a folder. */
    public static HashedFolder read(Path folder) throws ProblemException {
        Path records = folder.resolve("records");
        if (!Files.isDirectory(records)) {
            throw problem("receive.no-records", "The folder holds neither a plain copy nor records by hash.", folder);
        }
        try {
            return new HashedFolder(heads(records), source(folder), origin(folder));
        } catch (IOException e) {
            throw problem("receive.unreadable", "The folder cannot be read: " + e + ".", folder);
        }
    }

    private static List<Hash> heads(Path records) throws IOException, ProblemException {
        List<Hash> heads = new ArrayList<>();
        try (Stream<Path> files = Files.walk(records)) {
            for (Path file : files.filter(Files::isRegularFile).sorted().toList()) {
                String name = file.getFileName().toString();
                if (HASH.matcher(name).matches() && isHead(file)) {
                    heads.add(new Hash(name));
                }
            }
        }
        return heads;
    }

    private static boolean isHead(Path file) throws IOException, ProblemException {
        try {
            JsonObject object = CanonicalJson.readObject(Files.readAllBytes(file), CanonicalJson.LARGEST_PART);
            return object.text("fringekeep").orElse("").startsWith("head/");
        } catch (ProblemException e) {
            throw new ProblemException(
                    e.problems().get(0).at(file + ", " + e.problems().get(0).where()));
        }
    }

    private static Origin origin(Path folder) throws IOException, ProblemException {
        Path hint = folder.resolve("archive.json");
        if (!Files.exists(hint)) {
            throw problem("receive.no-origin", "The folder does not say which archive its records come from.", hint);
        }
        JsonObject object = CanonicalJson.readObject(Files.readAllBytes(hint), CanonicalJson.LARGEST_ENTRY);
        try {
            ArchiveId archive = new ArchiveId(object.text("archive").orElse(""));
            return new Origin(archive, object.text("title").orElse(archive.hex().substring(0, 8)));
        } catch (IllegalArgumentException e) {
            throw problem("receive.no-origin", "The archive's id is malformed: " + e.getMessage() + ".", hint);
        }
    }

    private static RecordSource source(Path folder) {
        return new RecordSource() {
            @Override
            public Optional<byte[]> head(Hash fingerprint) {
                return file(folder.resolve("records"), fingerprint);
            }

            @Override
            public Optional<byte[]> part(Hash part) {
                return file(folder.resolve("records"), part);
            }

            @Override
            public Optional<byte[]> payload(Hash payload) {
                return file(folder.resolve("payloads"), payload);
            }

            @Override
            public Optional<byte[]> raw(Hash raw) {
                return file(folder.resolve("raw"), raw);
            }
        };
    }

    private static Optional<byte[]> file(Path folder, Hash hash) {
        Path direct = folder.resolve(hash.hex());
        Path below = folder.resolve(hash.hex().substring(0, 2)).resolve(hash.hex());
        Path file = Files.exists(direct) ? direct : below;
        try {
            return Files.exists(file) ? Optional.of(Files.readAllBytes(file)) : Optional.empty();
        } catch (IOException e) {
            throw new StoreFailure("Reading " + file, e);
        }
    }

    private static ProblemException problem(String code, String what, Path where) {
        return new ProblemException(new Problem(
                code, what, where.toString(), "Name the folder of a plain copy or bundle. Nothing was changed."));
    }
}
