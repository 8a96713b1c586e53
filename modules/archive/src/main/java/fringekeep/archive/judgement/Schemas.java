package fringekeep.archive.judgement;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable.FlatColumn;
import fringekeep.archive.kind.SchemaResource;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/** Schemas of the two kinds, read once. */
final class Schemas {
    private static final Map<String, JsonObject> READ = new ConcurrentHashMap<>();

    private Schemas() {}

    static JsonObject numbered(String kind, int number, int newest) {
        if (number < 1 || number > newest) {
            throw new IllegalArgumentException(kind + " has no schema number " + number);
        }
        return READ.computeIfAbsent(
                kind + "-" + number + ".schema.json", name -> SchemaResource.read(Schemas.class, name));
    }

    static FlatColumn textColumn(String name, String label, String description) {
        return new FlatColumn(name, label, "", description);
    }
}
