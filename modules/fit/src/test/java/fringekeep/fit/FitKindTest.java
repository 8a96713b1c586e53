package fringekeep.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Tone;
import fringekeep.scan.PlacementFacet.Purpose;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class FitKindTest {
    private static final String HEADED = """
            {'form':'delimited/1','encoding':'UTF-8','delimiter':',','decimal':'.','skip':1,'comment':'#',
             'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}],
             'header':[{'key':'start','moment':'start'},{'key':'dwell','exposure':true},
              {'key':'laser power','setting':'laser power','unit':'W','deviation':'0.02'}]}""";

    private static final String BLURRED = Bench.SETUP.replace(
            "'uncertainty':{'sort':'exact'}}}],'sep",
            "'uncertainty':{'sort':'stated','text':'0.2','si':2e-10}}}],'sep");

    private final Bench bench = new Bench();

    /** Counts of a fringe with Poisson noise; deterministic for a seed. */
    private static byte[] file(double mean, double visibility, double phase, String start, long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        StringBuilder text = new StringBuilder("# start: " + start + "\n# dwell: 10 s\n# laser power: 7.30 W\nx,n\n");
        for (int i = 0; i < 32; i++) {
            double x = 16.625 * i;
            double expected = mean * (1 + visibility * Math.cos(2 * Math.PI * x / 266 + phase));
            text.append(x).append(',').append(poisson(expected, random)).append('\n');
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }

    private static int poisson(double mean, SplittableRandom random) {
        double left = -mean;
        int count = -1;
        while (left < 0) {
            left -= Math.log(1 - random.nextDouble());
            count++;
        }
        return count;
    }

    private RecordView plain(String choices, Hash setup, byte[]... files) throws ProblemException {
        List<Hash> scans = new ArrayList<>();
        for (byte[] file : files) {
            scans.add(bench.scan(HEADED, file));
        }
        return bench.fit(choices, setup, scans);
    }

    private static byte[] usual(long seed) {
        return file(700, 0.3, 0.7, "2031-05-14T09:00:00Z", seed);
    }

    @Test
    void takesThePeriodFromTheSetupAndSaysHowTheEstimatesAnswerToIt() throws ProblemException {
        Hash setup = bench.setup(BLURRED);

        RecordView fit = plain("{}", setup, usual(1));

        JsonObject period = fit.choices().object("period").orElseThrow();
        assertThat(period.text("from")).contains("setup");
        assertThat(period.number("u")).hasValue(2e-10);
        Estimates estimates =
                bench.records.facet(fit.fingerprint(), Estimates.class).orElseThrow();
        Sensitivity shared = estimates.sensitivities().get(0);
        assertThat(shared.source()).isEqualTo(setup);
        assertThat(shared.parameter()).isEqualTo("period");
        assertThat(estimates.names()).containsExactly("mean", "cosine", "sine", "visibility", "phase");
        RecordView turned = plain("{'period':{'sort':'fixed','si':2.661e-7}}", setup, usual(1));
        double derivative = (Bench.member(turned, "phase", "value") - Bench.member(fit, "phase", "value")) / 1e-10;
        assertThat(shared.derivatives()[4]).isCloseTo(derivative, within(0.02 * Math.abs(derivative)));
    }

    @Test
    void honoursMasksOfTheChannelAndDrawsThemAsBars() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        Hash scan = bench.scan(HEADED, usual(2));
        Hash mask = bench.mask(scan, "counts", 3, 5);
        Hash other = bench.mask(scan, "dark", 0, 31);

        RecordView fit = bench.fit(
                "{}", setup, List.of(scan), DetachedRecords.input("mask", mask), DetachedRecords.input("mask", other));

        assertThat(fit.result().integer("masked")).hasValue(3);
        assertThat(fit.result().integer("rows")).hasValue(29);
        assertThat(fit.result().integer("degreesOfFreedom")).hasValue(26);
        Picture picture = new FitKind()
                .drawings(fit, bench.records.inputs(fit.fingerprint()))
                .get(0);
        assertThat(picture.panels()).hasSize(2);
        List<Layer> bars = picture.panels().get(0).layers().stream()
                .filter(layer -> layer.tone() == Tone.MASKED)
                .toList();
        assertThat(bars)
                .singleElement()
                .satisfies(layer -> assertThat(((Layer.Points) layer).x()).hasSize(3));
    }

    @Test
    void aMaskedRowNoLongerCountsAtAll() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        String spoiled = new String(usual(3), StandardCharsets.UTF_8).replaceFirst("49.875,[0-9]+", "49.875,99999");
        Hash scan = bench.scan(HEADED, spoiled.getBytes(StandardCharsets.UTF_8));
        Hash clean = bench.scan(HEADED, usual(3));

        RecordView masked =
                bench.fit("{}", setup, List.of(scan), DetachedRecords.input("mask", bench.mask(scan, "counts", 3, 3)));
        RecordView same = bench.fit(
                "{}", setup, List.of(clean), DetachedRecords.input("mask", bench.mask(clean, "counts", 3, 3)));

        assertThat(masked.result().array("values")).isEqualTo(same.result().array("values"));
        RecordView open = bench.fit("{}", setup, List.of(scan));
        assertThat(open.result().array("outliers").objects())
                .extracting(outlier -> outlier.integer("row").getAsLong())
                .contains(3L);
    }

    @Test
    void namesTheQuestionByScanThingAndChannel() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        Hash first = bench.scan(HEADED, usual(4));
        Hash second = bench.scan(HEADED, usual(5));

        RecordView forward = bench.fit("{'combine':'sum'}", setup, List.of(first, second));
        RecordView backward = bench.fit("{'combine':'joint'}", setup, List.of(second, first));

        Optional<String> question = new FitKind().question(forward, bench.records.inputs(forward.fingerprint()));
        assertThat(question).isEqualTo(new FitKind().question(backward, bench.records.inputs(backward.fingerprint())));
        assertThat(question.orElseThrow())
                .contains(bench.records.view(first).head().thing().hex())
                .contains("counts");
    }

    @Test
    void weakScansAddUpWhateverTheWay() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        byte[][] files = new byte[8][];
        for (int k = 0; k < files.length; k++) {
            files[k] = file(60, 0.4, 0.7, "2031-05-14T09:0" + k + ":00Z", 100 + k);
        }

        RecordView sum = plain("{'combine':'sum'}", setup, files);
        RecordView joint = plain("{'combine':'joint'}", setup, files);
        RecordView shifted = plain("{'combine':'sum-after-phase'}", setup, files);

        for (RecordView fit : List.of(sum, joint, shifted)) {
            double u = Bench.member(fit, "visibility", "u");
            assertThat(u).isBetween(0.005, 0.025);
            assertThat(Bench.member(fit, "visibility", "value")).isCloseTo(0.4, within(3 * u));
            assertThat(Bench.member(fit, "visibility", "lower")).isLessThan(Bench.member(fit, "visibility", "upper"));
        }
        assertThat(Bench.value(sum, "mean")).isCloseTo(480, within(20.0));
        assertThat(sum.result().object("exposure").orElseThrow().number("si")).hasValue(80);
        assertThat(joint.result().array("scans").items()).hasSize(8);
        assertThat(joint.result().object("phase")).isEmpty();
    }

    @Test
    void comparesWithReferencesBeforeAndAfter() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        Hash before = bench.scan(HEADED, file(5000, 0.30, 0.2, "2031-05-14T09:00:00Z", 11));
        Hash after = bench.scan(HEADED, file(5000, 0.30, 0.4, "2031-05-14T09:20:00Z", 12));
        Hash signal = bench.scan(HEADED, file(5000, 0.15, 0.8, "2031-05-14T09:10:00Z", 13));

        RecordView fit = bench.fit(
                "{'references':'normalised'}",
                setup,
                List.of(signal),
                Bench.scanInput("reference", before, "counts"),
                DetachedRecords.input("placement", bench.place(before, setup, "reference")),
                Bench.scanInput("reference", after, "counts"),
                DetachedRecords.input("placement", bench.place(after, setup, "reference")));

        JsonObject reference = fit.result().object("reference").orElseThrow();
        JsonObject ratio = reference.object("relativeVisibility").orElseThrow();
        assertThat(ratio.number("value").orElseThrow())
                .isCloseTo(0.5, within(4 * ratio.number("u").orElseThrow()));
        JsonObject phase = reference.object("relativePhase").orElseThrow();
        assertThat(phase.number("value").orElseThrow())
                .isCloseTo(0.5, within(4 * phase.number("u").orElseThrow()));
        assertThat(ratio.number("u").orElseThrow()).isLessThan(0.03);
    }

    @Test
    void offersAFringeWithPurposePowerAndRate() throws ProblemException {
        RecordView fit = plain("{}", bench.setup(Bench.SETUP), usual(6));

        FringeFacet fringe =
                bench.records.facet(fit.fingerprint(), FringeFacet.class).orElseThrow();

        assertThat(fringe.purpose()).contains(Purpose.SIGNAL);
        assertThat(fringe.power().orElseThrow().value()).isEqualTo(7.3);
        assertThat(fringe.power().orElseThrow().deviation()).isEqualTo(0.02);
        assertThat(fringe.mean().value()).isCloseTo(70, within(2.0));
        assertThat(fringe.visibility().value()).isCloseTo(0.3, within(0.03));
        assertThat(fringe.start().orElseThrow()).hasToString("2031-05-14T09:00:00Z");
        assertThat(Bench.value(fit, "mean")).isCloseTo(700, within(20.0));
    }

    @Test
    void aBackgroundScanOfManyScansCountsOnce() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        Hash background = bench.scan(HEADED, file(9, 0, 0, "2031-05-14T08:00:00Z", 30));
        List<Hash> scans = new ArrayList<>();
        for (int k = 0; k < 4; k++) {
            scans.add(bench.scan(HEADED, usual(31 + k)));
        }

        for (String combine : List.of("sum", "sum-after-phase", "joint")) {
            RecordView fit = bench.fit(
                    "{'background':{'sort':'scan'},'combine':'" + combine + "'}",
                    setup,
                    scans,
                    Bench.scanInput("background", background, "counts"),
                    DetachedRecords.input("placement", bench.place(background, setup, "background")));

            double rate = Bench.member(fit, "backgroundRate", "value");
            assertThat(rate).isBetween(0.7, 1.1);
            double exposure = 32 * 10;
            assertThat(Bench.member(fit, "backgroundRate", "u"))
                    .as(combine)
                    .isCloseTo(Math.sqrt(rate * exposure) / exposure, within(1e-12));
        }
    }

    @Test
    void correctsPositionsByAPinnedCalibrationAndNamesItAsASource() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        Hash scan = bench.scan(HEADED, usual(40));
        Hash calibration = bench.records.enter("calibration", Bench.json("""
                        {'what':'position-scale','model':'calibration.scale/1','covariance':[1e-8],
                         'parameters':[{'name':'scale','value':1.01,'unit':'1'}],
                         'valid':{'from':'2031-05-01T00:00:00Z'}}"""));

        RecordView read = bench.fit("{'period':{'sort':'fixed','si':2.66e-7}}", setup, List.of(scan));
        RecordView corrected = bench.fit(
                "{'period':{'sort':'fixed','si':2.6866e-7}}",
                setup,
                List.of(scan),
                DetachedRecords.input("calibration", calibration));

        assertThat(corrected.choices().text("positions")).contains("calibrated");
        assertThat(Bench.member(corrected, "visibility", "value"))
                .isCloseTo(Bench.member(read, "visibility", "value"), within(1e-9));
        Estimates estimates =
                bench.records.facet(corrected.fingerprint(), Estimates.class).orElseThrow();
        assertThat(estimates.sensitivities()).singleElement().satisfies(shared -> {
            assertThat(shared.source()).isEqualTo(calibration);
            assertThat(shared.parameter()).isEqualTo("scale");
            assertThat(shared.deviation()).isCloseTo(1e-4, within(1e-12));
        });
    }

    @Test
    void correctsForDeadTime() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);
        RecordView open = plain("{}", setup, usual(7));

        RecordView corrected = plain("{'deadTime':{'sort':'given','si':1e-4}}", setup, usual(7));

        double rate = Bench.value(open, "mean") / 10;
        assertThat(Bench.value(corrected, "mean") / 10).isCloseTo(rate / (1 - rate * 1e-4), within(0.002 * rate));
    }

    @Test
    void refusesChoicesThatDoNotFitTogetherNamingEach() throws ProblemException {
        Hash setup = bench.setup(Bench.SETUP);

        assertThat(refusal("{'combine':'single'}", setup, 2)).containsExactly("fit.single-many");
        assertThat(refusal("{'combine':'joint','method':'fringe.weighted/1'}", setup, 2))
                .containsExactly("fit.joint-method");
        assertThat(refusal("{'background':{'sort':'scan'},'references':'normalised'}", setup, 1))
                .containsExactly("fit.no-background-scan", "fit.no-reference");
        assertThat(refusal("{'deadTime':{'sort':'setup'}}", setup, 1)).containsExactly("fit.no-dead-time");
        assertThat(refusal("{'background':{'sort':'channel','channel':'dim'}}", setup, 1))
                .containsExactly("fit.no-dark-channel");
        assertThat(refusal("{'range':{'from':0,'to':3e-8}}", setup, 1)).containsExactly("fit.too-few-points");
        assertThat(refusal("{'method':'fringe.guess/1'}", setup, 1)).containsExactly("fit.method-unknown");
    }

    private List<String> refusal(String choices, Hash setup, int scans) {
        byte[][] files = new byte[scans][];
        for (int k = 0; k < scans; k++) {
            files[k] = usual(20 + k);
        }
        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> plain(choices, setup, files));
        assertThat(thrown).as(choices).isNotNull();
        return thrown.problems().stream().map(Problem::code).toList();
    }

    @Test
    void theSameInputsGiveTheSameBits() throws ProblemException, StoppedException {
        RecordView fit = plain("{'driftOrder':1}", bench.setup(BLURRED), usual(8));

        Outcome again =
                FitComputation.INSTANCE.compute(fit.choices(), bench.records.inputs(fit.fingerprint()), Work.QUIET);

        assertThat(again).isInstanceOf(Outcome.Computed.class);
        assertThat(((Outcome.Computed) again).result()).isEqualTo(fit.result());
        assertThat(((Outcome.Computed) again).payloads().get(0).bytes()).isEqualTo(fit.payload("residuals"));
    }

    @Test
    void aScanWithoutFringeKeepsAnUpperLimit() throws ProblemException, IOException {
        Hash scan = bench.scan(Bench.PLAIN, Bench.reference("fringe_03.csv"));

        RecordView fit = bench.fit(
                "{'background':{'sort':'channel','channel':'dark'}}", bench.setup(Bench.SETUP), List.of(scan));

        assertThat(Bench.member(fit, "visibility", "lower")).isZero();
        assertThat(fit.result().number("upperLimit").orElseThrow())
                .isGreaterThan(Bench.member(fit, "visibility", "value"));
        assertThat(fit.result().object("fringe").orElseThrow().number("p").orElseThrow())
                .isGreaterThan(0.05);
    }
}
