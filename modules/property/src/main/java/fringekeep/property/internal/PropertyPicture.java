package fringekeep.property.internal;

import fringekeep.archive.facet.Plottable;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** Visibility against power: points, the quantum curve solid, the classical one dashed, bands of one standard uncertainty. */
public final class PropertyPicture {
    private PropertyPicture() {}

    /** The picture. */
    public static Picture of(Plottable offered) {
        List<Layer> layers = new ArrayList<>();
        for (Plottable.Series series : offered.series()) {
            Tone tone = series.name().startsWith("classical") ? Tone.CLASSICAL : Tone.QUANTUM;
            layers.add(
                    switch (series.sort()) {
                        case BAND -> new Layer.Band("", tone, series.x(), series.y(), series.other());
                        case CURVE ->
                            new Layer.Curve(
                                    series.label(),
                                    tone,
                                    tone == Tone.CLASSICAL ? Stroke.DASHED : Stroke.SOLID,
                                    series.x(),
                                    series.y());
                        case POINTS ->
                            new Layer.Points("", Tone.INK, Shape.DOT, series.x(), series.y(), series.other());
                    });
        }
        Axis y = new Axis("visibility", "", false, OptionalDouble.of(0), OptionalDouble.empty());
        Axis x = new Axis("laser power", "W", false, OptionalDouble.of(0), OptionalDouble.empty());
        return new Picture("", 140, 90, 1, List.of(new Panel("", "", x, y, layers, 1, true)));
    }
}
