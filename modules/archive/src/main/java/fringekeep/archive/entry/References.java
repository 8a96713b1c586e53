package fringekeep.archive.entry;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PersonId;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeSet;

/** Reads what a document refers to. */
final class References {
    private static final int LONGEST_ROLE = 40;
    private static final int LONGEST_CHANNEL = 64;
    private static final Set<String> ROLES_OF_RECORDS = Set.of("undoes", "chosen", "over");
    private final EntrySurroundings surroundings;
    private final Trouble trouble;
    private final String verdict;

    References(EntrySurroundings surroundings, Trouble trouble, String verdict) {
        this.surroundings = surroundings;
        this.trouble = trouble;
        this.verdict = verdict;
    }

    List<InputReference> inputs(JsonArray items) {
        List<InputReference> inputs = new ArrayList<>();
        for (int i = 0; i < items.items().size(); i++) {
            String pointer = JsonPointer.child("/inputs", i);
            object(items.items().get(i), pointer, Set.of("role", "record", "channel", "raw", "bytes"))
                    .flatMap(input -> input(input, pointer))
                    .ifPresent(inputs::add);
        }
        return inputs;
    }

    private Optional<InputReference> input(JsonObject input, String pointer) {
        Optional<String> role = name(input, "role", LONGEST_ROLE, pointer);
        if (input.get("raw").isPresent() == input.get("record").isPresent()) {
            trouble.add(
                    "entry.input",
                    "An input is either a record or a raw file.",
                    pointer,
                    "Give \"record\" or \"raw\", one of them.");
            return Optional.empty();
        }
        if (input.get("raw").isPresent()) {
            return role.flatMap(name -> raw(input, name, pointer));
        }
        Optional<String> channel =
                input.get("channel").isPresent() ? name(input, "channel", LONGEST_CHANNEL, pointer) : Optional.empty();
        Optional<Hash> record = record(input.get("record").orElseThrow(), JsonPointer.child(pointer, "record"));
        return role.flatMap(name -> record.map(hash -> new InputReference.OfRecord(name, hash, channel)));
    }

    private Optional<InputReference> raw(JsonObject input, String role, String pointer) {
        Optional<String> path = name(input, "raw", 4_096, pointer);
        OptionalLong bytes = input.integer("bytes");
        if (path.isPresent() && bytes.isPresent() && path.get().matches("[0-9a-f]{64}")) {
            return Optional.of(new InputReference.OfRaw(role, new Hash(path.get()), bytes.getAsLong()));
        }
        return path.flatMap(text -> tried(JsonPointer.child(pointer, "raw"), () -> {
            EntrySurroundings.TakenRaw taken = surroundings.rawFiles().take(text);
            return new InputReference.OfRaw(role, taken.hash(), taken.bytes());
        }));
    }

    List<AboutReference> about(JsonArray items) {
        List<AboutReference> about = new ArrayList<>();
        for (int i = 0; i < items.items().size(); i++) {
            String pointer = JsonPointer.child("/about", i);
            object(items.items().get(i), pointer, Set.of("role", "record", "reach"))
                    .flatMap(one -> about(one, pointer))
                    .ifPresent(about::add);
        }
        return about;
    }

    private Optional<AboutReference> about(JsonObject one, String pointer) {
        Optional<String> role = name(one, "role", LONGEST_ROLE, pointer);
        Optional<Hash> record = one.get("record").isPresent()
                ? record(one.get("record").get(), JsonPointer.child(pointer, "record"))
                : missing("record", pointer);
        Optional<Reach> reach = role.flatMap(name -> reach(one, name, pointer));
        return role.flatMap(name -> record.flatMap(hash -> reach.map(far -> new AboutReference(name, hash, far))));
    }

