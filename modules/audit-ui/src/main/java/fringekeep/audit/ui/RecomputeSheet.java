package fringekeep.audit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.record.Hash;
import fringekeep.audit.ui.VerdictReading.Way;
import fringekeep.desk.look.Texts;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import java.awt.BorderLayout;
import java.awt.Toolkit;
import java.awt.datatransfer.StringSelection;
import java.awt.event.ActionEvent;
import java.util.List;
import java.util.Optional;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JPanel;
import javax.swing.KeyStroke;

/** Verdicts on records and everything upstream of them, with the record of each beside. */
public final class RecomputeSheet implements DeskSheet {
    private static final Texts TEXTS = AuditStage.TEXTS;
    private static final String JOB = "recompute";

    private final DeskHand hand;
    private final List<Hash> targets;
    private final JPanel room = new JPanel(new BorderLayout());
    private ComparisonPane pane;
    private Way way = Way.THROUGH;

    RecomputeSheet(DeskHand hand, List<Hash> targets) {
        this.hand = hand;
        this.targets = List.copyOf(targets);
        room.setOpaque(false);
        key("ctrl R", this::again);
        key("alt L", () -> choose(way == Way.THROUGH ? Way.EACH : Way.THROUGH));
        key("ctrl C", this::copy);
        pane = fresh();
        again();
    }

    private void key(String stroke, Runnable work) {
        room.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        room.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private ComparisonPane fresh() {
        WordButton press = WordButton.low(TEXTS.of("make.revision"), 'M', false);
        press.addActionListener(event -> hand.show(new RevisionSheet(hand, RevisionReading.Ask.next(targets))));
        ComparisonPane made = new ComparisonPane(
                List.of(
                        new ComparisonPane.Word(
                                TEXTS.of("through"), 'f', way == Way.THROUGH, () -> choose(Way.THROUGH)),
                        new ComparisonPane.Word(TEXTS.of("each"), 'l', way == Way.EACH, () -> choose(Way.EACH)),
                        new ComparisonPane.Word(TEXTS.of("again"), 'A', false, this::again),
                        new ComparisonPane.Word(TEXTS.of("copy"), 'C', false, this::copy)),
                press,
                hand::open);
        made.title(TEXTS.of(way == Way.THROUGH ? "recomputed.through" : "recomputed.each"));
        room.removeAll();
        room.add(made, BorderLayout.CENTER);
        room.revalidate();
        return made;
    }

    private void choose(Way next) {
        way = next;
        pane = fresh();
        again();
        focusFirst();
    }

    private void again() {
        Archive archive = hand.archive();
        Way asked = way;
        pane.waiting(TEXTS.of("recomputing"));
        hand.run(JOB, work -> new VerdictReading(archive).read(targets, asked, work), pane::show);
    }

    private void copy() {
        Toolkit.getDefaultToolkit()
                .getSystemClipboard()
                .setContents(new StringSelection(pane.table().asTable()), null);
        hand.done(TEXTS.of("copied"));
    }

    /** What is shown, once it is there; for tests. */
    public Optional<VerdictView> shown() {
        return pane.view();
    }

    @Override
    public String name() {
        return "recompute";
    }

    @Override
    public JComponent component() {
        return room;
    }

    @Override
    public void focusFirst() {
        pane.table().focusRows();
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("hint.recompute"));
    }

    @Override
    public void left() {
        hand.stop(JOB);
    }
}
