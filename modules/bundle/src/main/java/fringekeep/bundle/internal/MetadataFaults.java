package fringekeep.bundle.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Whether the crate's metadata, the tables' description and the provenance follow their standards and agree with the files.
 * Only what a reader without network can decide is checked; the standards are named at the writers.
 */
public final class MetadataFaults {
    private static final int LARGEST = 512 << 20;
    private static final int DEEPEST = 64;
    private static final String MEND = "Get the bundle again from where it came, or export it anew.";

    private final Path data;
    private final List<Problem> faults = new ArrayList<>();

    private MetadataFaults(Path data) {
        this.data = data;
    }

    /** All faults, empty when the metadata are valid. */
    public static List<Problem> of(Path data) throws IOException {
        MetadataFaults check = new MetadataFaults(data);
        check.crate();
        check.tables();
        check.provenance();
        for (String needed : List.of("README.md", "LICENSE.txt", "CITATION.cff", "archive.json")) {
            if (!Files.isRegularFile(data.resolve(needed))) {
                check.fault(
                        "bundle.no-" + needed.replaceAll("[^a-zA-Z]", "").toLowerCase(java.util.Locale.ROOT),
                        needed + " is missing.",
                        needed);
            }
        }
        return List.copyOf(check.faults);
    }

    private void fault(String code, String what, String where) {
        faults.add(new Problem(code, what, where, MEND));
    }

    private Optional<JsonObject> read(String path) throws IOException {
        Path file = data.resolve(path);
        if (!Files.isRegularFile(file)) {
            fault("bundle.no-metadata", path + " is missing.", path);
            return Optional.empty();
        }
        try {
            if (JsonDocument.read(Files.readAllBytes(file), LARGEST, DEEPEST).value() instanceof JsonObject object) {
                return Optional.of(object);
            }
            fault("bundle.not-an-object", path + " is not a JSON object.", path);
        } catch (ProblemException e) {
            e.problems().forEach(problem -> faults.add(problem.at(path + ", " + problem.where())));
        }
        return Optional.empty();
    }

    private void crate() throws IOException {
        Optional<JsonObject> document = read(Crate.FILE);
        if (document.isEmpty()) {
            return;
        }
        if (!document.get().text("@context").equals(Optional.of(Crate.CONTEXT))) {
            fault("crate.context", "The context is not that of RO-Crate 1.2.", Crate.FILE + "/@context");
        }
        Map<String, JsonObject> entities = new HashMap<>();
        for (Json item : document.get().array("@graph").items()) {
            String id = item instanceof JsonObject object ? object.text("@id").orElse("") : "";
            if (id.isEmpty() || ((JsonObject) item).get("@type").isEmpty()) {
                fault("crate.entity", "An entity has no @id or no @type.", Crate.FILE + " " + id);
            } else if (entities.put(id, (JsonObject) item) != null) {
                fault("crate.twice", "Two entities have the @id " + id + ".", Crate.FILE);
            }
        }
        root(entities);
        entities.values().forEach(entity -> references(entity, entities));
    }

    private void root(Map<String, JsonObject> entities) throws IOException {
        JsonObject root = entities.get("./");
        if (root == null || !entities.containsKey(Crate.FILE)) {
            fault("crate.root", "There is no root dataset or no metadata descriptor.", Crate.FILE);
            return;
        }
        for (String needed : List.of("name", "description", "datePublished", "license")) {
            if (root.get(needed).isEmpty()) {
                fault("crate.root-" + needed, "The root dataset has no " + needed + ".", Crate.FILE + " ./");
            }
        }
        Set<String> parts = new HashSet<>(ids(root.get("hasPart").orElse(new JsonArray(List.of()))));
        for (Path file : Bag.filesBelow(data, data)) {
            String path = Bag.relative(data, file);
            boolean own = path.equals(Crate.FILE) || path.equals("ro-crate-preview.html");
            if (!own && !parts.contains(path)) {
                fault("crate.undescribed", path + " is not part of the root dataset.", Crate.FILE + " ./hasPart");
            }
        }
        for (String part : parts) {
            file(part, entities.get(part));
        }
    }

    private void file(String path, @org.jspecify.annotations.Nullable JsonObject entity) throws IOException {
        Path file = data.resolve(path);
        if (Zip.unsafe(path) || !Files.isRegularFile(file)) {
            fault("crate.no-file", "A described file is not there: " + path + ".", Crate.FILE);
        } else if (entity == null) {
            fault("crate.no-entity", "A part of the dataset is not described: " + path + ".", Crate.FILE);
        } else if (!entity.text("contentSize").equals(Optional.of(Long.toString(Files.size(file))))
                || !entity.text("sha256")
                        .equals(Optional.ofNullable(Bag.checksums(file).get("sha256")))) {
            fault(
                    "crate.file-differs",
                    "Size or hash of " + path + " differ from its description.",
                    Crate.FILE + " " + path);
        }
    }

    private static List<String> ids(Json value) {
        if (value instanceof JsonObject object && object.members().size() == 1) {
            return object.text("@id").stream().toList();
        }
        if (value instanceof JsonArray array) {
            return array.items().stream().flatMap(item -> ids(item).stream()).toList();
        }
        return List.of();
    }

    /** Every reference within the document leads to an entity; addresses of the web need not be described. */
    private void references(JsonObject entity, Map<String, JsonObject> entities) {
        entity.members().forEach((name, value) -> {
            for (String id : ids(value)) {
                boolean web = id.startsWith("https://") || id.startsWith("http://");
                if (!web && !entities.containsKey(id)) {
                    fault(
                            "crate.reference",
                            name + " leads to " + id + ", which is not described.",
                            Crate.FILE + " " + entity.text("@id").orElse(""));
                }
            }
        });
    }

    private void tables() throws IOException {
        Optional<JsonObject> document = read("datapackage.json");
        if (document.isPresent()) {
            TableFaults.of(data, document.get()).forEach(faults::add);
        }
    }

    private void provenance() throws IOException {
        Optional<JsonObject> document = read(Layout.PROVENANCE + "/prov.json");
        if (document.isPresent()) {
            faults.addAll(ProvFaults.of(document.get()));
        }
    }
}
