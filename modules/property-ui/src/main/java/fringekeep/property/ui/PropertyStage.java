package fringekeep.property.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.util.List;
import org.openide.util.lookup.ServiceProvider;

/** Deriving properties, on the desk. */
@ServiceProvider(service = DeskStage.class)
public final class PropertyStage implements DeskStage {
    private static final String FIT = "fit";
    private static final String SELECTION = "selection";
    private static final String PROPERTY = "property";

    /** For the platform. */
    public PropertyStage() {}

    @Override
    public int order() {
        return 600;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                action("property.of", "action.of", 'P', true, selection -> selection.isOf(FIT, SELECTION)),
                action("property.again", "action.again", 'n', true, selection -> selection.isOf(PROPERTY)),
                new DeskAction(
                        "property.rule",
                        PropertyWords.TEXTS.of("action.rule"),
                        'r',
                        "",
                        DeskMenu.FIT,
                        false,
                        DeskSelection::archiveOpen,
                        hand -> hand.show(new PropertySheet(hand, PropertyPlan.rule()))));
    }

    private static DeskAction action(
            String id, String key, char letter, boolean onRecord, java.util.function.Predicate<DeskSelection> applies) {
        return new DeskAction(
                id,
                PropertyWords.TEXTS.of(key),
                letter,
                "ctrl P",
                DeskMenu.FIT,
                onRecord,
                applies,
                PropertyStage::show);
    }

    private static void show(DeskHand hand) {
        DeskSelection selection = hand.selection();
        Archive archive = hand.archive();
        List<Hash> records = selection.records();
        hand.run(
                "property.plan",
                work -> plan(archive, selection, records),
                plan -> hand.show(new PropertySheet(hand, plan)));
    }

    private static PropertyPlan plan(Archive archive, DeskSelection selection, List<Hash> records)
            throws ProblemException {
        if (selection.isOf(FIT)) {
            return PropertyPlan.picked(records);
        }
        Hash record = selection.inHand().orElse(records.get(0));
        return selection.isOf(SELECTION)
                ? PropertyByHand.ofSelection(archive, record)
                : PropertyByHand.ofProperty(archive, record);
    }

    @Override
    public List<KeyLine> keys() {
        return List.of(
                new KeyLine("", PropertyWords.TEXTS.of("key.property")),
                new KeyLine("up, down", PropertyWords.TEXTS.of("key.fits")),
                new KeyLine("Ctrl Space", PropertyWords.TEXTS.of("key.compute")),
                new KeyLine("Ctrl Z, Ctrl Y", PropertyWords.TEXTS.of("key.undo")),
                new KeyLine("Ctrl Enter", PropertyWords.TEXTS.of("key.record")));
    }
}
