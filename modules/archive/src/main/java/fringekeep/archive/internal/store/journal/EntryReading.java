package fringekeep.archive.internal.store.journal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.HashSet;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;

/** Reads the members of an entry strictly. */
final class EntryReading {
    private final JsonObject object;
    private final Set<String> unread;

    private EntryReading(JsonObject object) {
        this.object = object;
        this.unread = new HashSet<>(object.members().keySet());
    }

    static Entry entry(JsonObject object) throws ProblemException {
        EntryReading reading = new EntryReading(object);
        String form = reading.text("fringekeep");
        if (!form.equals(EntryCodec.FORM)) {
            throw new ProblemException(new Problem(
                    form.startsWith("entry/") ? "journal.newer-form" : "journal.not-an-entry",
                    "The journal entry says it is \"" + form + "\"; this program knows \"" + EntryCodec.FORM + "\".",
                    "/fringekeep",
                    "Use a newer program. Nothing was changed."));
        }
        try {
            Entry entry = reading.whole();
            reading.refuseUnread();
            return entry;
        } catch (IllegalArgumentException | DateTimeException e) {
            throw wrong("", "The journal entry holds something malformed: " + e.getMessage() + ".");
        }
    }

    private Entry whole() throws ProblemException {
        Optional<Hash> previous = object.get("previous").isPresent() ? Optional.of(hash("previous")) : Optional.empty();
        return new Entry(
                new ArchiveId(text("archive")), integer("n"), Instant.parse(text("at")), act(text("act")), previous);
    }

    private Act act(String name) throws ProblemException {
        return switch (name) {
            case "founded" -> new Act.Founded(naming(), flag("invented"), continues());
            case "settings" -> new Act.Settings(naming());
            case "recorded" -> new Act.Recorded(hash("record"), optionalInteger("number"));
            case "received" -> new Act.Received(hash("record"), origin());
            case "supplied" -> new Act.Supplied(hash("record"), text("part"), hash("sha256"));
            case "purged" -> new Act.Purged(text("what"), hash("sha256"), text("reason"), text("text"));
            case "person-erased" -> new Act.PersonErased(new PersonId(text("person")));
            default -> throw wrong("/act", "The journal entry has the unknown act \"" + name + "\".");
        };
    }

    private Act.Naming naming() throws ProblemException {
        return new Act.Naming(text("title"), text("dayBoundary"), text("zone"));
    }

    private Optional<Act.Continues> continues() throws ProblemException {
        Optional<JsonObject> member = member("continues");
        if (member.isEmpty()) {
            return Optional.empty();
        }
        EntryReading inner = new EntryReading(member.get());
        Act.Continues continues =
                new Act.Continues(new ArchiveId(inner.text("archive")), inner.integer("n"), inner.hash("sha256"));
        inner.refuseUnread();
        return Optional.of(continues);
    }

    private Act.Origin origin() throws ProblemException {
        EntryReading inner = new EntryReading(
                member("origin").orElseThrow(() -> wrong("/origin", "The journal entry lacks \"origin\".")));
        Act.Origin origin = new Act.Origin(
                new ArchiveId(inner.text("archive")), inner.optionalInteger("n"), inner.optionalInteger("number"));
        inner.refuseUnread();
        return origin;
    }

    private Optional<JsonObject> member(String name) {
        unread.remove(name);
        return object.object(name);
    }

    private String text(String name) throws ProblemException {
        unread.remove(name);
        return object.text(name).orElseThrow(() -> lacks(name, "text"));
    }

    private Hash hash(String name) throws ProblemException {
        return new Hash(text(name));
    }

    private boolean flag(String name) throws ProblemException {
        unread.remove(name);
        return object.flag(name).orElseThrow(() -> lacks(name, "truth value"));
    }

    private long integer(String name) throws ProblemException {
        OptionalLong value = optionalInteger(name);
        if (value.isEmpty() || value.getAsLong() < 1) {
            throw lacks(name, "positive integer");
        }
        return value.getAsLong();
    }

    private OptionalLong optionalInteger(String name) {
        if (object.integer(name).isPresent()) {
            unread.remove(name);
        }
        return object.integer(name);
    }

    private void refuseUnread() throws ProblemException {
        if (!unread.isEmpty()) {
            String name = new java.util.TreeSet<>(unread).first();
            throw wrong("/" + name, "The journal entry has the unknown or malformed member \"" + name + "\".");
        }
    }

    private static ProblemException lacks(String name, String sort) {
        return wrong("/" + name, "The journal entry lacks the " + sort + " \"" + name + "\".");
    }

    private static ProblemException wrong(String where, String what) {
        return new ProblemException(new Problem(
                "journal.entry", what, where, "Fetch the entry again from where it is whole. Nothing was changed."));
    }
}
