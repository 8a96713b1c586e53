package fringekeep.desk.part;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;

/** A full-width line under the strip: what is wrong, where, what to do. Takes no room while there is nothing to say. */
@SuppressWarnings("serial")
public final class TroubleLine extends Painted {
    private transient List<Problem> problems = List.of();

    /** Shows problems; an empty list takes no room. */
    public void show(List<Problem> next) {
        problems = List.copyOf(next);
        StringBuilder words = new StringBuilder();
        next.forEach(problem ->
                words.append(problem.what()).append(' ').append(problem.mend()).append(' '));
        getAccessibleContext().setAccessibleName(words.toString());
        setToolTipText(words.length() == 0 ? null : words.toString());
        revalidate();
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, problems.isEmpty() ? 0 : 12 + 38 * Math.min(3, problems.size()));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        if (problems.isEmpty()) {
            return;
        }
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.CAUTION.color(), 0, 0, getWidth(), getHeight());
            pen.fill(Ink.CAUTIONRULE.color(), 0, 0, getWidth(), 2);
            pen.level(Ink.CAUTIONRULE, 0, getWidth(), getHeight() - 1.0);
            double y = 21;
            for (Problem problem : problems.subList(0, Math.min(3, problems.size()))) {
                String what = problem.where().isEmpty() ? problem.what() : problem.what() + "  " + problem.where();
                pen.fitted(what, Type.BODY_MEDIUM, Ink.INK, 16, y, getWidth() - 32.0);
                pen.fitted(problem.mend(), Type.BODY, Ink.INK2, 16, y + 17, getWidth() - 32.0);
                y += 38;
            }
        }
    }
}
