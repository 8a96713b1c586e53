package fringekeep.drawing;

/** The words around a panel. */
final class Words {
    private Words() {}

    /** Name and heading. */
    static String heading(Panel panel) {
        return panel.name().isEmpty() || panel.heading().isEmpty()
                ? panel.name() + panel.heading()
                : panel.name() + "\u2002" + panel.heading();
    }

    /** Label of the upright axis, with the power of ten taken out of its ticks. */
    static String ordinate(Panel panel, int exponent) {
        return label(panel.y(), exponent);
    }

    /** Label of the level axis. */
    static String abscissa(Panel panel, int exponent) {
        return label(panel.x(), exponent);
    }

    /** Room that a layer takes in the legend, with the gap behind it. */
    static double legendWidth(Layer layer, Measures measures) {
        return 5 * measures.gap() + Lettering.width(layer.name(), measures.smallFont()) + 3 * measures.gap();
    }

    private static String label(Axis axis, int exponent) {
        String power = exponent == 0 ? "" : "10" + NumberText.superscript(exponent);
        String unit = power.isEmpty() || axis.unit().isEmpty() ? power + axis.unit() : power + " " + axis.unit();
        if (axis.label().isEmpty()) {
            return unit;
        }
        return unit.isEmpty() ? axis.label() : axis.label() + " / " + unit;
    }
}
