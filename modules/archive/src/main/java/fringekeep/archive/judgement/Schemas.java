package fringekeep.archive.judgement;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable.FlatColumn;
import fringekeep.archive.kind.SchemaResource;

/** Schemas and columns of the two kinds. */
final class Schemas {
    private Schemas() {}

    static JsonObject numbered(String kind, int number, int newest) {
        if (number < 1 || number > newest) {
            throw new IllegalArgumentException(kind + " has no schema number " + number);
        }
        return SchemaResource.read(Schemas.class, kind + "-" + number + ".schema.json");
    }

    static FlatColumn textColumn(String name, String label, String description) {
        return new FlatColumn(name, label, "", description);
    }
}
