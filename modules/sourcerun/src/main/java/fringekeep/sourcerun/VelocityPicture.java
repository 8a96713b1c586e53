package fringekeep.sourcerun;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.kind.FlatTable;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A velocity distribution as a picture, a series and a table. Nodes may lie unevenly, so what is drawn of many is the density:
 * of a trace the share of each bin over its width, of a law the share in a fixed interval around each velocity.
 */
final class VelocityPicture {
    private static final int FEW = 12;
    private static final int GRID = 121;
    private static final double SMOOTHING = 30;

    private VelocityPicture() {}

    static Picture of(Distribution velocities, double[] deviations) {
        boolean few = velocities.nodes().length <= FEW;
        List<Layer> layers = List.of(
                few ? sticks(velocities) : shape(velocities, deviations),
                new Layer.Ruler("mean", Tone.INK_SECOND, Stroke.DASHED, false, velocities.mean()));
        Panel panel = new Panel(
                "",
                "",
                Axis.linear("velocity", "m/s"),
                few ? Axis.linear("share of the particles", "") : Axis.linear("share of the particles", "s/m"),
                layers,
                1,
                false);
        return new Picture("", 130, 75, 1, List.of(panel));
    }

    private static Layer sticks(Distribution velocities) {
        return new Layer.Sticks("", Tone.INK, velocities.nodes(), velocities.weights());
    }

    private static Layer shape(Distribution velocities, double[] deviations) {
        double[] nodes = velocities.nodes();
        if (deviations.length == nodes.length) {
            double[] widths = widths(nodes);
            double[] density = over(velocities.weights(), widths);
            return new Layer.Points("", Tone.INK, Shape.DOT, nodes, density, over(deviations, widths));
        }
        double[] grid = grid(nodes);
        return new Layer.Curve("", Tone.INK, Stroke.SOLID, grid, density(velocities, grid));
    }

    static Plottable plottable(Distribution velocities) {
        boolean few = velocities.nodes().length <= FEW;
        double[] x = few ? velocities.nodes() : grid(velocities.nodes());
        return new Plottable(List.of(new Plottable.Series(
                "distribution",
                "velocity distribution",
                few ? Plottable.Sort.POINTS : Plottable.Sort.CURVE,
                "velocity",
                "m/s",
                "share of the particles",
                few ? "1" : "s/m",
                x,
                few ? velocities.weights() : density(velocities, x),
                new double[0],
                List.of())));
    }

    /** Velocities at even distances from the first node to the last. */
    private static double[] grid(double[] nodes) {
        double[] grid = new double[GRID];
        double span = nodes[nodes.length - 1] - nodes[0];
        for (int i = 0; i < GRID; i++) {
            grid[i] = nodes[0] + span * i / (GRID - 1);
        }
        return grid;
    }

    /** Share in a fixed interval around each velocity over its width: nodes of quadratures lie too unevenly for less. */
    private static double[] density(Distribution velocities, double[] grid) {
        double[] nodes = velocities.nodes();
        double[] weights = velocities.weights();
        double half = (nodes[nodes.length - 1] - nodes[0]) / SMOOTHING / 2;
        double[] density = new double[grid.length];
        for (int i = 0; i < grid.length; i++) {
            density[i] = (below(nodes, weights, grid[i] + half) - below(nodes, weights, grid[i] - half)) / (2 * half);
        }
        return density;
    }

    /** Share of the particles slower than a velocity: half a node's share lies on either side of it. */
    private static double below(double[] nodes, double[] weights, double velocity) {
        double sum = 0;
        for (int i = 0; i < nodes.length; i++) {
            double middle = sum + weights[i] / 2;
            if (nodes[i] >= velocity) {
                double before = i == 0 ? 0 : sum - weights[i - 1] / 2;
                double share = i == 0 ? 0 : (velocity - nodes[i - 1]) / (nodes[i] - nodes[i - 1]);
                return i == 0 ? 0 : before + share * (middle - before);
            }
            sum += weights[i];
        }
        return sum;
    }

    static FlatTable table(Distribution velocities) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("velocity_m_per_s", "Velocity", "m/s", "Velocity of the node."),
                new FlatTable.FlatColumn("share", "Share", "1", "Share of the detected particles at the node."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        double[] nodes = velocities.nodes();
        double[] weights = velocities.weights();
        for (int i = 0; i < nodes.length; i++) {
            rows.add(List.of(Optional.of(nodes[i]), Optional.of(weights[i])));
        }
        return new FlatTable("velocities", columns, rows);
    }

    /** Widths of the intervals that nodes stand for. */
    private static double[] widths(double[] nodes) {
        double[] widths = new double[nodes.length];
        for (int i = 0; i < nodes.length; i++) {
            double below = i == 0 ? 0 : (nodes[i] - nodes[i - 1]) / 2;
            double above = i == nodes.length - 1 ? 0 : (nodes[i + 1] - nodes[i]) / 2;
            widths[i] = i == 0 ? 2 * above : i == nodes.length - 1 ? 2 * below : below + above;
        }
        return widths;
    }

    private static double[] over(double[] shares, double[] widths) {
        double[] density = new double[shares.length];
        for (int i = 0; i < shares.length; i++) {
            density[i] = widths[i] > 0 ? shares[i] / widths[i] : 0;
        }
        return density;
    }
}
