package fringekeep.sample;

import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Tone;
import fringekeep.interferometry.constants.Codata2018;
import java.util.List;

/** The distribution of masses in flight as sticks. */
final class MassPicture {
    private MassPicture() {}

    static Picture of(MassFacet mass) {
        double[] nodes = mass.nodes();
        double[] weights = mass.weights();
        for (int i = 0; i < nodes.length; i++) {
            nodes[i] /= Codata2018.ATOMIC_MASS_CONSTANT;
            weights[i] *= 100;
        }
        Panel panel = new Panel(
                "",
                "",
                Axis.linear("mass in flight", "u"),
                Axis.linear("share of the particles", "%"),
                List.of(new Layer.Sticks("", Tone.INK, nodes, weights)),
                1,
                false);
        return new Picture("Mass distribution", 120, 70, 1, List.of(panel));
    }
}
