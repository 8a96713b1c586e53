package fringekeep.bundle.internal;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.io.InputStream;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/** Where things stand in a bundle, and writing aside until it is whole. */
public final class Layout {
    /** Heads and parts, each a file named by its SHA-256. */
    public static final String RECORDS = "records";

    /** Payloads by hash. */
    public static final String PAYLOADS = "payloads";

    /** Raw files by hash. */
    public static final String RAW = "raw";

    /** Tables for people and programs. */
    public static final String TABLES = "tables";

    /** Pictures of what was asked for. */
    public static final String PICTURES = "pictures";

    /** JSON Schemas of the kinds. */
    public static final String SCHEMAS = "schemas";

    /** Provenance. */
    public static final String PROVENANCE = "provenance";

    private Layout() {}

    /** Path of a record's or part's bytes below {@code data}. */
    public static String record(Hash hash) {
        return RECORDS + "/" + hash.hex();
    }

    /** Path of a payload below {@code data}. */
    public static String payload(Hash hash) {
        return PAYLOADS + "/" + hash.hex();
    }

    /** Path of a raw file below {@code data}. */
    public static String raw(Hash hash) {
        return RAW + "/" + hash.hex();
    }

    /** Writes a file below a folder, making folders on the way. */
    public static void write(Path data, String path, byte[] bytes) throws IOException {
        Path file = data.resolve(path);
        Files.createDirectories(java.util.Objects.requireNonNull(file.getParent()));
        Files.write(file, bytes);
    }

    /** Copies a stream to a file below a folder. */
    public static void write(Path data, String path, InputStream bytes) throws IOException {
        Path file = data.resolve(path);
        Files.createDirectories(java.util.Objects.requireNonNull(file.getParent()));
        Files.copy(bytes, file);
    }

    /** Forces every file and folder to the disk, then gives the whole its final name. */
    public static void publish(Path aside, Path target) throws IOException, ProblemException {
        List<Path> all;
        try (Stream<Path> walk = Files.isDirectory(aside) ? Files.walk(aside) : Stream.of(aside)) {
            all = walk.toList();
        }
        for (Path path : all) {
            force(path);
        }
        requireFree(target);
        Files.move(aside, target, StandardCopyOption.ATOMIC_MOVE);
        force(java.util.Objects.requireNonNull(target.toAbsolutePath().getParent()));
    }

    private static void force(Path path) throws IOException {
        StandardOpenOption option = Files.isDirectory(path) ? StandardOpenOption.READ : StandardOpenOption.WRITE;
        try (FileChannel channel = FileChannel.open(path, option)) {
            channel.force(true);
        } catch (IOException e) {
            // some systems refuse to open folders; their files are forced all the same
            if (!Files.isDirectory(path)) {
                throw e;
            }
        }
    }

    /** Refuses to write over something that is there. */
    public static void requireFree(Path target) throws ProblemException {
        if (Files.exists(target)) {
            throw new ProblemException(new Problem(
                    "bundle.exists",
                    "There is something of that name already.",
                    target.toString(),
                    "Choose another name or move it away; nothing was written over."));
        }
    }

    /** Removes a folder or file with all it holds; one that is not there is no fault. */
    public static void remove(Path path) throws IOException {
        if (!Files.exists(path)) {
            return;
        }
        try (Stream<Path> all = Files.walk(path)) {
            for (Path each : all.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(each);
            }
        }
    }
}
