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
 * A velocity distribution as a picture, a series and a table. Nodes may lie unevenly, so what is drawn is the density: share
 * over the interval between the middles to the neighbours.
 */
final class VelocityPicture {
    private VelocityPicture() {}

    static Picture of(Distribution velocities, double[] deviations) {
        double[] nodes = velocities.nodes();
        double[] widths = widths(nodes);
        Layer shape;
        if (nodes.length == 1) {
            shape = new Layer.Sticks("", Tone.INK, nodes, velocities.weights());
        } else if (deviations.length == nodes.length) {
            shape = new Layer.Points(
                    "", Tone.INK, Shape.DOT, nodes, over(velocities.weights(), widths), over(deviations, widths));
        } else {
            shape = new Layer.Curve("", Tone.INK, Stroke.SOLID, nodes, over(velocities.weights(), widths));
        }
        List<Layer> layers =
                List.of(shape, new Layer.Ruler("mean", Tone.INK_SECOND, Stroke.DASHED, false, velocities.mean()));
        Panel panel = new Panel(
                "",
                "",
                Axis.linear("velocity", "m/s"),
                nodes.length == 1 ? Axis.linear("share", "") : Axis.linear("share of the particles", "s/m"),
                layers,
                1,
                false);
        return new Picture("", 130, 75, 1, List.of(panel));
    }

    static Plottable plottable(Distribution velocities) {
        double[] nodes = velocities.nodes();
        double[] density = nodes.length == 1 ? velocities.weights() : over(velocities.weights(), widths(nodes));
        return new Plottable(List.of(new Plottable.Series(
                "distribution",
                "velocity distribution",
                Plottable.Sort.CURVE,
                "velocity",
                "m/s",
                "share of the particles",
                nodes.length == 1 ? "1" : "s/m",
                nodes,
                density,
                new double[0],
                List.of())));
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
