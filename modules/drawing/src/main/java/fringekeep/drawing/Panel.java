package fringekeep.drawing;

import java.util.List;

/**
 * One pair of axes and what is drawn between them, in order from back to front.
 *
 * @param name short name such as "a", or empty
 * @param heading words above the panel, may be empty
 * @param x horizontal axis
 * @param y vertical axis
 * @param layers what is drawn, the first at the back
 * @param heightShare share of the picture's height among the panels of its column, &gt; 0; 1 is usual
 * @param legend whether the named layers are listed
 */
public record Panel(
        String name, String heading, Axis x, Axis y, List<Layer> layers, double heightShare, boolean legend) {
    /** Copies the list and checks the share. */
    public Panel {
        layers = List.copyOf(layers);
        if (!(heightShare > 0)) {
            throw new IllegalArgumentException("height share " + heightShare + ": must be positive");
        }
    }
}
