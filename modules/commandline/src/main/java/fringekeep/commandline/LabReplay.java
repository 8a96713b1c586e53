package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Person;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.FitScans;
import fringekeep.property.GatherProperty;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.TakeInFiles;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/**
 * Replays what the people of the invented laboratory entered. Clock and random source are scripted (record format 1, section
 * 13), so the same program makes the same journal on every machine.
 */
public final class LabReplay {
    private static final String SEED = "fringekeep demo lab 1";

    private final Archive archive;
    private final ScriptedSource source;
    private final Path raw;
    private final LabNames names;
    private final Work work;
    private final List<String> refused = new ArrayList<>();

    private LabReplay(Archive archive, ScriptedSource source, Path raw, Work work) {
        this.archive = archive;
        this.source = source;
        this.raw = raw;
        this.names = new LabNames(archive);
        this.work = work;
    }

    /** The archive, open, and the raw files that were refused, as is meant by the mishaps. */
    public record Replayed(Archive archive, List<String> refused) {
        /** Copies. */
        public Replayed {
            refused = List.copyOf(refused);
        }
    }

    /** Clock and random source of the replay. */
    private static final class ScriptedSource {
        private Instant now;
        private long counter;

        ScriptedSource(Instant founded) {
            this.now = founded;
        }

        byte[] next() {
            byte[] seed = SEED.getBytes(StandardCharsets.UTF_8);
            byte[] block = java.nio.ByteBuffer.allocate(seed.length + 8)
                    .put(seed)
                    .putLong(counter++)
                    .array();
            return java.util.Arrays.copyOf(Hash.of(block).bytes(), 16);
        }
    }

    /**
     * Makes the archive.
     *
     * @param samples folder of the sample data
     * @param folder where the archive goes
     * @param build program version
     */
    public static Replayed replay(Path samples, Path folder, Kinds kinds, String build, Work work)
            throws ProblemException, StoppedException {
        Path file = samples.resolve("lab").resolve("lab.json");
        JsonObject lab = object(Documents.read(file).value(), file);
        ScriptedSource source = new ScriptedSource(Instant.parse(text(lab, "founded", file)));
        ZoneId zone = ZoneId.of(text(lab, "zone", file));
        Circumstances circumstances = new Circumstances(() -> source.now, source::next, zone, build);
        List<Person> persons = new ArrayList<>();
        for (JsonObject person : lab.array("persons").objects()) {
            PersonId id = new PersonId(HexFormat.of().formatHex(source.next()));
            persons.add(new Person(id, person.text("name"), Optional.empty(), Optional.empty()));
        }
        Archives.Founding founding = new Archives.Founding(
                text(lab, "title", file),
                text(lab, "dayBoundary", file),
                zone.getId(),
                true,
                persons,
                Optional.empty());
        Archive archive = Archives.found(folder, founding, kinds, circumstances);
        boolean whole = false;
        try {
            Path raw =
                    samples.resolve("lab").resolve(text(lab, "rawFolder", file)).normalize();
            LabReplay replay = new LabReplay(archive, source, raw, work);
            replay.steps(lab.array("steps").objects());
            whole = true;
            return new Replayed(archive, replay.refused);
        } finally {
            if (!whole) {
                archive.close();
            }
        }
    }

    private static JsonObject object(Json value, Path file) throws ProblemException {
        if (value instanceof JsonObject object) {
            return object;
        }
        throw wrong("The script is not a JSON object.", file.toString());
    }

    private static String text(JsonObject object, String member, Path file) throws ProblemException {
        return object.text(member).orElseThrow(() -> wrong("The text \"" + member + "\" is missing.", file.toString()));
    }

    private static ProblemException wrong(String what, String where) {
        return new ProblemException(
                new Problem("demo.script", what, where, "Take the sample data that came with the program."));
    }

    private void steps(List<JsonObject> steps) throws ProblemException, StoppedException {
        for (int i = 0; i < steps.size(); i++) {
            work.check();
            work.progress(i, steps.size(), "steps of the invented laboratory");
            JsonObject step = steps.get(i);
            source.now = Instant.parse(step.text("at").orElseThrow());
            try {
                step(step);
            } catch (ProblemException e) {
                String where = "step " + step.integer("n").orElse(i + 1);
                throw new ProblemException(e.problems().stream()
                        .map(problem -> problem.at((where + " " + problem.where()).strip()))
                        .toList());
            }
        }
        work.progress(steps.size(), steps.size(), "steps of the invented laboratory");
    }

    private void step(JsonObject step) throws ProblemException, StoppedException {
        PersonId person = person(step.text("person").orElseThrow());
        switch (step.text("step").orElseThrow()) {
            case "record" -> record(step.array("documents"), person);
            case "take-in" -> takeIn(step, person);
            case "place" -> place(step, person);
            case "fit" -> fit(step);
            case "property" -> property(step);
            default -> throw wrong("There is no step \"" + step.text("step").orElse("") + "\".", "");
        }
    }

