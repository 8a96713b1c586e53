package fringekeep.desk.form;

import fringekeep.archive.NewRecord;
import fringekeep.archive.entry.EntryDocument;
import fringekeep.archive.entry.EntrySurroundings;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** What the people of the invented laboratory entered, one document after the other. */
final class LabDocuments {
    static final Kinds KINDS = Kinds.announced(LabDocuments.class.getClassLoader());

    private LabDocuments() {}

    /** All entry documents in the order in which they were entered. */
    static List<JsonObject> all() {
        Path file = Path.of("../../sample-data/lab/lab.json");
        try {
            JsonObject lab =
                    (JsonObject) JsonDocument.read(Files.readAllBytes(file)).value();
            List<JsonObject> documents = new ArrayList<>();
            lab.array("steps").objects().stream()
                    .filter(step -> step.text("step").orElse("").equals("record"))
                    .forEach(step -> documents.addAll(step.array("documents").objects()));
            return documents;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (ProblemException e) {
            throw new IllegalStateException(e);
        }
    }

    /** The first document of a kind. */
    static JsonObject first(String kind) {
        return all().stream()
                .filter(document -> document.text("kind").orElse("").equals(kind))
                .findFirst()
                .orElseThrow();
    }

    /** What a document asks to be recorded; others are known by the hash of what they are called. */
    static NewRecord entered(JsonObject document) throws ProblemException {
        EntrySurroundings surroundings = new EntrySurroundings(
                KINDS,
                LabDocuments::named,
                name -> new PersonId(named(name).hex().substring(0, 32)),
                path -> new EntrySurroundings.TakenRaw(named(path), path.length()));
        return EntryDocument.read(PrettyJson.write(document), surroundings).record();
    }

    static Hash named(String reference) {
        return reference.matches("[0-9a-f]{64}")
                ? new Hash(reference)
                : Hash.of(reference.getBytes(StandardCharsets.UTF_8));
    }
}
