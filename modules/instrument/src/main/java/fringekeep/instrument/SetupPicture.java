package fringekeep.instrument;

import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** The bench seen from the side: gratings, slits and plates along the beam, to scale along it. */
final class SetupPicture {
    private static final double TOP = 1;
    private static final int PERIODS_DRAWN = 9;

    private SetupPicture() {}

    static List<Picture> of(SetupFacet setup) {
        List<Double> places = places(setup);
        if (places.isEmpty()) {
            return List.of();
        }
        List<Layer> layers = new ArrayList<>();
        double last = places.get(places.size() - 1);
        double reach = Math.max(last, 1e-3) * 1000;
        layers.add(new Layer.Curve(
                "", Tone.INK_SECOND, Stroke.DASHED, new double[] {-0.15 * reach, 1.15 * reach}, new double[] {0, 0}));
        for (int i = 0; i < places.size(); i++) {
            Optional<Grating> grating = setup.grating(i);
            if (grating.isPresent()) {
                grating(grating.get(), i, 1000 * places.get(i), reach, layers);
            }
        }
        setup.slits().forEach(slit -> slit(slit, layers));
        setup.fieldPlates().ifPresent(plates -> plates(plates, layers));
        Axis along = new Axis(
                "distance from the first grating",
                "mm",
                false,
                OptionalDouble.of(-0.2 * reach),
                OptionalDouble.of(1.2 * reach));
        Axis up = new Axis(
                "height, not to scale", "", false, OptionalDouble.of(-1.6 * TOP), OptionalDouble.of(1.6 * TOP));
        Panel panel = new Panel("", "", along, up, layers, 1, false);
        return List.of(new Picture(setup.label(), 160, 60, 1, List.of(panel)));
    }

    /** Distances from the first grating (m): as entered, else summed from the separations. */
    static List<Double> places(SetupFacet setup) {
        List<Double> places = new ArrayList<>();
        int count = setup.gratings().size() == 1
                ? setup.separations().size() + 1
                : setup.gratings().size();
        double at = 0;
        for (int i = 0; i < count; i++) {
            Optional<Entered> entered =
                    setup.gratings().size() > 1 ? setup.gratings().get(i).position() : Optional.empty();
            double place = entered.map(Entered::si).orElse(at);
            places.add(place);
            at = place + setup.separation(i).map(Entered::si).orElse(0.0);
        }
        return places;
    }

    private static void grating(Grating grating, int place, double at, double reach, List<Layer> layers) {
        boolean material = grating.sort() == GratingSort.MATERIAL;
        double[] heights = new double[PERIODS_DRAWN];
        double[] places = new double[PERIODS_DRAWN];
        for (int i = 0; i < PERIODS_DRAWN; i++) {
            heights[i] = TOP * (2 * (i + 0.5) / PERIODS_DRAWN - 1);
            places[i] = at;
            double bar = 0.55 * TOP / PERIODS_DRAWN;
            if (material) {
                layers.add(new Layer.Curve("", Tone.INK, Stroke.SOLID, new double[] {at, at}, new double[] {
                    heights[i] - bar, heights[i] + bar
                }));
            }
        }
        if (!material) {
            Tone tone = grating.sort() == GratingSort.DEPLETION ? Tone.CLASSICAL : Tone.QUANTUM;
            layers.add(new Layer.Points("", tone, Shape.LOZENGE, places, heights, new double[0]));
        }
        double half = 0.01 * reach;
        String name = grating.name().isEmpty() ? Integer.toString(place + 1) : grating.name();
        layers.add(new Layer.Words("", Tone.INK, at - half, 1.3 * TOP, List.of(name)));
    }

    private static void slit(SetupFacet.Slit slit, List<Layer> layers) {
        if (slit.position().isEmpty()) {
            return;
        }
        double at = 1000 * slit.position().get().si();
        for (int side = -1; side <= 1; side += 2) {
            layers.add(new Layer.Curve("", Tone.INK_SECOND, Stroke.SOLID, new double[] {at, at}, new double[] {
                0.2 * side * TOP, 0.8 * side * TOP
            }));
        }
        layers.add(new Layer.Words("", Tone.INK_SECOND, at, -1.3 * TOP, List.of(slit.name())));
    }

    private static void plates(SetupFacet.FieldPlates plates, List<Layer> layers) {
        if (plates.position().isEmpty() || plates.length().isEmpty()) {
            return;
        }
        double from = 1000 * plates.position().get().si();
        double to = from + 1000 * plates.length().get().si();
        for (int side = -1; side <= 1; side += 2) {
            double y = 0.45 * side * TOP;
            layers.add(new Layer.Curve("", Tone.MARK, Stroke.SOLID, new double[] {from, to}, new double[] {y, y}));
        }
    }
}
