package fringekeep.desk.form;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Color;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.KeyEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import javax.swing.JCheckBox;

/**
 * What is dangerous, the usual caution, local rules first, and one check box that names the person at the desk. Takes no room
 * while there is nothing to warn of.
 */
@SuppressWarnings("serial")
public final class CautionLine extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", CautionLine.class);
    private static final int LINE = 18;

    private final Box box = new Box();
    private transient List<Caution> cautions = List.of();
    private String person = "";
    private String behind = "";

    /**
     * A line without cautions.
     *
     * @param read called on the window thread as the box is ticked or cleared
     */
    public CautionLine(Runnable read) {
        box.setName("caution read");
        box.addActionListener(event -> {
            revalidate();
            read.run();
        });
        add(box);
        setVisible(false);
    }

    /**
     * Shows cautions; none takes no room.
     *
     * @param person who is at the desk; empty when nobody was named yet
     * @param behind words behind the person, such as {@code is recorded with the setup}
     */
    public void show(List<Caution> next, String person, String behind) {
        if (!cautions.containsAll(next)) {
            box.setSelected(false); // more danger than was read of
        }
        this.cautions = List.copyOf(next);
        this.person = person;
        this.behind = behind;
        String words = cautions.stream()
                .map(caution -> caution.title() + ". " + caution.advice())
                .collect(Collectors.joining(" "));
        getAccessibleContext().setAccessibleName(words);
        setToolTipText(words.isEmpty() ? null : "<html><body width='420'>" + escaped(words));
        box.getAccessibleContext().setAccessibleName(TEXTS.of("caution.read", person) + " " + behind);
        setVisible(!cautions.isEmpty());
        revalidate();
        repaint();
    }

    private static String escaped(String words) {
        return words.replace("&", "&amp;").replace("<", "&lt;");
    }

    /** Whether cautions are shown that nobody has ticked yet. */
    public boolean unread() {
        return !cautions.isEmpty() && !box.isSelected();
    }

    /** Ticks the box or clears it. */
    public void tick(boolean read) {
        box.setSelected(read);
        repaint();
    }

    /** Whether the box is ticked. */
    public boolean read() {
        return box.isSelected();
    }

    /** Gives the box the focus. */
    public void focusBox() {
        box.requestFocusInWindow();
    }

    /** The sentences under the titles, broken to a width. */
    private List<String> lines(double width) {
        if (box.isSelected()) {
            return List.of(TEXTS.of("caution.local")); // it was read; the words stay in the tooltip
        }
        String advice = cautions.stream().map(CautionLine::brief).distinct().collect(Collectors.joining(" "));
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder();
        for (String word : (advice + " " + TEXTS.of("caution.local")).split(" ")) {
            if (Lettering.width(line + " " + word, Type.BODY) > width && line.length() > 0) {
                lines.add(line.toString());
                line.setLength(0);
            }
            line.append(line.length() == 0 ? "" : " ").append(word);
        }
        lines.add(line.toString());
        return lines;
    }

    /** The caution without its closing sentence, which stands once for all. */
    private static String brief(Caution caution) {
        int local = caution.advice().toLowerCase(java.util.Locale.ROOT).indexOf("local rules");
        int sentence = local < 0 ? -1 : caution.advice().lastIndexOf(". ", local);
        return sentence < 0 ? caution.advice() : caution.advice().substring(0, sentence + 1);
    }

    @Override
    public Dimension getPreferredSize() {
        double width = Math.max(300, getWidth() - 24.0);
        return new Dimension(
                400, cautions.isEmpty() ? 0 : 20 + LINE * (2 + lines(width).size()));
    }

    @Override
    public void doLayout() {
        box.setBounds(6, getHeight() - 29, Math.min(getWidth() - 12, box.getPreferredSize().width), 24);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.CAUTION.color(), 0, 0, getWidth(), getHeight());
            pen.fill(Ink.CAUTIONRULE.color(), 0, 0, getWidth(), 2);
            pen.level(Ink.CAUTIONRULE, 0, getWidth(), getHeight() - 1.0);
            String titles = cautions.stream().map(Caution::title).collect(Collectors.joining(", ")) + ".";
            pen.fitted(titles, Type.GROUP, Ink.INK, 12, 22, getWidth() - 24.0);
            double y = 22 + LINE;
            for (String line : lines(getWidth() - 24.0)) {
                pen.text(line, Type.BODY, Ink.INK, 12, y);
                y += LINE;
            }
        }
    }

    /** The check box, painted in the way of the house. */
    private final class Box extends JCheckBox {
        Box() {
            setOpaque(false);
            setMnemonic(KeyEvent.VK_R);
        }

        private String words() {
            return TEXTS.of("caution.read", person);
        }

        @Override
        public Dimension getPreferredSize() {
            double wide = Lettering.width(words() + "   " + behind, Type.BODY);
            return new Dimension((int) wide + 40, 24);
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                Color ink = Ink.INK.color();
                pen.fill(ink, 6, 5, 13, 13);
                pen.fill((isSelected() ? Ink.INK : Ink.CAUTION).color(), 7.5, 6.5, 10, 10);
                if (isSelected()) {
                    pen.line(Ink.SHEET, 1.8, 9, 11.5, 11.5, 14.5);
                    pen.line(Ink.SHEET, 1.8, 11.5, 14.5, 16, 8.5);
                }
                double end = pen.text(words(), Type.BODY, Ink.INK, 24, 16);
                pen.fill(ink, 24, 18.5, Lettering.width(words().substring(0, 1), Type.BODY), 1);
                pen.text(behind, Type.BODY, Ink.INK2, end + 12, 16);
                if (isFocusOwner()) {
                    pen.focus(2, 1, end, 22);
                }
            }
        }
    }
}
