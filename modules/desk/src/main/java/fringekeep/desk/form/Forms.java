package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Hash;
import fringekeep.desk.form.FormState.Way;
import fringekeep.desk.run.Job;
import fringekeep.desk.session.Register;
import fringekeep.desk.stage.DeskHand;
import java.util.function.Consumer;

/**
 * Opens forms. What is to be filled in comes as an entry document (the same that the headless program records): {@code kind}
 * may be left out, quantities may be texts such as {@code "10.50(5) mm"}, records are named by label or by 64 digits, raw
 * files by path. Whatever the document leaves out is asked for. To be used on the window thread while an archive is open.
 */
public final class Forms {
    private static final String PLACE = "form";

    private Forms() {}

    /** Opens a form for a new record; once recorded, the record is opened. */
    public static void open(DeskHand hand, String kind, JsonObject filled) {
        open(hand, kind, filled, recorded -> {});
    }

    /**
     * Opens a form for a new record.
     *
     * @param then called on the window thread with the fingerprint once it was recorded and is shown
     */
    public static void open(DeskHand hand, String kind, JsonObject filled, Consumer<Hash> then) {
        show(hand, reading -> reading.fresh(kind, filled), then);
    }

    /** Opens the form that corrects a record: it was never true. */
    public static void correct(DeskHand hand, Hash record) {
        show(hand, reading -> reading.from(record, Way.CORRECTS), recorded -> {});
    }

    /** Opens the form of a record that comes after another: things changed. A kind that has no such records is corrected. */
    public static void comeAfter(DeskHand hand, Hash record) {
        show(hand, reading -> reading.from(record, Way.AFTER), recorded -> {});
    }

    /** Opens a form for a new record like one that is there. */
    static void like(DeskHand hand, String kind, Hash record) {
        show(hand, reading -> reading.fresh(kind, reading.like(record)), recorded -> {});
    }

    /** Goes on with a draft. */
    static void resume(DeskHand hand, FormReading.Kept kept) {
        show(hand, reading -> reading.draft(kept.id(), kept.body()), recorded -> {});
    }

    private interface Opening {
        FormReading.Opened with(FormReading reading) throws fringekeep.archive.problem.ProblemException;
    }

    private static void show(DeskHand hand, Opening opening, Consumer<Hash> then) {
        Archive archive = hand.archive();
        Register register = hand.register();
        Job<FormReading.Opened> job = work -> opening.with(new FormReading(archive, register));
        hand.run(PLACE, job, opened -> hand.show(new FormSheet(hand, opened, then)));
    }
}
