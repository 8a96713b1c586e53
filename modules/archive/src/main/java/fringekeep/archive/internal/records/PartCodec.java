package fringekeep.archive.internal.records;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.Salt;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Parts as canonical bytes: {@code part/1} of record format 1, section 4. */
public final class PartCodec {
    static final String FORM = "part/1";

    private PartCodec() {}

    /**
     * Canonical bytes of a part.
     *
     * @throws ProblemException if names, depth, texts or size are beyond the format; pointers begin with the part's name
     */
    public static byte[] write(StoredPart part) throws ProblemException {
        JsonObject json = JsonObject.EMPTY
                .with("fringekeep", FORM)
                .with("name", part.name().text())
                .with("salt", part.salt().map(salt -> Json.of(salt.hex())))
                .with("value", part.value());
        String pointer = JsonPointer.child("", part.name().text());
        List<Problem> problems = CanonicalJson.examine(part.value(), pointer);
        if (problems.isEmpty()) {
            problems = CanonicalJson.examine(json, pointer);
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        byte[] bytes = CanonicalJson.write(json);
        if (bytes.length > CanonicalJson.LARGEST_PART) {
            throw new ProblemException(new Problem(
                    "part.too-large",
                    "The part would have " + bytes.length + " bytes; at most " + CanonicalJson.LARGEST_PART
                            + " are allowed.",
                    pointer,
                    "Put tables into a payload, attach long texts as files; nothing has been stored."));
        }
        return bytes;
    }

    /**
     * Reads a part.
     *
     * @throws ProblemException if the bytes are not canonical, of another form, or break a rule of the form
     */
    public static StoredPart read(byte[] bytes) throws ProblemException {
        JsonObject object = CanonicalJson.readObject(bytes, CanonicalJson.LARGEST_PART);
        StoredForm.require(object, FORM);
        Reading reading = new Reading(object, "", Set.of("fringekeep", "name", "salt", "value"));
        PartName name =
                PartName.of(reading.text("name")).orElseThrow(() -> reading.wrong("name", "names no known part"));
        return new StoredPart(name, salt(reading, name), reading.object("value"));
    }

    private static Optional<Salt> salt(Reading reading, PartName name) throws ProblemException {
        Optional<String> text = reading.optionalText("salt");
        if (name.salted() != text.isPresent()) {
            throw reading.wrong("salt", name.salted() ? "is missing" : "stands in a part that has none");
        }
        try {
            return text.map(Salt::new);
        } catch (IllegalArgumentException e) {
            throw reading.wrong("salt", "is " + e.getMessage());
        }
    }
}
