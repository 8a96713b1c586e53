package fringekeep.fit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The whole way from a file to a fit against the fits of general statistical programs (see README.txt beside the files).
 * Tolerances: the programs stop at 1e-7 to 1e-6 of the values and print all digits; standard errors of the likelihood fits are
 * of observed information.
 */
class FringeFitsReferenceTest {
    private static final double EDM = 3e-4;

    private final Bench bench = new Bench();

    private static JsonObject expected(String scan, String fit) throws IOException, ProblemException {
        JsonObject all = (JsonObject) JsonDocument.read(Bench.reference("public-reference-fits.json"), 1 << 20, 32)
                .value();
        return all.object("fits")
                .orElseThrow()
                .object(scan)
                .orElseThrow()
                .object(fit)
                .orElseThrow();
    }

    private RecordView fit(String scan, String choices) throws IOException, ProblemException {
        return bench.fit(
                choices.replaceFirst("\\{", "{'period':{'sort':'fixed','si':2.66e-7},"),
                bench.setup(Bench.SETUP),
                List.of(bench.scan(Bench.PLAIN, Bench.reference(scan + ".csv"))));
    }

    private static double rate(RecordView fit) {
        return Bench.value(fit, "mean")
                / fit.result().object("exposure").orElseThrow().number("si").orElseThrow();
    }

    @ParameterizedTest
    @ValueSource(strings = {"fringe_01", "fringe_02", "fringe_03", "fringe_05", "fringe_07"})
    void unweightedLeastSquaresIsThatOfALinearSolver(String scan) throws IOException, ProblemException {
        JsonObject reference = expected(scan, "lsq_linear_no_drift");

        RecordView fit = fit(scan, "{'method':'fringe.unweighted/1'," + darkAsKnown(reference) + "}");

        assertThat(rate(fit)).isCloseTo(number(reference, "N_rate"), within(1e-9 * number(reference, "N_rate")));
        assertThat(Bench.member(fit, "visibility", "value")).isCloseTo(number(reference, "V"), within(1e-9));
        assertThat(Bench.member(fit, "phase", "value")).isCloseTo(number(reference, "phi"), within(1e-8));
        assertThat(fit.result().integer("degreesOfFreedom")).hasValue((long) number(reference, "dof"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"fringe_01", "fringe_02", "fringe_03", "fringe_05", "fringe_07"})
    void scatterOfTheResidualsGivesTheSolversUncertainty(String scan) throws IOException, ProblemException {
        JsonObject reference = expected(scan, "lsq_linear_no_drift");

        RecordView fit =
                fit(scan, "{'method':'fringe.unweighted/1','covariance':'scatter'," + darkAsKnown(reference) + "}");

        double sigma = number(reference, "sigma_V_from_residual_scatter");
        assertThat(Bench.member(fit, "visibility", "u")).isCloseTo(sigma, within(1e-6 * sigma));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "fringe_01",
                "fringe_02",
                "fringe_03",
                "fringe_04",
                "fringe_05",
                "fringe_06",
                "fringe_07",
                "fringe_08"
            })
    void likelihoodWithAKnownBackgroundIsThatOfAMinimiser(String scan) throws IOException, ProblemException {
        JsonObject reference = expected(scan, "poisson_ml_fixed_background");
        String drift = model(scan);

        RecordView fit = fit(
                scan,
                "{'method':'fringe.poisson-likelihood/1','covariance':'observed',"
                        + darkAsKnown(expected(scan, "lsq_linear_no_drift")) + drift + "}");

        agrees(fit, reference);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "fringe_01",
                "fringe_02",
                "fringe_03",
                "fringe_04",
                "fringe_05",
                "fringe_06",
                "fringe_07",
                "fringe_08"
            })
    void likelihoodTogetherWithTheDarkCountsIsThatOfAMinimiser(String scan) throws IOException, ProblemException {
        JsonObject reference = expected(scan, "poisson_ml_joint_with_dark");
        String drift = model(scan);

        RecordView fit = fit(
                scan,
                "{'method':'fringe.poisson-likelihood/1','covariance':'observed',"
                        + "'background':{'sort':'channel','channel':'dark','joint':true}" + drift + "}");

        agrees(fit, reference);
        double exposure =
                fit.result().object("exposure").orElseThrow().number("si").orElseThrow();
        assertThat(Bench.value(fit, "background") / exposure)
                .isCloseTo(number(reference, "B_rate"), within(EDM * number(reference, "sigma_B")));
    }

    /** What the programs fitted beside mean, visibility and phase. */
    private static String model(String scan) {
        return switch (scan) {
            case "fringe_04" -> ",'driftOrder':1";
            case "fringe_06" -> ",'secondHarmonic':true";
            case "fringe_08" -> ",'phaseDrift':true";
            default -> "";
        };
    }

    private static void agrees(RecordView fit, JsonObject reference) {
        assertThat(rate(fit)).isCloseTo(number(reference, "N_rate"), within(EDM * number(reference, "sigma_N")));
        assertThat(Bench.member(fit, "visibility", "value"))
                .isCloseTo(number(reference, "V"), within(EDM * number(reference, "sigma_V")));
        assertThat(Bench.member(fit, "phase", "value"))
                .isCloseTo(number(reference, "phi"), within(EDM * number(reference, "sigma_phi")));
        assertThat(Bench.member(fit, "visibility", "u"))
                .isCloseTo(number(reference, "sigma_V"), within(2e-3 * number(reference, "sigma_V")));
        assertThat(fit.result().number("deviance").orElseThrow())
                .isCloseTo(number(reference, "deviance"), within(1e-6 * number(reference, "deviance")));
    }

    /** The rate is written with all digits, so that the reference's own background is taken off. */
    private static String darkAsKnown(JsonObject reference) {
        return "'background':{'sort':'known','si':" + number(reference, "background_rate") + "}";
    }

    private static double number(JsonObject reference, String name) {
        return reference.number(name).orElseThrow();
    }
}
