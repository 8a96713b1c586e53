package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.ArchiveFolder;
import fringekeep.archive.internal.store.files.Durable;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.nio.file.Files;

/** {@code archive.json}: what the folder is, for people and programs that only look. The journal rules. */
final class Hint {
    static final String FORM = "archive/1";

    private Hint() {}

    static void write(ArchiveFolder folder, State state) throws IOException {
        byte[] bytes = CanonicalJson.write(JsonObject.EMPTY
                .with("fringekeep", FORM)
                .with("archive", state.archive().hex())
                .with("title", state.naming().title()));
        if (!Files.exists(folder.hint()) || !java.util.Arrays.equals(bytes, Files.readAllBytes(folder.hint()))) {
            Durable.write(folder.hint(), bytes);
        }
    }

    /** Writes the hint again after the title changed. */
    static void rewrite(Store store) {
        try {
            write(store.folder(), store.state());
        } catch (IOException e) {
            throw new StoreFailure("Writing " + store.folder().hint(), e);
        }
    }

    /** Refuses a folder of another sort, such as a plain copy or one that a newer program laid out differently. */
    static void require(ArchiveFolder folder) throws IOException, ProblemException {
        if (!Files.exists(folder.hint())) {
            return; // only a hint: it is written again
        }
        JsonObject hint = read(folder);
        String form = hint.text("fringekeep").orElse("");
        if (form.startsWith("copy/")) {
            throw new ProblemException(new Problem(
                    "archive.is-a-copy",
                    "The folder is a plain copy of an archive, not an archive.",
                    folder.root().toString(),
                    "Restore it into a new folder and open that. Nothing was changed."));
        }
        if (!form.equals(FORM)) {
            throw new ProblemException(new Problem(
                    "archive.newer-form",
                    "The folder says it has the form \"" + form + "\"; this program knows \"" + FORM + "\".",
                    folder.hint().toString(),
                    "Use the newer program. Nothing was changed."));
        }
    }

    static JsonObject read(ArchiveFolder folder) throws IOException, ProblemException {
        try {
            return CanonicalJson.readObject(Files.readAllBytes(folder.hint()), CanonicalJson.LARGEST_ENTRY);
        } catch (ProblemException e) {
            throw new ProblemException(new Problem(
                    "archive.hint",
                    "The file that says what the folder is, is damaged: "
                            + e.problems().get(0).what(),
                    folder.hint().toString(),
                    "Delete that one file; it is written again from the journal. Nothing was changed."));
        }
    }
}
