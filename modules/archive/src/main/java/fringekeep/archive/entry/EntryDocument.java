package fringekeep.archive.entry;

import fringekeep.archive.NewRecord;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/**
 * Reads what a script or a form gives for a new record, collecting all that is wrong, each with JSON pointer, line and
 * column. Members: {@code kind}; {@code content} or {@code choices}; {@code identity}, {@code remark} (an object, or the words
 * alone); {@code person}; {@code about} and {@code inputs}; {@code corrects}; {@code after}. Quantities and moments may be
 * written as text.
 */
public final class EntryDocument {
    private static final Set<String> MEMBERS = Set.of(
            "kind", "content", "choices", "identity", "remark", "person", "about", "inputs", "corrects", "after");

    private final JsonObject object;
    private final EntrySurroundings surroundings;
    private final Trouble trouble;

    private EntryDocument(JsonDocument document, JsonObject object, EntrySurroundings surroundings) {
        this.object = object;
        this.surroundings = surroundings;
        this.trouble = new Trouble(document);
    }

    /**
     * Reads a document from bytes.
     *
     * @throws ProblemException all that is wrong; nothing was stored, but raw files named in it may have been taken in
     */
    public static Entered read(byte[] bytes, EntrySurroundings surroundings) throws ProblemException {
        return read(JsonDocument.read(bytes), surroundings);
    }

    /** Reads a document. */
    public static Entered read(JsonDocument document, EntrySurroundings surroundings) throws ProblemException {
        if (document.value() instanceof JsonObject object) {
            return new EntryDocument(document, object, surroundings).entered();
        }
        throw new ProblemException(new Problem(
                "entry.not-an-object",
                "An entry document is one JSON object.",
                document.place(""),
                "Write {\"kind\": …, \"content\": {…}}. Nothing has been stored."));
    }

    /** Problems found later, with pointers into the parts, with line and column of the document added. */
    public static List<Problem> placed(JsonDocument document, List<Problem> problems) {
        return problems.stream()
                .map(problem -> problem.at(Trouble.place(document, problem.where())))
                .toList();
    }

    private Entered entered() throws ProblemException {
        unknownMembers();
        Optional<RecordKind> kind = kind();
        String verdict = object.object("content")
                .flatMap(content -> content.text("verdict"))
                .orElse("");
        References references = new References(surroundings, trouble, verdict);
        List<InputReference> inputs = references.inputs(array("inputs"));
        List<AboutReference> about = references.about(array("about"));
        Optional<Hash> corrects = object.get("corrects").flatMap(value -> references.record(value, "/corrects"));
        Optional<After> after = object.get("after").flatMap(references::after);
        Optional<PersonId> person = object.get("person").flatMap(references::person);
        EnteredParts parts = new EnteredParts(trouble, kind);
        Map<PartName, JsonObject> values = parts.values(object);
        trouble.refuseAny();
        NewRecord record =
                new NewRecord(kind.orElseThrow().kind(), inputs, about, values, List.of(), corrects, after, person);
        return new Entered(record, parts.questions());
    }

    private void unknownMembers() {
        for (String name : object.members().keySet()) {
            if (!MEMBERS.contains(name)) {
                trouble.add(
                        "entry.unknown-member",
                        "An entry document has no member \"" + name + "\".",
                        JsonPointer.child("", name),
                        name.equals("result")
                                ? "Results are computed, never entered."
                                : "Use: " + String.join(", ", new TreeSet<>(MEMBERS)) + ".");
            }
        }
    }

    private Optional<RecordKind> kind() {
        Optional<String> name = object.text("kind");
        Optional<RecordKind> kind = name.flatMap(EntryDocument::kindName).flatMap(surroundings.kinds()::get);
        if (kind.isEmpty()) {
            List<String> known = new ArrayList<>();
            surroundings.kinds().all().forEach(one -> known.add(one.kind().text()));
            trouble.add(
                    "entry.kind",
                    name.isEmpty() ? "The kind is missing." : "There is no kind \"" + name.get() + "\".",
                    object.get("kind").isPresent() ? "/kind" : "",
                    "Write \"kind\" with one of: " + String.join(", ", known) + ".");
        }
        return kind;
    }

    private static Optional<KindName> kindName(String text) {
        try {
            return Optional.of(new KindName(text));
        } catch (IllegalArgumentException e) {
            return Optional.empty();
        }
    }

    private JsonArray array(String name) {
        if (object.get(name).isPresent() && !(object.get(name).get() instanceof JsonArray)) {
            trouble.add("entry.not-a-list", "\"" + name + "\" is a list.", "/" + name, "Write […].");
        }
        return object.array(name);
    }

    static Optional<String> text(Json value) {
        return value instanceof JsonText text ? Optional.of(text.value()) : Optional.empty();
    }
}
