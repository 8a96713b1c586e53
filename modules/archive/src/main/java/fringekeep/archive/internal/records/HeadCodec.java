package fringekeep.archive.internal.records;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.ThingId;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;

/** Heads as canonical bytes: {@code head/1} of record format 1, section 3. */
public final class HeadCodec {
    static final String FORM = "head/1";
    private static final long LARGEST_FILE = 1L << 40;
    private static final int LONGEST_ROLE = 40;
    private static final int LONGEST_NAME = 64;
    private static final int LONGEST_FORM = 20;
    private static final Set<String> MEMBERS = Set.of(
            "fringekeep",
            "kind",
            "schema",
            "thing",
            "inputs",
            "about",
            "payloads",
            "parts",
            "sealed",
            "corrects",
            "after");

    private HeadCodec() {}

    /**
     * Canonical bytes of a head.
     *
     * @throws ProblemException if the head breaks a rule of its form or a limit
     */
    public static byte[] write(Head head) throws ProblemException {
        List<Problem> problems = HeadRules.examine(head);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        JsonObject json = json(head);
        List<Problem> unwritable = CanonicalJson.examine(json, "");
        if (!unwritable.isEmpty()) {
            throw new ProblemException(unwritable);
        }
        byte[] bytes = CanonicalJson.write(json);
        if (bytes.length > CanonicalJson.LARGEST_HEAD) {
            throw new ProblemException(new Problem(
                    "head.too-large",
                    "The head would have " + bytes.length + " bytes; at most " + CanonicalJson.LARGEST_HEAD
                            + " are allowed.",
                    "",
                    "Refer to fewer records; nothing has been stored."));
        }
        return bytes;
    }

    /**
     * A digest of what a record says: inputs, about, after, payloads, content, choices, result; neither who and when nor of
     * which thing. Equal digests mean that two records say the same (record format 1, section 8).
     */
    public static Hash says(Head head) {
        SortedMap<String, Hash> parts = new TreeMap<>(head.parts());
        parts.remove(PartName.MADE.text());
        JsonObject said = json(head)
                .without("kind")
                .without("schema")
                .without("thing")
                .without("sealed")
                .without("corrects")
                .with("parts", json(parts));
        return Hash.of(CanonicalJson.write(said));
    }

    private static JsonObject json(Head head) {
        return JsonObject.EMPTY
                .with("fringekeep", FORM)
                .with("kind", head.kind().text())
                .with("schema", head.schema())
                .with("thing", head.thing().hex())
                .with(
                        "inputs",
                        new JsonArray(
                                head.inputs().stream().map(HeadCodec::json).toList()))
                .with(
                        "about",
                        new JsonArray(head.about().stream().map(HeadCodec::json).toList()))
                .with(
                        "payloads",
                        new JsonArray(
                                head.payloads().stream().map(HeadCodec::json).toList()))
                .with("parts", json(head.parts()))
                .with("sealed", json(head.sealed()))
                .with("corrects", head.corrects().map(hash -> Json.of(hash.hex())))
                .with("after", head.after().map(HeadCodec::json));
    }

    private static Json json(InputReference input) {
        if (input instanceof InputReference.OfRecord record) {
            return JsonObject.EMPTY
                    .with("role", record.role())
                    .with("record", record.record().hex())
                    .with("channel", record.channel().map(Json::of));
        }
        if (input instanceof InputReference.OfRaw raw) {
            return JsonObject.EMPTY
                    .with("role", raw.role())
                    .with("raw", raw.raw().hex())
                    .with("bytes", raw.bytes());
        }
        throw new AssertionError(input);
    }

    private static Json json(AboutReference about) {
        return JsonObject.EMPTY
                .with("role", about.role())
                .with("record", about.record().hex())
                .with("reach", about.reach().name().toLowerCase(Locale.ROOT));
    }

    private static Json json(PayloadReference payload) {
        return JsonObject.EMPTY
                .with("name", payload.name())
                .with("sha256", payload.sha256().hex())
                .with("bytes", payload.bytes())
                .with("form", payload.form());
    }

    private static Json json(After after) {
        return JsonObject.EMPTY
                .with("record", after.record().hex())
                .with("from", after.from().toString());
    }

    private static JsonObject json(SortedMap<String, Hash> parts) {
        SortedMap<String, Json> members = new TreeMap<>();
        parts.forEach((name, hash) -> members.put(name, Json.of(hash.hex())));
        return new JsonObject(members);
    }

