package fringekeep.bundle.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.bundle.stated.Author;
import fringekeep.bundle.stated.BundleSettings;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * The crate's metadata file: flattened and compacted JSON-LD.
 *
 * <p>Source: RO-Crate Metadata Specification 1.2 (2025-06-04), sections Structure, Root Data Entity, Data Entities,
 * Contextual Entities, Provenance. The context is named by reference, as the specification asks.
 */
final class Crate {
    static final String FILE = "ro-crate-metadata.json";
    static final String CONTEXT = "https://w3id.org/ro/crate/1.2/context";
    static final String CONFORMS_TO = "https://w3id.org/ro/crate/1.2";
    private static final String PROGRAM = "#program-";

    private final BundleSettings settings;
    private final SortedMap<String, JsonObject> entities = new TreeMap<>();

    private Crate(BundleSettings settings) {
        this.settings = settings;
    }

    /**
     * The document.
     *
     * @param files every file below {@code data} but the metadata file and the preview, by path
     */
    static JsonObject of(BundleSettings settings, Contents contents, SortedMap<String, FileFacts> files) {
        Crate crate = new Crate(settings);
        files.forEach(crate::file);
        contents.lineage().records().forEach(crate::making);
        crate.people();
        crate.license();
        crate.root(files);
        crate.descriptor();
        return JsonObject.EMPTY
                .with("@context", CONTEXT)
                .with("@graph", new JsonArray(List.<Json>copyOf(crate.entities.values())));
    }

    /**
     * What is said of a file.
     *
     * @param name words for people
     * @param description one sentence
     * @param format media type
     * @param bytes length
     * @param sha256 hash
     */
    record FileFacts(String name, String description, String format, long bytes, String sha256) {}

    private static JsonObject reference(String id) {
        return JsonObject.EMPTY.with("@id", id);
    }

    private static Json one(List<String> ids) {
        List<Json> references = ids.stream().<Json>map(Crate::reference).toList();
        return references.size() == 1 ? references.get(0) : new JsonArray(references);
    }

    private void add(JsonObject entity) {
        entities.put(entity.text("@id").orElseThrow(), entity);
    }

    private void descriptor() {
        add(JsonObject.EMPTY
                .with("@id", FILE)
                .with("@type", "CreativeWork")
                .with("about", reference("./"))
                .with("conformsTo", reference(CONFORMS_TO)));
    }

    private void root(SortedMap<String, FileFacts> files) {
        JsonObject root = JsonObject.EMPTY
                .with("@id", "./")
                .with("@type", "Dataset")
                .with("name", settings.title())
                .with("description", settings.description())
                .with("datePublished", settings.published().toString())
                .with("license", reference(settings.license().address()))
                .with(
                        "author",
                        one(settings.authors().stream().map(Crate::personId).toList()))
                .with("publisher", reference("#publisher"))
                .with("hasPart", one(List.copyOf(files.keySet())));
        if (!settings.keywords().isEmpty()) {
            root = root.with("keywords", String.join(", ", settings.keywords()));
        }
        add(root);
    }

    private void file(String path, FileFacts facts) {
        add(JsonObject.EMPTY
                .with("@id", path)
                .with("@type", "File")
                .with("name", facts.name())
                .with("description", facts.description())
                .with("encodingFormat", facts.format())
                .with("contentSize", Long.toString(facts.bytes()))
                .with("sha256", facts.sha256()));
    }

    private void making(LineageRecord record) {
        if (record.view().head().inputs().isEmpty()) {
            return;
        }
        List<String> objects = new ArrayList<>();
        for (InputReference input : record.view().head().inputs()) {
            String path = input instanceof InputReference.OfRecord of
                    ? Layout.record(of.record())
                    : Layout.raw(((InputReference.OfRaw) input).raw());
            if (entities.containsKey(path) && !objects.contains(path)) {
                objects.add(path);
            }
        }
        JsonObject made = record.view().part(PartName.MADE).orElse(JsonObject.EMPTY);
        String build = made.text("build").orElse("unknown");
        program(build);
        Hash fingerprint = record.fingerprint();
        JsonObject action = JsonObject.EMPTY
                .with("@id", "#making-" + fingerprint.hex())
                .with("@type", "CreateAction")
                .with("name", "making of " + record.label())
                .with("object", one(objects))
                .with("result", reference(Layout.record(fingerprint)))
                .with("instrument", reference(PROGRAM + build));
        if (made.text("at").isPresent()) {
            action = action.with("endTime", made.text("at").get());
        }
        add(action);
    }

    private void program(String build) {
        add(JsonObject.EMPTY
                .with("@id", PROGRAM + build)
                .with("@type", "SoftwareApplication")
                .with("name", "Fringekeep")
                .with("version", build));
    }

    private static String personId(Author author) {
        return author.orcid()
                .map(orcid -> "https://orcid.org/" + orcid)
                .orElseGet(() -> "#author-"
                        + author.name().toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]+", "-"));
    }

    private void people() {
        for (Author author : settings.authors()) {
            JsonObject person = JsonObject.EMPTY
                    .with("@id", personId(author))
                    .with("@type", "Person")
                    .with("name", author.name());
            if (author.affiliation().isPresent()) {
                person = person.with("affiliation", author.affiliation().get());
            }
            add(person);
        }
        add(JsonObject.EMPTY
                .with("@id", "#publisher")
                .with("@type", "Organization")
                .with("name", settings.publisher()));
    }

    private void license() {
        add(JsonObject.EMPTY
                .with("@id", settings.license().address())
                .with("@type", "CreativeWork")
                .with("name", settings.license().title())
                .with("description", "SPDX identifier " + settings.license().identifier()));
    }
}
