package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Estimate;
import java.io.IOException;
import java.nio.file.Files;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Fits against other programs: iminuit 2.11.2, scipy 1.10.1 and R (nls, glm); see ORIGIN.txt beside the files. iminuit and
 * R stop at a finite tolerance; the numbers agree to a thousandth of a standard error or better, most to 1e-6.
 */
class FringeFitReferenceTest {
    static IntStream scans() {
        return IntStream.rangeClosed(1, 8);
    }

    private static FringeOptions model(int number) {
        return FringeOptions.atPeriod(266e-9)
                .driftOrder(number == 4 ? 1 : 0)
                .secondHarmonic(number == 6)
                .phaseDrift(number == 8);
    }

    private static Background fixed(FringeData data) {
        return Background.known(data.darkTotal() / data.darkExposureTotal(), 0);
    }

    private static void agree(Estimate ours, JsonNode theirs, String value, String sigma, double part) {
        double error = theirs.get(sigma).doubleValue();
        assertThat(ours.value()).as(value).isCloseTo(theirs.get(value).doubleValue(), within(part * error));
        assertThat(ours.standardUncertainty()).as(sigma).isCloseTo(error, within(5 * part * error));
    }

    @ParameterizedTest
    @MethodSource("scans")
    void poissonLikelihoodWithFixedBackground(int number) throws IOException {
        FringeData data = ReferenceScans.scan(number);
        JsonNode theirs = ReferenceScans.fits(number).get("poisson_ml_fixed_background");

        FringeFit fit = FringeFitter.fit(
                        data, model(number).background(fixed(data)).covariance(CovarianceSort.OBSERVED))
                .orThrow();

        assertThat(fit.deviance()).isCloseTo(theirs.get("deviance").doubleValue(), within(2e-7));
        agree(fit.mean(), theirs, "N_rate", "sigma_N", 1e-3);
        agree(fit.visibility().orElseThrow(), theirs, "V", "sigma_V", 1e-3);
        agree(fit.phase().orElseThrow(), theirs, "phi", "sigma_phi", 1e-3);
        if (number == 4) {
            agree(fit.estimate("drift1").orElseThrow(), theirs, "drift", "sigma_drift", 1e-3);
        }
        if (number == 8) {
            agree(fit.estimate("phaseDrift").orElseThrow(), theirs, "phase_drift", "sigma_phase_drift", 1e-3);
        }
    }

    @ParameterizedTest
    @MethodSource("scans")
    void jointLikelihoodWithDarkCounts(int number) throws IOException {
        FringeData data = ReferenceScans.scan(number);
        JsonNode theirs = ReferenceScans.fits(number).get("poisson_ml_joint_with_dark");

        FringeFit fit = FringeFitter.fit(
                        data, model(number).background(Background.JOINT).covariance(CovarianceSort.OBSERVED))
                .orThrow();

        assertThat(fit.deviance()).isCloseTo(theirs.get("deviance").doubleValue(), within(2e-7));
        agree(fit.mean(), theirs, "N_rate", "sigma_N", 1e-3);
        agree(fit.visibility().orElseThrow(), theirs, "V", "sigma_V", 1e-3);
        agree(fit.phase().orElseThrow(), theirs, "phi", "sigma_phi", 1e-3);
        agree(fit.estimate("background").orElseThrow(), theirs, "B_rate", "sigma_B", 1e-3);
    }

