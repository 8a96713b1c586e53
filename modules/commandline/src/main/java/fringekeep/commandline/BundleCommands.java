package fringekeep.commandline;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.BundleReport;
import fringekeep.bundle.CheckBundle;
import fringekeep.bundle.ExportBundle;
import fringekeep.bundle.Level;
import fringekeep.bundle.stated.Author;
import fringekeep.bundle.stated.BundleSettings;
import fringekeep.bundle.stated.License;
import java.nio.file.Path;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Commands that write a dataset for strangers and check one. */
@Command(name = Main.NAME)
final class BundleCommands {
    private final Console console;

    BundleCommands(Console console) {
        this.console = console;
    }

    @Command(
            name = "bundle",
            description = "Exports records with everything they rest on as a dataset that strangers check.",
            mixinStandardHelpOptions = true,
            footer = {
                "",
                "The settings are a JSON document: name, title, description, published (YYYY-MM-DD), license",
                "(CC-BY-4.0, CC0-1.0, ODC-By-1.0 or ODbL-1.0), publisher, authors [{name, orcid?, affiliation?}], keywords."
            })
    int bundle(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(
                            names = "--settings",
                            required = true,
                            paramLabel = "FILE",
                            description = "What people state about it.")
                    Path settings,
            @Option(names = "--into", required = true, paramLabel = "FOLDER", description = "Where it goes.") Path into,
            @Option(names = "--zip", description = "As one zip file instead of a folder.") boolean zip,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "What the dataset is for.")
                    List<String> references)
            throws ProblemException, StoppedException {
        BundleSettings stated = settings(settings);
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            List<Hash> roots = session.find(references);
            ExportBundle.Exported exported = ExportBundle.export(session.archive(), roots, stated, into, zip, work);
            if (json) {
                console.json(JsonObject.EMPTY
                        .with("place", exported.place().toString())
                        .with("records", exported.records())
                        .with("rawFiles", exported.rawFiles())
                        .with("absent", exported.absent()));
            } else {
                console.line(exported.place() + ": " + exported.records() + " records, " + exported.rawFiles()
                        + " raw files" + (exported.absent() == 0 ? "" : ", " + exported.absent() + " only named"));
            }
            return Exit.DONE;
        }
    }

    @Command(
            name = "check-bundle",
            description = "Says at which level a bundle holds, and names what is wrong. Needs no archive.",
            mixinStandardHelpOptions = true)
    int checkBundle(
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(
                            names = "--level",
                            defaultValue = "RECOMPUTED",
                            description =
                                    "How far to check: files_intact, metadata_valid, lineage_follows, recomputed.")
                    Level level,
            @Parameters(paramLabel = "BUNDLE", description = "Folder or zip.") Path bundle)
            throws ProblemException, StoppedException {
        try (StoppableWork work = new StoppableWork(console, !json)) {
            BundleReport report = CheckBundle.check(bundle, Session.kinds(), level, work);
            if (json) {
                console.json(reportJson(report));
            } else {
                console.line("holds: " + report.level().words());
                console.line(report.records() + " records");
                report.recomputed().forEach((verdict, count) -> console.line("  " + verdict + "  " + count));
                report.notes().forEach(console::line);
                console.problems(report.allFaults());
            }
            return report.level().compareTo(level) >= 0 ? Exit.DONE : Exit.COULD_NOT;
        }
    }

    private static JsonObject reportJson(BundleReport report) {
        JsonObject recomputed = JsonObject.EMPTY;
        for (var each : report.recomputed().entrySet()) {
            recomputed = recomputed.with(each.getKey().replace(' ', '-'), each.getValue());
        }
        return JsonObject.EMPTY
                .with("level", report.level().words())
                .with("records", report.records())
                .with("recomputed", recomputed)
                .with("notes", JsonArray.ofTexts(report.notes()))
                .with("faults", Console.problemsJson(report.allFaults()));
    }

    private static BundleSettings settings(Path file) throws ProblemException {
        JsonDocument document = Documents.read(file);
        if (!(document.value() instanceof JsonObject object)) {
            throw wrong(file, "", "The settings are not a JSON object.");
        }
        License license = License.of(text(file, object, "license"))
                .orElseThrow(() -> wrong(file, "/license", "The licence is none of those offered."));
        try {
            return new BundleSettings(
                    text(file, object, "name"),
                    text(file, object, "title"),
                    text(file, object, "description"),
                    LocalDate.parse(text(file, object, "published")),
                    license,
                    authors(file, object),
                    text(file, object, "publisher"),
                    object.array("keywords").texts());
        } catch (IllegalArgumentException | IllegalStateException | DateTimeException e) {
            throw wrong(file, "", String.valueOf(e.getMessage()));
        }
    }

    private static List<Author> authors(Path file, JsonObject object) throws ProblemException {
        List<Author> authors = new ArrayList<>();
        for (Json each : object.array("authors").items()) {
            if (!(each instanceof JsonObject author)) {
                throw wrong(file, "/authors", "An author is not an object with a name.");
            }
            authors.add(new Author(text(file, author, "name"), author.text("orcid"), author.text("affiliation")));
        }
        return authors;
    }

    private static String text(Path file, JsonObject object, String member) throws ProblemException {
        return object.text(member)
                .orElseThrow(() -> wrong(file, "/" + member, "The text \"" + member + "\" is missing."));
    }

    private static ProblemException wrong(Path file, String pointer, String what) {
        return new ProblemException(new Problem(
                "bundle.settings", what, file + pointer, "Mend the settings; see fringekeep-headless bundle --help."));
    }
}
