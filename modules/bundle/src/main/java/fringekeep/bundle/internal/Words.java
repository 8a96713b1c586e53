package fringekeep.bundle.internal;

import fringekeep.bundle.stated.Author;
import fringekeep.bundle.stated.BundleSettings;
import java.util.List;
import java.util.Optional;

/** The files of a bundle that people read: how to check it, how to cite it, under which licence it stands. */
final class Words {
    private Words() {}

    static String readme(BundleSettings settings, Contents contents, List<Table> tables, List<String> pictures) {
        StringBuilder text = new StringBuilder();
        text.append("# ")
                .append(settings.title())
                .append("\n\n")
                .append(settings.description())
                .append("\n\n");
        text.append("Licence: ")
                .append(settings.license().identifier())
                .append(" (")
                .append(settings.license().address())
                .append("). Published ")
                .append(settings.published())
                .append(".\n\n");
        text.append("## How to check it with tools you have\n\n");
        text.append("In the folder that holds bagit.txt:\n\n");
        text.append("    sha256sum -c --quiet manifest-sha256.txt\n");
        text.append("    sha512sum -c --quiet manifest-sha512.txt tagmanifest-sha512.txt\n\n");
        text.append("Every file in records, payloads and raw is named by the SHA-256 of its bytes, so in data:\n\n");
        text.append(
                "    for f in records/* payloads/* raw/*; do echo \"${f##*/}  $f\"; done | sha256sum -c --quiet\n\n");
        text.append(
                        "Lineage rests on nothing else: a record's head names by hash its parts, its payloads and what it was\n")
                .append("made from. Start at a root below, open records/<hash>, and follow `inputs`.\n\n");
        text.append("## What was asked for\n\n");
        contents.lineage()
                .roots()
                .forEach(root -> contents.lineage()
                        .record(root)
                        .ifPresent(record -> text.append("- ")
                                .append(record.label())
                                .append(": ")
                                .append(record.title().text())
                                .append(", records/")
                                .append(root.hex())
                                .append('\n')));
        pictures.forEach(path -> text.append("- ").append(path).append('\n'));
        text.append("\n## What stands where\n\n");
        text.append("- records: heads and parts of ")
                .append(contents.lineage().records().size())
                .append(" records\n");
        text.append("- raw: ")
                .append(contents.lineage().rawFiles().size())
                .append(" files as the instruments wrote them\n");
        text.append("- payloads: tables of numbers that records carry\n");
        text.append("- schemas: JSON Schema of each kind of record\n");
        text.append("- provenance/prov.json: the lineage as PROV-JSON\n");
        text.append("- datapackage.json describes the tables (columns, SI units as UCUM codes, keys):\n");
        tables.forEach(table -> text.append("  - ")
                .append(table.path())
                .append(": ")
                .append(table.title())
                .append('\n'));
        if (!contents.lineage().absent().isEmpty()) {
            text.append("\nNamed but not in this dataset (spoken of, nothing was made from them):\n\n");
            contents.lineage()
                    .absent()
                    .forEach(absent -> text.append("- ").append(absent.hex()).append('\n'));
        }
        text.append("\nSpreadsheets: open the tables as text with a decimal point; no cell is a formula.\n");
        return text.toString();
    }

    /**
     * CITATION.cff with every scalar in single quotes, which YAML reads as text whatever stands in it.
     *
     * <p>Source: Citation File Format 1.2.0, schema guide.
     */
    static String citation(BundleSettings settings) {
        StringBuilder text = new StringBuilder("cff-version: 1.2.0\n");
        text.append("message: 'If you use these data, cite them as below.'\n");
        text.append("type: dataset\n");
        text.append("title: ").append(yaml(settings.title())).append('\n');
        text.append("abstract: ").append(yaml(settings.description())).append('\n');
        text.append("authors:\n");
        for (Author author : settings.authors()) {
            text.append("  - name: ").append(yaml(author.name())).append('\n');
            orcid(author)
                    .ifPresent(orcid ->
                            text.append("    orcid: ").append(yaml(orcid)).append('\n'));
        }
        text.append("license: ").append(settings.license().identifier()).append('\n');
        text.append("date-released: ")
                .append(yaml(settings.published().toString()))
                .append('\n');
        if (!settings.keywords().isEmpty()) {
            text.append("keywords:\n");
            settings.keywords()
                    .forEach(word -> text.append("  - ").append(yaml(word)).append('\n'));
        }
        return text.toString();
    }

    private static Optional<String> orcid(Author author) {
        return author.orcid().map(orcid -> "https://orcid.org/" + orcid);
    }

    private static String yaml(String text) {
        return "'" + text.replace("'", "''").replaceAll("\\s+", " ") + "'";
    }

    static String license(BundleSettings settings) {
        return settings.license().title() + "\nSPDX identifier: "
                + settings.license().identifier() + "\n"
                + "The text of the licence: " + settings.license().address() + "\n"
                + "It applies to all data in this folder.\n";
    }

    static String preview(BundleSettings settings, Contents contents, List<Table> tables) {
        StringBuilder text =
                new StringBuilder("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n<title>");
        text.append(html(settings.title()))
                .append("</title>\n</head>\n<body>\n<h1>")
                .append(html(settings.title()));
        text.append("</h1>\n<p>").append(html(settings.description())).append("</p>\n<dl>\n");
        entry(text, "published", settings.published().toString());
        entry(text, "licence", settings.license().title());
        entry(text, "publisher", settings.publisher());
        entry(
                text,
                "authors",
                String.join(", ", settings.authors().stream().map(Author::name).toList()));
        entry(text, "records", Integer.toString(contents.lineage().records().size()));
        entry(text, "raw files", Integer.toString(contents.lineage().rawFiles().size()));
        text.append("</dl>\n<ul>\n<li><a href=\"README.md\">README.md</a></li>\n");
        tables.forEach(table -> text.append("<li><a href=\"")
                .append(table.path())
                .append("\">")
                .append(html(table.title()))
                .append("</a></li>\n"));
        return text.append("</ul>\n</body>\n</html>\n").toString();
    }

    private static void entry(StringBuilder text, String term, String value) {
        text.append("<dt>").append(term).append("</dt><dd>").append(html(value)).append("</dd>\n");
    }

    private static String html(String text) {
        return text.replace("&", "&amp;")
                .replace("<", "&lt;")
                .replace(">", "&gt;")
                .replace("\"", "&quot;");
    }
}
