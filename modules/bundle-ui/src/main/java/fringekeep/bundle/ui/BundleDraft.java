package fringekeep.bundle.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.bundle.stated.Author;
import fringekeep.bundle.stated.BundleSettings;
import fringekeep.bundle.stated.License;
import fringekeep.desk.look.Texts;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * What is typed about a dataset, as it is typed, with what is wrong at each field.
 *
 * @param name folder's name
 * @param title title
 * @param description one paragraph
 * @param published day of publication, YYYY-MM-DD
 * @param license SPDX identifier
 * @param publisher who answers for it
 * @param keywords with commas between
 * @param authors at least one
 * @param into folder it is written into
 * @param zip whether as one file
 */
record BundleDraft(
        String name,
        String title,
        String description,
        String published,
        String license,
        String publisher,
        String keywords,
        List<Writer> authors,
        String into,
        boolean zip) {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", BundleDraft.class);

    /** Copies. */
    BundleDraft {
        authors = List.copyOf(authors);
    }

    /** An author as typed. */
    record Writer(String name, String orcid, String affiliation) {
        boolean empty() {
            return (name + orcid + affiliation).isBlank();
        }
    }

    /** What is wrong, by field: name, title, …, into, author.0, author.0.orcid. Empty when it can be exported. */
    Map<String, String> faults() {
        Map<String, String> faults = new TreeMap<>();
        if (!name.matches("[a-z0-9][a-z0-9-]{0,59}")) {
            faults.put("name", TEXTS.of("fault.name"));
        }
        require(faults, "title", title);
        require(faults, "description", description);
        require(faults, "publisher", publisher);
        require(faults, "into", into);
        if (day().isEmpty()) {
            faults.put("published", TEXTS.of("fault.published"));
        }
        if (License.of(license).isEmpty()) {
            faults.put("license", TEXTS.of("fault.license"));
        }
        if (authors.stream().allMatch(Writer::empty)) {
            faults.put("author.0", TEXTS.of("fault.authors"));
        }
        for (int i = 0; i < authors.size(); i++) {
            Writer writer = authors.get(i);
            if (!writer.empty() && writer.name().isBlank()) {
                faults.put("author." + i, TEXTS.of("fault.author"));
            }
            if (!writer.orcid().isBlank() && !Author.isOrcid(writer.orcid().strip())) {
                faults.put("author." + i + ".orcid", TEXTS.of("fault.orcid"));
            }
        }
        return faults;
    }

    private static void require(Map<String, String> faults, String field, String text) {
        if (text.isBlank()) {
            faults.put(field, TEXTS.of("fault.empty"));
        }
    }

    private Optional<LocalDate> day() {
        try {
            return Optional.of(LocalDate.parse(published.strip()));
        } catch (DateTimeParseException e) {
            return Optional.empty(); // said at the field
        }
    }

    /** The settings; only without faults. */
    BundleSettings settings() {
        return new BundleSettings(
                name,
                title.strip(),
                description.strip(),
                day().orElseThrow(),
                License.of(license).orElseThrow(),
                authors.stream()
                        .filter(writer -> !writer.empty())
                        .map(BundleDraft::author)
                        .toList(),
                publisher.strip(),
                Arrays.stream(keywords.split(","))
                        .map(String::strip)
                        .filter(word -> !word.isEmpty())
                        .toList());
    }

    private static Author author(Writer writer) {
        return new Author(writer.name().strip(), stated(writer.orcid()), stated(writer.affiliation()));
    }

    private static Optional<String> stated(String text) {
        return text.isBlank() ? Optional.empty() : Optional.of(text.strip());
    }

    /** As it is kept. */
    JsonObject json() {
        List<Json> writers = authors.stream()
                .<Json>map(writer -> JsonObject.EMPTY
                        .with("name", writer.name())
                        .with("orcid", writer.orcid())
                        .with("affiliation", writer.affiliation()))
                .toList();
        return JsonObject.EMPTY
                .with("kind", "bundle")
                .with("name", name)
                .with("title", title)
                .with("description", description)
                .with("published", published)
                .with("license", license)
                .with("publisher", publisher)
                .with("keywords", keywords)
                .with("authors", new JsonArray(writers))
                .with("into", into)
                .with("form", zip ? "zip" : "folder");
    }

    /**
     * As it was kept; fields that are missing stay as they are here. Of a draft that was kept for another record only what
     * is said about any dataset is taken: authors, licence, publisher, place.
     *
     * @param root the record that is exported, in hexadecimal digits
     */
    BundleDraft taking(JsonObject kept, String root) {
        boolean same = kept.text("root").filter(root::equals).isPresent();
        JsonObject own = same
                ? kept
                : kept.without("name")
                        .without("title")
                        .without("description")
                        .without("published")
                        .without("keywords");
        return taking(own);
    }

    private BundleDraft taking(JsonObject kept) {
        List<Writer> writers = new ArrayList<>();
        for (JsonObject each : kept.array("authors").objects()) {
            writers.add(new Writer(
                    each.text("name").orElse(""),
                    each.text("orcid").orElse(""),
                    each.text("affiliation").orElse("")));
        }
        return new BundleDraft(
                kept.text("name").orElse(name),
                kept.text("title").orElse(title),
                kept.text("description").orElse(description),
                kept.text("published").orElse(published),
                kept.text("license").orElse(license),
                kept.text("publisher").orElse(publisher),
                kept.text("keywords").orElse(keywords),
                writers.isEmpty() ? authors : writers,
                kept.text("into").orElse(into),
                kept.text("form").map("zip"::equals).orElse(zip));
    }
}
