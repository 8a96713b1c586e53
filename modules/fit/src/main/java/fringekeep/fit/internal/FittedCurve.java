package fringekeep.fit.internal;

import fringekeep.archive.json.JsonObject;
import java.util.List;

/**
 * The fitted curve in counts of one exposure, with a band of one standard uncertainty from mean, cosine and sine.
 *
 * @param positions vertices (m)
 * @param values counts
 * @param lower curve less its standard uncertainty
 * @param upper curve and its standard uncertainty
 * @param mean mean with background
 */
public record FittedCurve(double[] positions, double[] values, double[] lower, double[] upper, double mean) {
    private static final double TWO_PI = 2 * Math.PI;

    /**
     * Makes the curve along the rows in their order, so that drifts show where they happened.
     *
     * @param exposure exposure the estimates are stated for
     * @param points about how many vertices
     */
    public static FittedCurve of(
            JsonObject choices, JsonObject result, List<ResidualTable.Row> rows, double exposure, int points) {
        return new Maker(choices, result, exposure).along(rows, points);
    }

    private static final class Maker {
        private final List<String> names;
        private final double[] values;
        private final double[] covariance;
        private final double period;
        private final double background;

        Maker(JsonObject choices, JsonObject result, double exposure) {
            names = result.array("estimates").texts();
            values = result.array("values").numbers();
            covariance = result.array("covariance").numbers();
            period = estimate("period", new FitChoices(choices).periodSi());
            double rate = result.object("backgroundRate")
                    .map(each -> each.number("value").orElse(0))
                    .orElse(new FitChoices(choices).background().number("si").orElse(0));
            background = estimate("background", rate * exposure);
        }

        private double estimate(String name, double otherwise) {
            int at = names.indexOf(name);
            return at >= 0 ? values[at] : otherwise;
        }

        FittedCurve along(List<ResidualTable.Row> rows, int points) {
            int n = rows.size();
            int between = Math.max(1, points / Math.max(1, n - 1));
            int vertices = n < 2 ? n : (n - 1) * between + 1;
            double[][] all = new double[4][vertices];
            for (int k = 0; k < vertices; k++) {
                int row = Math.min(k / between, Math.max(0, n - 2));
                double part = n < 2 ? 0 : k / (double) between - row;
                double next = rows.get(Math.min(row + 1, n - 1)).position();
                double x = rows.get(row).position() * (1 - part) + next * part;
                double t = n < 2 ? 0 : (row + part) / (n - 1) - 0.5;
                vertex(x, t, k, all);
            }
            return new FittedCurve(all[0], all[1], all[2], all[3], values[0] + background);
        }

        private void vertex(double x, double t, int k, double[][] all) {
            double angle = TWO_PI * x / period + estimate("phaseDrift", 0) * t;
            double cos = StrictMath.cos(angle);
            double sin = StrictMath.sin(angle);
            double drift = 1 + estimate("drift1", 0) * t + estimate("drift2", 0) * (t * t - 1.0 / 12);
            double second = estimate("cosine2", 0) * StrictMath.cos(2 * angle)
                    + estimate("sine2", 0) * StrictMath.sin(2 * angle);
            double signal = values[0] + values[1] * cos + values[2] * sin + second;
            double u = Math.abs(drift) * deviation(new double[] {1, cos, sin});
            double value = drift * signal + background;
            all[0][k] = x;
            all[1][k] = value;
            all[2][k] = value - u;
            all[3][k] = value + u;
        }

        private double deviation(double[] gradient) {
            double variance = 0;
            for (int i = 0; i < gradient.length; i++) {
                for (int j = 0; j < gradient.length; j++) {
                    int row = Math.max(i, j);
                    variance += gradient[i] * gradient[j] * covariance[row * (row + 1) / 2 + Math.min(i, j)];
                }
            }
            return Math.sqrt(Math.max(0, variance));
        }
    }
}
