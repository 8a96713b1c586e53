package fringekeep.property.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.NumberText;
import java.awt.BasicStroke;
import java.awt.geom.Rectangle2D;

/** The scale from classical to quantum: the log likelihood ratio, the stretch in which the data cannot tell. */
final class SayScale {
    private final Answer.Say say;
    private final double from;
    private final double room;
    private final double reach;

    SayScale(Answer.Say say, double from, double room) {
        this.say = say;
        this.from = from;
        this.room = room;
        double farthest = Math.max(Math.abs(say.ratio()), 4 * say.threshold());
        farthest = Math.max(farthest, Math.abs(say.ifQuantum().orElse(0)));
        this.reach = 1.1 * Math.max(farthest, Math.abs(say.ifClassical().orElse(0)));
    }

    /** Small ratios matter most, so the scale is that of the root. */
    double place(double ratio) {
        double share = Math.sqrt(Math.min(1, Math.abs(ratio) / reach)) * Math.signum(ratio);
        return from + room * (0.5 + share / 2);
    }

    void paint(Pen pen, double y) {
        double left = place(-say.threshold());
        double right = place(say.threshold());
        pen.graphics().setColor(Ink.SHEET.color());
        pen.graphics().fill(new Rectangle2D.Double(left, y - 4, right - left, 9));
        pen.graphics().setColor(Ink.RULE.color());
        pen.graphics().setStroke(new BasicStroke(1));
        pen.graphics().draw(new Rectangle2D.Double(left, y - 4, right - left, 9));
        say.ifQuantum().ifPresent(ratio -> tick(pen, ratio, y, Ink.INK3, 1));
        say.ifClassical().ifPresent(ratio -> tick(pen, ratio, y, Ink.INK3, 1));
        Ink ink = say.verdict().equals("classical") ? Ink.CLASSICAL : Ink.QUANTUM;
        boolean tells = say.verdict().equals("quantum") || say.verdict().equals("classical");
        tick(pen, say.ratio(), y, tells ? ink : Ink.INK, 3);
        String words = (say.ratio() > 0 ? "+" : "") + NumberText.fixed(say.ratio(), 1);
        double at = Math.min(place(say.ratio()) + 7, from + room - 40);
        pen.text(words, Type.BODY_MEDIUM, Ink.INK, at, y + 15);
    }

    private void tick(Pen pen, double ratio, double y, Ink ink, double wide) {
        pen.fill(ink.color(), place(ratio) - wide / 2, y - 7, wide, 15);
    }
}
