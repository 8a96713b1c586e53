package fringekeep.drawing;

import java.awt.BasicStroke;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.Point;
import java.awt.Toolkit;
import java.awt.datatransfer.DataFlavor;
import java.awt.datatransfer.Transferable;
import java.awt.datatransfer.UnsupportedFlavorException;
import java.awt.event.ActionEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javax.accessibility.AccessibleContext;
import javax.accessibility.AccessibleRole;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.KeyStroke;

/**
 * Shows a picture on the screen. Keys: + and − zoom about the middle or the point read, 0 shows all, arrows read out points,
 * Ctrl C copies picture and numbers, Ctrl S saves. Dragging zooms to the rectangle dragged. Lives on the window thread.
 */
@SuppressWarnings("serial")
public final class PictureView extends JComponent {
    private final transient Supplier<Theme> theme;
    private final transient Consumer<Picture> save;
    private transient Picture whole;
    private transient Picture shown;
    private transient Optional<Hands> hands = Optional.empty();
    private boolean held;
    private boolean zoomed;
    private transient List<Frame> frames = List.of();
    private transient Readout readout;
    private transient Consumer<String> listener = words -> {};
    private transient Optional<Point> dragFrom = Optional.empty();
    private transient Optional<Point> dragTo = Optional.empty();

    /**
     * A view of one picture.
     *
     * @param picture what is shown
     * @param theme asked at each painting, so that a switch of theme needs a repaint only
     * @param save called when a person asks to save; writes away from the window thread
     */
    public PictureView(Picture picture, Supplier<Theme> theme, Consumer<Picture> save) {
        this.whole = picture;
        this.shown = picture;
        this.theme = theme;
        this.save = save;
        this.readout = Readout.of(picture);
        setFocusable(true);
        setOpaque(true);
        getAccessibleContext().setAccessibleName(accessibleName(picture));
        keys();
        Mouse mouse = new Mouse();
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
    }

    /** Something more to do with the picture than to look at it. */
    public interface Hands {
        /**
         * The mouse went down.
         *
         * @return whether what follows is for these hands; if not, dragging zooms and a click reads out as ever
         */
        boolean down(MouseEvent event);

        /** The mouse moves while down. */
        void drag(MouseEvent event);

        /** The mouse is up again. */
        void up(MouseEvent event);

        /** Draws over the picture. */
        void over(Graphics2D g, Theme colours);
    }

    /**
     * The point that is read out.
     *
     * @param panel place of its panel in the picture
     * @param layer place of its layer in the panel
     * @param point place of it in the layer
     */
    public record Picked(int panel, int layer, int point) {}

    /** Gives the view hands. */
    public void hands(Hands next) {
        hands = Optional.of(next);
    }

    /** The point that is read out, where one is. */
    public Optional<Picked> picked() {
        return readout.spot().map(spot -> new Picked(spot.panel(), spot.layer(), spot.point()));
    }

    /** The point nearest to a place, within twelve units. */
    public Optional<Picked> near(int px, int py) {
        return readout.nearest(frames, px, py, 12)
                .spot()
                .map(spot -> new Picked(spot.panel(), spot.layer(), spot.point()));
    }

    /** Shows another picture of the same panels, zoomed as before; what was read out stays read where it still is. */
    public void show(Picture next) {
        boolean as = zoomed && next.panels().size() == whole.panels().size();
        Picture before = shown;
        Optional<Readout.Spot> read = readout.spot();
        whole = next;
        shown = next;
        zoomed = as;
        if (as) {
            for (int i = 0; i < next.panels().size(); i++) {
                shown = Zoom.as(shown, i, before.panels().get(i));
            }
        }
        readout = Readout.of(next).at(read);
        getAccessibleContext().setAccessibleName(accessibleName(next));
        repaint();
    }

    /** The rectangle between the axes of a panel as last painted; empty before the first painting. */
    public Optional<Rectangle2D> plot(int panel) {
        return panel < frames.size() ? Optional.of(frames.get(panel).plot()) : Optional.empty();
    }

    /** The abscissa at a place from the left, as last painted (unit of the axis); 0 before the first painting. */
    public double abscissa(int panel, double px) {
        return panel < frames.size() ? frames.get(panel).x().value(px) : 0;
    }