    @ParameterizedTest
    @MethodSource("scans")
    void unweightedLeastSquares(int number) throws IOException {
        FringeData data = ReferenceScans.scan(number);
        JsonNode theirs = ReferenceScans.fits(number).get("lsq_linear_no_drift");
        FringeOptions options = FringeOptions.atPeriod(266e-9)
                .secondHarmonic(number == 6)
                .estimator(Estimator.UNWEIGHTED)
                .background(Background.ESTIMATED)
                .covariance(CovarianceSort.OBSERVED);

        FringeFit counted = FringeFitter.fit(data, options).orThrow();
        FringeFit scattered = FringeFitter.fit(
                        data, options.background(fixed(data)).covariance(CovarianceSort.RESIDUAL_SCATTER))
                .orThrow();

        Estimate visibility = counted.visibility().orElseThrow();
        assertThat(counted.mean().value()).isCloseTo(theirs.get("N_rate").doubleValue(), within(1e-11));
        assertThat(visibility.value()).isCloseTo(theirs.get("V").doubleValue(), within(1e-11));
        assertThat(counted.phase().orElseThrow().value())
                .isCloseTo(theirs.get("phi").doubleValue(), within(1e-11));
        assertThat(visibility.standardUncertainty())
                .isCloseTo(theirs.get("sigma_V_from_counts_and_dark").doubleValue(), within(1e-9));
        assertThat(counted.phase().orElseThrow().standardUncertainty())
                .isCloseTo(theirs.get("sigma_phi_from_counts").doubleValue(), within(1e-9));
        assertThat(scattered.visibility().orElseThrow().standardUncertainty())
                .isCloseTo(theirs.get("sigma_V_from_residual_scatter").doubleValue(), within(1e-9));
        double dwell = data.exposures()[0];
        assertThat(counted.residualSumOfSquares() / (dwell * dwell))
                .isCloseTo(theirs.get("rss").doubleValue(), within(1e-7));
        assertThat(counted.degreesOfFreedom()).isEqualTo(theirs.get("dof").intValue());
    }

    @ParameterizedTest
    @MethodSource("scans")
    void leastSquaresWeightedByCountsAsOtherProgramsDo(int number) throws IOException {
        FringeData data = ReferenceScans.scan(number);
        JsonNode theirs = ReferenceScans.fits(number).get("weighted_lsq_fixed_background");

        FringeFit fit = FringeFitter.fit(
                        data,
                        model(number)
                                .background(fixed(data))
                                .estimator(Estimator.WEIGHTED_BY_COUNTS)
                                .covariance(CovarianceSort.OBSERVED))
                .orThrow();

        assertThat(fit.chiSquare()).isCloseTo(theirs.get("chi2").doubleValue(), within(1e-6));
        agree(fit.visibility().orElseThrow(), theirs, "V", "sigma_V", 1e-3);
        agree(fit.phase().orElseThrow(), theirs, "phi", "sigma_phi", 1e-3);
        assertThat(fit.degreesOfFreedom()).isEqualTo(theirs.get("dof").intValue());
    }

    static Stream<String> statisticalProgram() throws IOException {
        return Files.readAllLines(ReferenceScans.FOLDER.resolve("r-fits.csv")).stream()
                .filter(line -> line.startsWith("public,"));
    }

    @ParameterizedTest
    @MethodSource("statisticalProgram")
    void generalLinearModelOfTheStatisticalProgram(String line) throws IOException {
        List<String> cells = Stream.of(line.split(",", -1)).map(String::trim).toList();
        FringeData data = ReferenceScans.scan(Integer.parseInt(cells.get(1)));
        FringeOptions options = FringeOptions.atPeriod(266e-9).background(fixed(data));

        FringeFit glm = FringeFitter.fit(data, options).orThrow();
        FringeFit nls = FringeFitter.fit(
                        data, options.estimator(Estimator.UNWEIGHTED).covariance(CovarianceSort.RESIDUAL_SCATTER))
                .orThrow();

        double[] ours = {
            nls.mean().value(),
            nls.visibility().orElseThrow().value(),
            nls.phase().orElseThrow().value(),
            nls.visibility().orElseThrow().standardUncertainty(),
            nls.phase().orElseThrow().standardUncertainty(),
            glm.mean().value(),
            glm.visibility().orElseThrow().value(),
            glm.phase().orElseThrow().value(),
            glm.visibility().orElseThrow().standardUncertainty(),
            glm.phase().orElseThrow().standardUncertainty(),
            glm.deviance()
        };
        // The program's own stop: 1e-8 relative on the deviance, which is 1e-4 of a standard error on the parameters.
        double[] tolerances = {1e-6, 1e-6, 1e-6, 1e-5, 1e-5, 1e-6, 1e-5, 1e-5, 2e-5, 2e-4, 1e-6};
        for (int i = 0; i < ours.length; i++) {
            double theirs = Double.parseDouble(cells.get(i + 2));
            assertThat(ours[i]).as("column " + (i + 2)).isCloseTo(theirs, within(tolerances[i] * Math.max(1, theirs)));
        }
    }