    /**
     * Reads a head.
     *
     * @throws ProblemException if the bytes are not canonical, of another form, or break a rule of the form
     */
    public static Head read(byte[] bytes) throws ProblemException {
        JsonObject object = CanonicalJson.readObject(bytes, CanonicalJson.LARGEST_HEAD);
        StoredForm.require(object, FORM);
        Head head = head(new Reading(object, "", MEMBERS));
        List<Problem> problems = HeadRules.examine(head);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return head;
    }

    private static Head head(Reading reading) throws ProblemException {
        return new Head(
                kind(reading),
                (int) reading.integer("schema", 1, Integer.MAX_VALUE),
                thing(reading),
                inputs(reading),
                about(reading),
                payloads(reading),
                parts(reading, "parts"),
                parts(reading, "sealed"),
                reading.optionalHash("corrects"),
                after(reading));
    }

    private static KindName kind(Reading reading) throws ProblemException {
        try {
            return new KindName(reading.text("kind"));
        } catch (IllegalArgumentException e) {
            throw reading.wrong("kind", "is " + e.getMessage());
        }
    }

    private static ThingId thing(Reading reading) throws ProblemException {
        try {
            return new ThingId(reading.text("thing"));
        } catch (IllegalArgumentException e) {
            throw reading.wrong("thing", "is " + e.getMessage());
        }
    }

    private static List<InputReference> inputs(Reading reading) throws ProblemException {
        List<InputReference> inputs = new ArrayList<>();
        List<Json> items = reading.array("inputs");
        for (int i = 0; i < items.size(); i++) {
            inputs.add(input(items.get(i), JsonPointer.child("/inputs", i)));
        }
        return inputs;
    }

    private static InputReference input(Json item, String pointer) throws ProblemException {
        JsonObject object = StoredForm.object(item, pointer);
        if (object.get("raw").isPresent()) {
            Reading raw = new Reading(object, pointer, Set.of("role", "raw", "bytes"));
            return new InputReference.OfRaw(
                    raw.name("role", LONGEST_ROLE), raw.hash("raw"), raw.integer("bytes", 0, LARGEST_FILE));
        }
        Reading record = new Reading(object, pointer, Set.of("role", "record", "channel"));
        Optional<String> channel =
                record.has("channel") ? Optional.of(record.name("channel", LONGEST_NAME)) : Optional.empty();
        return new InputReference.OfRecord(record.name("role", LONGEST_ROLE), record.hash("record"), channel);
    }

    private static List<AboutReference> about(Reading reading) throws ProblemException {
        List<AboutReference> about = new ArrayList<>();
        List<Json> items = reading.array("about");
        for (int i = 0; i < items.size(); i++) {
            String pointer = JsonPointer.child("/about", i);
            Reading one =
                    new Reading(StoredForm.object(items.get(i), pointer), pointer, Set.of("role", "record", "reach"));
            about.add(new AboutReference(one.name("role", LONGEST_ROLE), one.hash("record"), reach(one)));
        }
        return about;
    }

    private static AboutReference.Reach reach(Reading reading) throws ProblemException {
        return switch (reading.text("reach")) {
            case "record" -> AboutReference.Reach.RECORD;
            case "thing" -> AboutReference.Reach.THING;
            default -> throw reading.wrong("reach", "is neither \"record\" nor \"thing\"");
        };
    }

    private static List<PayloadReference> payloads(Reading reading) throws ProblemException {
        List<PayloadReference> payloads = new ArrayList<>();
        List<Json> items = reading.array("payloads");
        for (int i = 0; i < items.size(); i++) {
            String pointer = JsonPointer.child("/payloads", i);
            JsonObject object = StoredForm.object(items.get(i), pointer);
            Reading one = new Reading(object, pointer, Set.of("name", "sha256", "bytes", "form"));
            payloads.add(new PayloadReference(
                    one.name("name", LONGEST_NAME),
                    one.hash("sha256"),
                    one.integer("bytes", 0, LARGEST_FILE),
                    one.name("form", LONGEST_FORM)));
        }
        return payloads;
    }

    private static SortedMap<String, Hash> parts(Reading reading, String name) throws ProblemException {
        JsonObject object = reading.object(name);
        SortedMap<String, Hash> parts = new TreeMap<>();
        Reading members =
                new Reading(object, reading.pointer(name), object.members().keySet());
        for (Map.Entry<String, Json> member : object.members().entrySet()) {
            parts.put(member.getKey(), members.hash(member.getKey()));
        }
        return parts;
    }

    private static Optional<After> after(Reading reading) throws ProblemException {
        if (!reading.has("after")) {
            return Optional.empty();
        }
        Reading after = new Reading(reading.object("after"), "/after", Set.of("record", "from"));
        return Optional.of(new After(after.hash("record"), after.instant("from")));
    }
}
