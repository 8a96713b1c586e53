package fringekeep.bundle.ui;

import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.util.List;
import javax.swing.SwingUtilities;
import org.openide.util.lookup.ServiceProvider;

/** Exporting datasets and checking bundles, in the menu for bundles. */
@ServiceProvider(service = DeskStage.class)
public final class BundleStage implements DeskStage {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", BundleStage.class);

    /** For the service loader. */
    public BundleStage() {}

    @Override
    public int order() {
        return 800;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                new DeskAction(
                        "bundle.export",
                        TEXTS.of("action.export"),
                        'E',
                        "ctrl E",
                        DeskMenu.BUNDLE,
                        false,
                        selection ->
                                selection.archiveOpen() && !selection.records().isEmpty(),
                        hand -> hand.show(new ExportSheet(
                                hand,
                                SwingUtilities::invokeLater,
                                hand.selection().records()))),
                new DeskAction(
                        "bundle.check",
                        TEXTS.of("action.check"),
                        'C',
                        "",
                        DeskMenu.BUNDLE,
                        false,
                        DeskSelection::archiveOpen,
                        hand -> hand.show(new CheckSheet(hand, SwingUtilities::invokeLater))));
    }

    @Override
    public List<KeyLine> keys() {
        return List.of(
                new KeyLine("", TEXTS.of("keys.bundle")),
                new KeyLine("Ctrl Enter", TEXTS.of("keys.do")),
                new KeyLine("Z  F  F5", TEXTS.of("keys.check")));
    }
}
