package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.graph.Cause;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Commands about single records of any kind. */
@Command(name = Main.NAME)
final class RecordCommands {
    private final Console console;

    RecordCommands(Console console) {
        this.console = console;
    }

    @Command(
            name = "record",
            description = "Records what JSON documents say: new, correcting (\"corrects\") or continuing (\"after\").",
            mixinStandardHelpOptions = true,
            footer = {
                "",
                "A document: {\"kind\", \"content\" or \"choices\", \"about\"?, \"inputs\"?, \"corrects\"?, \"after\"?, \"remark\"?}.",
                "Quantities may be written as text: \"266.0(1) nm\". See fringekeep-headless schema KIND."
            })
    int record(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--person", paramLabel = "NAME", description = "Who enters.") @Nullable String person,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Parameters(arity = "1..*", paramLabel = "FILE", description = "Documents; - is the input stream.")
                    List<Path> files)
            throws ProblemException, StoppedException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            Entering entering = new Entering(
                    session.archive(),
                    session.archive()::find,
                    name -> session.person(name).orElseThrow(),
                    Path.of(""));
            List<Json> recorded = new ArrayList<>();
            for (Path file : files) {
                work.check();
                Entering.Done done = entered(entering, session, file, person, work);
                console.problems(done.questions());
                recorded.add(recordedJson(done.recorded()));
                if (!json) {
                    console.line(done.recorded().label() + "  "
                            + done.recorded().fingerprint().shortForm() + "  "
                            + done.recorded().fingerprint());
                }
            }
            if (json) {
                console.json(new JsonArray(recorded));
            }
            return Exit.DONE;
        }
    }

    private static Entering.Done entered(
            Entering entering, Session session, Path file, @Nullable String person, StoppableWork work)
            throws ProblemException, StoppedException {
        JsonDocument document = Documents.read(file);
        try {
            return entering.enter(document, session.person(person), work);
        } catch (ProblemException e) {
            throw new ProblemException(e.problems().stream()
                    .map(problem -> problem.at(file + ": " + problem.where()))
                    .toList());
        }
    }

    private static JsonObject recordedJson(Archive.Recorded recorded) {
        return JsonObject.EMPTY
                .with("record", recorded.fingerprint().hex())
                .with("label", recorded.label())
                .with("entry", recorded.n())
                .with("at", recorded.at().toString());
    }

    @Command(
            name = "show",
            description = "Shows records: parts, inputs, state and why.",
            mixinStandardHelpOptions = true)
    int show(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "Records.") List<String> references)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            List<Json> shown = new ArrayList<>();
            for (Hash record : session.find(references)) {
                shown.add(shown(session.archive(), record));
                if (!json) {
                    text(session.archive(), record);
                }
            }
            if (json) {
                console.json(new JsonArray(shown));
            }
            return Exit.DONE;
        }
    }

    private static Title title(Archive archive, Hash record, RecordView view) {
        return archive.kinds()
                .get(view.head().kind())
                .map(kind -> kind.title(view, archive.inputs(record)))
                .orElse(new Title(view.head().kind().text(), ""));
    }

    private void text(Archive archive, Hash record) {
        RecordView view = archive.record(record).orElseThrow();
        Title title = title(archive, record, view);
        console.line(archive.label(record) + "  " + record.shortForm() + "  " + title.text());
        if (!title.detail().isEmpty()) {
            console.line("  " + title.detail());
        }
        archive.graph()
                .states(record)
                .forEach(state -> console.line("  " + state.name().toLowerCase(Locale.ROOT)));
        for (Cause cause : archive.graph().causes(record)) {
            console.line("  " + LineageCommands.words(archive, cause));
        }
        for (PartName part : PartName.values()) {
            view.part(part).ifPresent(value -> {
                console.line("  " + part.text());
                console.json(value);
            });
            if (view.withheld(part)) {
                console.line("  " + part.text() + " is withheld");
            }
        }
    }

    private static JsonObject shown(Archive archive, Hash record) {
        RecordView view = archive.record(record).orElseThrow();
        Title title = title(archive, record, view);
        JsonObject object = JsonObject.EMPTY
                .with("record", record.hex())
                .with("label", archive.label(record))
                .with("kind", view.head().kind().text())
                .with("title", title.text())
                .with("detail", title.detail())
                .with(
                        "states",
                        JsonArray.ofTexts(archive.graph().states(record).stream()
                                .sorted()
                                .map(state -> state.name().toLowerCase(Locale.ROOT))
                                .toList()))
                .with(
                        "causes",
                        JsonArray.ofTexts(archive.graph().causes(record).stream()
                                .map(cause -> LineageCommands.words(archive, cause))
                                .toList()));
        for (PartName part : PartName.values()) {
            object = object.with(part.text(), view.part(part));
        }
        return object;
    }

    @Command(
            name = "list",
            description = "Lists records of a kind with the columns of its table.",
            mixinStandardHelpOptions = true)
    int list(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON with SI values.") boolean json,
            @Option(
                            names = "--limit",
                            defaultValue = "100",
                            paramLabel = "ROWS",
                            description = "Rows at most (${DEFAULT-VALUE} when not given).")
                    int limit,
            @Option(names = "--all", description = "Also records that were corrected.") boolean all,
            @Option(names = "--word", paramLabel = "WORD", description = "Found by this word; may be repeated.")
                    @Nullable
                    List<String> words,
            @Option(
                            names = "--where",
                            paramLabel = "COLUMN=TEXT",
                            description = "Only rows with this text; may be repeated.")
                    @Nullable
                    Map<String, String> where,
            @Option(names = "--linked-with", paramLabel = "RECORD", description = "Only records linked with this one.")
                    @Nullable
                    String linked,
            @Parameters(paramLabel = "KIND", description = "Such as scan or fit.") String kind)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            Projection projection = projection(session.archive(), kind);
            List<Listing.Filter> filters = new ArrayList<>();
            new java.util.TreeMap<>(where == null ? Map.<String, String>of() : where)
                    .forEach((column, text) -> filters.add(new Listing.Filter(column, Listing.Comparison.IS, text)));
            Optional<Hash> with = linked == null
                    ? Optional.empty()
                    : Optional.of(session.archive().find(linked));
            Listing listing = new Listing(
                    projection.name(),
                    filters,
                    !all,
                    words == null ? List.of() : words,
                    with,
                    "n",
                    false,
                    Optional.empty(),
                    Math.max(1, Math.min(10_000, limit)));
            Page page = session.archive().list(listing);
            if (json) {
                console.json(rowsJson(page));
            } else {
                rows(projection, page);
            }
            return Exit.DONE;
        }
    }

    private static Projection projection(Archive archive, String kind) throws ProblemException {
        for (RecordKind each : archive.kinds().all()) {
            if (each.kind().text().equals(kind)) {
                return each.projections().get(0);
            }
        }
        throw noKind(archive.kinds().all(), kind);
    }

    private static ProblemException noKind(List<RecordKind> kinds, String kind) {
        return new ProblemException(new Problem(
                "command.kind",
                "There is no kind \"" + kind + "\".",
                "",
                "Name one of: "
                        + String.join(
                                ", ",
                                kinds.stream().map(each -> each.kind().text()).toList())
                        + "."));
    }

    private static JsonArray rowsJson(Page page) {
        return new JsonArray(page.rows().stream()
                .<Json>map(line -> {
                    JsonObject row =
                            JsonObject.EMPTY.with("record", line.record().hex()).with("label", line.label());
                    for (Map.Entry<String, Object> cell : line.row().values().entrySet()) {
                        row = row.with(cell.getKey(), cell(cell.getValue()));
                    }
                    return row;
                })
                .toList());
    }

    private static Json cell(Object value) {
        if (value instanceof Number number) {
            return Json.of(number.doubleValue());
        }
        return value instanceof Boolean flag ? new JsonBoolean(flag) : Json.of(value.toString());
    }

    private void rows(Projection projection, Page page) {
        List<String> heads = new ArrayList<>(List.of("record"));
        for (Column column : projection.columns()) {
            boolean unit = !column.shownUnit().isEmpty() && !column.shownUnit().equals("1");
            heads.add(column.label()
                    + (unit ? " / " + Units.of(column.shownUnit()).shown() : ""));
        }
        List<List<String>> rows = new ArrayList<>();
        for (Page.Line line : page.rows()) {
            List<String> row = new ArrayList<>(List.of(line.label()));
            for (Column column : projection.columns()) {
                row.add(shown(column, line.row().values().get(column.name())));
            }
            rows.add(row);
        }
        console.table(heads, rows);
        console.line(page.rows().size() + " rows" + (page.last().isPresent() ? ", more with --limit" : ""));
    }

    private static String shown(Column column, @Nullable Object value) {
        if (value == null) {
            return "\u2013";
        }
        if (value instanceof Double number) {
            boolean deviation = !column.deviationOf().isEmpty();
            double shown = deviation
                    ? Units.of(column.shownUnit()).differenceFromSi(number)
                    : Units.of(column.shownUnit()).fromSi(number);
            return String.format(Locale.ROOT, deviation ? "%.2g" : "%.6g", shown);
        }
        return value instanceof Hash hash ? hash.shortForm() : value.toString();
    }

    @Command(
            name = "schema",
            description = "Prints the JSON Schema of a kind, or lists the kinds.",
            mixinStandardHelpOptions = true)
    int schema(
            @Option(names = "--number", description = "Schema number; the newest when not given.") @Nullable
                    Integer number,
            @Parameters(arity = "0..1", paramLabel = "KIND", description = "Such as setup.") @Nullable String kind)
            throws ProblemException {
        List<RecordKind> kinds = Session.kinds().all();
        if (kind == null) {
            kinds.forEach(each -> console.line(each.kind() + "  " + each.schema()));
            return Exit.DONE;
        }
        RecordKind found = kinds.stream()
                .filter(each -> each.kind().text().equals(kind))
                .findFirst()
                .orElseThrow(() -> noKind(kinds, kind));
        console.json(found.jsonSchema(number == null ? found.schema() : number));
        return Exit.DONE;
    }

    @Command(
            name = "judge",
            description = "Withdraws, masks, doubts or restores records with a reason; nothing is lost.",
            mixinStandardHelpOptions = true)
    int judge(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--person", required = true, paramLabel = "NAME", description = "Who judges.")
                    String person,
            @Option(
                            names = "--verdict",
                            required = true,
                            paramLabel = "VERDICT",
                            description = "withdrawn, masked, doubted, restored or preferred.")
                    String verdict,
            @Option(
                            names = "--reason",
                            required = true,
                            paramLabel = "CODE",
                            description = "Code of the reason, such as mode-hop; see schema judgement.")
                    String reason,
            @Option(names = "--words", paramLabel = "TEXT", description = "The reason in words.") @Nullable
                    String words,
            @Option(names = "--channel", paramLabel = "NAME", description = "With masked: which channel.") @Nullable
                    String channel,
            @Option(
                            names = "--points",
                            paramLabel = "FIRST-LAST",
                            description = "With masked: rows from 0; may be repeated.")
                    @Nullable
                    List<String> points,
            @Option(
                            names = "--over",
                            paramLabel = "RECORD",
                            description = "With preferred: passed over; may be repeated.")
                    @Nullable
                    List<String> over,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "What is judged.") List<String> references)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            JsonObject content = JsonObject.EMPTY
                    .with("verdict", verdict)
                    .with("reason", reason)
                    .with("channel", Optional.ofNullable(channel).map(Json::of));
            if (points != null) {
                content = content.with("points", ranges(points));
            }
            String role =
                    switch (verdict) {
                        case "restored" -> "undoes";
                        case "preferred" -> "chosen";
                        default -> "target";
                    };
            List<AboutReference> about = new ArrayList<>();
            for (Hash record : session.find(references)) {
                about.add(new AboutReference(role, record, AboutReference.Reach.RECORD));
            }
            for (Hash record : session.find(over == null ? List.of() : over)) {
                about.add(new AboutReference("over", record, AboutReference.Reach.RECORD));
            }
            Map<PartName, JsonObject> parts = new HashMap<>();
            parts.put(PartName.CONTENT, content);
            if (words != null) {
                parts.put(PartName.REMARK, JsonObject.EMPTY.with("text", words));
            }
            Archive.Recorded recorded = session.archive()
                    .record(new NewRecord(
                            new KindName("judgement"),
                            List.of(),
                            about,
                            parts,
                            List.of(),
                            Optional.empty(),
                            Optional.empty(),
                            session.person(person)));
            RecordedText.write(console, session.archive(), List.of(recorded.fingerprint()), json);
            return Exit.DONE;
        }
    }

    private static JsonArray ranges(List<String> points) throws ProblemException {
        List<Json> ranges = new ArrayList<>();
        for (String range : points) {
            if (!range.matches("[0-9]{1,9}(-[0-9]{1,9})?")) {
                throw new ProblemException(new Problem(
                        "command.points",
                        "\"" + range + "\" is no range of rows.",
                        "--points",
                        "Write 14-27, or 3 for one row; rows count from 0. Nothing has been stored."));
            }
            String[] ends = range.split("-");
            ranges.add(JsonArray.ofNumbers(Double.parseDouble(ends[0]), Double.parseDouble(ends[ends.length - 1])));
        }
        return new JsonArray(ranges);
    }
}
