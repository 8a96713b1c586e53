package fringekeep.archive.internal.records;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Reads the members of one object strictly: unknown and missing ones are problems that say where. */
final class Reading {
    private static final Instant EARLIEST = Instant.parse("0001-01-01T00:00:00Z");
    private static final Instant LATEST = Instant.parse("9999-12-31T23:59:59.999999999Z");
    private final JsonObject object;
    private final String pointer;

    Reading(JsonObject object, String pointer, Set<String> known) throws ProblemException {
        this.object = object;
        this.pointer = pointer;
        for (String name : object.members().keySet()) {
            if (!known.contains(name)) {
                throw wrong(name, "is not a member of this form");
            }
        }
    }

    String text(String name) throws ProblemException {
        return optionalText(name).orElseThrow(() -> wrong(name, "is missing"));
    }

    Optional<String> optionalText(String name) throws ProblemException {
        Optional<Json> value = object.get(name);
        if (value.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(value.filter(JsonText.class::isInstance)
                .map(found -> ((JsonText) found).value())
                .orElseThrow(() -> wrong(name, "is not a text")));
    }

    String name(String name, int longest) throws ProblemException {
        String text = text(name);
        if (text.isEmpty() || text.length() > longest) {
            throw wrong(name, "has " + text.length() + " characters; 1 to " + longest + " are allowed");
        }
        return text;
    }

    long integer(String name, long least, long most) throws ProblemException {
        Json value = object.get(name).orElseThrow(() -> wrong(name, "is missing"));
        if (value instanceof JsonNumber number && number.asInteger().isPresent()) {
            long integer = number.asInteger().getAsLong();
            if (integer >= least && integer <= most) {
                return integer;
            }
        }
        throw wrong(name, "is not an integer from " + least + " to " + most);
    }

    Hash hash(String name) throws ProblemException {
        return optionalHash(name).orElseThrow(() -> wrong(name, "is missing"));
    }

    Optional<Hash> optionalHash(String name) throws ProblemException {
        Optional<String> text = optionalText(name);
        try {
            return text.map(Hash::new);
        } catch (IllegalArgumentException e) {
            throw wrong(name, "is " + e.getMessage());
        }
    }

    Instant instant(String name) throws ProblemException {
        String text = text(name);
        try {
            Instant instant = Instant.parse(text);
            if (instant.toString().equals(text) && !instant.isBefore(EARLIEST) && !instant.isAfter(LATEST)) {
                return instant;
            }
        } catch (DateTimeException e) {
            throw wrong(name, "is not an instant such as 2031-05-14T09:03:11.250Z");
        }
        throw wrong(name, "is not an instant in its shortest form, years 0001 to 9999");
    }

    JsonObject object(String name) throws ProblemException {
        return object.object(name).orElseThrow(() -> wrong(name, "is missing or not an object"));
    }

    List<Json> array(String name) throws ProblemException {
        if (object.get(name).orElseThrow(() -> wrong(name, "is missing")) instanceof JsonArray array) {
            return array.items();
        }
        throw wrong(name, "is not an array");
    }

    boolean has(String name) {
        return object.get(name).isPresent();
    }

    String pointer(String name) {
        return JsonPointer.child(pointer, name);
    }

    ProblemException wrong(String name, String why) {
        return wrong("record.member", name, why);
    }

    ProblemException wrong(String code, String name, String why) {
        return new ProblemException(new Problem(
                code, "The member \"" + name + "\" " + why + ".", pointer(name), "Nothing has been stored."));
    }
}
