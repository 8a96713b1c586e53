package fringekeep.drawing;

import java.awt.geom.Rectangle2D;
import java.util.List;

/**
 * Where one panel lies on the page.
 *
 * @param panel what is drawn
 * @param plot the rectangle between the axes
 * @param x horizontal scale
 * @param y vertical scale
 * @param xTicks ticks of the horizontal axis
 * @param yTicks ticks of the vertical axis
 * @param left left edge of words above and beside the plot
 * @param top upper edge of the first line of words
 * @param ownsX whether tick labels and axis label stand below; not where the next panel shares the axis
 * @param legend lines of the legend, each a list of layers
 */
record Frame(
        Panel panel,
        Rectangle2D plot,
        Scale x,
        Scale y,
        Ticks xTicks,
        Ticks yTicks,
        double left,
        double top,
        boolean ownsX,
        List<List<Layer>> legend) {}
