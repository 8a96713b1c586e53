package fringekeep.benchmarks;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.fringe.CovarianceSort;
import fringekeep.interferometry.fringe.Estimator;
import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.FringeFitter;
import fringekeep.interferometry.fringe.FringeOptions;
import fringekeep.interferometry.molecule.MeasuredCurve;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.PowerCurveChoices;
import fringekeep.interferometry.molecule.PowerCurveFitter;
import fringekeep.interferometry.molecule.PowerCurveIntervals;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import fringekeep.interferometry.nearfield.WeightedNodes;
import fringekeep.interferometry.special.Bessel;
import fringekeep.interferometry.special.SplitMix64;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;
import org.apache.commons.math3.analysis.MultivariateMatrixFunction;
import org.apache.commons.math3.analysis.MultivariateVectorFunction;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresBuilder;
import org.apache.commons.math3.fitting.leastsquares.LevenbergMarquardtOptimizer;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Fits, averaged curves and Bessel functions against SciPy and Commons Math on the same invented data. */
class NumericsBenchmarkTest {
    private static final int SCANS = 200;
    private static final int POINTS = 40;
    private static final double PERIOD = 266e-9;
    private static final FringeOptions SQUARES =
            FringeOptions.atPeriod(PERIOD).estimator(Estimator.UNWEIGHTED).covariance(CovarianceSort.RESIDUAL_SCATTER);

    @TempDir
    private static Path folder;

    private static Optional<OtherSide> scipy = Optional.empty();
    private static Path scans = Path.of("");
    private static final double[] PLACES = new double[POINTS];
    private static final List<FringeData> DATA = new ArrayList<>();
    /** The same counts, every scan over a grid of its own: moved by whole picometres. */
    private static final List<FringeData> MOVED = new ArrayList<>();

    @BeforeAll
    static void prepare() throws IOException {
        scipy = OtherSide.start(folder);
        Bench.print(
                "reference: %s; JDK %s; load average %.1f",
                scipy.map(OtherSide::version).orElse("SciPy is MISSING: rows against it are left out"),
                System.getProperty("java.version"),
                ManagementFactory.getOperatingSystemMXBean().getSystemLoadAverage());
        SplitMix64 random = new SplitMix64(266);
        List<double[]> rows = new ArrayList<>();
        for (int k = 0; k < POINTS; k++) {
            PLACES[k] = 16.0 * k;
        }
        rows.add(PLACES);
        for (int scan = 0; scan < SCANS; scan++) {
            double phase = 2 * Math.PI * random.nextDouble();
            double[] counts = new double[POINTS];
            for (int k = 0; k < POINTS; k++) {
                double mean = 300 * (1 + 0.4 * Math.cos(2 * Math.PI * PLACES[k] / 266 + phase));
                counts[k] = Math.max(0, Math.rint(mean + Math.sqrt(mean) * random.nextGaussian()));
            }
            rows.add(counts);
            double move = 1e-12 * scan;
            DATA.add(FringeData.of(Arrays.stream(PLACES).map(x -> x * 1e-9).toArray(), counts));
            MOVED.add(FringeData.of(
                    Arrays.stream(PLACES).map(x -> x * 1e-9 + move).toArray(), counts));
        }
        scans = table("scans.csv", rows);
    }

    @AfterAll
    static void end() {
        scipy.ifPresent(OtherSide::close);
    }

    private static Path table(String name, List<double[]> rows) throws IOException {
        String text = rows.stream()
                .map(row -> Arrays.stream(row).mapToObj(Double::toString).collect(Collectors.joining(",")))
                .collect(Collectors.joining("\n"));
        return Files.writeString(folder.resolve(name), text, StandardCharsets.UTF_8);
    }

    private static double fits(List<FringeData> scans, FringeOptions options) {
        return Bench.cpu(() -> {
                    double sum = 0;
                    for (FringeData data : scans) {
                        sum += FringeFitter.fit(data, options).orThrow().mean().value();
                    }
                    assertThat(sum).isPositive();
                })
                / SCANS;
    }

