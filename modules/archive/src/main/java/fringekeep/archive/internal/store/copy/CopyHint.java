package fringekeep.archive.internal.store.copy;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.nio.file.Files;
import java.util.Optional;

/**
 * What a plain copy says of itself.
 *
 * @param archive whose copy
 * @param n last entry copied
 * @param sha256 hash of that entry
 */
public record CopyHint(ArchiveId archive, long n, Hash sha256) {
    private static final String FORM = "copy/1";

    /** Its bytes. */
    public byte[] bytes() {
        return CanonicalJson.write(JsonObject.EMPTY
                .with("fringekeep", FORM)
                .with("archive", archive.hex())
                .with("n", n)
                .with("sha256", sha256.hex()));
    }

    /**
     * Reads it.
     *
     * @return empty if the folder has no {@code archive.json}
     */
    public static Optional<CopyHint> read(CopyFolder folder) throws IOException, ProblemException {
        if (!Files.exists(folder.hint())) {
            return Optional.empty();
        }
        JsonObject object = object(folder);
        String form = object.text("fringekeep").orElse("");
        try {
            if (form.equals(FORM) && object.integer("n").isPresent()) {
                return Optional.of(new CopyHint(
                        new ArchiveId(object.text("archive").orElse("")),
                        object.integer("n").getAsLong(),
                        new Hash(object.text("sha256").orElse(""))));
            }
        } catch (IllegalArgumentException e) {
            throw wrong(folder, "says of itself something malformed: " + e.getMessage());
        }
        throw wrong(folder, "says it has the form \"" + form + "\"; a plain copy has \"" + FORM + "\"");
    }

    private static JsonObject object(CopyFolder folder) throws IOException, ProblemException {
        try {
            return CanonicalJson.readObject(Files.readAllBytes(folder.hint()), CanonicalJson.LARGEST_ENTRY);
        } catch (ProblemException e) {
            throw CopyContents.broken(e, folder.hint().toString());
        }
    }

    private static ProblemException wrong(CopyFolder folder, String what) {
        return new ProblemException(new Problem(
                "copy.form",
                "The folder " + what + ".",
                folder.hint().toString(),
                "Name the folder of a plain copy. Nothing was changed."));
    }
}
