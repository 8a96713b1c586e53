package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.desk.stage.DeskHand;
import java.security.SecureRandom;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.HexFormat;
import java.util.Optional;
import java.util.Set;

/** Keeps what is typed as a draft of the archive, so that a crash loses at most the last second. */
final class DraftKeeper {
    private static final SecureRandom RANDOM = new SecureRandom();

    private final DeskHand hand;
    private final Archive archive;
    private final FormModel model;
    private final String title;
    private final String id;
    private final String place;
    private boolean kept;
    private boolean over;
    private Optional<FormState> saved = Optional.empty();

    DraftKeeper(DeskHand hand, FormModel model, String title, Optional<String> id) {
        this.hand = hand;
        this.archive = hand.archive();
        this.model = model;
        this.title = title;
        this.id = id.orElseGet(DraftKeeper::fresh);
        this.place = "draft " + this.id;
        this.kept = id.isPresent();
        if (id.isPresent()) {
            saved = Optional.of(model.state());
        }
    }

    private static String fresh() {
        byte[] bytes = new byte[16];
        RANDOM.nextBytes(bytes);
        return HexFormat.of().formatHex(bytes);
    }

    /** The draft as it is kept. */
    JsonObject body() {
        JsonObject body = JsonObject.EMPTY
                .with("kind", model.kind().name())
                .with("title", title)
                .with("saved", Instant.now().truncatedTo(ChronoUnit.SECONDS).toString())
                .with("state", model.state().json());
        return model.base().map(base -> body.with("of", base.record().hex())).orElse(body);
    }

    /** Keeps the present state, unless it is kept already or nothing was typed. */
    void keep(Runnable done) {
        if (over || saved.equals(Optional.of(model.state())) || !kept && !model.touched()) {
            return;
        }
        JsonObject body = body();
        saved = Optional.of(model.state());
        kept = true;
        hand.run(
                place,
                work -> {
                    archive.drafts().save(id, body);
                    return Boolean.TRUE;
                },
                done(done));
    }

    private static java.util.function.Consumer<Boolean> done(Runnable work) {
        return answer -> work.run();
    }

    /** Whether anything is kept. */
    boolean isKept() {
        return kept;
    }

    /** The draft that goes when the record is recorded. */
    Set<String> ids() {
        return kept ? Set.of(id) : Set.of();
    }

    /** Nothing is kept any more: it was recorded. */
    void recorded() {
        over = true;
    }

    /** Throws the draft away. */
    void discard(Runnable done) {
        over = true;
        if (!kept) {
            done.run();
            return;
        }
        hand.run(
                place,
                work -> {
                    archive.drafts().remove(id);
                    return Boolean.TRUE;
                },
                done(done));
    }
}
