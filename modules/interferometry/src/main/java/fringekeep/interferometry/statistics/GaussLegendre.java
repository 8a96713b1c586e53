package fringekeep.interferometry.statistics;

import java.util.function.DoubleUnaryOperator;

/**
 * Gauss&ndash;Legendre quadrature with 24 nodes, exact for polynomials up to degree 47. Nodes by Newton's method on the
 * Legendre recurrence (Abramowitz and Stegun, 22.7.10 and 25.4.29).
 */
public final class GaussLegendre {
    private static final int ORDER = 24;
    private static final double[] NODES = new double[ORDER];
    private static final double[] WEIGHTS = new double[ORDER];

    static {
        for (int i = 0; i < ORDER; i++) {
            double x = -StrictMath.cos(Math.PI * (i + 0.75) / (ORDER + 0.5));
            double slope = 1;
            for (int newton = 0; newton < 20; newton++) {
                double last = 1;
                double value = x;
                for (int k = 2; k <= ORDER; k++) {
                    double next = ((2 * k - 1) * x * value - (k - 1) * last) / k;
                    last = value;
                    value = next;
                }
                slope = ORDER * (x * value - last) / (x * x - 1);
                x -= value / slope;
            }
            NODES[i] = x;
            WEIGHTS[i] = 2 / ((1 - x * x) * slope * slope);
        }
    }

    private GaussLegendre() {}

    /**
     * Number of nodes of a panel.
     *
     * @return 24
     */
    public static int order() {
        return ORDER;
    }

    /**
     * Nodes and weights of equal panels.
     *
     * @param low lower end
     * @param high upper end
     * @param panels number of panels
     * @param nodes filled with panels &times; {@link #order} nodes, rising
     * @param weights filled with their weights
     */
    public static void fill(double low, double high, int panels, double[] nodes, double[] weights) {
        double half = 0.5 * (high - low) / panels;
        for (int panel = 0; panel < panels; panel++) {
            double middle = low + (2 * panel + 1) * half;
            for (int i = 0; i < ORDER; i++) {
                nodes[panel * ORDER + i] = middle + half * NODES[i];
                weights[panel * ORDER + i] = half * WEIGHTS[i];
            }
        }
    }

    /**
     * The integral over one panel.
     *
     * @param f smooth function
     * @param low lower end
     * @param high upper end
     * @return the integral
     */
    public static double integrate(DoubleUnaryOperator f, double low, double high) {
        double half = 0.5 * (high - low);
        double middle = 0.5 * (high + low);
        double sum = 0;
        for (int i = 0; i < ORDER; i++) {
            sum += WEIGHTS[i] * f.applyAsDouble(middle + half * NODES[i]);
        }
        return half * sum;
    }

    /**
     * The integral over equal panels.
     *
     * @param f piecewise smooth function
     * @param low lower end
     * @param high upper end
     * @param panels number of panels, at least 1
     * @return the integral
     */
    public static double integrate(DoubleUnaryOperator f, double low, double high, int panels) {
        double sum = 0;
        for (int panel = 0; panel < panels; panel++) {
            double from = low + (high - low) * panel / panels;
            double to = low + (high - low) * (panel + 1) / panels;
            sum += integrate(f, from, to);
        }
        return sum;
    }
}
