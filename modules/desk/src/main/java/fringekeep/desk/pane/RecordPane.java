package fringekeep.desk.pane;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureView;
import java.awt.Graphics;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.BorderFactory;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.ScrollPaneConstants;

/** The pane of the record in hand. */
@SuppressWarnings("serial")
public final class RecordPane extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", RecordPane.class);
    private static final int FOOT = 60;

    private final PageHead head = new PageHead();
    private final transient PaneEar ear;
    private final PageBody body = new PageBody();
    private final JScrollPane scroll = new JScrollPane(body);
    private final LineageLine line;
    private transient Optional<RecordPage> page = Optional.empty();

    /** A pane that tells a listener what a person does. */
    public RecordPane(PaneEar ear) {
        this.ear = ear;
        this.line = new LineageLine(ear::follow);
        setName("record");
        setOpaque(true);
        setFocusable(true);
        scroll.getViewport().setOpaque(false);
        scroll.setOpaque(false);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        add(head);
        add(scroll);
        add(line);
        head.setVisible(false);
        scroll.setVisible(false);
        line.setVisible(false);
        getAccessibleContext().setAccessibleName(TEXTS.of("pane"));
    }

    /** Shows a record, or that there is none. */
    public void show(Optional<RecordPage> next) {
        boolean same = page.map(RecordPage::record).equals(next.map(RecordPage::record));
        page = next;
        boolean there = next.isPresent();
        head.setVisible(there);
        scroll.setVisible(there);
        line.setVisible(there);
        next.ifPresent(one -> fill(one, same));
        revalidate();
        repaint();
    }

    private void fill(RecordPage next, boolean same) {
        head.show(next, ear.actions());
        line.show(next.knots());
        List<PictureView> views = new ArrayList<>();
        for (Picture picture : next.pictures()) {
            views.add(new PictureView(picture, Ink::theme, ear::save));
        }
        List<JComponent> groups = new ArrayList<>();
        next.groups().forEach(group -> groups.add(new FactsPanel(group)));
        if (!next.notes().isEmpty()) {
            groups.add(Math.min(2, groups.size()), new NotesPanel(next.notes(), ear));
        }
        List<BesidePanel> besides = next.besides().stream()
                .map(beside -> new BesidePanel(beside, () -> ear.follow(List.of(beside.record()))))
                .toList();
        body.show(views, besides, next.tables().stream().map(TablePanel::new).toList(), groups);
        if (!same) {
            scroll.getVerticalScrollBar().setValue(0);
        }
    }

    /** The record shown. */
    public Optional<RecordPage> page() {
        return page;
    }

    /** Says by how much the record in hand moves, behind its state. */
    public void size(Hash record, String words) {
        if (page.filter(one -> one.record().equals(record)).isPresent()) {
            head.size(words);
            revalidate();
        }
    }

    /** Gives the focus to the lineage line at the foot. */
    public void focusLine() {
        line.requestFocusInWindow();
    }

    /** Whether the lineage line has the focus. */
    public boolean lineFocused() {
        return line.isFocusOwner();
    }

    /** Gives the focus to the first drawing, or to the pane. */
    public void focusPage() {
        List<PictureView> pictures = body.pictures();
        if (pictures.isEmpty()) {
            requestFocusInWindow();
        } else {
            pictures.get(0).requestFocusInWindow();
        }
    }

    @Override
    public void doLayout() {
        int width = getWidth();
        int top = head.heightIn(width);
        int foot = getHeight() - FOOT - 4;
        head.setBounds(0, 0, width, top);
        scroll.setBounds(0, top, width, Math.max(10, foot - top));
        line.setBounds(0, foot, width, FOOT);
        body.sight(foot - top);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            if (page.isEmpty()) {
                pen.text(TEXTS.of("none"), Type.BODY, Ink.INK2, 0, 29);
                pen.text(TEXTS.of("none.key"), Type.SMALL, Ink.INK3, 0, 47);
            }
            if (isFocusOwner()) {
                pen.fill(Ink.SELRULE.color(), 0, 34, 40, 2);
            }
        }
    }
}
