package fringekeep.bundle.internal;

import fringekeep.archive.Archive;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.lineage.ProvJson;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PayloadReference;
import fringekeep.bundle.stated.BundleSettings;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureFiles;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/** Writes the {@code data} folder of a bundle in the order in which its files refer to one another. */
public final class Writing {
    private final Archive archive;
    private final Contents contents;
    private final BundleSettings settings;
    private final Path data;
    private final Work work;
    private final SortedMap<String, String> names = new TreeMap<>();
    private final SortedMap<String, String> descriptions = new TreeMap<>();

    private Writing(Archive archive, Contents contents, BundleSettings settings, Path data, Work work) {
        this.archive = archive;
        this.contents = contents;
        this.settings = settings;
        this.data = data;
        this.work = work;
    }

    /** Writes everything below {@code data}. */
    public static void write(Archive archive, Contents contents, BundleSettings settings, Path data, Work work)
            throws IOException, ProblemException, StoppedException {
        new Writing(archive, contents, settings, data, work).run();
    }

    private void run() throws IOException, ProblemException, StoppedException {
        records();
        rawFiles();
        schemas();
        List<String> pictures = pictures();
        List<Table> tables = Tables.of(archive, contents);
        for (Table table : tables) {
            file(table.path(), table.title(), "table with SI units", table.csv());
        }
        file(
                Layout.PROVENANCE + "/prov.json",
                "provenance",
                "the lineage of every record as PROV-JSON",
                PrettyJson.write(ProvJson.of(contents.lineage())));
        file(
                "archive.json",
                "archive of origin",
                "id, title and journal head of the archive at the time of export",
                CanonicalJson.write(origin()));
        file("LICENSE.txt", "licence", "the licence of the data", utf8(Words.license(settings)));
        file("CITATION.cff", "citation", "how to cite the dataset", utf8(Words.citation(settings)));
        file(
                "README.md",
                "read me",
                "what stands where and how to check it",
                utf8(Words.readme(settings, contents, tables, pictures)));
        file("datapackage.json", "description of the tables", "Data Package 2", PrettyJson.write(dataPackage(tables)));
        Layout.write(data, "ro-crate-preview.html", utf8(Words.preview(settings, contents, tables)));
        Layout.write(data, Crate.FILE, PrettyJson.write(Crate.of(settings, contents, facts())));
    }

