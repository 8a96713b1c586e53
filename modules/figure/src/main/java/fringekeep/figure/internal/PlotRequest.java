package fringekeep.figure.internal;

import fringekeep.archive.json.JsonObject;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One series as a figure's choices ask for it.
 *
 * @param panel name of its panel
 * @param position position within the panel
 * @param input position among the inputs
 * @param series name of the series the input offers, or {@code value}
 * @param estimate with {@code value}: which estimate
 * @param at with {@code value}: abscissa in the axis' unit
 * @param label words in the legend when they differ from the input's
 * @param xUnit UCUM code of the panel's abscissa
 * @param yUnit UCUM code of its ordinate
 */
record PlotRequest(
        String panel,
        int position,
        int input,
        String series,
        Optional<String> estimate,
        OptionalDouble at,
        Optional<String> label,
        String xUnit,
        String yUnit) {
    /** Name by which a single number is asked for. */
    static final String VALUE = "value";

    static PlotRequest of(JsonObject panel, JsonObject series, int position) {
        return new PlotRequest(
                panel.text("name").orElseThrow(),
                position,
                (int) series.integer("input").orElseThrow(),
                series.text("series").orElseThrow(),
                series.text("estimate"),
                series.number("at"),
                series.text("label"),
                unit(panel, "x"),
                unit(panel, "y"));
    }

    private static String unit(JsonObject panel, String axis) {
        return panel.object(axis).flatMap(object -> object.text("unit")).orElseThrow();
    }

    /** Where the request stands in the choices, for problems. */
    String pointer(int panelPosition) {
        return "/choices/panels/" + panelPosition + "/series/" + position;
    }
}
