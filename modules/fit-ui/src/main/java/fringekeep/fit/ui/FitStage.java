package fringekeep.fit.ui;

import fringekeep.archive.record.Hash;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import fringekeep.fit.TrialFits;
import java.util.List;
import org.openide.util.lookup.ServiceProvider;

/** Fitting by hand and fitting many, on the desk. */
@ServiceProvider(service = DeskStage.class)
public final class FitStage implements DeskStage {
    private static final String SCAN = "scan";
    private static final String FIT = "fit";

    /** For the platform. */
    public FitStage() {}

    @Override
    public int order() {
        return 500;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                new DeskAction(
                        "fit.hand",
                        FitWords.TEXTS.of("action.fit"),
                        'F',
                        "F",
                        DeskMenu.FIT,
                        true,
                        selection -> selection.isOf(SCAN, FIT),
                        FitStage::byHand),
                new DeskAction(
                        "fit.each",
                        FitWords.TEXTS.of("action.each"),
                        'e',
                        "",
                        DeskMenu.FIT,
                        false,
                        selection -> selection.isOf(SCAN),
                        hand -> hand.show(EachSheet.of(hand, hand.selection().records()))),
                new DeskAction(
                        "fit.unfitted",
                        FitWords.TEXTS.of("action.unfitted"),
                        'a',
                        "",
                        DeskMenu.FIT,
                        false,
                        DeskSelection::archiveOpen,
                        hand -> hand.show(EachSheet.ofUnfitted(hand))));
    }

    /** A fit is begun anew from its own scans. */
    private static void byHand(DeskHand hand) {
        DeskSelection selection = hand.selection();
        if (selection.isOf(SCAN)) {
            hand.show(new FitSheet(hand, selection.records()));
            return;
        }
        Hash fit = selection.inHand().orElse(selection.records().get(0));
        hand.run("fit.scans", work -> TrialFits.scansOf(hand.archive(), fit), scans -> {
            if (!scans.isEmpty()) {
                hand.show(new FitSheet(hand, scans));
            }
        });
    }

    @Override
    public List<KeyLine> keys() {
        return List.of(
                new KeyLine("", FitWords.TEXTS.of("key.fit")),
                new KeyLine("left, right", FitWords.TEXTS.of("key.points")),
                new KeyLine("M", FitWords.TEXTS.of("key.mask")),
                new KeyLine("[ ]", FitWords.TEXTS.of("key.from")),
                new KeyLine("\\", FitWords.TEXTS.of("key.whole")),
                new KeyLine("Space", FitWords.TEXTS.of("key.compare")),
                new KeyLine("Ctrl Z, Ctrl Y", FitWords.TEXTS.of("key.undo")),
                new KeyLine("Ctrl Enter", FitWords.TEXTS.of("key.keep")));
    }
}
