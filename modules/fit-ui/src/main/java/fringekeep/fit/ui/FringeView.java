package fringekeep.fit.ui;

import fringekeep.archive.json.Json;
import fringekeep.desk.look.Ink;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureView;
import fringekeep.drawing.Theme;
import fringekeep.drawing.Tone;
import fringekeep.fit.Trial;
import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.event.ActionEvent;
import java.awt.event.MouseEvent;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;

/**
 * The fringe with hands: the two ends of the range are dragged along the axis, a point is masked by a click or by M where it
 * is read out, [ and ] set the ends there, \ takes both away.
 */
final class FringeView implements PictureView.Hands {
    private static final double NANOMETRES = 1e9;
    private static final double GRASP = 9;

    private final FitByHand fit;
    private final PictureView view;
    private Optional<Edge> held = Optional.empty();
    private Optional<PictureView.Picked> clicked = Optional.empty();

    private enum Edge {
        FROM("range.from"),
        TO("range.to");

        private final String path;

        Edge(String path) {
            this.path = path;
        }
    }

    FringeView(FitByHand fit, Picture first, Consumer<Picture> save) {
        this.fit = fit;
        this.view = new PictureView(first, Ink::theme, save);
        view.setName("fit.fringe");
        view.hands(this);
        key("M", this::turnRead);
        key("typed [", () -> endHere(Edge.FROM));
        key("typed ]", () -> endHere(Edge.TO));
        key("typed \\", this::whole);
    }

    PictureView view() {
        return view;
    }

    private void key(String stroke, Runnable work) {
        view.getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        view.getActionMap().put(stroke, new AbstractAction() {
            private static final long serialVersionUID = 1L;

            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    /** Masks the point that is read out, or uses it again. */
    void turnRead() {
        view.picked().flatMap(this::point).ifPresent(fit::turn);
    }

    private void endHere(Edge edge) {
        view.picked()
                .flatMap(this::point)
                .ifPresent(point -> fit.change(plan -> plan.with(edge.path, Optional.of(Json.of(point.read())))));
    }

    private void whole() {
        fit.change(plan -> plan.with("range", Optional.empty()));
    }

    /** The point behind a point of the picture. */
    Optional<Trial.Point> point(PictureView.Picked picked) {
        Picture picture = view.picture();
        Optional<Trial> trial = fit.trial();
        if (trial.isEmpty() || picked.panel() >= picture.panels().size()) {
            return Optional.empty();
        }
        Layer layer = picture.panels().get(picked.panel()).layers().get(picked.layer());
        List<Trial.Point> points = trial.get().points(use(layer, picked.panel()));
        boolean counts = layer instanceof Layer.Points && !layer.name().equals("expected");
        boolean residual = picked.panel() == 1;
        return (counts || residual) && picked.point() < points.size()
                ? Optional.of(points.get(picked.point()))
                : Optional.empty();
    }

    private static Trial.Use use(Layer layer, int panel) {
        if (layer.tone() == Tone.MASKED) {
            return Trial.Use.MASKED;
        }
        return panel == 0 && layer.tone() == Tone.INK_SECOND ? Trial.Use.OUTSIDE : Trial.Use.USED;
    }

    @Override
    public boolean down(MouseEvent event) {
        held = edgeAt(event);
        clicked = held.isPresent() ? Optional.empty() : view.near(event.getX(), event.getY());
        return held.isPresent() || clicked.flatMap(this::point).isPresent();
    }

    @Override
    public void drag(MouseEvent event) {
        clicked = Optional.empty();
        held.ifPresent(edge -> fit.drag(plan -> plan.with(edge.path, rangeEnd(edge, event.getX()))));
    }

    @Override
    public void up(MouseEvent event) {
        held.ifPresent(edge -> fit.release());
        held = Optional.empty();
        clicked.flatMap(this::point).ifPresent(fit::turn);
        clicked = Optional.empty();
    }

    /** Beyond the outermost point an end holds nothing back: then it is taken away. */
    private Optional<Json> rangeEnd(Edge edge, int px) {
        double at = view.abscissa(0, px) / NANOMETRES;
        double other = fit.plan()
                .number(edge == Edge.FROM ? Edge.TO.path : Edge.FROM.path)
                .orElse(edge == Edge.FROM ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY);
        double[] ends = ends();
        boolean beyond = edge == Edge.FROM ? at <= ends[0] : at >= ends[1];
        boolean crossed = edge == Edge.FROM ? at >= other : at <= other;
        if (beyond) {
            return Optional.empty();
        }
        return Optional.of(Json.of(crossed ? other : Math.rint(at * 1e12) / 1e12));
    }

    /** Least and greatest position as read (m). */
    private double[] ends() {
        double[] ends = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
        fit.trial()
                .ifPresent(trial -> trial.points().forEach(point -> {
                    ends[0] = Math.min(ends[0], point.read());
                    ends[1] = Math.max(ends[1], point.read());
                }));
        return ends;
    }

    private Optional<Edge> edgeAt(MouseEvent event) {
        Optional<Rectangle2D> foot = axis();
        if (foot.isEmpty() || !foot.get().contains(event.getX(), event.getY())) {
            return Optional.empty();
        }
        double from = Math.abs(event.getX() - place(Edge.FROM));
        double to = Math.abs(event.getX() - place(Edge.TO));
        if (Math.min(from, to) > GRASP) {
            return Optional.empty();
        }
        return Optional.of(from <= to ? Edge.FROM : Edge.TO);
    }

    /** The strip along the foot of the plots in which the ends stand. */
    private Optional<Rectangle2D> axis() {
        int last = view.picture().panels().size() - 1;
        return view.plot(last)
                .map(plot -> new Rectangle2D.Double(
                        plot.getX() - GRASP, plot.getMaxY() - 4, plot.getWidth() + 2 * GRASP, 26));
    }

    private double place(Edge edge) {
        OptionalDouble end = fit.plan().number(edge.path);
        Rectangle2D plot = view.plot(0).orElseThrow();
        double outermost = edge == Edge.FROM ? plot.getMinX() : plot.getMaxX();
        double place = end.isPresent() ? view.placeOf(0, end.getAsDouble() * NANOMETRES) : outermost;
        return Math.max(plot.getMinX(), Math.min(plot.getMaxX(), place));
    }

    @Override
    public void over(Graphics2D g, Theme colours) {
        Optional<Rectangle2D> top = view.plot(0);
        Optional<Rectangle2D> foot = view.plot(view.picture().panels().size() - 1);
        if (top.isEmpty() || foot.isEmpty()) {
            return;
        }
        for (Edge edge : Edge.values()) {
            double x = Math.floor(place(edge)) + 0.5;
            boolean set = fit.plan().number(edge.path).isPresent();
            g.setColor(set ? Ink.SELRULE.color() : colours.rule());
            g.setStroke(new BasicStroke(1));
            if (set) {
                g.draw(new Line2D.Double(x, top.get().getMinY(), x, foot.get().getMaxY()));
            }
            g.fill(handle(edge, x, foot.get().getMaxY()));
        }
    }

    /** A flag at the axis that points into the range. */
    private static Path2D handle(Edge edge, double x, double y) {
        double side = edge == Edge.FROM ? 9 : -9;
        Path2D flag = new Path2D.Double();
        flag.moveTo(x, y);
        flag.lineTo(x + side, y + 5);
        flag.lineTo(x, y + 10);
        flag.closePath();
        return flag;
    }
}