    private static void againstScipy(
            String row,
            String what,
            List<FringeData> data,
            FringeOptions options,
            ToDoubleFunction<FringeFit> result,
            double tolerance) {
        if (scipy.isEmpty()) {
            return;
        }
        OtherSide other = scipy.orElseThrow();
        double[] theirs = other.ask(what, scans, 50).results();
        for (int k = 0; k < theirs.length; k++) {
            FringeFit fit = FringeFitter.fit(data.get(k), options).orThrow();
            assertThat(result.applyAsDouble(fit)).isCloseTo(theirs[k], within(tolerance));
        }
        Bench.compare(
                row,
                () -> fits(data, options),
                "SciPy",
                () -> other.ask(what, scans, 50).seconds() / 50);
    }

    private static double visibility(FringeFit fit) {
        return fit.visibility().orElseThrow().value();
    }

    @Test
    void fringeFitAtFixedPeriodAgainstCurveFit() {
        againstScipy("fringe fit, period fixed", "fixed", DATA, SQUARES, NumericsBenchmarkTest::visibility, 1e-6);
    }

    @Test
    void fringeFitOverANewGridEachTimeAgainstCurveFit() {
        againstScipy(
                "the same, a new grid each time", "fixed", MOVED, SQUARES, NumericsBenchmarkTest::visibility, 1e-6);
    }

    @Test
    void freePeriodOverANewGridEachTimeAgainstCurveFit() {
        againstScipy(
                "period free, a new grid each time",
                "free",
                MOVED,
                SQUARES.periodFree(true),
                fit -> 1e9 * fit.estimate("period").orElseThrow().value(),
                1e-4);
    }

    @Test
    void poissonLikelihoodAgainstMinimize() {
        againstScipy(
                "Poisson likelihood, period fixed",
                "poisson",
                DATA,
                FringeOptions.atPeriod(PERIOD),
                NumericsBenchmarkTest::visibility,
                1e-4);
    }

    @Test
    void freePeriodAgainstCurveFit() {
        againstScipy(
                "fringe fit, period free",
                "free",
                DATA,
                SQUARES.periodFree(true),
                fit -> 1e9 * fit.estimate("period").orElseThrow().value(),
                1e-4);
    }

    @Test
    void fringeFitAtFixedPeriodAgainstCommonsMath() {
        for (int k = 0; k < 20; k++) {
            double theirs = commons(DATA.get(k))[1];
            FringeFit fit = FringeFitter.fit(DATA.get(k), SQUARES).orThrow();
            assertThat(Math.abs(theirs)).isCloseTo(visibility(fit), within(1e-6));
        }
        Bench.compare(
                "fringe fit, period fixed",
                () -> fits(DATA, SQUARES),
                "Commons Math LM",
                () -> Bench.cpu(() -> {
                            for (FringeData data : DATA) {
                                assertThat(commons(data)).hasSize(3);
                            }
                        })
                        / SCANS);
    }

    private static double[] commons(FringeData data) {
        double[] counts = data.counts();
        double mean = Arrays.stream(counts).average().orElseThrow();
        double a = 0;
        double b = 0;
        for (int k = 0; k < POINTS; k++) {
            double t = 2 * Math.PI * PLACES[k] / 266;
            a += 2 * (counts[k] - mean) * Math.cos(t) / POINTS;
            b += 2 * (counts[k] - mean) * Math.sin(t) / POINTS;
        }
        MultivariateVectorFunction model = p -> {
            double[] values = new double[POINTS];
            for (int k = 0; k < POINTS; k++) {
                values[k] = p[0] * (1 + p[1] * Math.cos(2 * Math.PI * PLACES[k] / 266 + p[2]));
            }
            return values;
        };
        MultivariateMatrixFunction slopes = p -> {
            double[][] rows = new double[POINTS][];
            for (int k = 0; k < POINTS; k++) {
                double t = 2 * Math.PI * PLACES[k] / 266 + p[2];
                double cos = Math.cos(t);
                rows[k] = new double[] {1 + p[1] * cos, p[0] * cos, -p[0] * p[1] * Math.sin(t)};
            }
            return rows;
        };
        return new LevenbergMarquardtOptimizer()
                .optimize(new LeastSquaresBuilder()
                        .start(new double[] {mean, Math.hypot(a, b) / mean, Math.atan2(-b, a)})
                        .model(model, slopes)
                        .target(counts)
                        .maxEvaluations(200)
                        .maxIterations(200)
                        .build())
                .getPoint()
                .toArray();
    }

