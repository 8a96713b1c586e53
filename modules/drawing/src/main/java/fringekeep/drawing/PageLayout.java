package fringekeep.drawing;

import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;

/**
 * Lays the panels of a picture out on a page. Panels follow each other in rows of {@link Picture#columns()}; a panel shares
 * its horizontal axis with the one above it in its column when both axes are equal and
 * it has neither name nor heading of its own.
 */
final class PageLayout {
    private final Picture picture;
    private final Measures measures;
    private final double width;
    private final double height;

    private PageLayout(Picture picture, Measures measures, double width, double height) {
        this.picture = picture;
        this.measures = measures;
        this.width = width;
        this.height = height;
    }

    /** Frames in the order of the panels. */
    static List<Frame> of(Picture picture, Measures measures, double width, double height) {
        return new PageLayout(picture, measures, width, height).frames();
    }

    private List<Frame> frames() {
        Frame[] frames = new Frame[picture.panels().size()];
        int columns = Math.min(picture.columns(), Math.max(1, frames.length));
        double cell = width / columns;
        for (int column = 0; column < columns; column++) {
            layOut(column, columns, cell, frames);
        }
        return List.of(frames);
    }

    private void layOut(int column, int columns, double cell, Frame[] frames) {
        List<Panel> panels = new ArrayList<>();
        for (int i = column; i < frames.length; i += columns) {
            panels.add(picture.panels().get(i));
        }
        double titleHeight = picture.title().isEmpty() ? 0 : measures.textLine() + measures.gap();
        double gutter = column == 0 ? measures.gap() / 2 : 3 * measures.gap();
        double left = column * cell + gutter;
        double right = (column + 1) * cell - 2 * measures.gap();
        double shares = panels.stream().mapToDouble(Panel::heightShare).sum();
        double words = 0;
        for (int i = 0; i < panels.size(); i++) {
            words += above(panels.get(i), right - left) + below(panels, i);
        }
        double free = Math.max(panels.size() * 10.0, height - titleHeight - words);
        double labels = labelWidth(panels, free, shares);
        double top = titleHeight;
        for (int i = 0; i < panels.size(); i++) {
            double above = above(panels.get(i), right - left);
            double tall = free * panels.get(i).heightShare() / shares;
            Rectangle2D plot = new Rectangle2D.Double(
                    left + labels, top + above, Math.max(10, right - left - labels), Math.max(8, tall));
            frames[column + i * columns] = frame(panels, i, plot, left, top);
            top += above + tall + below(panels, i);
        }
    }

    private Frame frame(List<Panel> panels, int i, Rectangle2D plot, double left, double top) {
        Panel panel = panels.get(i);
        double[] xRange = Extent.ofX(panel.x(), sharing(panels, i));
        Scale x = new Scale(xRange[0], xRange[1], panel.x().logarithmic(), plot.getMinX(), plot.getMaxX());
        Scale y = vertical(panel, plot.getMaxY(), plot.getMinY());
        return new Frame(
                panel,
                plot,
                x,
                y,
                Ticks.of(x, label -> Lettering.width(label, measures.smallFont()) + 3 * measures.gap()),
                yTicks(y),
                left,
                top,
                !sharedBelow(panels, i),
                legend(panel, plot.getMaxX() - left));
    }

    private static Scale vertical(Panel panel, double bottom, double top) {
        double[] range = Extent.ofY(panel);
        return new Scale(range[0], range[1], panel.y().logarithmic(), bottom, top);
    }

    private Ticks yTicks(Scale y) {
        double line = measures.smallLine();
        double room = Math.max(1.2 * line, Math.min(2.4 * line, Math.abs(y.end() - y.start()) / 4));
        return Ticks.of(y, label -> room);
    }

    private double labelWidth(List<Panel> panels, double free, double shares) {
        double widest = 0;
        for (Panel panel : panels) {
            Scale y = vertical(panel, free * panel.heightShare() / shares, 0);
            for (String label : yTicks(y).labels()) {
                widest = Math.max(widest, Lettering.width(label, measures.smallFont()));
            }
        }
        return widest + 1.5 * measures.gap();
    }

    private double above(Panel panel, double cellWidth) {
        double lines = Words.heading(panel).isEmpty() ? 0 : measures.smallLine();
        lines += Words.ordinate(panel, 0).isEmpty() ? 0 : measures.smallLine();
        lines += legend(panel, cellWidth).size() * measures.smallLine();
        return lines + (lines > 0 ? measures.gap() : measures.smallLine() / 2);
    }

    private double below(List<Panel> panels, int i) {
        if (sharedBelow(panels, i)) {
            return 1.5 * measures.gap();
        }
        double label = Words.abscissa(panels.get(i), 0).isEmpty() ? 0 : measures.smallLine();
        return measures.gap() + measures.smallLine() + label + 2 * measures.gap();
    }

    private static boolean sharedBelow(List<Panel> panels, int i) {
        if (i + 1 >= panels.size()) {
            return false;
        }
        Panel next = panels.get(i + 1);
        return panels.get(i).x().equals(next.x()) && Words.heading(next).isEmpty();
    }

    private static List<Panel> sharing(List<Panel> panels, int i) {
        int first = i;
        while (first > 0 && sharedBelow(panels, first - 1)) {
            first--;
        }
        int last = i;
        while (sharedBelow(panels, last)) {
            last++;
        }
        return panels.subList(first, last + 1);
    }

    private List<List<Layer>> legend(Panel panel, double room) {
        List<List<Layer>> lines = new ArrayList<>();
        double used = room;
        for (Layer layer : panel.layers()) {
            if (!panel.legend() || layer.name().isEmpty() || layer instanceof Layer.Words) {
                continue;
            }
            double need = Words.legendWidth(layer, measures);
            if (lines.isEmpty() || used + need > room) {
                lines.add(new ArrayList<>());
                used = 0;
            }
            lines.get(lines.size() - 1).add(layer);
            used += need;
        }
        return lines;
    }
}
