package fringekeep.desk.form;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.judgement.JudgementKind;
import fringekeep.archive.judgement.NoteKind;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskStage;
import fringekeep.desk.stage.KeyLine;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.BiConsumer;
import java.util.function.Consumer;
import java.util.function.Predicate;
import org.openide.util.lookup.ServiceProvider;

/** Entering by hand: new records, corrections, continuations, judgements and notes. */
@ServiceProvider(service = DeskStage.class)
public final class FormStage implements DeskStage {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormStage.class);
    private static final String JUDGEMENT = new JudgementKind().kind().text();
    private static final String NOTE = new NoteKind().kind().text();

    @Override
    public int order() {
        return 100;
    }

    @Override
    public List<DeskAction> actions() {
        return List.of(
                action("new", 'N', "ctrl N", false, DeskSelection::archiveOpen, FormStage::begin),
                action("kinds", 'e', "ctrl shift N", false, DeskSelection::archiveOpen, KindChoice::show),
                action("correct", 'C', "C", true, FormStage::enterable, hand -> inHand(hand, Forms::correct)),
                action("continue", 'a', "A", true, FormStage::continuable, hand -> inHand(hand, Forms::comeAfter)),
                action("judge", 'J', "J", true, FormStage::some, FormStage::judge),
                action("note", 'N', "N", true, DeskSelection::archiveOpen, FormStage::note));
    }

    private static DeskAction action(
            String id,
            char mnemonic,
            String stroke,
            boolean onRecord,
            Predicate<DeskSelection> applies,
            Consumer<DeskHand> work) {
        return new DeskAction(
                "form." + id, TEXTS.of("action." + id), mnemonic, stroke, DeskMenu.RECORD, onRecord, applies, work);
    }

    private static boolean some(DeskSelection selection) {
        return !selection.records().isEmpty();
    }

    private static boolean enterable(DeskSelection selection) {
        return selection.inHand().isPresent()
                && selection.kind().filter(kind -> FormWords.of(kind).entered()).isPresent();
    }

    private static boolean continuable(DeskSelection selection) {
        return selection.inHand().isPresent()
                && selection
                        .kind()
                        .filter(kind -> FormWords.of(kind).continues())
                        .isPresent();
    }

    private static void inHand(DeskHand hand, BiConsumer<DeskHand, Hash> work) {
        hand.selection().inHand().ifPresent(record -> work.accept(hand, record));
    }

    /** A new record of the open stop's kind; where no form begins such records, the kinds to choose from. */
    private static void begin(DeskHand hand) {
        hand.openKind()
                .filter(kind -> FormWords.of(kind).begun())
                .ifPresentOrElse(kind -> Forms.open(hand, kind, JsonObject.EMPTY), () -> KindChoice.show(hand));
    }

    /** One judgement of all that is selected. */
    private static void judge(DeskHand hand) {
        List<Hash> records = hand.selection().records();
        Graph graph = hand.register().graph();
        List<Json> about = new ArrayList<>();
        records.forEach(record -> about.add(entry("target", record)));
        records.stream()
                .flatMap(record -> graph.judgements(record).stream())
                .distinct()
                .forEach(judgement -> about.add(entry("undoes", judgement)));
        Hash chosen = hand.selection().inHand().filter(records::contains).orElse(records.get(0));
        about.add(entry("chosen", chosen));
        records.stream().filter(record -> !record.equals(chosen)).forEach(record -> about.add(entry("over", record)));
        Forms.open(hand, JUDGEMENT, JsonObject.EMPTY.with("about", new JsonArray(about)));
    }

    private static void note(DeskHand hand) {
        List<Json> about = new ArrayList<>();
        hand.selection().records().forEach(record -> about.add(entry("subject", record)));
        Forms.open(hand, NOTE, JsonObject.EMPTY.with("about", new JsonArray(about)));
    }

    private static JsonObject entry(String role, Hash record) {
        return JsonObject.EMPTY.with("role", role).with("record", record.hex()).with("reach", "record");
    }

    @Override
    public void opened(DeskHand hand) {
        var register = hand.register();
        var archive = hand.archive();
        hand.run(
                "form drafts",
                work -> new FormReading(archive, register).drafts(Optional.empty()),
                drafts -> offer(hand, drafts));
    }

    private static void offer(DeskHand hand, List<FormReading.Kept> drafts) {
        if (drafts.size() == 1) {
            hand.done(TEXTS.of("drafts.kept", drafts.get(0).words()));
        } else if (!drafts.isEmpty()) {
            hand.done(TEXTS.of("drafts.several", drafts.size()));
        }
    }

    @Override
    public List<KeyLine> keys() {
        List<KeyLine> lines = new ArrayList<>();
        lines.add(new KeyLine("", TEXTS.of("keys")));
        for (int i = 1; !TEXTS.orElse("keys." + i, "").isEmpty(); i++) {
            String[] halves = TEXTS.of("keys." + i).split("\\|", 2);
            lines.add(new KeyLine(halves[0].strip(), halves[1].strip()));
        }
        return lines;
    }
}
