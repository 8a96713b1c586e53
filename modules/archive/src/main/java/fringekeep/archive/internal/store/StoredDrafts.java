package fringekeep.archive.internal.store;

import fringekeep.archive.Drafts;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.nio.charset.StandardCharsets;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.sql.Types;
import java.time.Instant;
import java.util.Collections;
import java.util.HexFormat;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.regex.Pattern;

/** Drafts in their table. */
final class StoredDrafts implements Drafts {
    private static final Pattern ID = Pattern.compile("[0-9a-f]{32}");
    private final Store store;

    StoredDrafts(Store store) {
        this.store = store;
    }

    @Override
    public SortedMap<String, JsonObject> all() throws ProblemException {
        Map<String, String> texts = store.database().readCommitted(StoredDrafts::texts);
        SortedMap<String, JsonObject> drafts = new TreeMap<>();
        for (Map.Entry<String, String> text : texts.entrySet()) {
            drafts.put(text.getKey(), parsed(text.getValue()));
        }
        return Collections.unmodifiableSortedMap(drafts);
    }

    /** Bodies by id, as stored. */
    static SortedMap<String, String> texts(Connection c) throws SQLException {
        SortedMap<String, String> texts = new TreeMap<>();
        Sql.list(
                c,
                "select id, body from draft order by id",
                row -> texts.put(HexFormat.of().formatHex(row.getBytes(1)), row.getString(2)));
        return texts;
    }

    @Override
    public Optional<JsonObject> get(String id) throws ProblemException {
        byte[] key = key(id);
        Optional<String> text = store.database()
                .readCommitted(c -> Sql.first(c, "select body from draft where id = ?", row -> row.getString(1), key));
        return text.isPresent() ? Optional.of(parsed(text.get())) : Optional.empty();
    }

    private static JsonObject parsed(String text) throws ProblemException {
        if (JsonDocument.read(text.getBytes(StandardCharsets.UTF_8)).value() instanceof JsonObject object) {
            return object;
        }
        throw new ProblemException(new Problem("draft.damaged", "A stored draft is not an object.", "draft", ""));
    }

    @Override
    public void save(String id, JsonObject body) throws ProblemException {
        byte[] key = key(id);
        String text = new String(CanonicalJson.write(body), StandardCharsets.UTF_8);
        String kind = body.text("kind")
                .orElseThrow(() -> new ProblemException(new Problem(
                        "draft.kind", "A draft says what kind it is of.", "/kind", "Add the member \"kind\".")));
        store.<Integer, ProblemException>write((c, progress) -> save(c, key, kind, body, text));
    }

    private static int save(Connection c, byte[] key, String kind, JsonObject body, String text) throws SQLException {
        Sql.run(c, "delete from draft where id = ?", key);
        Object person = body.text("person")
                .filter(id -> ID.matcher(id).matches())
                .<Object>map(id -> HexFormat.of().parseHex(id))
                .orElse(new Sql.Null(Types.BINARY));
        return Sql.run(
                c,
                "insert into draft (id, kind, person, body, saved) values (?, ?, ?, ?, ?)",
                key,
                kind,
                person,
                text,
                Timestamp.from(Instant.now()));
    }

    @Override
    public void remove(String id) throws ProblemException {
        byte[] key = key(id);
        store.<Integer, ProblemException>write((c, progress) -> remove(c, key));
    }

    static int remove(Connection c, byte[] key) throws SQLException {
        return Sql.run(c, "delete from draft where id = ?", key);
    }

    static byte[] key(String id) throws ProblemException {
        if (!ID.matcher(id).matches()) {
            throw new ProblemException(new Problem(
                    "draft.id",
                    "\"" + id + "\" is not an id of 32 lower-case hexadecimal digits.",
                    "",
                    "Draw a new id."));
        }
        return HexFormat.of().parseHex(id);
    }
}