    private static byte[] utf8(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    private void file(String path, String name, String description, byte[] bytes) throws IOException {
        Layout.write(data, path, bytes);
        names.put(path, name);
        descriptions.put(path, description);
    }

    private void records() throws IOException, ProblemException, StoppedException {
        List<LineageRecord> records = contents.lineage().records();
        for (int i = 0; i < records.size(); i++) {
            work.check();
            work.progress(i, records.size(), "records");
            LineageRecord record = records.get(i);
            stored(
                    record.fingerprint(),
                    "head of " + record.label(),
                    record.title().text());
            parts(record, record.view().head().parts(), "part ");
            parts(record, record.view().head().sealed(), "sealed part ");
            for (PayloadReference payload : record.view().head().payloads()) {
                String path = Layout.payload(payload.sha256());
                if (!names.containsKey(path)) {
                    file(
                            path,
                            payload.name() + " of " + record.label(),
                            "payload, form " + payload.form(),
                            record.view().payload(payload.name()));
                }
            }
        }
    }

    private void parts(LineageRecord record, Map<String, Hash> parts, String words) throws IOException {
        for (Map.Entry<String, Hash> part : parts.entrySet()) {
            // a part that is not at hand was withheld or purged: its hash in the head says so, and check names it
            if (archive.stored(part.getValue()).isPresent()) {
                stored(part.getValue(), words + part.getKey() + " of " + record.label(), "part of a record");
            }
        }
    }

    private void stored(Hash hash, String name, String description) throws IOException {
        String path = Layout.record(hash);
        if (!names.containsKey(path)) {
            byte[] bytes = archive.stored(hash)
                    .orElseThrow(() -> new IllegalStateException("a record at hand has no stored head: " + hash));
            file(path, name, description.isBlank() ? "head of a record" : description, bytes);
        }
    }

    private void rawFiles() throws IOException, ProblemException, StoppedException {
        int done = 0;
        for (Hash raw : contents.lineage().rawFiles().keySet()) {
            work.check();
            work.progress(done++, contents.lineage().rawFiles().size(), "raw files");
            try (InputStream bytes = archive.raw(raw).orElseThrow(() -> missing(raw))) {
                Layout.write(data, Layout.raw(raw), bytes);
            }
            names.put(Layout.raw(raw), "raw file " + raw.shortForm());
            descriptions.put(Layout.raw(raw), "bytes as the instrument wrote them");
        }
    }

    private static ProblemException missing(Hash raw) {
        return new ProblemException(new Problem(
                "bundle.raw-missing",
                "A raw file that a record was made from is not at hand.",
                raw.hex(),
                "Run check on the archive; restore the file, or leave out what rests on it. No bundle was written."));
    }

    private void schemas() throws IOException {
        SortedMap<String, RecordKind> used = new TreeMap<>();
        for (LineageRecord record : contents.lineage().records()) {
            archive.kinds()
                    .get(record.view().head().kind())
                    .ifPresent(kind ->
                            used.put(kind.kind() + "-" + record.view().head().schema(), kind));
        }
        for (Map.Entry<String, RecordKind> each : used.entrySet()) {
            int number = Integer.parseInt(each.getKey().substring(each.getKey().lastIndexOf('-') + 1));
            file(
                    Layout.SCHEMAS + "/" + each.getKey() + ".schema.json",
                    "schema of " + each.getValue().kind(),
                    "JSON Schema, draft 2020-12: one member per part",
                    PrettyJson.write(each.getValue().jsonSchema(number)));
        }
    }

    private List<String> pictures() throws IOException {
        List<String> paths = new ArrayList<>();
        for (Hash root : contents.lineage().roots()) {
            LineageRecord record = contents.lineage().record(root).orElseThrow();
            RecordKind kind = archive.kinds().get(record.view().head().kind()).orElse(null);
            List<Picture> drawings = kind == null ? List.of() : kind.drawings(record.view(), record.inputs());
            for (int i = 0; i < drawings.size(); i++) {
                String base = Layout.PICTURES + "/"
                        + record.label().toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-")
                        + (drawings.size() == 1 ? "" : "-" + (i + 1));
                for (PictureFiles.Form form : PictureFiles.Form.values()) {
                    String path = base + "." + form.ending();
                    file(
                            path,
                            record.label(),
                            "drawn from records/" + root.hex(),
                            PictureFiles.write(drawings.get(i), form));
                    paths.add(path);
                }
            }
        }
        return paths;
    }

    private JsonObject origin() {
        return JsonObject.EMPTY
                .with("fringekeep", "origin/1")
                .with("archive", archive.facts().id().hex())
                .with("title", archive.facts().title())
                .with(
                        "invented",
                        new fringekeep.archive.json.JsonBoolean(archive.facts().invented()))
                .with("n", archive.facts().watermark())
                .with("sha256", archive.journalHead().hex())
                .with(
                        "roots",
                        JsonArray.ofTexts(contents.lineage().roots().stream()
                                .map(Hash::hex)
                                .toList()));
    }

    private JsonObject dataPackage(List<Table> tables) throws IOException {
        List<Json> resources = new ArrayList<>();
        for (Table table : tables) {
            byte[] csv = Files.readAllBytes(data.resolve(table.path()));
            resources.add(table.resource(csv, Hash.of(csv).hex()));
        }
        List<Json> contributors = settings.authors().stream()
                .<Json>map(author ->
                        JsonObject.EMPTY.with("title", author.name()).with("roles", JsonArray.of(Json.of("author"))))
                .toList();
        return JsonObject.EMPTY
                .with("$schema", "https://datapackage.org/profiles/2.0/datapackage.json")
                .with("name", settings.name())
                .with("title", settings.title())
                .with("description", settings.description())
                .with("created", settings.published() + "T00:00:00Z")
                .with("keywords", JsonArray.ofTexts(settings.keywords()))
                .with("contributors", new JsonArray(contributors))
                .with(
                        "licenses",
                        JsonArray.of(JsonObject.EMPTY
                                .with("name", settings.license().identifier())
                                .with("title", settings.license().title())
                                .with("path", settings.license().address())))
                .with("resources", new JsonArray(resources));
    }

    private SortedMap<String, Crate.FileFacts> facts() throws IOException {
        SortedMap<String, Crate.FileFacts> facts = new TreeMap<>();
        for (Map.Entry<String, String> each : names.entrySet()) {
            Path file = data.resolve(each.getKey());
            String sum = Bag.checksums(file).get("sha256");
            facts.put(
                    each.getKey(),
                    new Crate.FileFacts(
                            each.getValue(),
                            descriptions.getOrDefault(each.getKey(), each.getValue()),
                            format(each.getKey()),
                            Files.size(file),
                            java.util.Objects.requireNonNull(sum)));
        }
        return facts;
    }

    private static String format(String path) {
        if (path.startsWith(Layout.RECORDS + "/") || path.endsWith(".json")) {
            return "application/json";
        }
        String ending = path.substring(path.lastIndexOf('.') + 1);
        return switch (ending) {
            case "csv" -> "text/csv";
            case "svg" -> "image/svg+xml";
            case "pdf" -> "application/pdf";
            case "png" -> "image/png";
            case "md" -> "text/markdown";
            case "txt" -> "text/plain";
            case "cff" -> "application/yaml";
            default -> "application/octet-stream";
        };
    }
}
