package fringekeep.figure.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.quantity.Units;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Turns a figure's choices and its table into a picture. */
public final class FigurePicture {
    private FigurePicture() {}

    /**
     * The picture.
     *
     * @param choices complete choices of the figure
     * @param result its result
     * @param table its table of numbers
     */
    public static Picture of(JsonObject choices, JsonObject result, FigureTable table) {
        List<Panel> panels = new ArrayList<>();
        for (JsonObject panel : choices.array("panels").objects()) {
            panels.add(panel(panel, result, table));
        }
        return new Picture(
                choices.text("title").orElse(""),
                choices.number("widthMillimetres").orElseThrow(),
                choices.number("heightMillimetres").orElseThrow(),
                (int) choices.integer("panelsInRow").orElseThrow(),
                panels);
    }

    private static Panel panel(JsonObject panel, JsonObject result, FigureTable table) {
        String name = panel.text("name").orElseThrow();
        List<JsonObject> asked = panel.array("series").objects();
        List<Layer> layers = new ArrayList<>();
        for (JsonObject series : result.array("series").objects()) {
            if (series.text("panel").orElse("").equals(name)) {
                int position = (int) series.integer("position").orElseThrow();
                layers.add(layer(asked.get(position), series, table.rows(name, position)));
            }
        }
        return new Panel(
                name,
                panel.text("heading").orElse(""),
                axis(panel.object("x").orElseThrow()),
                axis(panel.object("y").orElseThrow()),
                layers,
                1,
                panel.flag("legend").orElse(false));
    }

    private static Axis axis(JsonObject axis) {
        String unit = axis.text("unit").orElseThrow();
        return new Axis(
                axis.text("label").orElseThrow(),
                unit.equals("1") ? "" : Units.of(unit).shown(),
                axis.flag("logarithmic").orElse(false),
                axis.number("from"),
                axis.number("to"));
    }

    private static Layer layer(JsonObject asked, JsonObject series, FigureTable.Rows rows) {
        String label = series.text("label").orElse("");
        Tone tone = constant(Tone.class, asked.text("tone").orElseThrow());
        Stroke stroke = constant(Stroke.class, asked.text("stroke").orElse("solid"));
        Shape shape = constant(Shape.class, asked.text("shape").orElse("dot"));
        return switch (series.text("sort").orElseThrow()) {
            case "points" -> new Layer.Points(label, tone, shape, rows.x(), rows.y(), rows.other());
            case "curve" -> new Layer.Curve(label, tone, stroke, rows.x(), rows.y());
            case "band" -> new Layer.Band(label, tone, rows.x(), rows.y(), rows.other());
            case "level" -> new Layer.Ruler(label, tone, stroke, true, rows.y()[0]);
            default -> throw new IllegalStateException("sort of series: " + series);
        };
    }

    private static <E extends Enum<E>> E constant(Class<E> type, String words) {
        return Enum.valueOf(type, words.replace('-', '_').toUpperCase(Locale.ROOT));
    }
}