    /** Facts speak of things; masks, and judgements on judgements or between records, of the very record. */
    private Optional<Reach> reach(JsonObject one, String role, String pointer) {
        if (one.get("reach").isEmpty()) {
            boolean record = verdict.equals("masked") || ROLES_OF_RECORDS.contains(role);
            return Optional.of(record ? Reach.RECORD : Reach.THING);
        }
        String text = one.text("reach").orElse("");
        if (text.equals("record")) {
            return Optional.of(Reach.RECORD);
        }
        if (text.equals("thing")) {
            return Optional.of(Reach.THING);
        }
        trouble.add(
                "entry.reach",
                "The reach is neither \"record\" nor \"thing\".",
                JsonPointer.child(pointer, "reach"),
                "Write \"thing\" for all records of the thing, \"record\" for that one alone.");
        return Optional.empty();
    }

    Optional<Hash> record(Json value, String pointer) {
        Optional<String> text = EntryDocument.text(value);
        if (text.isEmpty()) {
            trouble.add(
                    "entry.reference",
                    "A record is named by a text.",
                    pointer,
                    "Write its number (\"scan 412\"), its short form or its 64 digits.");
        }
        return text.flatMap(
                reference -> tried(pointer, () -> surroundings.records().find(reference)));
    }

    Optional<PersonId> person(Json value) {
        Optional<String> text = EntryDocument.text(value);
        if (text.isEmpty()) {
            trouble.add("entry.person", "A person is named by a text.", "/person", "Write the name or the id.");
        }
        return text.flatMap(
                name -> tried("/person", () -> surroundings.persons().find(name)));
    }

    Optional<After> after(Json value) {
        return object(value, "/after", Set.of("record", "from")).flatMap(after -> {
            Optional<Hash> record = after.get("record").isPresent()
                    ? record(after.get("record").get(), "/after/record")
                    : missing("record", "/after");
            Optional<Instant> from = name(after, "from", 64, "/after").flatMap(this::instant);
            return record.flatMap(hash -> from.map(instant -> new After(hash, instant)));
        });
    }

    private Optional<Instant> instant(String text) {
        try {
            return Optional.of(OffsetDateTime.parse(text).toInstant());
        } catch (DateTimeException e) {
            trouble.add(
                    "entry.instant",
                    "\"" + text + "\" is not an instant.",
                    "/after/from",
                    "Write it as 2031-05-14T09:00:00Z or 2031-05-14T11:00:00+02:00.");
            return Optional.empty();
        }
    }

    private Optional<JsonObject> object(Json value, String pointer, Set<String> known) {
        if (!(value instanceof JsonObject object)) {
            trouble.add("entry.not-an-object", "Here an object is expected.", pointer, "Write {…}.");
            return Optional.empty();
        }
        for (String name : object.members().keySet()) {
            if (!known.contains(name)) {
                trouble.add(
                        "entry.unknown-member",
                        "There is no member \"" + name + "\" here.",
                        JsonPointer.child(pointer, name),
                        "Use: " + String.join(", ", new TreeSet<>(known)) + ".");
            }
        }
        return Optional.of(object);
    }

    private Optional<String> name(JsonObject object, String name, int longest, String pointer) {
        if (object.get(name).isEmpty()) {
            return missing(name, pointer);
        }
        Optional<String> text = object.text(name).filter(value -> !value.isEmpty() && value.length() <= longest);
        if (text.isEmpty()) {
            trouble.add(
                    "entry.text",
                    "\"" + name + "\" is a text of 1 to " + longest + " characters.",
                    JsonPointer.child(pointer, name),
                    "Write it in quotes.");
        }
        return text;
    }

    private <T> Optional<T> missing(String name, String pointer) {
        trouble.add("entry.missing", "\"" + name + "\" is missing.", pointer, "Add it.");
        return Optional.empty();
    }

    private <T> Optional<T> tried(String pointer, Finding<T> finding) {
        try {
            return Optional.of(finding.find());
        } catch (ProblemException e) {
            for (Problem problem : e.problems()) {
                String where = problem.where().isEmpty() ? "" : " (" + problem.where() + ")";
                trouble.add(new Problem(problem.code(), problem.what() + where, pointer, problem.mend()));
            }
            return Optional.empty();
        }
    }

    @FunctionalInterface
    private interface Finding<T> {
        T find() throws ProblemException;
    }
}
