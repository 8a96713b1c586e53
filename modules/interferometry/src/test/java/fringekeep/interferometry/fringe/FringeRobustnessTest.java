package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.interferometry.statistics.Interval;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Any possible scan gives a fit with finite numbers or a reason, never an exception, whatever is asked of it. */
class FringeRobustnessTest {
    private static FringeOptions options(Random random) {
        Estimator estimator = Estimator.values()[random.nextInt(4)];
        FringeOptions options = FringeOptions.atPeriod(1)
                .estimator(estimator)
                .covariance(random.nextBoolean() ? CovarianceSort.EXPECTED : CovarianceSort.OBSERVED)
                .driftOrder(random.nextInt(4) == 0 ? random.nextInt(4) : 0)
                .secondHarmonic(random.nextInt(4) == 0)
                .phaseDrift(random.nextInt(6) == 0)
                .periodFree(random.nextInt(6) == 0)
                .scaleByDispersion(random.nextBoolean());
        return options.background(
                switch (random.nextInt(4)) {
                    case 0 -> Background.NONE;
                    case 1 -> Background.known(random.nextDouble(), 0.1);
                    case 2 -> Background.ESTIMATED;
                    default -> Background.JOINT;
                });
    }

    private static FringeData scan(Random random) {
        int n = 3 + random.nextInt(20);
        double mean = StrictMath.pow(10, 4 * random.nextDouble() - 1);
        double visibility = random.nextDouble();
        double[] positions = new double[n];
        double[] counts = new double[n];
        double[] exposures = new double[n];
        double[] times = new double[n];
        boolean[] masked = new boolean[n];
        double step = 0.02 + 0.3 * random.nextDouble();
        for (int i = 0; i < n; i++) {
            positions[i] = step * i;
            exposures[i] = 0.5 + random.nextDouble();
            times[i] = i;
            masked[i] = random.nextInt(15) == 0;
            counts[i] = SimulatedScans.poisson(
                    random, exposures[i] * mean * (1 + visibility * StrictMath.cos(2 * Math.PI * positions[i])));
        }
        int dark = 1 + random.nextInt(3);
        double[] darkCounts = new double[dark];
        double[] darkExposures = new double[dark];
        for (int i = 0; i < dark; i++) {
            darkExposures[i] = 1;
            darkCounts[i] = SimulatedScans.poisson(random, 0.3 * mean * random.nextDouble());
        }
        FringeData data = FringeData.of(positions, counts)
                .exposures(exposures)
                .times(times)
                .masked(masked)
                .dark(darkCounts, darkExposures);
        return random.nextInt(5) == 0
                ? data.deadTime(new DeadTime(DeadTime.Sort.values()[random.nextInt(3)], 1e-5))
                : data;
    }

    private static void finite(double... values) {
        for (double value : values) {
            assertThat(value).isFinite();
        }
    }

    private static void ends(Optional<Interval> interval) {
        interval.ifPresent(i -> finite(i.low(), i.high()));
    }

    @Test
    void anyScanGivesFiniteNumbersOrAReason() {
        int fitted = 0;
        for (int seed = 0; seed < 1500; seed++) {
            Random random = new Random(seed);
            FringeData data = scan(random);
            FringeOptions options = options(random);
            FringeOutcome outcome;
            try {
                outcome = FringeFitter.fit(data, options);
                if (outcome instanceof FringeFit fit) {
                    fitted++;
                    finite(fit.values());
                    finite(fit.covariance());
                    FringeGoodness goodness = fit.goodness();
                    finite(goodness.pValue(), goodness.dispersion(), goodness.statistic());
                    finite(fit.expectedCounts());
                    if (seed % 4 == 0) {
                        ends(fit.visibilityInterval(0.6827));
                        ends(fit.phaseInterval(0.6827));
                        fit.significance().ifPresent(s -> finite(s.statistic(), s.deviations()));
                        fit.upperLimit(0.95).ifPresent(limit -> finite(limit.value()));
                    }
                }
            } catch (RuntimeException | AssertionError e) {
                throw new AssertionError("seed " + seed + ", " + options, e);
            }
        }
        assertThat(fitted).isGreaterThan(900);
    }
}
