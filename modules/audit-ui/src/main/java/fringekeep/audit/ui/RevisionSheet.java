package fringekeep.audit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PersonId;
import fringekeep.audit.NextRevision;
import fringekeep.audit.Revision;
import fringekeep.desk.look.Texts;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.NumberText;
import java.awt.Toolkit;
import java.awt.datatransfer.StringSelection;
import java.awt.event.ActionEvent;
import java.util.List;
import java.util.Optional;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.KeyStroke;

/** What would change, by how many standard uncertainties; recorded on request when it was not only supposed. */
public final class RevisionSheet implements DeskSheet {
    private static final Texts TEXTS = AuditStage.TEXTS;
    private static final String JOB = "revision";

    private final DeskHand hand;
    private final RevisionReading.Ask ask;
    private final WordButton press;
    private final ComparisonPane pane;
    private List<Revision> revisions = List.of();
    private boolean recording;

    RevisionSheet(DeskHand hand, RevisionReading.Ask ask) {
        this.hand = hand;
        this.ask = ask;
        this.press = WordButton.low(TEXTS.of("revision.record", "0"), 'R', true);
        press.setName("record revisions");
        press.setEnabled(false);
        press.setVisible(ask.recordable());
        press.addActionListener(event -> recordAll());
        this.pane = new ComparisonPane(
                List.of(
                        new ComparisonPane.Word(TEXTS.of("again"), 'A', false, () -> read(Optional.empty())),
                        new ComparisonPane.Word(TEXTS.of("copy"), 'C', false, this::copy)),
                press,
                hand::open);
        pane.title(TEXTS.of(ask.recordable() ? "revision.title" : "suppose.title"));
        pane.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT)
                .put(KeyStroke.getKeyStroke("ctrl ENTER"), "record");
        pane.getActionMap().put("record", new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                press.doClick();
            }
        });
        if (ask.recordable()) {
            hand.person(person -> read(Optional.of(person)));
        } else {
            read(Optional.empty());
        }
    }

    private void read(Optional<PersonId> person) {
        Archive archive = hand.archive();
        pane.waiting(TEXTS.of("revising"));
        hand.run(JOB, work -> new RevisionReading(archive).read(ask, person, work), answer -> {
            revisions = answer.revisions();
            pane.title(answer.title());
            pane.show(answer.view());
            long possible = revisions.stream()
                    .filter(revision -> revision.after().isPresent())
                    .count();
            press.setText(TEXTS.of("revision.record", NumberText.count(possible)));
            press.setEnabled(possible > 0);
            pane.revalidate();
        });
    }

    private void recordAll() {
        if (!press.isEnabled() || recording) {
            return;
        }
        recording = true;
        press.setEnabled(false);
        Archive archive = hand.archive();
        List<Revision> all = revisions;
        hand.run(
                JOB,
                work -> record(archive, all),
                recorded -> {
                    recording = false;
                    hand.done(TEXTS.of("revision.recorded", NumberText.count(recorded.size())));
                    if (!recorded.isEmpty()) {
                        hand.open(recorded.get(recorded.size() - 1).fingerprint());
                    }
                },
                problems -> {
                    recording = false;
                    press.setEnabled(true);
                    hand.say(problems);
                });
    }

    private static List<Archive.Recorded> record(Archive archive, List<Revision> revisions) throws ProblemException {
        return NextRevision.record(archive, revisions);
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
        return ask.recordable() ? "revision" : "suppose";
    }

    @Override
    public JComponent component() {
        return pane;
    }

    @Override
    public void focusFirst() {
        pane.table().focusRows();
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of(ask.recordable() ? "hint.revision" : "hint.suppose"));
    }

    @Override
    public void left() {
        hand.stop(JOB);
    }
}
