package fringekeep.archive.internal.store.files;

import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.channels.Channels;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.BasicFileAttributes;
import java.security.DigestOutputStream;
import java.security.MessageDigest;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Files named by the SHA-256 of their bytes, {@code ab/ab12…}, read-only. Thread-safe: names appear only by renaming a
 * complete file, and the same bytes have the same name.
 */
public final class HashedFiles {
    private final Path root;
    private final Path aside;

    /** Files under {@code root}, written in {@code aside} on the same disk first. */
    public HashedFiles(Path root, Path aside) {
        this.root = root;
        this.aside = aside;
    }

    /** Where a file lies or would lie. */
    public Path path(Hash hash) {
        return root.resolve(hash.hex().substring(0, 2)).resolve(hash.hex());
    }

    /** Its length, if it is there (bytes). */
    public Optional<Long> size(Hash hash) throws IOException {
        try {
            BasicFileAttributes attributes = Files.readAttributes(path(hash), BasicFileAttributes.class);
            return attributes.isRegularFile() ? Optional.of(attributes.size()) : Optional.empty();
        } catch (NoSuchFileException e) {
            return Optional.empty();
        }
    }

    /** Its bytes, if it is there. */
    public Optional<InputStream> open(Hash hash) throws IOException {
        try {
            return Optional.of(Files.newInputStream(path(hash)));
        } catch (NoSuchFileException e) {
            return Optional.empty();
        }
    }

    /**
     * Writes bytes aside and forces them to the disk; nothing is under its name yet.
     *
     * @param largest more bytes than that are refused with an {@link IOException}
     */
    public Written write(InputStream bytes, long largest) throws IOException {
        Durable.makeFolders(aside);
        Path file = Files.createTempFile(aside, "", ".part");
        boolean done = false;
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            MessageDigest digest = Hash.digest();
            OutputStream out = new DigestOutputStream(Channels.newOutputStream(channel), digest);
            long size = bytes.transferTo(out);
            if (size > largest) {
                throw new IOException("more than " + largest + " bytes");
            }
            channel.force(true);
            done = true;
            return new Written(file, Hash.fromBytes(digest.digest()), size);
        } finally {
            if (!done) {
                Files.deleteIfExists(file);
            }
        }
    }

    /** Gives a written file its name, unless whole bytes are there under it already; damaged ones are replaced. */
    public void adopt(Written written) throws IOException {
        Path target = path(written.hash());
        if (whole(written.hash(), written.size())) {
            Files.delete(written.file());
            // The crash that left it may have come before its folder was forced.
            Durable.forceFolder(Durable.folderOf(target));
            return;
        }
        Durable.makeFolders(Durable.folderOf(target));
        if (!written.file().toFile().setReadOnly()) {
            throw new IOException("cannot be made read-only: " + written.file());
        }
        Durable.move(written.file(), target);
    }

    /** Whether the file is there with that length and its own hash. */
    public boolean whole(Hash hash, long size) throws IOException {
        Optional<Long> found = size(hash);
        return found.isPresent() && found.get() == size && hash.equals(rehash(hash));
    }

    /** SHA-256 of the bytes that lie under the name now. */
    public Hash rehash(Hash hash) throws IOException {
        return hashOf(path(hash));
    }

    /** SHA-256 of a file. */
    public static Hash hashOf(Path file) throws IOException {
        MessageDigest digest = Hash.digest();
        try (InputStream in = Files.newInputStream(file)) {
            byte[] buffer = new byte[1 << 16];
            for (int read = in.read(buffer); read >= 0; read = in.read(buffer)) {
                digest.update(buffer, 0, read);
            }
        }
        return Hash.fromBytes(digest.digest());
    }

    /** Removes a file that was purged for cause. */
    public void delete(Hash hash) throws IOException {
        Path file = path(hash);
        if (Files.exists(file) && !file.toFile().setWritable(true)) {
            throw new IOException("cannot be made writable: " + file);
        }
        if (Files.deleteIfExists(file)) {
            Durable.forceFolder(Durable.folderOf(file));
        }
    }

    /** All files below the root, whatever their names, in order of their names. */
    public List<Path> all() throws IOException {
        if (!Files.isDirectory(root)) {
            return List.of();
        }
        try (Stream<Path> files = Files.walk(root)) {
            return files.filter(file -> !Files.isDirectory(file)).sorted().toList();
        }
    }

    /**
     * Bytes written aside.
     *
     * @param file where
     * @param hash their SHA-256
     * @param size how many
     */
    public record Written(Path file, Hash hash, long size) {
        /** Throws them away. */
        public void discard() throws IOException {
            Files.deleteIfExists(file);
        }
    }
}
