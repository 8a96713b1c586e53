package fringekeep.desk.window;

import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.openide.util.Lookup;

/** All that stages add to the desk, in one order. */
final class DeskStages {
    private final List<DeskStage> stages;
    private final List<DeskAction> actions = new ArrayList<>();

    DeskStages(Collection<? extends DeskStage> announced) {
        stages = announced.stream()
                .map(DeskStage.class::cast)
                .sorted(Comparator.comparingInt(DeskStage::order)
                        .thenComparing(stage -> stage.getClass().getName()))
                .toList();
        stages.forEach(stage -> actions.addAll(stage.actions()));
    }

    /** The same with one more. */
    DeskStages with(DeskStage more) {
        List<DeskStage> all = new ArrayList<>(stages);
        all.add(more);
        return new DeskStages(all);
    }

    /** Those that modules announce. */
    static DeskStages announced() {
        return new DeskStages(Lookup.getDefault().lookupAll(DeskStage.class));
    }

    List<DeskStage> all() {
        return stages;
    }

    List<DeskAction> in(DeskMenu menu) {
        return actions.stream().filter(action -> action.menu() == menu).toList();
    }

    /** Those that stand at a record's title now. */
    List<DeskAction> onRecord(DeskSelection selection) {
        return actions.stream()
                .filter(action -> action.onRecord() && action.applies().test(selection))
                .toList();
    }

    /** All keys that actions have. */
    Set<String> strokes() {
        Set<String> strokes = new LinkedHashSet<>();
        actions.stream()
                .map(DeskAction::stroke)
                .filter(stroke -> !stroke.isEmpty())
                .forEach(strokes::add);
        return strokes;
    }

    /** What a key does with what is selected. */
    Optional<DeskAction> forStroke(String stroke, DeskSelection selection) {
        return actions.stream()
                .filter(action ->
                        action.stroke().equals(stroke) && action.applies().test(selection))
                .findFirst();
    }

    List<KeyLine> keys() {
        List<KeyLine> lines = new ArrayList<>();
        stages.forEach(stage -> lines.addAll(stage.keys()));
        return lines;
    }
}
