package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.RiceDistribution;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Fringe statistics against independent numerics; each case says how its values were made. */
class FringeStatisticsReferenceTest {
    private static List<JsonNode> cases(String kind) throws IOException {
        List<JsonNode> found = new ArrayList<>();
        for (JsonNode node : ReferenceScans.checks()) {
            if (node.get("id").textValue().startsWith(kind)) {
                found.add(node);
            }
        }
        assertThat(found).as(kind).isNotEmpty();
        return found;
    }

    private static double in(JsonNode node, String name) {
        return node.get("inputs").get(name).get("value").doubleValue();
    }

    private static void check(JsonNode node, String name, double value) {
        double theirs = node.get("expected").get(name).get("value").doubleValue();
        JsonNode tolerance = node.get("tolerance");
        double allowed = tolerance.get("absolute").doubleValue()
                + tolerance.get("relative").doubleValue() * Math.abs(theirs);
        assertThat(value).as(node.get("id").textValue() + " " + name).isCloseTo(theirs, within(allowed));
    }

    @Test
    void expectedErrorsOfAPlannedScan() throws IOException {
        for (JsonNode node : cases("b.sigma_V")) {
            FringePlanning.ExpectedErrors errors = FringePlanning.errors(
                    (int) in(node, "points_per_one_period"),
                    in(node, "mean_signal_per_point"),
                    in(node, "V"),
                    in(node, "background_per_point_known"),
                    in(node, "phase"));
            check(node, "sigma_V_ML", errors.visibilityLikelihood());
            check(node, "sigma_phi_ML", errors.phaseLikelihood());
            check(node, "sigma_V_LSQ", errors.visibilitySquares());
            check(node, "sigma_phi_LSQ", errors.phaseSquares());
        }
    }

    @Test
    void closedFormsAtManyPoints() {
        // physics of the field: sigma_V^2 = V^2 / {N [(1 - V^2)^(-1/2) - 1]}, sigma_phi^2 = 1 / {N [1 - sqrt(1 -
        // V^2)]}.
        double visibility = 0.4;
        double root = Math.sqrt(1 - visibility * visibility);

        double forVisibility = FringePlanning.countsForVisibility(0.01, visibility, 0);
        double forPhase = FringePlanning.countsForPhase(0.05, visibility, 0);

        assertThat(forVisibility).isCloseTo(visibility * visibility / (1e-4 * (1 / root - 1)), within(1e-5));
        assertThat(forPhase).isCloseTo(1 / (0.0025 * (1 - root)), within(1e-6));
        assertThat(FringePlanning.countsForVisibility(0.01, 0, 0)).isCloseTo(2 / 1e-4, within(1e-5));
    }

    @Test
    void riceLawOfTheVisibility() throws IOException {
        for (JsonNode node : cases("b.rice")) {
            double noise = in(node, "sigma_quadrature");
            double visibility = in(node, "true_V");
            check(node, "mean_Vhat", noise * RiceDistribution.mean(visibility / noise));
            double meanSquare = visibility * visibility + 2 * noise * noise;
            check(node, "mean_Vhat_squared", meanSquare);
            check(node, "second_moment_corrected", AmplitudeLimits.secondMomentCorrected(meanSquare, noise));
        }
    }

    @Test
    void upperLimits() throws IOException {
        for (JsonNode node : cases("b.upper_limit")) {
            double seen = in(node, "V_hat");
            double noise = in(node, "sigma_quadrature");
            double level = in(node, "confidence");
            check(node, "classical_upper_limit", AmplitudeLimits.classicalUpperLimit(seen, noise, level));
            check(node, "bayes_flat_prior_upper_limit", AmplitudeLimits.flatPriorUpperLimit(seen, noise, level));
            check(node, "no_fringe_threshold", AmplitudeLimits.threshold(noise, level));
        }
    }

    @Test
    void lossesWhileScanning() throws IOException {
        for (JsonNode node : cases("b.jitter")) {
            check(node, "jitter_factor", FringePlanning.jitterFactor(in(node, "sigma_phi")));
            check(node, "travel_factor", FringePlanning.travelFactor(in(node, "travel_per_dwell"), in(node, "period")));
        }
    }

    @Test
    void contrastOfExtremesAgainstFirstHarmonic() throws IOException {
        for (JsonNode node : cases("b.harmonics")) {
            check(node, "V_minmax", FringePlanning.contrastOfCurve(in(node, "c1"), in(node, "c2"), in(node, "p")));
            check(node, "V_first_harmonic", in(node, "c1"));
        }
        for (JsonNode node : cases("b.fringe_fit")) {
            List<Double> counts = new ArrayList<>();
            node.get("inputs").get("counts").get("value").forEach(count -> counts.add(count.doubleValue()));
            double[] array = counts.stream().mapToDouble(Double::doubleValue).toArray();
            check(node, "V_minmax_raw", FringePlanning.contrastOfExtremes(array, in(node, "background_known")));
        }
    }

    @Test
    void neymanWeightsAreBiasedAndTheOthersAreNot() {
        // Known bias of weights 1 / counts: a constant level of 20 comes out near 19, of 5 near 3.8.
        java.util.Random random = new java.util.Random(20310514);
        double[] positions = new double[16];
        for (int i = 0; i < 16; i++) {
            positions[i] = i / 16.0;
        }
        double byCounts = 0;
        double byModel = 0;
        double byLikelihood = 0;
        int scans = 2000;
        for (int k = 0; k < scans; k++) {
            double[] counts = new double[16];
            for (int i = 0; i < 16; i++) {
                counts[i] = SimulatedScans.poisson(random, 20);
            }
            FringeData data = FringeData.of(positions, counts);
            FringeOptions options = FringeOptions.atPeriod(1);
            byCounts += mean(data, options.estimator(Estimator.WEIGHTED_BY_COUNTS)) / scans;
            byModel += mean(data, options.estimator(Estimator.WEIGHTED)) / scans;
            byLikelihood += mean(data, options) / scans;
        }

        assertThat(byCounts).isBetween(18.8, 19.2);
        assertThat(byModel).isCloseTo(20, within(0.08));
        assertThat(byLikelihood).isCloseTo(20, within(0.08));
    }

    private static double mean(FringeData data, FringeOptions options) {
        return FringeFitter.fit(data, options).orThrow().mean().value();
    }
}
