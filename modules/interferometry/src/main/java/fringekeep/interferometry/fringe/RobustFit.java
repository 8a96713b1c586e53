package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Distributions;
import java.util.ArrayList;
import java.util.List;

/**
 * A fit that names points which do not belong to it, one after the other, and fits again without them.
 *
 * <p>Each round finds the point whose count deviates most from what the other points expect there, and takes it out if a
 * deviation as large is less likely than the given probability, counted once for every point (Bonferroni). What is taken
 * out is a finding for a person to judge, never hidden.
 *
 * @param fit the fit without the outliers
 * @param outliers the points taken out, most striking first
 */
public record RobustFit(FringeFit fit, List<Outlier> outliers) {
    /** Copies the list. */
    public RobustFit {
        outliers = List.copyOf(outliers);
    }

    /**
     * A point that does not belong.
     *
     * @param point index in the scan
     * @param count what was counted
     * @param expected what the other points expect there
     * @param pValue probability of so large a deviation, already multiplied by the number of points
     */
    public record Outlier(int point, double count, double expected, double pValue) {}

    /**
     * Fits robustly.
     *
     * @param data the scan
     * @param options how it is fitted
     * @param probability largest probability at which a point is taken out, for example 0.01
     * @return the fit and its outliers, or the reason why the scan has no fit; at most a quarter of the points are taken out
     */
    public static RobustOutcome of(FringeData data, FringeOptions options, double probability) {
        FringeOutcome first = FringeFitter.fit(data, options);
        if (first instanceof FringeFailure failure) {
            return new RobustOutcome.None(failure);
        }
        FringeFit fit = first.orThrow();
        FringeData left = data;
        List<Outlier> outliers = new ArrayList<>();
        while (outliers.size() < data.size() / 4) {
            Outlier worst = worst(fit, left, options);
            if (worst == null || worst.pValue() > probability) {
                break;
            }
            outliers.add(worst);
            left = without(left, worst.point());
            if (!(FringeFitter.fit(left, options) instanceof FringeFit again)) {
                break;
            }
            fit = again;
        }
        return new RobustOutcome.Found(new RobustFit(fit, outliers));
    }

    private static FringeData without(FringeData data, int point) {
        boolean[] masked = data.masked();
        masked[point] = true;
        return data.masked(masked);
    }

    /** The point with the largest residual over what remains unexplained, judged against a fit without it. */
    private static @org.jspecify.annotations.Nullable Outlier worst(
            FringeFit fit, FringeData data, FringeOptions options) {
        double[] expected = fit.expectedCounts();
        List<Outlier> candidates = new ArrayList<>();
        int used = 0;
        int row = 0;
        for (int i = 0; i < data.size(); i++) {
            if (data.masked[i]) {
                continue;
            }
            used++;
            double mu = Math.max(expected[row++], 0.1);
            double deviate = Math.abs(data.counts[i] - mu) / Math.sqrt(mu);
            if (deviate > 2) {
                candidates.add(new Outlier(i, data.counts[i], mu, deviate));
            }
        }
        candidates.sort(java.util.Comparator.comparingDouble(Outlier::pValue).reversed());
        Outlier worst = null;
        for (Outlier candidate : candidates.subList(0, Math.min(3, candidates.size()))) {
            Outlier judged = judged(candidate.point(), data, options, used);
            if (judged != null && (worst == null || judged.pValue() < worst.pValue())) {
                worst = judged;
            }
        }
        return worst;
    }

    private static @org.jspecify.annotations.Nullable Outlier judged(
            int point, FringeData data, FringeOptions options, int used) {
        if (!(FringeFitter.fit(without(data, point), options) instanceof FringeFit others)) {
            return null;
        }
        FringeModel model = new FringeModel(data, options);
        model.evaluate(others.inside().theta());
        int row = 0;
        for (int i = 0; i < point; i++) {
            row += data.masked[i] ? 0 : 1;
        }
        double mu = Math.max(model.expected[row], 1e-9);
        double[] slopes = new double[3];
        System.arraycopy(model.slopes, row * model.parameters, slopes, 0, 3);
        double spread = fringekeep.interferometry.statistics.SymmetricMatrix.form(
                others.inside().widened().covariance(), slopes);
        double dispersion = Math.max(1, others.goodness().dispersion());
        long count = (long) data.counts[point];
        double tail = count > mu ? Distributions.poissonAbove(mu, count - 1) : Distributions.poissonAtMost(mu, count);
        // The expectation is itself uncertain: the deviate shrinks by the root of counting over total variance.
        double shrink = Math.sqrt(mu / (mu * dispersion + Math.max(spread, 0)));
        double deviate = tail < 0.5 && tail > 1e-300 ? -Distributions.normalQuantile(tail) : tail < 0.5 ? 37 : 0;
        double both = 2 * Distributions.normal(-deviate * shrink);
        return new Outlier(point, count, mu, Math.min(1, both * used));
    }
}
