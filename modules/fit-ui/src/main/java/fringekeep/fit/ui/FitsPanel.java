package fringekeep.fit.ui;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.event.FocusEvent;
import java.awt.event.FocusListener;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javax.accessibility.AccessibleRole;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;

/** Recorded fits of the same scans, side by side as rows; one of them may be drawn behind the one that is tried. */
@SuppressWarnings("serial")
final class FitsPanel extends Painted {
    private static final int ROW = 22;
    private static final int HEAD = 24;
    private static final double[] RIGHTS = {0.58, 0.73, 0.89, 1.0};

    private transient List<FitLine> lines = List.of();
    private transient Optional<Hash> compared = Optional.empty();
    private final transient Consumer<Optional<Hash>> compare;
    private int at;

    /** A list that tells which fit is to be drawn behind. */
    FitsPanel(Consumer<Optional<Hash>> compare) {
        this.compare = compare;
        setName("fit.others");
        setFocusable(true);
        getAccessibleContext().setAccessibleName(FitWords.TEXTS.of("others"));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                int row = (event.getY() - HEAD) / ROW;
                if (event.getY() >= HEAD && row < lines.size()) {
                    boolean same = row == at;
                    go(row);
                    if (same) {
                        turn();
                    }
                }
            }
        });
        addFocusListener(new FocusListener() {
            @Override
            public void focusGained(FocusEvent event) {
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                repaint();
            }
        });
        key("UP", () -> go(at - 1));
        key("DOWN", () -> go(at + 1));
        key("SPACE", this::turn);
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.LIST;
    }

    private void key(String stroke, Runnable work) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void go(int row) {
        at = Math.max(0, Math.min(lines.size() - 1, row));
        say();
        repaint();
    }

    /** Draws the fit of the row in hand behind, or not any more. */
    void turn() {
        current()
                .ifPresent(line -> compare.accept(
                        compared.equals(Optional.of(line.fit())) ? Optional.empty() : Optional.of(line.fit())));
    }

    /** The row in hand. */
    Optional<FitLine> current() {
        return at < lines.size() ? Optional.of(lines.get(at)) : Optional.empty();
    }

    void show(List<FitLine> next, Optional<Hash> behind) {
        lines = List.copyOf(next);
        compared = behind;
        at = Math.max(0, Math.min(at, lines.size() - 1));
        say();
        revalidate();
        repaint();
    }

    List<FitLine> lines() {
        return lines;
    }

    private void say() {
        getAccessibleContext()
                .setAccessibleDescription(current()
                        .map(line -> line.label() + ", " + line.word() + " " + line.how() + ", "
                                + String.join(", ", line.numbers()))
                        .orElse(FitWords.TEXTS.of("others.none")));
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(520, HEAD + ROW * Math.max(1, lines.size()));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double width = getWidth();
            pen.text(FitWords.TEXTS.of("others"), Type.GROUP, Ink.INK, 0, 16);
            String[] heads = {"visibility", "phase", "quality", "p"};
            for (int i = 0; i < heads.length; i++) {
                pen.textEndingAt(FitWords.TEXTS.of("result." + heads[i]), Type.HEAD, Ink.INK2, width * RIGHTS[i], 16);
            }
            pen.level(Ink.RULE, 0, width, HEAD - 1.0);
            if (lines.isEmpty()) {
                pen.fitted(FitWords.TEXTS.of("others.none"), Type.BODY, Ink.INK3, 0, HEAD + 15.0, width);
            }
            for (int i = 0; i < lines.size(); i++) {
                row(pen, lines.get(i), i, width);
            }
            if (isFocusOwner()) {
                pen.focus(-4, HEAD - 1.0 + (double) at * ROW, width + 8, ROW + 1.0);
            }
        }
    }

    private void row(Pen pen, FitLine line, int i, double width) {
        double y = HEAD + (double) i * ROW;
        double base = y + 15;
        boolean behind = compared.equals(Optional.of(line.fit()));
        if (i == at && !lines.isEmpty()) {
            pen.fill(Ink.SEL.color(), -4, y, width + 8, ROW - 1.0);
        }
        double x = pen.text(line.label(), behind ? Type.GROUP : Type.BODY, Ink.INK, 0, base) + 6;
        if (line.mark().isPresent()) {
            line.mark().get().paint(pen.graphics(), x, y + 4, 12);
            x = pen.text(line.word(), Type.SMALL, Ink.INK2, x + 16, base) + 8;
        }
        String how = behind ? FitWords.TEXTS.of("others.drawn", line.how()) : line.how();
        double room = width * RIGHTS[0] - Lettering.width(line.numbers().get(0), Type.BODY) - x - 8;
        pen.fitted(how, Type.SMALL, Ink.INK2, x, base, Math.max(0, room));
        for (int k = 0; k < RIGHTS.length; k++) {
            pen.textEndingAt(line.numbers().get(k), Type.BODY, Ink.INK, width * RIGHTS[k], base);
        }
        pen.level(Ink.HAIR, 0, width, y + ROW - 1);
    }
}
