package fringekeep.scan.ui;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.swing.SwingUtilities;
import org.openide.util.lookup.ServiceProvider;

/** Taking in and placing, in menus, on keys, and by files dropped on the window. */
@ServiceProvider(service = DeskStage.class)
public final class ScanStage implements DeskStage {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", ScanStage.class);

    private Optional<TakeInSheet> takeIn = Optional.empty();
    private Optional<fringekeep.archive.Archive> of = Optional.empty();

    /** For the service loader. */
    public ScanStage() {}

    @Override
    public int order() {
        return 300;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                new DeskAction(
                        "scan.take-in",
                        TEXTS.of("action.take-in"),
                        'T',
                        "ctrl I",
                        DeskMenu.ARCHIVE,
                        false,
                        DeskSelection::archiveOpen,
                        hand -> {
                            TakeInSheet sheet = takeIn(hand);
                            hand.show(sheet);
                            if (sheet.model().size() == 0) {
                                sheet.choose();
                            }
                        }),
                new DeskAction(
                        "scan.place",
                        TEXTS.of("action.place"),
                        'P',
                        "P",
                        DeskMenu.RECORD,
                        true,
                        selection -> selection.isOf("scan"),
                        hand -> place(hand, hand.selection().records())),
                new DeskAction(
                        "scan.unplaced",
                        TEXTS.of("action.unplaced"),
                        'U',
                        "U",
                        DeskMenu.RECORD,
                        false,
                        DeskSelection::archiveOpen,
                        hand -> hand.list("scan", UnplacedScans.of(hand.register()), TEXTS.of("unplaced.words"))));
    }

    private static void place(DeskHand hand, List<Hash> scans) {
        hand.show(new PlaceSheet(hand, scans));
    }

    /** The sheet of the open archive; kept while its work goes on. */
    private TakeInSheet takeIn(DeskHand hand) {
        if (of.filter(hand.archive()::equals).isEmpty() || takeIn.isEmpty()) {
            of = Optional.of(hand.archive());
            takeIn = Optional.of(new TakeInSheet(hand, SwingUtilities::invokeLater, scans -> place(hand, scans)));
        }
        return takeIn.get();
    }

    /** The sheet for taking in, once shown. */
    Optional<TakeInSheet> takeInSheet() {
        return takeIn;
    }

    @Override
    public boolean dropped(List<Path> files, DeskHand hand) {
        TakeInSheet sheet = takeIn(hand);
        hand.show(sheet);
        sheet.add(files);
        return true;
    }

    @Override
    public List<KeyLine> keys() {
        return List.of(
                new KeyLine("", TEXTS.of("keys.take-in")),
                new KeyLine("Enter", TEXTS.of("keys.enter")),
                new KeyLine("left, right", TEXTS.of("keys.profile")),
                new KeyLine("A  D", TEXTS.of("keys.add")),
                new KeyLine("Delete", TEXTS.of("keys.delete")),
                new KeyLine("F5", TEXTS.of("keys.again")),
                new KeyLine("", TEXTS.of("keys.place")),
                new KeyLine("S R B L E T", TEXTS.of("keys.purpose")),
                new KeyLine("Ctrl Enter", TEXTS.of("keys.place.do")));
    }
}
