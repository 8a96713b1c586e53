package fringekeep.drawing;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** Narrows or widens the axes of a picture; gives a picture again. */
final class Zoom {
    private Zoom() {}

    /** The picture with the axes of one panel, and the x axis of those that share it, set to a range. */
    static Picture to(Picture picture, int panel, double xFrom, double xTo, double yFrom, double yTo) {
        Axis shared = picture.panels().get(panel).x();
        List<Panel> panels = new ArrayList<>();
        for (int i = 0; i < picture.panels().size(); i++) {
            Panel each = picture.panels().get(i);
            Axis x = each.x().equals(shared) ? ranged(each.x(), xFrom, xTo) : each.x();
            Axis y = i == panel ? ranged(each.y(), yFrom, yTo) : each.y();
            panels.add(new Panel(each.name(), each.heading(), x, y, each.layers(), each.heightShare(), each.legend()));
        }
        return new Picture(
                picture.title(), picture.widthMillimetres(), picture.heightMillimetres(), picture.columns(), panels);
    }

    /** The picture with the axes of one panel as they were in another picture of the same panels. */
    static Picture as(Picture picture, int panel, Panel before) {
        List<Panel> panels = new ArrayList<>(picture.panels());
        Panel each = panels.get(panel);
        Axis x = ranged(each.x(), before.x());
        Axis y = panel == 0 ? ranged(each.y(), before.y()) : each.y();
        panels.set(
                panel, new Panel(each.name(), each.heading(), x, y, each.layers(), each.heightShare(), each.legend()));
        return new Picture(
                picture.title(), picture.widthMillimetres(), picture.heightMillimetres(), picture.columns(), panels);
    }

    private static Axis ranged(Axis axis, Axis before) {
        return new Axis(axis.label(), axis.unit(), axis.logarithmic(), before.from(), before.to());
    }

    /** The picture with a panel's abscissae scaled about a place of the page; less than 1 zooms in. */
    static Picture by(Picture picture, List<Frame> frames, int panel, double factor, double px) {
        Frame frame = frames.get(panel);
        double left = px + (frame.plot().getMinX() - px) * factor;
        double right = px + (frame.plot().getMaxX() - px) * factor;
        return to(
                picture,
                panel,
                frame.x().value(left),
                frame.x().value(right),
                frame.y().from(),
                frame.y().to());
    }

    private static Axis ranged(Axis axis, double from, double to) {
        return new Axis(axis.label(), axis.unit(), axis.logarithmic(), OptionalDouble.of(from), OptionalDouble.of(to));
    }
}
