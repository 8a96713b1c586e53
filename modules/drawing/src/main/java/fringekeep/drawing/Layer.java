package fringekeep.drawing;

import java.util.List;

/** One thing drawn between the axes. Coordinates are in the units of the axes. */
public sealed interface Layer {
    /** Name in the legend; empty keeps the layer out of it. */
    String name();

    /** Colour by meaning. */
    Tone tone();

    /** Measured points, with a bar of one standard deviation where {@code deviations} is not empty. */
    record Points(String name, Tone tone, Shape shape, double[] x, double[] y, double[] deviations) implements Layer {
        /** Copies the arrays; x and y are of equal length, deviations of that length or empty. */
        public Points {
            x = x.clone();
            y = y.clone();
            deviations = deviations.clone();
            Lengths.require(x.length, y.length);
            if (deviations.length != 0) {
                Lengths.require(x.length, deviations.length);
            }
        }
    }

    /** A curve through the given vertices, solid or dashed. */
    record Curve(String name, Tone tone, Stroke stroke, double[] x, double[] y) implements Layer {
        /** Copies the arrays, which are of equal length. */
        public Curve {
            x = x.clone();
            y = y.clone();
            Lengths.require(x.length, y.length);
        }
    }

    /** An area between two curves over the same abscissae. */
    record Band(String name, Tone tone, double[] x, double[] lower, double[] upper) implements Layer {
        /** Copies the arrays, which are of equal length. */
        public Band {
            x = x.clone();
            lower = lower.clone();
            upper = upper.clone();
            Lengths.require(x.length, lower.length);
            Lengths.require(x.length, upper.length);
        }
    }

    /** Upright sticks from zero, as residuals are drawn. */
    record Sticks(String name, Tone tone, double[] x, double[] y) implements Layer {
        /** Copies the arrays, which are of equal length. */
        public Sticks {
            x = x.clone();
            y = y.clone();
            Lengths.require(x.length, y.length);
        }
    }

    /** A level (horizontal) or upright line over the whole panel. */
    record Ruler(String name, Tone tone, Stroke stroke, boolean level, double at) implements Layer {}

    /** Words at a place, or beside a point. */
    record Words(String name, Tone tone, double x, double y, List<String> lines) implements Layer {
        /** Copies the lines. */
        public Words {
            lines = List.copyOf(lines);
        }
    }
}
