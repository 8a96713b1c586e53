package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.record.Hash;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureFiles;
import fringekeep.fit.FitScans;
import fringekeep.fit.UnfittedScans;
import fringekeep.property.GatherProperty;
import fringekeep.property.SelectFits;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.TakeInFiles;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Commands of the chain: files to scans, placements, fits, selections, properties, pictures. */
@Command(name = Main.NAME)
final class StageCommands {
    private final Console console;

    StageCommands(Console console) {
        this.console = console;
    }

    @Command(
            name = "take-in",
            description = "Takes raw files in by a reading profile; a bad file is refused whole and the others go on.",
            mixinStandardHelpOptions = true)
    int takeIn(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(
                            names = "--profile",
                            paramLabel = "RECORD",
                            description = "The reading profile; guessed when not given.")
                    @Nullable
                    String profile,
            @Option(names = "--person", paramLabel = "NAME", description = "Who takes them in.") @Nullable
                    String person,
            @Option(names = "--file-times", description = "Also record the time of each file.") boolean times,
            @Parameters(arity = "1..*", paramLabel = "FILE", description = "Files in the order of their numbers.")
                    List<Path> files)
            throws ProblemException {
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            Optional<Hash> by = profile == null
                    ? Optional.empty()
                    : Optional.of(session.archive().find(profile));
            List<TakeInFiles.FileOutcome> outcomes = new TakeInFiles(session.archive())
                    .takeIn(new TakeInFiles.Request(files, by, times, session.person(person)), work);
            if (json) {
                console.json(new JsonArray(outcomes.stream()
                        .<Json>map(outcome -> outcomeJson(session.archive(), outcome))
                        .toList()));
            } else {
                outcomes.forEach(outcome -> outcomeText(session.archive(), outcome));
            }
            return code(outcomes);
        }
    }

    private static int code(List<TakeInFiles.FileOutcome> outcomes) {
        if (outcomes.stream().anyMatch(each -> each.state() == TakeInFiles.State.STOPPED)) {
            return Exit.STOPPED;
        }
        return outcomes.stream().anyMatch(each -> each.state() == TakeInFiles.State.REFUSED)
                ? Exit.COULD_NOT
                : Exit.DONE;
    }

    private static String words(TakeInFiles.State state) {
        return state.name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }

    private void outcomeText(Archive archive, TakeInFiles.FileOutcome outcome) {
        List<String> scans = outcome.scans().stream().map(archive::label).toList();
        console.line(outcome.file() + "  " + words(outcome.state())
                + (scans.isEmpty() ? "" : "  " + String.join(", ", scans))
                + (outcome.findings().isEmpty() ? "" : "  findings: " + String.join(", ", outcome.findings())));
        console.problems(outcome.problems());
    }

    private static JsonObject outcomeJson(Archive archive, TakeInFiles.FileOutcome outcome) {
        return JsonObject.EMPTY
                .with("file", outcome.file().toString())
                .with("state", words(outcome.state()))
                .with("raw", outcome.raw().map(hash -> Json.of(hash.hex())))
                .with(
                        "scans",
                        JsonArray.ofTexts(
                                outcome.scans().stream().map(archive::label).toList()))
                .with("findings", JsonArray.ofTexts(outcome.findings()))
                .with("problems", Console.problemsJson(outcome.problems()));
    }

    @Command(
            name = "place",
            description = "Says where scans belong: setup, run, velocities, series step, purpose; many in one act.",
            mixinStandardHelpOptions = true)
    int place(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--person", required = true, paramLabel = "NAME", description = "Who places.")
                    String person,
            @Option(names = "--setup", required = true, paramLabel = "RECORD", description = "The setup.") String setup,
            @Option(names = "--run", paramLabel = "RECORD", description = "The source run.") @Nullable String run,
            @Option(names = "--velocity", paramLabel = "RECORD", description = "A velocity; may be repeated.") @Nullable
                    List<String> velocities,
            @Option(names = "--series", paramLabel = "RECORD", description = "The series.") @Nullable String series,
            @Option(
                            names = "--step",
                            paramLabel = "STEP",
                            description = "Its step, from 0, of the first scan; the next have the next steps.")
                    @Nullable
                    Integer step,
            @Option(
                            names = "--batch",
                            paramLabel = "RECORD",
                            description = "The batch, where the run names none or several.")
                    @Nullable
                    String batch,
            @Option(
                            names = "--purpose",
                            required = true,
                            paramLabel = "PURPOSE",
                            description = "signal, reference, background, laser-off, empty-beam, test.")
                    String purpose,
            @Parameters(arity = "1..*", paramLabel = "SCAN", description = "Scans in order.") List<String> scans)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            Archive archive = session.archive();
            Purpose meant = purpose(purpose);
            List<PlaceScans.Place> places = new ArrayList<>();
            for (int i = 0; i < scans.size(); i++) {
                places.add(new PlaceScans.Place(
                        archive.find(scans.get(i)),
                        meant,
                        archive.find(setup),
                        found(archive, run),
                        session.find(velocities == null ? List.of() : velocities),
                        found(archive, series),
                        step == null ? OptionalInt.empty() : OptionalInt.of(step + i),
                        found(archive, batch),
                        Optional.empty()));
            }
            List<Hash> placed =
                    new PlaceScans(archive).place(places, session.person(person).orElseThrow());
            RecordedText.write(console, archive, placed, json);
            return Exit.DONE;
        }
    }

    private static Optional<Hash> found(Archive archive, @Nullable String reference) throws ProblemException {
        return reference == null ? Optional.empty() : Optional.of(archive.find(reference));
    }

    static Purpose purpose(String word) throws ProblemException {
        return Purpose.of(word)
                .orElseThrow(() -> new ProblemException(new Problem(
                        "command.purpose",
                        "\"" + word + "\" is no purpose of a scan.",
                        "",
                        "Name one of: "
                                + String.join(
                                        ", ",
                                        Arrays.stream(Purpose.values())
                                                .map(Purpose::text)
                                                .toList())
                                + ". Nothing has been stored.")));
    }

    @Command(
            name = "fit",
            description = "Fits the fringe of scans, each by itself or together.",
            mixinStandardHelpOptions = true)
    int fit(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(
                            names = "--channel",
                            defaultValue = "counts",
                            paramLabel = "NAME",
                            description = "Channel that is fitted (${DEFAULT-VALUE} when not given).")
                    String channel,
            @Option(
                            names = "--choices",
                            paramLabel = "FILE",
                            description = "JSON object with choices; what is missing is written out.")
                    @Nullable
                    Path choices,
            @Option(
                            names = "--together",
                            description = "One fit of all scans (combine: sum, sum-after-phase or joint).")
                    boolean together,
            @Option(names = "--background", paramLabel = "SCAN", description = "A background scan; may be repeated.")
                    @Nullable
                    List<String> backgrounds,
            @Option(names = "--reference", paramLabel = "SCAN", description = "A reference scan; may be repeated.")
                    @Nullable
                    List<String> references,
            @Option(
                            names = "--notwithstanding",
                            paramLabel = "JUDGEMENT",
                            description = "Use a withdrawn scan in spite of it.")
                    @Nullable
                    List<String> notwithstanding,
            @Option(names = "--again", description = "Correct the fit that answers the same question.") boolean again,
            @Option(names = "--unfitted", description = "All placed signal and reference scans without a fit.")
                    boolean unfitted,
            @Parameters(arity = "0..*", paramLabel = "SCAN", description = "Scans.") @Nullable List<String> scans)
            throws ProblemException {
        JsonObject chosen = choices == null ? JsonObject.EMPTY : object(choices);
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            List<Hash> meant = unfitted
                    ? new UnfittedScans(session.archive())
                            .find(new UnfittedScans.Rule(
                                    Set.of(Purpose.SIGNAL, Purpose.REFERENCE),
                                    Optional.empty(),
                                    Optional.empty(),
                                    Optional.empty(),
                                    Optional.empty(),
                                    false))
                    : session.find(scans == null ? List.of() : scans);
            List<List<Hash>> groups =
                    together ? List.of(meant) : meant.stream().map(List::of).toList();
            List<Hash> background = session.find(backgrounds == null ? List.of() : backgrounds);
            List<Hash> reference = session.find(references == null ? List.of() : references);
            List<Hash> inSpite = session.find(notwithstanding == null ? List.of() : notwithstanding);
            List<FitScans.Request> requests = groups.stream()
                    .filter(group -> !group.isEmpty())
                    .map(group -> new FitScans.Request(group, channel, chosen, reference, background, inSpite, again))
                    .toList();
            List<FitScans.FitOutcome> outcomes =
                    new FitScans(session.archive()).fitEach(requests, Optional.empty(), work);
            fits(session.archive(), outcomes, json);
            return outcomes.stream().allMatch(each -> each.problems().isEmpty()) ? Exit.DONE : Exit.COULD_NOT;
        }
    }

    private static JsonObject object(Path file) throws ProblemException {
        if (Documents.read(file).value() instanceof JsonObject object) {
            return object;
        }
        throw new ProblemException(new Problem(
                "command.no-object", "The document is not a JSON object.", file.toString(), "Write { … }."));
    }

    private void fits(Archive archive, List<FitScans.FitOutcome> outcomes, boolean json) {
        List<Json> written = new ArrayList<>();
        for (FitScans.FitOutcome outcome : outcomes) {
            String scans = String.join(
                    ", ", outcome.request().scans().stream().map(archive::label).toList());
            if (json) {
                written.add(JsonObject.EMPTY
                        .with("scans", scans)
                        .with("fit", outcome.fit().map(fit -> Json.of(fit.hex())))
                        .with("label", outcome.fit().map(fit -> Json.of(archive.label(fit))))
                        .with("problems", Console.problemsJson(outcome.problems())));
            } else {
                outcome.fit()
                        .ifPresent(
                                fit -> console.line(archive.label(fit) + "  of " + scans + "  " + title(archive, fit)));
                console.problems(outcome.problems());
            }
        }
        if (json) {
            console.json(new JsonArray(written));
        }
    }

    private static String title(Archive archive, Hash record) {
        RecordView view = archive.record(record).orElseThrow();
        return archive.kinds()
                .get(view.head().kind())
                .map(kind -> kind.title(view, archive.inputs(record)).text())
                .orElse("");
    }

    @Command(
            name = "select",
            description = "Resolves a rule over the list of fits to a selection, with what is left out and why.",
            mixinStandardHelpOptions = true)
    int select(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--person", required = true, paramLabel = "NAME", description = "Who selects.")
                    String person,
            @Option(names = "--label", defaultValue = "", paramLabel = "TEXT", description = "A short name.")
                    String label,
            @Option(names = "--rule", required = true, paramLabel = "TEXT", description = "The rule in words.")
                    String rule,
            @Option(names = "--is", paramLabel = "COLUMN=TEXT", description = "A column's text; may be repeated.")
                    @Nullable
                    Map<String, String> is,
            @Option(
                            names = "--from",
                            paramLabel = "COLUMN=NUMBER",
                            description = "At least this (SI); may be repeated.")
                    @Nullable
                    Map<String, Double> from,
            @Option(
                            names = "--below",
                            paramLabel = "COLUMN=NUMBER",
                            description = "Less than this (SI); may be repeated.")
                    @Nullable
                    Map<String, Double> below)
            throws ProblemException {
        Set<String> columns = new HashSet<>();
        Map<String, String> texts = is == null ? Map.of() : is;
        Map<String, Double> least = from == null ? Map.of() : from;
        Map<String, Double> most = below == null ? Map.of() : below;
        columns.addAll(texts.keySet());
        columns.addAll(least.keySet());
        columns.addAll(most.keySet());
        List<SelectFits.Condition> conditions = new ArrayList<>();
        for (String column : new java.util.TreeSet<>(columns)) {
            conditions.add(new SelectFits.Condition(
                    column, Optional.ofNullable(texts.get(column)), number(least, column), number(most, column)));
        }
        try (Session session = Session.open(folder)) {
            NewRecord selection = new SelectFits(session.archive())
                    .select(label, rule, conditions, session.person(person).orElseThrow());
            Archive.Recorded recorded = session.archive().record(selection);
            RecordedText.write(console, session.archive(), List.of(recorded.fingerprint()), json);
            return Exit.DONE;
        }
    }

    private static OptionalDouble number(Map<String, Double> map, String key) {
        Double value = map.get(key);
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    @Command(
            name = "property",
            description = "Derives polarizability, and where asked absorption cross section, from a selection of fits.",
            mixinStandardHelpOptions = true)
    int property(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(
                            names = "--choices",
                            paramLabel = "FILE",
                            description = "JSON object with choices; what is missing is written out.")
                    @Nullable
                    Path choices,
            @Option(
                            names = "--quoted",
                            paramLabel = "RECORD",
                            description = "A quoted value to stand beside; may be repeated.")
                    @Nullable
                    List<String> quoted,
            @Option(names = "--suppose", description = "Compute and print, record nothing.") boolean suppose,
            @Parameters(paramLabel = "SELECTION", description = "The selection.") String selection)
            throws ProblemException, StoppedException {
        JsonObject chosen = choices == null ? JsonObject.EMPTY : object(choices);
        try (Session session = Session.open(folder);
                StoppableWork work = new StoppableWork(console, !json)) {
            Archive archive = session.archive();
            NewRecord request = new GatherProperty(archive)
                    .request(
                            archive.find(selection),
                            chosen,
                            session.find(quoted == null ? List.of() : quoted),
                            Optional.empty());
            NewRecord computed = archive.compute(request, List.of(), work);
            if (suppose) {
                console.json(new JsonObject(new TreeMap<>(Map.<String, Json>of(
                        "choices",
                        computed.parts().getOrDefault(fringekeep.archive.record.PartName.CHOICES, JsonObject.EMPTY),
                        "result",
                        computed.parts().getOrDefault(fringekeep.archive.record.PartName.RESULT, JsonObject.EMPTY)))));
                return Exit.DONE;
            }
            Archive.Recorded recorded = archive.record(computed);
            RecordedText.write(console, archive, List.of(recorded.fingerprint()), json);
            return Exit.DONE;
        }
    }

    @Command(
            name = "draw",
            description = "Writes the pictures of records as SVG, PDF, PNG and CSV.",
            mixinStandardHelpOptions = true)
    int draw(
            @Option(names = "--archive", paramLabel = "FOLDER", description = "The archive.") @Nullable Path folder,
            @Option(names = "--json", description = "Write JSON.") boolean json,
            @Option(names = "--into", required = true, paramLabel = "FOLDER", description = "Where they go.") Path into,
            @Option(
                            names = "--form",
                            split = ",",
                            paramLabel = "FORM",
                            description = "svg, pdf, png, csv; all when not given.")
                    PictureFiles.Form @Nullable [] forms,
            @Parameters(arity = "1..*", paramLabel = "RECORD", description = "What is drawn.") List<String> references)
            throws ProblemException {
        try (Session session = Session.open(folder)) {
            List<String> written = new ArrayList<>();
            for (Hash record : session.find(references)) {
                written.addAll(
                        draw(session.archive(), record, into, forms == null ? PictureFiles.Form.values() : forms));
            }
            if (json) {
                console.json(JsonArray.ofTexts(written));
            } else {
                written.forEach(console::line);
            }
            return Exit.DONE;
        }
    }

    private static List<String> draw(Archive archive, Hash record, Path into, PictureFiles.Form[] forms)
            throws ProblemException {
        RecordView view = archive.record(record).orElseThrow();
        List<Picture> pictures = archive.kinds()
                .get(view.head().kind())
                .map(kind -> kind.drawings(view, archive.inputs(record)))
                .orElse(List.of());
        if (pictures.isEmpty()) {
            throw new ProblemException(new Problem(
                    "command.nothing-to-draw",
                    archive.label(record) + " has no picture.",
                    "",
                    "Draw a scan, a fit, a velocity, a property or a figure."));
        }
        String name = archive.label(record).replaceAll("[^A-Za-z0-9]+", "-");
        List<String> written = new ArrayList<>();
        try {
            Files.createDirectories(into);
            for (int i = 0; i < pictures.size(); i++) {
                for (PictureFiles.Form form : forms) {
                    Path file = into.resolve(name + (pictures.size() == 1 ? "" : "-" + (i + 1)) + "." + form.ending());
                    Files.write(file, PictureFiles.write(pictures.get(i), form));
                    written.add(file.toString());
                }
            }
            return written;
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "command.not-written",
                    "The picture could not be written: " + e.getMessage() + ".",
                    into.toString(),
                    "Choose another folder."));
        }
    }
}
