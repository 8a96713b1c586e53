package fringekeep.drawing;

import java.util.List;

/** The range that an axis takes from its data. */
final class Extent {
    private final boolean logarithmic;
    private double low = Double.POSITIVE_INFINITY;
    private double high = Double.NEGATIVE_INFINITY;

    private Extent(boolean logarithmic) {
        this.logarithmic = logarithmic;
    }

    /** Range of the abscissae of panels that share the axis, as {from, to}. */
    static double[] ofX(Axis axis, List<Panel> panels) {
        Extent extent = new Extent(axis.logarithmic());
        panels.forEach(panel -> panel.layers().forEach(extent::takeX));
        return extent.range(axis, 0.02);
    }

    /** Range of the ordinates of a panel, as {from, to}. */
    static double[] ofY(Panel panel) {
        Extent extent = new Extent(panel.y().logarithmic());
        panel.layers().forEach(extent::takeY);
        return extent.range(panel.y(), 0.06);
    }

    private void takeX(Layer layer) {
        if (layer instanceof Layer.Points points) {
            take(points.x());
        } else if (layer instanceof Layer.Curve curve) {
            take(curve.x());
        } else if (layer instanceof Layer.Band band) {
            take(band.x());
        } else if (layer instanceof Layer.Sticks sticks) {
            take(sticks.x());
        } else if (layer instanceof Layer.Ruler ruler && !ruler.level()) {
            take(ruler.at());
        }
    }

    private void takeY(Layer layer) {
        if (layer instanceof Layer.Points points) {
            takeBars(points);
        } else if (layer instanceof Layer.Curve curve) {
            take(curve.y());
        } else if (layer instanceof Layer.Band band) {
            take(band.lower());
            take(band.upper());
        } else if (layer instanceof Layer.Sticks sticks) {
            take(sticks.y());
            take(0);
        } else if (layer instanceof Layer.Ruler ruler && ruler.level()) {
            take(ruler.at());
        }
    }

    private void takeBars(Layer.Points points) {
        take(points.y());
        for (int i = 0; i < points.deviations().length; i++) {
            take(points.y()[i] - points.deviations()[i]);
            take(points.y()[i] + points.deviations()[i]);
        }
    }

    private void take(double[] values) {
        for (double value : values) {
            take(value);
        }
    }

    private void take(double value) {
        if (Double.isFinite(value) && (!logarithmic || value > 0)) {
            low = Math.min(low, value);
            high = Math.max(high, value);
        }
    }

    private double[] range(Axis axis, double margin) {
        double from = low <= high ? low : logarithmic ? 1 : 0;
        double to = low <= high ? high : logarithmic ? 10 : 1;
        double[] padded = padded(from, to, margin);
        double first = axis.from().orElse(padded[0]);
        double last = axis.to().orElse(padded[1]);
        if (logarithmic && !(first > 0)) {
            first = padded[0];
        }
        return last > first ? new double[] {first, last} : widened(first);
    }

    private double[] padded(double from, double to, double margin) {
        if (from == to) {
            return widened(from);
        }
        if (logarithmic) {
            double ratio = StrictMath.pow(to / from, margin);
            return new double[] {from / ratio, to * ratio};
        }
        return new double[] {from - margin * (to - from), to + margin * (to - from)};
    }

    private double[] widened(double at) {
        if (logarithmic) {
            return new double[] {at / 2, at * 2};
        }
        double half = at == 0 ? 1 : Math.abs(at) / 10;
        return new double[] {at - half, at + half};
    }
}