    static Stream<JsonNode> fits() throws IOException {
        return StreamSupport.stream(ReferenceScans.checks().spliterator(), false)
                .filter(node -> node.get("id").textValue().startsWith("b.fringe_fit"));
    }

    private static double[] array(JsonNode node) {
        return StreamSupport.stream(node.get("value").spliterator(), false)
                .mapToDouble(JsonNode::doubleValue)
                .toArray();
    }

    private static void check(JsonNode expected, String name, double value) {
        double theirs = expected.get(name).get("value").doubleValue();
        assertThat(value).as(name).isCloseTo(theirs, within(1e-7 + 1e-6 * Math.abs(theirs)));
    }

    @ParameterizedTest
    @MethodSource("fits")
    void fitsOfThePublicChecks(JsonNode node) {
        JsonNode in = node.get("inputs");
        JsonNode expected = node.get("expected");
        double[] positions = array(in.get("position"));
        for (int i = 0; i < positions.length; i++) {
            positions[i] *= 1e-9;
        }
        FringeData data = FringeData.of(positions, array(in.get("counts")));
        FringeOptions options = FringeOptions.atPeriod(
                        in.get("period").get("value").doubleValue() * 1e-9)
                .background(
                        Background.known(in.get("background_known").get("value").doubleValue(), 0));

        FringeFit likelihood = FringeFitter.fit(data, options).orThrow();
        FringeFit squares = FringeFitter.fit(
                        data, options.estimator(Estimator.UNWEIGHTED).covariance(CovarianceSort.OBSERVED))
                .orThrow();
        FringeFit weighted = FringeFitter.fit(
                        data, options.estimator(Estimator.WEIGHTED_BY_COUNTS).covariance(CovarianceSort.OBSERVED))
                .orThrow();

        check(expected, "N_LSQ", squares.mean().value());
        check(expected, "V_LSQ", squares.visibility().orElseThrow().value());
        check(expected, "phi_LSQ", squares.phase().orElseThrow().value());
        check(
                expected,
                "sigma_V_LSQ_from_counts",
                squares.visibility().orElseThrow().standardUncertainty());
        check(expected, "V_WLSQ", weighted.visibility().orElseThrow().value());
        check(expected, "phi_WLSQ", weighted.phase().orElseThrow().value());
        check(expected, "sigma_V_WLSQ", weighted.visibility().orElseThrow().standardUncertainty());
        check(expected, "chi2_WLSQ", weighted.chiSquare());
        check(expected, "N_ML", likelihood.mean().value());
        check(expected, "V_ML", likelihood.visibility().orElseThrow().value());
        check(expected, "phi_ML", likelihood.phase().orElseThrow().value());
        check(expected, "sigma_V_ML", likelihood.visibility().orElseThrow().standardUncertainty());
        check(expected, "sigma_phi_ML", likelihood.phase().orElseThrow().standardUncertainty());
        check(expected, "deviance_ML", likelihood.deviance());
    }

    @ParameterizedTest
    @MethodSource("scans")
    void biasCorrectionOfTheLikelihoodFit(int number) throws IOException {
        FringeData data = ReferenceScans.scan(number);
        JsonNode theirs = ReferenceScans.fits(number);
        JsonNode fit = theirs.get("poisson_ml_fixed_background");

        double corrected = AmplitudeLimits.biasCorrected(
                fit.get("V").doubleValue(), fit.get("sigma_V").doubleValue());

        assertThat(data.size()).isPositive();
        assertThat(corrected)
                .isCloseTo(
                        theirs.get("bias_corrected_V_sqrt_max0_V2_minus_sigma2").doubleValue(), within(1e-12));
    }
}
