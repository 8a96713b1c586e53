package fringekeep.desk.list;

import fringekeep.desk.list.ListContent.Head;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Component;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.DefaultListModel;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JList;
import javax.swing.JPopupMenu;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;
import javax.swing.ListCellRenderer;
import javax.swing.SwingUtilities;

/** A small list of columns: Space shows or hides one, Alt with arrows moves it, S sorts by it. */
final class ColumnChoice {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", ColumnChoice.class);
    private static final int ROW = 22;

    private final ListEar ear;
    private final Question question;
    private final List<String> shown = new ArrayList<>();
    private final DefaultListModel<Head> model = new DefaultListModel<>();
    private final JList<Head> list = new JList<>(model);
    private final JPopupMenu popup = new JPopupMenu();

    ColumnChoice(ListEar ear, ListContent content, Question question) {
        this.ear = ear;
        this.question = question;
        content.heads().forEach(head -> {
            shown.add(head.column());
            model.addElement(head);
        });
        ear.offered(question.kind()).stream()
                .filter(head -> !shown.contains(head.column()))
                .forEach(model::addElement);
    }

    void show(Component over, JComponent back) {
        list.setName("columns");
        list.getAccessibleContext().setAccessibleName(TEXTS.of("columns"));
        list.setCellRenderer(new Line());
        list.setSelectedIndex(0);
        list.setVisibleRowCount(Math.min(18, model.size()));
        list.setBackground(Ink.SHEET.color());
        list.addMouseListener(new MouseAdapter() {
            @Override
            public void mouseClicked(MouseEvent event) {
                toggle();
            }
        });
        key("SPACE", this::toggle);
        key("S", this::sort);
        key("alt UP", () -> move(-1));
        key("alt DOWN", () -> move(1));
        key("HOME", this::usual);
        key("ENTER", () -> popup.setVisible(false));
        JScrollPane scroll = new JScrollPane(list);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        JLabel hint = new JLabel(TEXTS.of("columns.hint"));
        hint.setFont(Type.SMALL);
        hint.setBorder(BorderFactory.createEmptyBorder(4, 12, 4, 12));
        popup.setName("columns choice");
        popup.add(hint);
        popup.add(scroll);
        popup.setBackground(Ink.SHEET.color());
        popup.addPopupMenuListener(new Closing(back));
        popup.show(over, Math.max(16, over.getWidth() - 320), 32);
        SwingUtilities.invokeLater(list::requestFocusInWindow);
    }

    private void key(String stroke, Runnable work) {
        list.getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        list.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void toggle() {
        Optional.ofNullable(list.getSelectedValue()).ifPresent(head -> {
            if (!shown.remove(head.column())) {
                shown.add(head.column());
            }
            tell();
        });
    }

    private void move(int by) {
        int from = list.getSelectedIndex();
        int to = from + by;
        if (from < 0 || to < 0 || to >= model.size()) {
            return;
        }
        Head head = model.remove(from);
        model.add(to, head);
        list.setSelectedIndex(to);
        list.ensureIndexIsVisible(to);
        tell();
    }

    private void sort() {
        Optional.ofNullable(list.getSelectedValue()).ifPresent(head -> {
            popup.setVisible(false);
            ear.ask(question.turned(head.column()));
        });
    }

    private void usual() {
        popup.setVisible(false);
        ear.columns(question.kind(), List.of());
    }

    private void tell() {
        List<String> ordered = new ArrayList<>();
        for (int i = 0; i < model.size(); i++) {
            if (shown.contains(model.get(i).column())) {
                ordered.add(model.get(i).column());
            }
        }
        shown.clear();
        shown.addAll(ordered);
        list.repaint();
        ear.columns(question.kind(), ordered);
    }

    private record Closing(JComponent back) implements javax.swing.event.PopupMenuListener {
        @Override
        public void popupMenuWillBecomeVisible(javax.swing.event.PopupMenuEvent event) {}

        @Override
        public void popupMenuWillBecomeInvisible(javax.swing.event.PopupMenuEvent event) {
            back.requestFocusInWindow();
        }

        @Override
        public void popupMenuCanceled(javax.swing.event.PopupMenuEvent event) {}
    }

    @SuppressWarnings("serial")
    private final class Line extends Painted implements ListCellRenderer<Head> {
        private transient Head head = new Head("", false, "");
        private boolean selected;

        @Override
        public Component getListCellRendererComponent(
                JList<? extends Head> all, Head value, int index, boolean isSelected, boolean hasFocus) {
            head = value;
            selected = isSelected;
            return this;
        }

        @Override
        public Dimension getPreferredSize() {
            return new Dimension(300, ROW);
        }

        @Override
        public void paint(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                pen.fill((selected ? Ink.SEL : Ink.SHEET).color(), 0, 0, getWidth(), getHeight());
                if (shown.contains(head.column())) {
                    Mark.HERE.paint(pen.graphics(), 10, 5, 12);
                }
                double end = pen.text(head.text(), Type.BODY, Ink.INK, 30, 15);
                String from = Spec.of(head.column()).way().stream()
                        .reduce((first, last) -> last)
                        .orElse("");
                double room = getWidth() - 12 - Lettering.width(from, Type.SMALL);
                if (room > end + 8) {
                    pen.text(from, Type.SMALL, Ink.INK2, room, 15);
                }
                pen.level(Ink.HAIR, 10, getWidth() - 10.0, getHeight() - 1.0);
            }
        }
    }
}