    @Test
    void averagedVisibilityAgainstPowerWithBootstrap() throws IOException {
        double[] speeds = new double[64];
        double[] weights = new double[64];
        for (int k = 0; k < 64; k++) {
            double u = (k + 0.5) / 64 * 7 - 3.5;
            speeds[k] = 140 + 14 * u;
            weights[k] = Math.exp(-0.5 * u * u);
        }
        PowerSeriesSetup setup = PowerSeriesSetup.symmetric(PERIOD, 0.42, 0.105, LaserBeam.ideal(2 * PERIOD, 0.9e-3));
        BeamEnsemble beam = new BeamEnsemble(
                WeightedNodes.of(speeds, weights),
                WeightedNodes.single(1000 * 1.66053906660e-27),
                WeightedNodes.single(0));
        VisibilityAgainstPower truth = new VisibilityAgainstPower(setup, beam, Description.QUANTUM);
        SplitMix64 random = new SplitMix64(9);
        double[] powers = new double[25];
        double[] values = new double[25];
        double[] uncertainties = new double[25];
        for (int k = 0; k < 25; k++) {
            powers[k] = 0.5 + 0.4 * k;
            uncertainties[k] = 0.008;
            values[k] = truth.visibility(powers[k], new OpticalResponse(105e-30, 0)) + 0.008 * random.nextGaussian();
        }
        MeasuredCurve data = new MeasuredCurve(powers, values, uncertainties);
        PowerCurveFitter fitter = new PowerCurveFitter(setup, beam, PowerCurveChoices.polarizabilityOnly());
        if (scipy.isEmpty()) {
            return;
        }
        OtherSide other = scipy.orElseThrow();
        Path file = table("powers.csv", List.of(powers, values, uncertainties));
        double[] theirs = other.ask("bootstrap", file, 1000).results();
        PropertyFit fit = fitter.fit(data, Description.QUANTUM).orThrow();
        PowerCurveIntervals.Bootstrap spread =
                new PowerCurveIntervals(fitter, data, Description.QUANTUM, fit).bootstrap(7, 2000);
        assertThat(1e30 * fit.estimate(Parameter.POLARIZABILITY_VOLUME).value()).isCloseTo(theirs[0], within(2e-3));
        // 1,000 resamples give a spread to 2.2 %, 2,000 to 1.6 %.
        assertThat(1e30 * spread.deviation()[0]).isCloseTo(theirs[1], within(0.1 * theirs[1]));
        Bench.compare(
                "V(P) fit with 2,000-fold bootstrap",
                () -> Bench.cpu(() -> {
                    PropertyFit found = fitter.fit(data, Description.QUANTUM).orThrow();
                    assertThat(new PowerCurveIntervals(fitter, data, Description.QUANTUM, found)
                                    .bootstrap(7, 2000)
                                    .failed())
                            .isZero();
                }),
                "SciPy (100, scaled)",
                () -> 20 * other.ask("bootstrap", file, 100).seconds());
    }

    @Test
    void besselFunctions() throws IOException {
        double[] places = new double[100_000];
        SplitMix64 random = new SplitMix64(3);
        for (int k = 0; k < places.length; k++) {
            places[k] = 40 * random.nextDouble();
        }
        if (scipy.isEmpty()) {
            return;
        }
        OtherSide other = scipy.orElseThrow();
        Path file = table("bessel.csv", List.of(places));
        double[] theirs = other.ask("bessel", file, 1000).results();
        for (int k = 0; k < theirs.length; k++) {
            assertThat(Bessel.j(2, places[k])).isCloseTo(theirs[k], within(1e-13));
        }
        Bench.compare(
                "one value of J2",
                () -> Bench.cpu(() -> {
                            double sum = 0;
                            for (double place : places) {
                                sum += Bessel.j(2, place);
                            }
                            assertThat(sum).isFinite();
                        })
                        / places.length,
                "scipy.special.jv, array",
                () -> other.ask("bessel", file, 1).seconds() / places.length);
    }
}
