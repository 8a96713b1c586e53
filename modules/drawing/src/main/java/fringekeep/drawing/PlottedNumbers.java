package fringekeep.drawing;

import java.nio.charset.StandardCharsets;

/** The plotted numbers as a table: one row per point or vertex, full digits, RFC 4180 quoting, LF. */
final class PlottedNumbers {
    private final StringBuilder text =
            new StringBuilder("panel,layer,name,sort,x_label,x_unit,x,y_label,y_unit,y,deviation,lower,upper\n");

    private PlottedNumbers() {}

    static byte[] csv(Picture picture) {
        PlottedNumbers numbers = new PlottedNumbers();
        for (int i = 0; i < picture.panels().size(); i++) {
            Panel panel = picture.panels().get(i);
            String name = panel.name().isEmpty() ? Integer.toString(i + 1) : panel.name();
            for (int layer = 0; layer < panel.layers().size(); layer++) {
                numbers.layer(panel, name, layer + 1, panel.layers().get(layer));
            }
        }
        return numbers.text.toString().getBytes(StandardCharsets.UTF_8);
    }

    private void layer(Panel panel, String name, int number, Layer layer) {
        double[] none = new double[0];
        if (layer instanceof Layer.Points points) {
            rows(panel, name, number, layer, "points", points.x(), points.y(), points.deviations(), none, none);
        } else if (layer instanceof Layer.Curve curve) {
            rows(panel, name, number, layer, "curve", curve.x(), curve.y(), none, none, none);
        } else if (layer instanceof Layer.Band band) {
            rows(panel, name, number, layer, "band", band.x(), none, none, band.lower(), band.upper());
        } else if (layer instanceof Layer.Sticks sticks) {
            rows(panel, name, number, layer, "sticks", sticks.x(), sticks.y(), none, none, none);
        } else if (layer instanceof Layer.Ruler ruler) {
            double[] at = {ruler.at()};
            boolean level = ruler.level();
            String sort = level ? "level ruler" : "upright ruler";
            rows(panel, name, number, layer, sort, level ? none : at, level ? at : none, none, none, none);
        }
    }

    private void rows(Panel panel, String name, int number, Layer layer, String sort, double[]... columns) {
        int length = 0;
        for (double[] column : columns) {
            length = Math.max(length, column.length);
        }
        for (int i = 0; i < length; i++) {
            text.append(quoted(name)).append(',').append(number).append(',').append(quoted(layer.name()));
            text.append(',').append(sort).append(',').append(axis(panel.x())).append(',');
            text.append(cell(columns[0], i)).append(',').append(axis(panel.y()));
            for (int column = 1; column < columns.length; column++) {
                text.append(',').append(cell(columns[column], i));
            }
            text.append('\n');
        }
    }

    private static String axis(Axis axis) {
        return quoted(axis.label()) + "," + quoted(axis.unit());
    }

    private static String cell(double[] column, int i) {
        return i < column.length ? NumberText.full(column[i]) : "";
    }

    private static String quoted(String words) {
        boolean plain = words.chars().noneMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r');
        return plain ? words : '"' + words.replace("\"", "\"\"") + '"';
    }
}
