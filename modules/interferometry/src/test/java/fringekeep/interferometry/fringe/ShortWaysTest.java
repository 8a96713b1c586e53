package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** The short ways to frequent fits give the bits, the findings and the refusals of the general way. */
class ShortWaysTest {
    private static final int SCANS = 400;

    private static List<FringeOptions> ways() {
        List<FringeOptions> ways = new ArrayList<>();
        for (CovarianceSort sort : CovarianceSort.values()) {
            FringeOptions squares =
                    FringeOptions.atPeriod(1).estimator(Estimator.UNWEIGHTED).covariance(sort);
            ways.add(squares);
            ways.add(squares.scaleByDispersion(true));
            ways.add(squares.periodFree(true));
            ways.add(squares.periodFree(true).scaleByDispersion(true).period(1.01));
            if (sort != CovarianceSort.RESIDUAL_SCATTER) {
                ways.add(FringeOptions.atPeriod(1).covariance(sort));
                ways.add(FringeOptions.atPeriod(1).covariance(sort).scaleByDispersion(true));
            }
        }
        return ways;
    }

    private static FringeData scan(Random random, int k) {
        int points = 3 + random.nextInt(k % 9 == 0 ? 5 : 60);
        double mean = Math.pow(10, -1 + 8 * random.nextDouble());
        double visibility = 1.05 * random.nextDouble();
        double phase = 6.3 * random.nextDouble();
        double[] places = new double[points];
        double[] counts = new double[points];
        double[] exposures = new double[points];
        double[] monitor = new double[points];
        boolean[] masked = new boolean[points];
        double step = k % 5 == 0 ? 0.25 : 0.02 + 0.2 * random.nextDouble();
        double start = k % 3 == 0 ? 0 : 40 * random.nextDouble();
        for (int i = 0; i < points; i++) {
            places[i] = start + step * i;
            exposures[i] = 0.5 + random.nextDouble();
            monitor[i] = 100 + 20 * random.nextDouble();
            masked[i] = k % 4 == 0 && random.nextInt(8) == 0;
            double expected = mean * (1 + visibility * Math.cos(2 * Math.PI * places[i] * 1.003 + phase));
            double noise = k % 11 == 0 ? 0 : Math.sqrt(Math.abs(expected)) * random.nextGaussian();
            counts[i] = Math.max(0, Math.rint(expected + noise));
        }
        FringeData data = FringeData.of(places, counts).masked(masked);
        return k % 2 == 0 ? data : data.exposures(exposures).monitor(monitor);
    }

    @Test
    void shortWaysGiveTheBitsOfTheGeneralOne() {
        Random random = new Random(4);
        for (int k = 0; k < SCANS; k++) {
            FringeData data = scan(random, k);
            for (FringeOptions way : ways()) {
                compare(FringeFitter.general(data, way), FringeFitter.fit(data, way), "scan " + k + ", " + way);
            }
        }
    }

    @Test
    void ordinaryScansTakeTheShortWays() {
        FringeOptions squares = FringeOptions.atPeriod(266e-9).estimator(Estimator.UNWEIGHTED);
        double[] places = new double[40];
        double[] counts = new double[40];
        for (int i = 0; i < 40; i++) {
            places[i] = 16e-9 * i;
            counts[i] = Math.rint(300 * (1 + 0.4 * StrictMath.cos(2 * Math.PI * 16 * i / 266.0)) + 11 * (i % 3 - 1));
        }
        FringeData data = FringeData.of(places, counts);

        assertThat(PlainSquares.fit(data, squares)).isNotNull();
        assertThat(FreeSquares.fit(data, squares.periodFree(true))).isNotNull();
    }

    private static void compare(FringeOutcome expected, FringeOutcome found, String where) {
        if (expected instanceof FringeFailure) {
            assertThat(found).as(where).isEqualTo(expected);
            return;
        }
        FringeFit one = expected.orThrow();
        FringeFit other = found.orThrow();
        assertThat(bits(other)).as(where).containsExactly(bits(one));
        assertThat(other.names()).isEqualTo(one.names());
        assertThat(other.findings()).as(where).isEqualTo(one.findings());
        assertThat(other.degreesOfFreedom()).isEqualTo(one.degreesOfFreedom());
    }

    private static long[] bits(FringeFit fit) {
        List<double[]> parts = List.of(
                fit.values(),
                fit.covariance(),
                fit.expectedCounts(),
                fit.standardisedResiduals(),
                fit.inside().plainCovariance(),
                new double[] {fit.deviance(), fit.chiSquare(), fit.residualSumOfSquares()});
        return parts.stream()
                .flatMapToDouble(java.util.Arrays::stream)
                .mapToLong(Double::doubleToLongBits)
                .toArray();
    }

    @Test
    void manyAnglesHaveTheBitsOfOne() {
        Random random = new Random(9);
        double[] pair = new double[2];
        for (int k = 0; k < 3000; k++) {
            double[] turns = new double[1 + random.nextInt(50)];
            for (int i = 0; i < turns.length; i++) {
                turns[i] = switch (k % 3) {
                    case 0 -> Math.rint(40 * random.nextGaussian()) / 16;
                    case 1 -> 0.1 * (random.nextInt(400) - 200) * (1 + 1e-16 * random.nextInt(9));
                    default -> Math.scalb(random.nextGaussian(), random.nextInt(60) - 40);
                };
            }
            double factor = k % 2 == 0 ? 1 : 1 + 0.01 * random.nextGaussian();
            double[][] all = new double[4][turns.length];
            Turns.all(turns, factor, all[0], all[1], all[2], all[3]);
            for (int i = 0; i < turns.length; i++) {
                Turns.both(turns[i] * factor, pair, 0);
                assertThat(all[0][i]).as("cosine of " + turns[i] + " turns").isEqualTo(pair[0]);
                assertThat(all[1][i]).as("sine of " + turns[i] + " turns").isEqualTo(pair[1]);
            }
        }
    }
}
