package fringekeep.property.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Beside the plot: what is shared between scans in per cent, and quoted values with how far they are from ours. */
@SuppressWarnings("serial")
final class SidePanel extends Painted {
    static final int WIDTH = 244;
    private static final int ROW = 22;
    private static final int HEAD = 24;

    private transient List<Answer.Shared> shared = List.of();
    private transient List<Gathered.Quoted> quoted = List.of();
    private transient Optional<double[]> ours = Optional.empty();

    SidePanel() {
        setName("property.side");
    }

    void show(Optional<Answer> answer, List<Gathered.Quoted> beside) {
        shared = answer.map(Answer::shared).orElse(List.of());
        ours = answer.map(Answer::volume);
        quoted = List.copyOf(beside);
        List<String> words = new ArrayList<>();
        shared.forEach(row -> words.add(row.name() + " " + row.percent() + " %"));
        quoted.forEach(each -> words.add(each.label() + " " + each.value()));
        getAccessibleContext().setAccessibleName(PropertyWords.TEXTS.of("shared"));
        getAccessibleContext().setAccessibleDescription(String.join("; ", words));
        revalidate();
        repaint();
    }

    List<Answer.Shared> shared() {
        return shared;
    }

    @Override
    public Dimension getPreferredSize() {
        int first = shared.isEmpty() ? 0 : HEAD + ROW * shared.size() + 12;
        return new Dimension(WIDTH, first + (quoted.isEmpty() ? 0 : HEAD + 38 * quoted.size()));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double width = getWidth();
            double y = 0;
            if (!shared.isEmpty()) {
                pen.text(PropertyWords.TEXTS.of("shared"), Type.GROUP, Ink.INK, 0, 16);
                pen.textEndingAt("u / %", Type.HEAD, Ink.INK, width, 16);
                pen.level(Ink.RULE, 0, width, HEAD - 1.0);
                y = HEAD;
                for (Answer.Shared row : shared) {
                    double value = Lettering.width(row.percent(), Type.BODY);
                    pen.fitted(
                            row.name(), row.strong() ? Type.GROUP : Type.BODY, Ink.INK2, 0, y + 15, width - value - 8);
                    pen.textEndingAt(row.percent(), row.strong() ? Type.GROUP : Type.BODY, Ink.INK, width, y + 15);
                    pen.level(Ink.HAIR, 0, width, y + ROW - 1);
                    y += ROW;
                }
                y += 12;
            }
            if (!quoted.isEmpty()) {
                quoted(pen, y, width);
            }
        }
    }

    private void quoted(Pen pen, double top, double width) {
        pen.text(PropertyWords.TEXTS.of("quoted"), Type.GROUP, Ink.INK, 0, top + 16);
        pen.level(Ink.RULE, 0, width, top + HEAD - 1);
        double y = top + HEAD;
        for (Gathered.Quoted each : quoted) {
            String apart = ours.map(volume -> Gathered.apart(volume, each)).orElse("");
            pen.fitted(each.label(), Type.BODY, Ink.INK2, 0, y + 15, width * 0.4);
            double end = width;
            if (!apart.isEmpty()) {
                pen.textEndingAt(apart, Type.SMALL, Ink.INK2, width, y + 15);
                end -= Lettering.width(apart, Type.SMALL) + 8;
            }
            pen.textEndingAt(Pen.shortened(each.value(), Type.BODY, width * 0.5), Type.BODY, Ink.INK, end, y + 15);
            pen.fitted(each.how(), Type.SMALL, Ink.INK2, 0, y + 31, width);
            pen.level(Ink.HAIR, 0, width, y + 37);
            y += 38;
        }
    }
}
