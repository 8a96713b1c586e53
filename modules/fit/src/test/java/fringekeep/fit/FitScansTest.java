package fringekeep.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.Regathering;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.ScriptedCircumstances;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.FitScans.FitOutcome;
import fringekeep.fit.FitScans.Request;
import fringekeep.instrument.CalibrationKind;
import fringekeep.instrument.SetupKind;
import fringekeep.sample.BatchKind;
import fringekeep.sample.CompoundKind;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.PlacementKind;
import fringekeep.scan.ReadingProfileKind;
import fringekeep.scan.ScanKind;
import fringekeep.scan.SeriesKind;
import fringekeep.scan.TakeInFiles;
import fringekeep.sourcerun.SourceRunKind;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FitScansTest {
    private static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    private static final String HEADED = """
            {'form':'delimited/1','encoding':'UTF-8','delimiter':',','decimal':'.','skip':1,'comment':'#',
             'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}],
             'header':[{'key':'start','moment':'start'},{'key':'dwell','exposure':true}]}""";

    @TempDir
    private static Path archives;

    private static Archive archive;

    @TempDir
    private Path folder;

    private Hash profile;
    private Hash setup;
    private Hash run;
    private Hash batch;
    private Hash compound;
    private int files;

    @BeforeAll
    static void found() throws ProblemException {
        Kinds kinds = new Kinds(List.of(
                new CompoundKind(),
                new BatchKind(),
                new SetupKind(),
                new CalibrationKind(),
                new SourceRunKind(),
                new ReadingProfileKind(),
                new ScanKind(),
                new SeriesKind(),
                new PlacementKind(),
                new MaskKind(),
                new FitKind()));
        Person person = new Person(PERSON, Optional.of("N. N."), Optional.empty(), Optional.empty());
        archive = Archives.found(
                archives.resolve("lab"),
                new Archives.Founding("test", "06:00", "Etc/GMT-2", true, List.of(person), Optional.empty()),
                kinds,
                ScriptedCircumstances.stepping(
                        "fit verbs", Instant.parse("2031-05-14T09:00:00Z"), ZoneId.of("Etc/GMT-2"), "1.0.0"));
    }

    @AfterAll
    static void close() {
        archive.close();
    }

    @BeforeEach
    void bench() throws ProblemException, StoppedException {
        profile = enter("reading-profile", Bench.json(HEADED));
        setup = enter("setup", Bench.json(Bench.SETUP));
        compound = archive.record(archive.compute(
                        new NewRecord(
                                new KindName("compound"),
                                List.of(),
                                List.of(),
                                Map.of(
                                        PartName.CHOICES,
                                        Bench.json("{'charge':0,'composition':{'sort':'formula','formula':'C60'}}")),
                                List.of(),
                                Optional.empty(),
                                Optional.empty(),
                                Optional.of(PERSON)),
                        List.of(),
                        Work.QUIET))
                .fingerprint();
        batch = enter("batch", Bench.json("{'label':'B','cautions':[]}"), thing("compound", compound));
        run = enter("source-run", Bench.json("{'settings':[]}"), thing("batch", batch));
    }

    private static AboutReference thing(String role, Hash record) {
        return new AboutReference(role, record, AboutReference.Reach.THING);
    }

    private static Hash enter(String kind, JsonObject content, AboutReference... about) throws ProblemException {
        return enter(kind, content, Optional.empty(), Optional.empty(), about);
    }

    private static Hash enter(
            String kind, JsonObject content, Optional<Hash> corrects, Optional<After> after, AboutReference... about)
            throws ProblemException {
        return archive.record(new NewRecord(
                        new KindName(kind),
                        List.of(),
                        List.of(about),
                        Map.of(PartName.CONTENT, content),
                        List.of(),
                        corrects,
                        after,
                        Optional.of(PERSON)))
                .fingerprint();
    }

    private Hash scan(String start, int mean) throws IOException, ProblemException {
        StringBuilder text = new StringBuilder("# start: " + start + "\n# dwell: 10 s\nx,n\n");
        for (int i = 0; i < 16; i++) {
            double phase = 2 * Math.PI * i * 33.25 / 266;
            text.append(33.25 * i).append(',').append(Math.round(mean * (1 + 0.3 * Math.cos(phase)) + i % 3));
            text.append('\n');
        }
        Path file = Files.writeString(folder.resolve(files++ + ".csv"), text.append('\n'));
        TakeInFiles.Request request =
                new TakeInFiles.Request(List.of(file), Optional.of(profile), false, Optional.empty());
        return new TakeInFiles(archive)
                .takeIn(request, Work.QUIET)
                .get(0)
                .scans()
                .get(0);
    }

    private Hash place(Hash scan, Purpose purpose) throws ProblemException {
        return new PlaceScans(archive)
                .place(
                        List.of(new PlaceScans.Place(
                                scan,
                                purpose,
                                setup,
                                Optional.of(run),
                                List.of(),
                                Optional.empty(),
                                OptionalInt.empty(),
                                Optional.empty(),
                                Optional.empty())),
                        PERSON)
                .get(0);
    }

    private Hash placed(String start, int mean) throws IOException, ProblemException {
        Hash scan = scan(start, mean);
        place(scan, Purpose.SIGNAL);
        return scan;
    }

    private static Hash judge(String verdict, Hash target, AboutReference.Reach reach, JsonObject more)
            throws ProblemException {
        JsonObject content = more.with("verdict", verdict).with("reason", "mode-hop");
        return enter("judgement", content, new AboutReference("target", target, reach));
    }

    private static List<String> roles(Hash fit) {
        return archive.record(fit).orElseThrow().head().inputs().stream()
                .map(InputReference::role)
                .toList();
    }

    private static Hash pinned(Hash fit, String role) {
        return archive.record(fit).orElseThrow().head().inputs().stream()
                .filter(input -> input.role().equals(role))
                .map(input -> ((InputReference.OfRecord) input).record())
                .findFirst()
                .orElseThrow();
    }

    private static Hash fit(Hash scan, String choices) throws ProblemException, StoppedException {
        return new FitScans(archive)
                .fit(Request.of(scan, "counts", Bench.json(choices)), Optional.of(PERSON), Work.QUIET);
    }

    private static List<String> refused(Hash scan) {
        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> fit(scan, "{}"));
        assertThat(thrown).isNotNull();
        return thrown.problems().stream().map(Problem::code).toList();
    }

    @Test
    void pinsScanPlacementSetupRunBatchAndCompoundInThatOrder() throws IOException, ProblemException, StoppedException {
        Hash scan = scan("2031-05-14T10:00:00Z", 700);
        Hash placement = place(scan, Purpose.SIGNAL);

        Hash fit = fit(scan, "{}");

        assertThat(roles(fit)).containsExactly("scan", "placement", "setup", "run", "batch", "compound");
        assertThat(pinned(fit, "placement")).isEqualTo(placement);
        assertThat(pinned(fit, "batch")).isEqualTo(batch);
        assertThat(pinned(fit, "compound")).isEqualTo(compound);
        assertThat(archive.graph().causes(fit)).isEmpty();
    }

    @Test
    void takesTheSegmentOfTheSetupThatHeldWhenTheScanBegan() throws IOException, ProblemException, StoppedException {
        Hash early = placed("2031-05-14T10:00:00Z", 700);
        Hash late = placed("2031-05-14T12:00:00Z", 701);
        Hash changed = enter(
                "setup",
                Bench.json(Bench.SETUP.replace("266.0", "266.5").replace("2.66e-7", "2.665e-7")),
                Optional.empty(),
                Optional.of(new After(setup, Instant.parse("2031-05-14T11:00:00Z"))));

        assertThat(pinned(fit(early, "{}"), "setup")).isEqualTo(setup);
        Hash fit = fit(late, "{}");
        assertThat(pinned(fit, "setup")).isEqualTo(changed);
        assertThat(archive.record(fit)
                        .orElseThrow()
                        .choices()
                        .object("period")
                        .orElseThrow()
                        .number("si"))
                .hasValue(2.665e-7);
    }

    @Test
    void pinsLiveMasksAndHonoursThem() throws IOException, ProblemException, StoppedException {
        Hash scan = placed("2031-05-14T10:00:00Z", 700);
        Hash mask = judge(
                "masked",
                scan,
                AboutReference.Reach.RECORD,
                JsonObject.EMPTY.with("channel", "counts").with("points", JsonArray.of(JsonArray.ofNumbers(2, 4))));

        Hash fit = fit(scan, "{}");

        assertThat(pinned(fit, "mask")).isEqualTo(mask);
        assertThat(archive.record(fit).orElseThrow().result().integer("masked")).hasValue(3);
        assertThat(archive.graph().causes(fit)).isEmpty();
    }

    @Test
    void refusesWhatIsNotPlacedOrWithdrawnUnlessAskedForNotwithstanding()
            throws IOException, ProblemException, StoppedException {
        Hash unplaced = scan("2031-05-14T10:00:00Z", 700);
        Hash withdrawn = placed("2031-05-14T10:00:00Z", 702);
        Hash judgement = judge("withdrawn", withdrawn, AboutReference.Reach.RECORD, JsonObject.EMPTY);

        assertThat(refused(unplaced)).containsExactly("gather.not-placed");
        assertThat(refused(withdrawn)).containsExactly("gather.withdrawn");
        Request knowing = new Request(
                List.of(withdrawn), "counts", JsonObject.EMPTY, List.of(), List.of(), List.of(judgement), false);
        Hash fit = new FitScans(archive).fit(knowing, Optional.of(PERSON), Work.QUIET);
        assertThat(pinned(fit, "notwithstanding")).isEqualTo(judgement);
        assertThat(archive.graph().causes(fit)).isEmpty();
    }

    @Test
    void manyGoOnWhenOneIsRefusedAndAStopKeepsWhatIsDone() throws IOException, ProblemException {
        Hash good = placed("2031-05-14T10:00:00Z", 700);
        Hash bad = scan("2031-05-14T10:10:00Z", 701);
        Hash last = placed("2031-05-14T10:20:00Z", 702);
        List<Request> requests = new ArrayList<>();
        for (Hash scan : List.of(good, bad, last)) {
            requests.add(Request.of(scan, "counts", JsonObject.EMPTY));
        }
        AtomicLong done = new AtomicLong();
        Work afterTwo = new Work() {
            @Override
            public void progress(long reached, long total, String what) {
                done.set(reached);
            }

            @Override
            public boolean stopped() {
                return done.get() >= 2;
            }
        };

        List<FitOutcome> outcomes = new FitScans(archive).fitEach(requests, Optional.of(PERSON), afterTwo);

        assertThat(outcomes.get(0).fit()).isPresent();
        assertThat(archive.record(outcomes.get(0).fit().orElseThrow())).isPresent();
        assertThat(outcomes.get(1).problems()).extracting(Problem::code).containsExactly("gather.not-placed");
        assertThat(outcomes.get(2).problems()).extracting(Problem::code).containsExactly("fit.stopped");
    }

    @Test
    void findsSignalsOfARunThatHaveNoFitYet() throws IOException, ProblemException, StoppedException {
        Hash fitted = placed("2031-05-14T10:00:00Z", 700);
        Hash open = placed("2031-05-14T10:10:00Z", 701);
        Hash reference = scan("2031-05-14T10:20:00Z", 702);
        place(reference, Purpose.REFERENCE);
        Hash tomorrow = placed("2031-05-15T10:00:00Z", 703);
        fit(fitted, "{}");
        UnfittedScans.Rule rule = new UnfittedScans.Rule(
                Set.of(Purpose.SIGNAL),
                Optional.empty(),
                Optional.of(Instant.parse("2031-05-15T04:00:00Z")),
                Optional.empty(),
                Optional.of(run),
                false);

        assertThat(new UnfittedScans(archive).find(rule)).containsExactly(open).doesNotContain(tomorrow);
    }

    @Test
    void fittingAgainCorrectsTheFitThatAnswersTheSameQuestion() throws IOException, ProblemException, StoppedException {
        Hash scan = placed("2031-05-14T10:00:00Z", 700);
        Hash first = fit(scan, "{}");
        Request again = new Request(
                List.of(scan), "counts", Bench.json("{'driftOrder':1}"), List.of(), List.of(), List.of(), true);

        Hash second = new FitScans(archive).fit(again, Optional.of(PERSON), Work.QUIET);

        assertThat(archive.record(second).orElseThrow().head().corrects()).contains(first);
        assertThat(archive.graph().current(first)).contains(second);
    }

    @Test
    void aCorrectedSetupOutdatesTheFitAndRegatheringAsksItAnew()
            throws IOException, ProblemException, StoppedException {
        Hash scan = placed("2031-05-14T10:00:00Z", 700);
        Hash old = fit(scan, "{}");
        Hash corrected = enter(
                "setup",
                Bench.json(Bench.SETUP.replace("266.0", "265.0").replace("2.66e-7", "2.65e-7")),
                Optional.of(setup),
                Optional.empty());
        assertThat(archive.graph().causes(old)).isNotEmpty();

        Regathering.StandIn standIn = new Regathering.StandIn() {
            @Override
            public Optional<Hash> of(Hash input) {
                return archive.graph().current(input);
            }

            @Override
            public List<Hash> because(Hash input) {
                return List.of();
            }
        };
        NewRecord request =
                new FitRegathering().regather(archive, old, standIn, List.of()).orElseThrow();
        Hash fresh =
                archive.record(archive.compute(request, List.of(), Work.QUIET)).fingerprint();

        assertThat(pinned(fresh, "setup")).isEqualTo(corrected);
        RecordView record = archive.record(fresh).orElseThrow();
        assertThat(record.head().corrects()).contains(old);
        assertThat(record.choices().object("period").orElseThrow().number("si")).hasValue(2.65e-7);
        assertThat(archive.graph().causes(fresh)).isEmpty();
    }
}
