package fringekeep.archive.internal.store.copy;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;

/** Walks the lines of one file of a copy; lines of records are verified and their places remembered. */
final class Lines {
    private static final int HASH_LENGTH = 64;
    private final Path path;
    private final int file;
    private final CopySource source;
    private final byte[] bytes;
    private int position;
    private int number;

    Lines(Path path, int file, CopySource source) throws IOException {
        this.path = path;
        this.file = file;
        this.source = source;
        this.bytes = Files.readAllBytes(path);
    }

    boolean more() {
        return position < bytes.length;
    }

    int number() {
        return number;
    }

    String place() {
        return path + ", line " + (number + 1);
    }

    /** Whether the next line is what should stand behind the hash: a line was broken in two and looks withheld. */
    private boolean isBytesOf(Hash hash) {
        int end = position;
        while (end < bytes.length && bytes[end] != '\n') {
            end++;
        }
        return Hash.of(Arrays.copyOfRange(bytes, position, end)).equals(hash);
    }

    /** The next line without its end. */
    byte[] next() throws ProblemException {
        int end = end();
        byte[] line = Arrays.copyOfRange(bytes, position, end);
        position = end + 1;
        number++;
        return line;
    }

    private int end() throws ProblemException {
        for (int i = position; i < bytes.length; i++) {
            if (bytes[i] == '\n') {
                return i;
            }
        }
        throw CopyContents.wrong("copy.line", "The last line is cut off.", place(), "Take the file from another copy.");
    }

    /** Whether the next line is of that hash. */
    boolean isNext(Hash hash) {
        return position + HASH_LENGTH < bytes.length
                && hash.hex().equals(new String(bytes, position, HASH_LENGTH, StandardCharsets.US_ASCII));
    }

    /** Takes the next line, which must be of that hash; false if it is the hash alone. */
    boolean take(Hash hash) throws ProblemException {
        if (!isNext(hash)) {
            throw CopyContents.wrong(
                    "copy.line-missing",
                    "Here the line of " + hash + " is expected.",
                    place(),
                    "Take the file from another copy.");
        }
        String where = place();
        int begin = position + HASH_LENGTH + 1;
        byte[] line = next();
        boolean alone = line.length == HASH_LENGTH;
        if (alone && !isBytesOf(hash)) {
            return false;
        }
        byte[] content = line.length > HASH_LENGTH && line[HASH_LENGTH] == ' '
                ? Arrays.copyOfRange(line, HASH_LENGTH + 1, line.length)
                : new byte[0];
        if (alone || !Hash.of(content).equals(hash)) {
            throw CopyContents.wrong(
                    "copy.hash",
                    "The bytes of the line are not those of its hash " + hash + ".",
                    where,
                    "Take the file from another copy.");
        }
        source.add(hash, file, begin, content.length);
        return true;
    }
}
