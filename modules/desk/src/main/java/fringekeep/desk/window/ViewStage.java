package fringekeep.desk.window;

import fringekeep.archive.graph.StateName;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.States;
import fringekeep.desk.session.View;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import fringekeep.desk.stage.SizeOfChange;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import org.openide.util.Lookup;

/** The desk's own entries: what is in view, columns of the list. */
final class ViewStage implements DeskStage {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", ViewStage.class);

    private static final Mark OUTDATED = States.mark(StateName.OUTDATED);

    private final Desk desk;

    ViewStage(Desk desk) {
        this.desk = desk;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                action("view.day", 'D', "alt D", DeskMenu.DAY, hand -> new Days(desk, hand).here()),
                action("view.previous", 'P', "ctrl LEFT", DeskMenu.DAY, hand -> new Days(desk, hand).step(-1)),
                action("view.next", 'N', "ctrl RIGHT", DeskMenu.DAY, hand -> new Days(desk, hand).step(1)),
                action("view.choose", 'C', "ctrl D", DeskMenu.DAY, hand -> desk.chooseView()),
                action("view.all", 'A', "alt HOME", DeskMenu.DAY, hand -> desk.view(View.ALL)),
                new DeskAction(
                        "record.size",
                        TEXTS.of("record.size"),
                        'H',
                        "H",
                        DeskMenu.LINEAGE,
                        true,
                        this::movable,
                        hand -> desk.sizeOfChange()),
                action(
                        "list.columns",
                        'o',
                        "",
                        DeskMenu.RECORD,
                        hand -> desk.listPane().chooseColumns()));
    }

    /** Whether the record in hand is outdated and something here can work out by how much. */
    private boolean movable(DeskSelection selection) {
        return desk.recordPane()
                        .page()
                        .filter(page -> selection.inHand().equals(Optional.of(page.record())))
                        .filter(page -> page.states().stream().anyMatch(state -> state.mark() == OUTDATED))
                        .isPresent()
                && Lookup.getDefault().lookup(SizeOfChange.class) != null;
    }

    private static DeskAction action(String id, char mnemonic, String stroke, DeskMenu menu, Consumer<DeskHand> work) {
        return new DeskAction(id, TEXTS.of(id), mnemonic, stroke, menu, false, DeskSelection::archiveOpen, work);
    }

    @Override
    public int order() {
        return 0;
    }

    @Override
    public List<KeyLine> keys() {
        List<KeyLine> lines = new ArrayList<>();
        for (int i = 1; !TEXTS.orElse("keys.view." + i, "").isEmpty(); i++) {
            String[] parts = TEXTS.of("keys.view." + i).split("\\|", 2);
            lines.add(parts.length == 1 ? new KeyLine("", parts[0]) : new KeyLine(parts[0].strip(), parts[1].strip()));
        }
        return lines;
    }
}
