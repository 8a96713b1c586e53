package fringekeep.commandline;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;

/** Reads documents from files or the input stream. */
final class Documents {
    private Documents() {}

    /** A document; {@code -} is the input stream. */
    static JsonDocument read(Path file) throws ProblemException {
        byte[] bytes = bytes(file);
        try {
            return JsonDocument.read(bytes);
        } catch (ProblemException e) {
            throw new ProblemException(e.problems().stream()
                    .map(problem -> problem.at(file + (problem.where().isEmpty() ? "" : ", " + problem.where())))
                    .toList());
        }
    }

    /** The bytes of a file; {@code -} is the input stream. At most one byte more than a document may have is read. */
    static byte[] bytes(Path file) throws ProblemException {
        try {
            if (file.toString().equals("-")) {
                return System.in.readNBytes(JsonDocument.LARGEST + 1);
            }
            try (var in = Files.newInputStream(file)) {
                return in.readNBytes(JsonDocument.LARGEST + 1);
            }
        } catch (NoSuchFileException e) {
            throw unreadable(file, "There is no such file.");
        } catch (IOException e) {
            throw unreadable(file, "The file cannot be read: " + e.getMessage() + ".");
        }
    }

    private static ProblemException unreadable(Path file, String what) {
        return new ProblemException(new Problem(
                "command.unreadable", what, file.toString(), "Name another file; nothing has been stored."));
    }
}
