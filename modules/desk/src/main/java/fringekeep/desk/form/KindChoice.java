package fringekeep.desk.form;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import java.awt.Graphics;
import java.awt.event.KeyAdapter;
import java.awt.event.KeyEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import javax.swing.JComponent;

/** All kinds that people enter, each with what it is for, and the drafts that are kept. */
@SuppressWarnings("serial")
final class KindChoice extends Painted implements DeskSheet {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", KindChoice.class);
    private static final int TOP = 84;
    private static final int ROW = FormLayout.ROW;

    private final transient List<Entry> entries;
    private int at;

    /** A row: its words, what they mean, what choosing it does. */
    private record Entry(String words, String detail, Runnable work) {}

    private KindChoice(List<Entry> entries) {
        this.entries = entries;
        setName("kinds");
        setFocusable(true);
        getAccessibleContext().setAccessibleName(TEXTS.of("kinds.title"));
        tell();
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                int index = (event.getY() - TOP) / ROW;
                if (event.getY() >= TOP && index < entries.size()) {
                    at = index;
                    entries.get(at).work().run();
                }
            }
        });
        addKeyListener(new KeyAdapter() {
            @Override
            public void keyPressed(KeyEvent event) {
                pressed(event);
            }
        });
    }

    /** Shows what may be entered. */
    static void show(DeskHand hand) {
        var register = hand.register();
        var archive = hand.archive();
        hand.run(
                "form kinds",
                work -> new FormReading(archive, register).drafts(java.util.Optional.empty()),
                drafts -> hand.show(new KindChoice(entries(hand, drafts))));
    }

    private static List<Entry> entries(DeskHand hand, List<FormReading.Kept> drafts) {
        List<Entry> entries = new ArrayList<>();
        for (FormReading.Kept kept : drafts) {
            entries.add(new Entry(kept.words(), TEXTS.of("kinds.draft"), () -> Forms.resume(hand, kept)));
        }
        Stops stops = Stops.shipped();
        hand.archive().kinds().all().stream()
                .map(RecordKind::kind)
                .filter(kind -> FormWords.of(kind.text()).begun())
                .sorted(Comparator.comparingInt(kind -> stops.of(kind.text()).orElse(Integer.MAX_VALUE)))
                .forEach(kind -> entries.add(new Entry(
                        Stops.label(kind.text()),
                        FormWords.of(kind.text()).purpose(),
                        () -> Forms.open(hand, kind.text(), JsonObject.EMPTY))));
        return List.copyOf(entries);
    }

    private void pressed(KeyEvent event) {
        switch (event.getKeyCode()) {
            case KeyEvent.VK_DOWN -> move(1);
            case KeyEvent.VK_UP -> move(-1);
            case KeyEvent.VK_ENTER -> entries.get(at).work().run();
            default -> {
                return;
            }
        }
        event.consume();
    }

    private void move(int by) {
        at = Math.floorMod(at + by, entries.size());
        tell();
        repaint();
    }

    private void tell() {
        getAccessibleContext()
                .setAccessibleDescription(
                        entries.get(at).words() + ", " + entries.get(at).detail());
    }

    @Override
    public String name() {
        return "kinds";
    }

    @Override
    public JComponent component() {
        return this;
    }

    @Override
    public void focusFirst() {
        requestFocusInWindow();
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("kinds.hint"));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.text(TEXTS.of("kinds.title"), Type.TITLE, Ink.INK, 16, 32);
            pen.text(TEXTS.of("kinds.words"), Type.BODY, Ink.INK2, 16, 54);
            double end = Math.min(getWidth() - 16.0, 900);
            pen.level(Ink.RULE, 16, end, TOP - 1.0);
            for (int i = 0; i < entries.size(); i++) {
                double y = TOP + (double) ROW * i;
                if (i == at) {
                    pen.fill(Ink.SEL.color(), 16, y, end - 16, ROW - 1.0);
                }
                pen.fitted(entries.get(i).words(), i == at ? Type.GROUP : Type.BODY, Ink.INK, 22, y + 15, 250);
                pen.fitted(entries.get(i).detail(), Type.BODY, Ink.INK2, 280, y + 15, end - 286);
                pen.level(Ink.HAIR, 16, end, y + ROW - 1);
            }
            if (isFocusOwner()) {
                pen.focus(16, TOP + (double) ROW * at, end - 16, ROW);
            }
        }
    }
}
