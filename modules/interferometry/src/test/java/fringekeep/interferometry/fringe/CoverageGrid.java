package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Seeded scans of known truth, cell by cell: how often intervals cover, how estimates lie, how p-values spread. */
final class CoverageGrid {
    static final double ONE_SIGMA = 0.6826894921370859;
    static final double TWO_SIGMA = 0.9544997361036416;

    private CoverageGrid() {}

    /** A cell: total signal counts, visibility, points, background over signal, linear drift fitted too. */
    record Cell(double counts, double visibility, int points, double background, double drift) {
        double noise() {
            return Math.sqrt(2 * (1 + background) / counts);
        }

        boolean phaseMeaningful() {
            return visibility > 4 * noise();
        }
    }

    /** Shares of scans, and mean deviations of estimates in standard errors. */
    record Shares(
            int scans,
            int failed,
            double visibilityOne,
            double visibilityTwo,
            double waldOne,
            double waldTwo,
            double phaseOne,
            double phaseTwo,
            double below5,
            double below32,
            double below50,
            double meanBias,
            double visibilityBias) {}

    static Shares run(Cell cell, int scans, long seed) {
        Random random = new Random(seed);
        double mean = cell.counts() / cell.points();
        double background = cell.background() * mean;
        FringeOptions options = FringeOptions.atPeriod(1)
                .background(background > 0 ? Background.known(background, 0) : Background.NONE)
                .driftOrder(cell.drift() == 0 ? 0 : 1);
        int failed = 0;
        double[] sums = new double[12];
        for (int k = 0; k < scans; k++) {
            double phase = 2 * Math.PI * random.nextDouble() - Math.PI;
            FringeData data = SimulatedScans.scan(
                    random, cell.points(), mean, cell.visibility(), phase, background, cell.drift());
            if (!(FringeFitter.fit(data, options) instanceof FringeFit fit)
                    || !(fit.mean().value() > 0)) {
                failed++;
                continue;
            }
            FringeProfile profile = FringeProfile.of(fit);
            sums[0] += profile.acceptsVisibility(cell.visibility(), ONE_SIGMA) ? 1 : 0;
            sums[1] += profile.acceptsVisibility(cell.visibility(), TWO_SIGMA) ? 1 : 0;
            sums[2] += cell.phaseMeaningful() && profile.acceptsPhase(phase, ONE_SIGMA) ? 1 : 0;
            sums[3] += cell.phaseMeaningful() && profile.acceptsPhase(phase, TWO_SIGMA) ? 1 : 0;
            Estimate seen = fit.visibility().orElseThrow();
            double off = Math.abs(seen.value() - cell.visibility()) / seen.standardUncertainty();
            sums[10] += off <= 1 ? 1 : 0;
            sums[11] += off <= 2 ? 1 : 0;
            double p = fit.goodness().pValue();
            sums[4] += p < 0.05 ? 1 : 0;
            sums[5] += p < 1 - ONE_SIGMA ? 1 : 0;
            sums[6] += p < 0.5 ? 1 : 0;
            sums[7] += fit.mean().value() - mean;
            sums[9] += fit.mean().standardUncertainty();
            double corrected =
                    AmplitudeLimits.biasCorrected(seen.value(), fit.harmonic().quadratureNoise());
            sums[8] += (corrected - cell.visibility()) / cell.noise();
        }
        double n = scans - failed;
        return new Shares(
                scans,
                failed,
                sums[0] / n,
                sums[1] / n,
                sums[10] / n,
                sums[11] / n,
                sums[2] / n,
                sums[3] / n,
                sums[4] / n,
                sums[5] / n,
                sums[6] / n,
                sums[7] / sums[9],
                sums[8] / n);
    }

    static List<Cell> whole() {
        List<Cell> cells = new ArrayList<>();
        double[][] surroundings = {{0, 0}, {0.5, 0}, {0, 0.3}, {0.5, 0.3}};
        for (double counts : new double[] {50, 100, 200, 1000, 10_000, 1_000_000}) {
            for (double visibility : new double[] {0, 0.1, 0.3, 0.6, 0.75, 0.9}) {
                for (int points : new int[] {8, 24, 200}) {
                    for (double[] surrounding : surroundings) {
                        cells.add(new Cell(counts, visibility, points, surrounding[0], surrounding[1]));
                    }
                }
            }
        }
        return List.copyOf(cells);
    }

    static List<Cell> thin() {
        return List.of(
                new Cell(50, 0, 8, 0, 0),
                new Cell(100, 0.6, 8, 0, 0),
                new Cell(100, 0.6, 200, 0, 0),
                new Cell(50, 0.3, 40, 0, 0),
                new Cell(100, 0.2, 40, 0, 0),
                new Cell(100, 0.3, 12, 1, 0),
                new Cell(200, 0, 24, 0.5, 0),
                new Cell(200, 0.1, 24, 0, 0),
                new Cell(200, 0.4, 24, 0, 0.4),
                new Cell(200, 0.9, 24, 0.2, 0),
                new Cell(500, 0.2, 8, 0, 0),
                new Cell(500, 0.6, 40, 0, -0.3),
                new Cell(1000, 0, 40, 0, 0),
                new Cell(1000, 0.05, 40, 2, 0),
                new Cell(1000, 0.3, 16, 0.3, 0.3),
                new Cell(1000, 0.9, 16, 0, 0),
                new Cell(2000, 0.4, 200, 0, 0),
                new Cell(5000, 0.15, 30, 1, 0),
                new Cell(10_000, 0.02, 40, 0, 0),
                new Cell(10_000, 0.7, 40, 0, -0.4),
                new Cell(50_000, 0.3, 100, 0.1, 0),
                new Cell(100_000, 0.9, 40, 0, 0),
                new Cell(1_000_000, 0, 40, 0, 0),
                new Cell(1_000_000, 0.25, 24, 0.05, 0));
    }
}