    private PersonId person(String name) throws ProblemException {
        return archive.persons().stream()
                .filter(person -> person.name().equals(Optional.of(name)))
                .findFirst()
                .map(Person::id)
                .orElseThrow(() -> wrong("Nobody is called " + name + ".", ""));
    }

    private void record(JsonArray documents, PersonId person) throws ProblemException, StoppedException {
        Entering entering = new Entering(archive, names::find, this::person, raw);
        for (JsonObject document : documents.objects()) {
            JsonDocument own = JsonDocument.read(PrettyJson.write(document));
            entering.enter(own, Optional.of(person), Work.QUIET);
        }
    }

    private void takeIn(JsonObject step, PersonId person) throws ProblemException {
        List<String> files = step.array("files").texts();
        Hash profile = names.find(step.text("profile").orElseThrow());
        TakeInFiles.Request request = new TakeInFiles.Request(
                files.stream().map(raw::resolve).toList(), Optional.of(profile), false, Optional.of(person));
        List<TakeInFiles.FileOutcome> outcomes = new TakeInFiles(archive).takeIn(request, Work.QUIET);
        for (int i = 0; i < files.size(); i++) {
            TakeInFiles.FileOutcome outcome = outcomes.get(i);
            if (outcome.state() == TakeInFiles.State.REFUSED) {
                refused.add(files.get(i) + ": " + outcome.problems().get(0).what());
            } else {
                names.scansOf(files.get(i), outcome.scans());
            }
        }
    }

    private void place(JsonObject step, PersonId person) throws ProblemException {
        List<PlaceScans.Place> places = new ArrayList<>();
        List<Hash> velocities = names.all(step.array("velocities"));
        for (JsonObject scan : step.array("scans").objects()) {
            Optional<Hash> series = scan.text("series").isPresent()
                    ? Optional.of(names.find(scan.text("series").get()))
                    : Optional.empty();
            places.add(new PlaceScans.Place(
                    names.find(scan.text("scan").orElseThrow()),
                    StageCommands.purpose(scan.text("purpose").orElseThrow()),
                    names.find(step.text("setup").orElseThrow()),
                    step.text("run").isPresent()
                            ? Optional.of(names.find(step.text("run").get()))
                            : Optional.empty(),
                    velocities,
                    series,
                    scan.integer("step").isPresent()
                            ? OptionalInt.of((int) scan.integer("step").getAsLong())
                            : OptionalInt.empty(),
                    Optional.empty(),
                    Optional.empty()));
        }
        new PlaceScans(archive).place(places, person);
    }

    private void fit(JsonObject step) throws ProblemException {
        List<String> each = step.array("each").texts();
        List<String> together = step.array("together").texts();
        List<Hash> background = names.all(step.array("background"));
        List<FitScans.Request> requests = new ArrayList<>();
        for (int i = 0; i < each.size(); i++) {
            List<Hash> references = step.array("references").items().isEmpty()
                    ? List.of()
                    : names.all((JsonArray) step.array("references").items().get(i));
            requests.add(request(step, List.of(names.find(each.get(i))), references, background));
        }
        if (!together.isEmpty()) {
            requests.add(request(step, names.all(step.array("together")), List.of(), background));
        }
        List<FitScans.FitOutcome> outcomes = new FitScans(archive).fitEach(requests, Optional.empty(), Work.QUIET);
        List<Problem> problems = outcomes.stream()
                .flatMap(outcome -> outcome.problems().stream())
                .toList();
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        IntStream.range(0, each.size())
                .forEach(i -> names.fitOf(each.get(i), outcomes.get(i).fit().orElseThrow()));
    }

    private static FitScans.Request request(
            JsonObject step, List<Hash> scans, List<Hash> references, List<Hash> background) {
        return new FitScans.Request(
                scans,
                step.text("channel").orElse("counts"),
                step.object("choices").orElse(JsonObject.EMPTY),
                references,
                background,
                List.of(),
                step.flag("again").orElse(false));
    }

    private void property(JsonObject step) throws ProblemException, StoppedException {
        archive.record(archive.compute(
                new GatherProperty(archive)
                        .request(
                                names.find(step.text("selection").orElseThrow()),
                                step.object("choices").orElse(JsonObject.EMPTY),
                                names.all(step.array("quoted")),
                                Optional.empty()),
                List.of(),
                Work.QUIET));
    }

    /** Names of a JSON text. */
    static String name(Json value) throws ProblemException {
        if (value instanceof JsonText text) {
            return text.value();
        }
        throw wrong("A name of a record is not a text.", "");
    }
}
