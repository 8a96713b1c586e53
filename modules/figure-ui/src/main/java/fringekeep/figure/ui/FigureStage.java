package fringekeep.figure.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.util.List;
import org.openide.util.lookup.ServiceProvider;

/** Figures and statements. */
@ServiceProvider(service = DeskStage.class)
public final class FigureStage implements DeskStage {
    private static final Texts TEXTS = new Texts("fringekeep.figure.ui.Texts", FigureStage.class);

    /** For the service loader. */
    public FigureStage() {}

    @Override
    public int order() {
        return 800;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(new DeskAction(
                "figure.make",
                TEXTS.of("make"),
                'i',
                "ctrl G",
                DeskMenu.FIT,
                true,
                FigureStage::plottable,
                FigureStage::make));
    }

    @Override
    public List<KeyLine> keys() {
        return List.of(
                new KeyLine("", TEXTS.of("keys")),
                new KeyLine("Ctrl G", TEXTS.of("keys.make")),
                new KeyLine("F2", TEXTS.of("keys.panel")),
                new KeyLine("Ctrl Enter", TEXTS.of("keys.record")));
    }

    private static boolean plottable(DeskSelection selection) {
        return selection.isOf("property", "fit", "velocity", "quoted", "figure");
    }

    private static void make(DeskHand hand) {
        Archive archive = hand.archive();
        List<Hash> records = hand.selection().records();
        boolean again = hand.selection().isOf("figure");
        hand.run(
                "figure",
                work -> again
                        ? FigureDraft.from(archive, records.get(0))
                        : FigureDraft.of(archive, FigureProposal.of(archive, records)),
                draft -> hand.show(new FigureSheet(hand, draft)));
    }
}