    /** The place from the left of an abscissa, as last painted; 0 before the first painting. */
    public double placeOf(int panel, double abscissa) {
        return panel < frames.size() ? frames.get(panel).x().placeNear(abscissa) : 0;
    }

    /** Tells a listener what is read out, empty when nothing is. */
    public void onReadout(Consumer<String> words) {
        this.listener = words;
    }

    /** What is read out now, empty when nothing is. */
    public String readoutWords() {
        return readout.spot().map(Readout.Spot::words).orElse("");
    }

    /** The whole picture. */
    public Picture picture() {
        return whole;
    }

    /** The picture with the axes as zoomed. */
    public Picture shown() {
        return shown;
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(200, 120);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        Graphics2D g = (Graphics2D) graphics.create();
        Theme colours = theme.get();
        frames = new PicturePainter(g, colours, Measures.SCREEN).paint(shown, getWidth(), getHeight());
        hands.ifPresent(each -> each.over(g, colours));
        readout.spot().ifPresent(spot -> cross(g, spot, colours));
        g.setColor(colours.color(Tone.QUANTUM));
        g.setStroke(new BasicStroke(1));
        dragged().ifPresent(g::draw);
        if (isFocusOwner()) {
            g.setStroke(new BasicStroke(2));
            g.draw(new Rectangle2D.Double(1, 1, getWidth() - 2, getHeight() - 2));
        }
        g.dispose();
    }

    @Override
    public AccessibleContext getAccessibleContext() {
        if (accessibleContext == null) {
            accessibleContext = new AccessibleJComponent() {
                @Override
                public AccessibleRole getAccessibleRole() {
                    return AccessibleRole.CANVAS;
                }
            };
        }
        return accessibleContext;
    }

    private void cross(Graphics2D g, Readout.Spot spot, Theme colours) {
        Frame frame = frames.get(spot.panel());
        if (!frame.x().holds(spot.x())) {
            return;
        }
        double x = frame.x().place(spot.x());
        double y = frame.y().placeNear(spot.y());
        Rectangle2D plot = frame.plot();
        g.setColor(colours.color(Tone.QUANTUM));
        g.setStroke(new BasicStroke(1));
        g.draw(new Line2D.Double(x, plot.getMinY(), x, plot.getMaxY()));
        g.draw(new Line2D.Double(plot.getMinX(), y, plot.getMaxX(), y));
        g.setFont(Lettering.regular(11.5));
        double width = Lettering.width(spot.words(), g.getFont());
        double left = Math.max(plot.getMinX(), Math.min(x + 6, plot.getMaxX() - width - 4));
        double base = plot.getMinY() + 13;
        g.setColor(colours.ground());
        g.fill(new Rectangle2D.Double(left - 3, base - 12, width + 6, 16));
        g.setColor(colours.color(Tone.INK));
        Lettering.draw(g, spot.words(), g.getFont(), left, base);
    }

    private Optional<Rectangle2D> dragged() {
        return dragFrom.flatMap(from -> dragTo.map(to -> new Rectangle2D.Double(
                Math.min(from.x, to.x), Math.min(from.y, to.y), Math.abs(from.x - to.x), Math.abs(from.y - to.y))));
    }

    private void keys() {
        key("PLUS", "typed +", () -> zoom(0.7));
        key("ADD", "ADD", () -> zoom(0.7));
        key("EQUALS", "EQUALS", () -> zoom(0.7));
        key("MINUS", "MINUS", () -> zoom(1 / 0.7));
        key("SUBTRACT", "SUBTRACT", () -> zoom(1 / 0.7));
        key("0", "0", this::showAll);
        key("NUMPAD0", "NUMPAD0", this::showAll);
        key("LEFT", "LEFT", () -> read(readout.moved(-1)));
        key("RIGHT", "RIGHT", () -> read(readout.moved(1)));
        key("UP", "UP", () -> read(readout.otherLayer(-1)));
        key("DOWN", "DOWN", () -> read(readout.otherLayer(1)));
        key("copy", "ctrl C", this::copy);
        key("save", "ctrl S", this::save);
    }

