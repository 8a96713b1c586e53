package fringekeep.archive.internal.store.files;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.Objects;

/** Writing so that a power cut leaves the old or the new, never half: aside, force to disk, rename, force the folder. */
public final class Durable {
    private static final boolean FOLDERS_CAN_BE_FORCED = java.io.File.separatorChar == '/';

    private Durable() {}

    /** Forces a file's bytes to the disk. */
    public static void force(Path file) throws IOException {
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            channel.force(true);
        }
    }

    /** Forces a folder's list of names to the disk, where the system lets a program do so. */
    public static void forceFolder(Path folder) throws IOException {
        if (FOLDERS_CAN_BE_FORCED) {
            try (FileChannel channel = FileChannel.open(folder, StandardOpenOption.READ)) {
                channel.force(true);
            }
        }
    }

    /** The folder that holds a file; every name within an archive or copy has one. */
    public static Path folderOf(Path file) {
        return Objects.requireNonNull(file.toAbsolutePath().getParent(), "a file without a folder");
    }

    /** Makes a folder and those above it, each forced into the one that holds it. */
    public static void makeFolders(Path folder) throws IOException {
        if (Files.isDirectory(folder)) {
            return;
        }
        Path above = folder.toAbsolutePath().getParent();
        if (above != null) {
            makeFolders(above);
        }
        try {
            Files.createDirectory(folder);
        } catch (java.nio.file.FileAlreadyExistsException e) {
            if (!Files.isDirectory(folder)) {
                throw e;
            }
            return;
        }
        if (above != null) {
            forceFolder(above);
        }
    }

    /** Writes a whole file under its name, replacing what was there. */
    public static void write(Path file, byte[] bytes) throws IOException {
        Path folder = folderOf(file);
        Path aside = Files.createTempFile(folder, ".", ".part");
        try {
            try (FileChannel channel = FileChannel.open(aside, StandardOpenOption.WRITE)) {
                ByteBuffer buffer = ByteBuffer.wrap(bytes);
                while (buffer.hasRemaining()) {
                    channel.write(buffer);
                }
                channel.force(true);
            }
            move(aside, file);
        } finally {
            Files.deleteIfExists(aside);
        }
    }

    /** Renames in one step and forces the folder that holds the new name. */
    public static void move(Path from, Path to) throws IOException {
        Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        forceFolder(folderOf(to));
    }
}
