package fringekeep.archive.internal.store.journal;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import java.util.OptionalLong;

/** Entries as canonical bytes: {@code entry/1}. */
public final class EntryCodec {
    static final String FORM = "entry/1";

    private EntryCodec() {}

    /** Canonical bytes of an entry. */
    public static byte[] write(Entry entry) {
        JsonObject json = act(entry.act())
                .with("fringekeep", FORM)
                .with("archive", entry.archive().hex())
                .with("n", entry.n())
                .with("at", entry.at().toString())
                .with("act", entry.act().name())
                .with("previous", entry.previous().map(hash -> Json.of(hash.hex())));
        return CanonicalJson.write(json);
    }

    private static JsonObject act(Act act) {
        if (act instanceof Act.Founded founded) {
            return naming(founded.naming())
                    .with("invented", Json.of(founded.invented()))
                    .with("continues", founded.continues().map(EntryCodec::continues));
        } else if (act instanceof Act.Settings settings) {
            return naming(settings.naming());
        } else if (act instanceof Act.Recorded recorded) {
            return integer(JsonObject.EMPTY.with("record", recorded.record().hex()), "number", recorded.number());
        } else if (act instanceof Act.Received received) {
            return JsonObject.EMPTY.with("record", received.record().hex()).with("origin", origin(received.origin()));
        } else if (act instanceof Act.Supplied supplied) {
            return JsonObject.EMPTY
                    .with("record", supplied.record().hex())
                    .with("part", supplied.part())
                    .with("sha256", supplied.sha256().hex());
        } else if (act instanceof Act.Purged purged) {
            return JsonObject.EMPTY
                    .with("what", purged.what())
                    .with("sha256", purged.sha256().hex())
                    .with("reason", purged.reason())
                    .with("text", purged.text());
        } else if (act instanceof Act.PersonErased erased) {
            return JsonObject.EMPTY.with("person", erased.person().hex());
        }
        throw new AssertionError(act);
    }

    private static JsonObject naming(Act.Naming naming) {
        return JsonObject.EMPTY
                .with("title", naming.title())
                .with("dayBoundary", naming.dayBoundary())
                .with("zone", naming.zone());
    }

    private static Json continues(Act.Continues continues) {
        return JsonObject.EMPTY
                .with("archive", continues.archive().hex())
                .with("n", continues.n())
                .with("sha256", continues.sha256().hex());
    }

    private static Json origin(Act.Origin origin) {
        JsonObject archive = JsonObject.EMPTY.with("archive", origin.archive().hex());
        return integer(integer(archive, "n", origin.n()), "number", origin.number());
    }

    private static JsonObject integer(JsonObject object, String name, OptionalLong value) {
        return value.isPresent() ? object.with(name, value.getAsLong()) : object;
    }

    /**
     * Reads an entry.
     *
     * @throws ProblemException if the bytes are not canonical, of another form, or not an entry
     */
    public static Entry read(byte[] bytes) throws ProblemException {
        return EntryReading.entry(CanonicalJson.readObject(bytes, CanonicalJson.LARGEST_ENTRY));
    }
}