    private void key(String name, String stroke, Runnable work) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(stroke), name);
        getActionMap().put(name, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void read(Readout next) {
        readout = next;
        String words = readoutWords();
        getAccessibleContext().setAccessibleDescription(words);
        listener.accept(words);
        repaint();
    }

    /** Zooms the abscissae; less than 1 zooms in. */
    public void zoom(double factor) {
        if (frames.isEmpty()) {
            return;
        }
        int panel = readout.spot().map(Readout.Spot::panel).orElse(0);
        Frame frame = frames.get(panel);
        double about = readout.spot()
                .filter(spot -> frame.x().holds(spot.x()))
                .map(spot -> frame.x().place(spot.x()))
                .orElse(frame.plot().getCenterX());
        shown = Zoom.by(shown, frames, panel, factor, about);
        zoomed = true;
        repaint();
    }

    /** Shows all again. */
    public void showAll() {
        shown = whole;
        zoomed = false;
        repaint();
    }

    /** Copies the picture and its numbers to the clipboard. */
    public void copy() {
        Toolkit.getDefaultToolkit().getSystemClipboard().setContents(new Copied(shown), null);
    }

    /** Asks the owner to save. */
    public void save() {
        save.accept(shown);
    }

    private static String accessibleName(Picture picture) {
        String headings = picture.panels().stream()
                .map(panel -> Words.heading(panel).isEmpty() ? Words.ordinate(panel, 0) : Words.heading(panel))
                .reduce((a, b) -> a + "; " + b)
                .orElse("");
        return picture.title().isEmpty() ? headings : picture.title() + ": " + headings;
    }

    private final class Mouse extends MouseAdapter {
        @Override
        public void mousePressed(MouseEvent event) {
            requestFocusInWindow();
            held = hands.isPresent() && hands.get().down(event);
            if (held) {
                return;
            }
            dragFrom = Optional.of(event.getPoint());
            dragTo = Optional.empty();
        }

        @Override
        public void mouseDragged(MouseEvent event) {
            if (held) {
                hands.ifPresent(each -> each.drag(event));
                return;
            }
            dragTo = Optional.of(event.getPoint());
            repaint();
        }

        @Override
        public void mouseReleased(MouseEvent event) {
            if (held) {
                held = false;
                hands.ifPresent(each -> each.up(event));
                return;
            }
            Optional<Rectangle2D> area = dragged();
            dragFrom = Optional.empty();
            dragTo = Optional.empty();
            if (area.isPresent() && area.get().getWidth() > 5 && area.get().getHeight() > 5) {
                zoomTo(area.get());
            } else {
                read(readout.nearest(frames, event.getX(), event.getY(), 12));
            }
        }

        private void zoomTo(Rectangle2D area) {
            for (int i = 0; i < frames.size(); i++) {
                Frame frame = frames.get(i);
                Rectangle2D part = area.createIntersection(frame.plot());
                if (part.getWidth() > 5 && part.getHeight() > 5) {
                    zoomed = true;
                    shown = Zoom.to(
                            shown,
                            i,
                            frame.x().value(part.getMinX()),
                            frame.x().value(part.getMaxX()),
                            frame.y().value(part.getMaxY()),
                            frame.y().value(part.getMinY()));
                    repaint();
                    return;
                }
            }
            repaint();
        }
    }

    /** A picture on the clipboard: pixels for documents, numbers for spreadsheets. */
    private record Copied(Picture picture) implements Transferable {
        @Override
        public DataFlavor[] getTransferDataFlavors() {
            return new DataFlavor[] {DataFlavor.imageFlavor, DataFlavor.stringFlavor};
        }

        @Override
        public boolean isDataFlavorSupported(DataFlavor flavor) {
            return flavor.equals(DataFlavor.imageFlavor) || flavor.equals(DataFlavor.stringFlavor);
        }

        @Override
        public Object getTransferData(DataFlavor flavor) throws UnsupportedFlavorException {
            if (flavor.equals(DataFlavor.imageFlavor)) {
                int width = (int) Math.round(picture.widthMillimetres() * 8);
                int height = (int) Math.round(picture.heightMillimetres() * 8);
                return PictureFiles.screen(picture, Theme.PAPER, width, height);
            }
            if (flavor.equals(DataFlavor.stringFlavor)) {
                return new String(PictureFiles.write(picture, PictureFiles.Form.CSV), StandardCharsets.UTF_8);
            }
            throw new UnsupportedFlavorException(flavor);
        }
    }
}
