package fringekeep.drawing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Walks over the measured points of a picture, one after the other, and says each in words.
 *
 * @param spots all points in order of panel, layer and abscissa as given
 * @param at which one is read, -1 = none
 */
record Readout(List<Spot> spots, int at) {
    /** One point that can be read out. */
    record Spot(int panel, int layer, int point, double x, double y, String words) {}

    static Readout of(Picture picture) {
        List<Spot> spots = new ArrayList<>();
        for (int p = 0; p < picture.panels().size(); p++) {
            Panel panel = picture.panels().get(p);
            for (int l = 0; l < panel.layers().size(); l++) {
                Layer layer = panel.layers().get(l);
                if (layer instanceof Layer.Points points) {
                    add(spots, panel, p, l, points.x(), points.y(), points.deviations());
                } else if (layer instanceof Layer.Sticks sticks) {
                    add(spots, panel, p, l, sticks.x(), sticks.y(), new double[0]);
                }
            }
        }
        return new Readout(List.copyOf(spots), -1);
    }

    private static void add(
            List<Spot> spots, Panel panel, int p, int l, double[] xs, double[] ys, double[] deviations) {
        for (int i = 0; i < xs.length; i++) {
            if (Double.isFinite(xs[i]) && Double.isFinite(ys[i])) {
                double deviation = i < deviations.length ? deviations[i] : 0;
                spots.add(new Spot(p, l, i, xs[i], ys[i], words(panel, i, xs[i], ys[i], deviation)));
            }
        }
    }

    private static String words(Panel panel, int i, double x, double y, double deviation) {
        return "point " + (i + 1) + ": " + side(panel.x(), "x", NumberText.significant(x, 6)) + ", "
                + side(panel.y(), "y", NumberText.measured(y, deviation));
    }

    private static String side(Axis axis, String otherwise, String value) {
        String label = axis.label().isEmpty() ? otherwise : axis.label();
        return label + " " + value + (axis.unit().isEmpty() ? "" : " " + axis.unit());
    }

    /** The same point as before: that of its panel with its abscissa, else none. */
    Readout at(Optional<Spot> before) {
        for (int i = 0; i < spots.size() && before.isPresent(); i++) {
            if (spots.get(i).panel == before.get().panel && spots.get(i).x == before.get().x) {
                return new Readout(spots, i);
            }
        }
        return new Readout(spots, -1);
    }

    /** The next or previous point, staying at the ends. */
    Readout moved(int by) {
        return spots.isEmpty() ? this : new Readout(spots, Math.max(0, Math.min(spots.size() - 1, at + by)));
    }

    /** The first point of the next or previous layer. */
    Readout otherLayer(int by) {
        if (at < 0) {
            return moved(1);
        }
        Spot now = spots.get(at);
        for (int i = at; i >= 0 && i < spots.size(); i += by) {
            Spot spot = spots.get(i);
            if (spot.panel != now.panel || spot.layer != now.layer) {
                return new Readout(spots, i);
            }
        }
        return this;
    }

    /** The point nearest to a place on the page; empty where none is within {@code reach}. */
    Readout nearest(List<Frame> frames, double px, double py, double reach) {
        int best = -1;
        double least = reach * reach;
        for (int i = 0; i < spots.size(); i++) {
            Spot spot = spots.get(i);
            Frame frame = frames.get(spot.panel);
            if (frame.x().holds(spot.x) && frame.y().holds(spot.y)) {
                double dx = frame.x().place(spot.x) - px;
                double dy = frame.y().place(spot.y) - py;
                if (dx * dx + dy * dy < least) {
                    least = dx * dx + dy * dy;
                    best = i;
                }
            }
        }
        return new Readout(spots, best);
    }

    /** The point that is read. */
    Optional<Spot> spot() {
        return at < 0 || at >= spots.size() ? Optional.empty() : Optional.of(spots.get(at));
    }
}
