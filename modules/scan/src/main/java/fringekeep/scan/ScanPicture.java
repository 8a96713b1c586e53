package fringekeep.scan;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.quantity.Units;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Tone;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Draws counts against the first axis. */
final class ScanPicture {
    private static final double WIDTH = 120;
    private static final double HEIGHT = 75;
    private static final List<Tone> TONES =
            List.of(Tone.INK, Tone.SERIES_THREE, Tone.SERIES_FOUR, Tone.SERIES_FIVE, Tone.SERIES_SIX);
    private static final List<Shape> SHAPES =
            List.of(Shape.DOT, Shape.TRIANGLE, Shape.SQUARE, Shape.CROSS, Shape.CIRCLE);

    private ScanPicture() {}

    static Picture of(CountTable table) {
        CountTable.Column axis = table.axes().get(0);
        String unit = shownUnit(axis);
        double[] x = inUnit(axis.values(), unit);
        List<Layer> layers = new ArrayList<>();
        for (CountTable.Column channel : table.channels()) {
            if (channel.unit().equals("1") && layers.size() < TONES.size()) {
                layers.add(points(channel, x, layers.size()));
            }
        }
        Panel panel = new Panel(
                "",
                "",
                Axis.linear(axis.name(), unit.equals("1") ? "" : shown(unit)),
                Axis.linear("counts", ""),
                layers,
                1,
                layers.size() > 1);
        return new Picture("", WIDTH, HEIGHT, 1, List.of(panel));
    }

    private static Layer points(CountTable.Column channel, double[] x, int series) {
        double[] values = channel.values();
        int[] there = java.util.stream.IntStream.range(0, values.length)
                .filter(i -> !Double.isNaN(values[i]))
                .toArray();
        double[] px = Arrays.stream(there).mapToDouble(i -> x[i]).toArray();
        double[] py = Arrays.stream(there).mapToDouble(i -> values[i]).toArray();
        double[] deviations =
                Arrays.stream(py).map(y -> Math.sqrt(Math.max(0, y))).toArray();
        return new Layer.Points(channel.name(), TONES.get(series), SHAPES.get(series), px, py, deviations);
    }

    /** Positions are read in nanometres, other axes in SI. */
    private static String shownUnit(CountTable.Column axis) {
        return axis.unit().equals("m") ? "nm" : axis.unit();
    }

    private static String shown(String unit) {
        return Units.of(unit).shown();
    }

    private static double[] inUnit(double[] si, String unit) {
        return Arrays.stream(si).map(value -> Units.of(unit).fromSi(value)).toArray();
    }
}
