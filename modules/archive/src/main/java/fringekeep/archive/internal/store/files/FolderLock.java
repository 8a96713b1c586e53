package fringekeep.archive.internal.store.files;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * Keeps a second program out. The system drops the lock when the program ends, however it ends. The locked byte lies far
 * behind the text, so that the text can be read where a lock forbids reading.
 */
public final class FolderLock implements AutoCloseable {
    private static final long LOCKED_BYTE = Long.MAX_VALUE - 1;
    private final FileChannel channel;
    private final FileLock lock;

    private FolderLock(FileChannel channel, FileLock lock) {
        this.channel = channel;
        this.lock = lock;
    }

    /**
     * Takes the lock.
     *
     * @param now written beside the process number, for people
     * @throws ProblemException naming who holds it
     */
    public static FolderLock take(Path file, Instant now) throws ProblemException, IOException {
        FileChannel channel =
                FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.READ, StandardOpenOption.WRITE);
        FileLock lock = null;
        try {
            lock = locked(channel);
            if (lock == null) {
                throw new ProblemException(held(file));
            }
            String text = "process " + ProcessHandle.current().pid() + " since " + now + "\n";
            channel.truncate(0);
            channel.write(ByteBuffer.wrap(text.getBytes(StandardCharsets.UTF_8)), 0);
            return new FolderLock(channel, lock);
        } finally {
            if (lock == null) {
                channel.close();
            }
        }
    }

    /** Who holds the lock, in words; empty when nobody does. */
    public static String holder(Path file) throws IOException {
        if (!Files.exists(file)) {
            return "";
        }
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
            FileLock lock = locked(channel);
            if (lock == null) {
                return Files.readString(file).strip();
            }
            lock.release();
            return "";
        }
    }

    private static @Nullable FileLock locked(FileChannel channel) throws IOException {
        try {
            return channel.tryLock(LOCKED_BYTE, 1, false);
        } catch (OverlappingFileLockException e) {
            return null; // held within this program
        }
    }

    private static Problem held(Path file) throws IOException {
        String holder = Files.readString(file).strip();
        return new Problem(
                "archive.in-use",
                "Another program has the archive open" + (holder.isEmpty() ? "." : " (" + holder + ")."),
                Durable.folderOf(file).toString(),
                "Close the archive there, or work in that program; it is free again as soon as that program has ended."
                        + " Nothing was changed.");
    }

    @Override
    public void close() throws IOException {
        lock.release();
        channel.close();
    }
}
