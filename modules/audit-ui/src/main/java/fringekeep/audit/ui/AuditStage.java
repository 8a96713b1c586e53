package fringekeep.audit.ui;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.util.List;
import java.util.Set;
import org.openide.util.lookup.ServiceProvider;

/** Recomputing, supposing and next revisions. */
@ServiceProvider(service = DeskStage.class)
public final class AuditStage implements DeskStage {
    static final Texts TEXTS = new Texts("fringekeep.audit.ui.Texts", AuditStage.class);

    /** For the service loader. */
    public AuditStage() {}

    @Override
    public int order() {
        return 900;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                new DeskAction(
                        "audit.recompute",
                        TEXTS.of("recompute"),
                        'm',
                        "ctrl R",
                        DeskMenu.LINEAGE,
                        true,
                        AuditStage::computed,
                        AuditStage::recompute),
                new DeskAction(
                        "audit.suppose",
                        TEXTS.of("suppose"),
                        'S',
                        "ctrl shift S",
                        DeskMenu.LINEAGE,
                        false,
                        AuditStage::some,
                        AuditStage::suppose),
                new DeskAction(
                        "audit.revise",
                        TEXTS.of("revise"),
                        'x',
                        "ctrl shift N",
                        DeskMenu.LINEAGE,
                        false,
                        AuditStage::some,
                        AuditStage::revise));
    }

    @Override
    public List<KeyLine> keys() {
        return List.of(
                new KeyLine("", TEXTS.of("keys")),
                new KeyLine("Ctrl R", TEXTS.of("keys.recompute")),
                new KeyLine("Ctrl Shift S", TEXTS.of("keys.suppose")),
                new KeyLine("Ctrl Shift N", TEXTS.of("keys.revise")));
    }

    private static boolean some(DeskSelection selection) {
        return !selection.records().isEmpty();
    }

    /** Kinds that are computed, or gather what is: decided by whether anything stands upstream. */
    private static boolean computed(DeskSelection selection) {
        return some(selection);
    }

    private static void recompute(DeskHand hand) {
        hand.show(new RecomputeSheet(hand, hand.selection().records()));
    }

    private static void suppose(DeskHand hand) {
        List<Hash> without = hand.selection().records();
        hand.show(new RevisionSheet(hand, RevisionReading.Ask.supposing(without)));
    }

    private static void revise(DeskHand hand) {
        hand.show(new RevisionSheet(
                hand, RevisionReading.Ask.next(hand.selection().records())));
    }

    /** Whether a record stands and is outdated. */
    static boolean outdated(Set<StateName> states) {
        return states.contains(StateName.OUTDATED) && !states.contains(StateName.CORRECTED);
    }
}
