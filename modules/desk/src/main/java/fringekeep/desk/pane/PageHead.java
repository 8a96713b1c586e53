package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.session.States.Sentence;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Title, fingerprint, sentence of identity, sentences of state, and what can be done as underlined words at the right. */
@SuppressWarnings("serial")
final class PageHead extends Painted {
    private transient List<PageAction> actions = List.of();
    private final transient List<Rectangle> places = new ArrayList<>();
    private transient Optional<RecordPage> page = Optional.empty();
    private String size = "";

    PageHead() {
        MouseAdapter mouse = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                actionAt(event).ifPresent(action -> action.work().run());
            }

            @Override
            public void mouseMoved(MouseEvent event) {
                boolean over = actionAt(event).isPresent();
                setCursor(Cursor.getPredefinedCursor(over ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        };
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
    }

    private Optional<PageAction> actionAt(MouseEvent event) {
        for (int i = 0; i < places.size() && i < actions.size(); i++) {
            if (places.get(i).contains(event.getPoint())) {
                return Optional.of(actions.get(i));
            }
        }
        return Optional.empty();
    }

    /** Says by how much the record moves. */
    void size(String words) {
        size = words;
        getAccessibleContext()
                .setAccessibleDescription(getAccessibleContext().getAccessibleDescription() + "; " + words);
        repaint();
    }

    void show(RecordPage next, List<PageAction> what) {
        if (page.filter(one -> one.record().equals(next.record())).isEmpty()) {
            size = "";
        }
        page = Optional.of(next);
        actions = List.copyOf(what);
        getAccessibleContext().setAccessibleName(next.label());
        StringBuilder words = new StringBuilder(next.identity());
        next.states().forEach(state -> words.append("; ").append(state.text()));
        getAccessibleContext().setAccessibleDescription(words.toString());
        revalidate();
        repaint();
    }

    private List<String> identity(int width) {
        return page.map(one -> Lines.of(one.identity(), Type.BODY, width, 2)).orElse(List.of());
    }

    private List<String> lines(Sentence state, int width) {
        String more = state.mark() == fringekeep.desk.look.Mark.RING && !size.isEmpty() ? ". " + size : "";
        return Lines.of(state.text() + more, Type.BODY, width - 17.0, 3);
    }

    /** Height that title, identity and states need in a width. */
    int heightIn(int width) {
        int lines = identity(width).size();
        for (Sentence state : page.map(RecordPage::states).orElse(List.of())) {
            lines += lines(state, width).size();
        }
        return 42 + 18 * Math.max(1, lines);
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, heightIn(Math.max(400, getWidth())));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        places.clear();
        if (page.isEmpty()) {
            return;
        }
        RecordPage now = page.get();
        try (Pen pen = new Pen(graphics)) {
            double end = pen.text(now.label(), Type.TITLE, Ink.INK, 0, 29);
            pen.text(now.record().shortForm(), Type.MONO, Ink.INK3, end + 16, 28);
            actions(pen);
            double y = 51;
            for (String line : identity(getWidth())) {
                pen.text(line, Type.BODY, Ink.INK, 0, y);
                y += 18;
            }
            for (Sentence state : now.states()) {
                state.mark().paint(pen.graphics(), 0, y - 10, 12);
                for (String line : lines(state, getWidth())) {
                    pen.text(line, Type.BODY, Ink.INK, 17, y);
                    y += 18;
                }
            }
        }
    }

    private void actions(Pen pen) {
        double x = getWidth();
        for (int i = actions.size() - 1; i >= 0; i--) {
            PageAction action = actions.get(i);
            double width = Lettering.width(action.word(), Type.BODY);
            x -= width;
            pen.text(action.word(), Type.BODY, Ink.INK, x, 27);
            int at = Math.max(0, action.word().indexOf(action.mnemonic()));
            double before = Lettering.width(action.word().substring(0, at), Type.BODY);
            double under = Lettering.width(action.word().substring(at, at + 1), Type.BODY);
            pen.fill(Ink.INK.color(), x + before, 29, under, 1);
            places.add(0, new Rectangle((int) x - 4, 10, (int) width + 8, 24));
            x -= 18;
        }
    }
}
