package fringekeep.scan.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.scan.TakeInFiles;
import fringekeep.scan.TakeInFiles.Chosen;
import fringekeep.scan.TryFiles;
import fringekeep.scan.TryFiles.Look;
import fringekeep.scan.TryFiles.Tried;
import fringekeep.scan.ui.FileLine.Stand;
import fringekeep.scan.ui.FileLine.Taken;
import fringekeep.scan.ui.FileLine.Trial;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.function.Consumer;
import javax.swing.JComponent;

/**
 * Taking raw files in: chosen or dropped files are tried at once, seen before they are recorded, and taken in together.
 * Refused ones stay with what is wrong. Leaving the sheet lets taking in go on; stopping keeps what is done.
 */
final class TakeInSheet implements DeskSheet {
    static final String NAME = "take in";
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", TakeInSheet.class);
    private static final int LINES_SHOWN = 20_000;
    private static final String TAKING = "take in";
    private static final String TRYING = "take in trial";
    private static final String LOOKING = "take in look";

    private final DeskHand hand;
    private final Archive archive;
    private final Executor window;
    private final Consumer<List<Hash>> place;
    private final TakeInModel model = new TakeInModel();
    private final TakeInPane pane;
    private List<Hash> profiles = List.of();
    private boolean running;
    private boolean stopAsked;
    private int asked;
    private String said = "";

    /**
     * An empty sheet.
     *
     * @param window the window thread
     * @param place shows the sheet that places scans
     */
    TakeInSheet(DeskHand hand, Executor window, Consumer<List<Hash>> place) {
        this.hand = hand;
        this.archive = hand.archive();
        this.window = window;
        this.place = place;
        this.pane = new TakeInPane(new Ear(), hand::save);
        pane.fileTimes(
                hand.remembered("take in file times").filter("true"::equals).isPresent());
        readProfiles();
        changed();
    }

    private void readProfiles() {
        record Named(List<Hash> profiles, List<String> words) {}
        hand.run(
                "take in profiles",
                work -> {
                    List<Hash> found = new TryFiles(archive).profiles();
                    return new Named(
                            found, found.stream().map(this::profileWords).toList());
                },
                named -> {
                    boolean other = !profiles.equals(named.profiles());
                    profiles = named.profiles();
                    pane.profiles(named.words());
                    if (other) {
                        tryAgain();
                    }
                });
    }

    /** {@code profile 2, counter 2}. Asks the archive. */
    private String profileWords(Hash profile) {
        String label =
                archive.label(profile).replace("reading-profile", "profile").replace("reading profile", "profile");
        String words = archive.record(profile)
                .flatMap(record -> record.content().text("label"))
                .orElse("");
        return words.isEmpty() ? label : words;
    }

    /** Adds files and folders: folders are walked through. */
    void add(List<Path> chosen) {
        hand.run("take in files", work -> FoundFiles.of(chosen, work), found -> {
            model.add(found);
            changed();
            pane.selectFirst();
            tryFiles();
        });
    }

    /** Asks for files. */
    void choose() {
        add(hand.chooseFiles(TEXTS.of("take-in.choose")));
    }

    // ---- trying

    private void tryFiles() {
        List<Chosen> untried = model.untried();
        if (untried.isEmpty()) {
            return;
        }
        hand.run(TRYING, work -> tryEach(untried, work), done -> changed());
    }

    private Boolean tryEach(List<Chosen> untried, Work work) {
        TryFiles trial = new TryFiles(archive);
        for (int i = 0; i < untried.size() && !work.stopped(); i++) {
            work.progress(i, untried.size(), TEXTS.of("take-in.trying"));
            Chosen chosen = untried.get(i);
            Tried tried = trial.attempt(chosen.file(), chosen.profile());
            List<Hash> scans = tried.known().isEmpty() ? tried.otherwise() : tried.known();
            Trial words =
                    new Trial(tried, tried.profile().map(this::profileWords).orElse(""), scanWords(scans));
            window.execute(() -> tried(chosen, words));
        }
        return Boolean.TRUE;
    }

    private String scanWords(List<Hash> scans) {
        List<String> labels = scans.stream().limit(3).map(archive::label).toList();
        return String.join(", ", labels) + (scans.size() > 3 ? " \u2026" : "");
    }

    private void tried(Chosen chosen, Trial trial) {
        model.tried(chosen, trial).ifPresent(row -> {
            pane.show(row, model.line(row));
            if (pane.selected().contains(row) && pane.selected().get(0).equals(row)) {
                look();
            }
            summary();
        });
    }

    /** Tries what was refused once more: the file or the profiles may have been mended. */
    private void tryAgain() {
        List<Integer> refused = new ArrayList<>();
        for (int row = 0; row < model.size(); row++) {
            Stand stand = model.line(row).stand();
            if (stand == Stand.REFUSED || stand == Stand.WAITS) {
                refused.add(row);
            }
        }
        for (int row : refused) {
            model.ask(List.of(row), model.line(row).asked());
        }
        changed();
        tryFiles();
    }

    // ---- looking

    private void look() {
        Optional<Integer> row = pane.selected().stream().findFirst().filter(one -> one < model.size());
        pane.choice(row.map(model::line), pane.selected().size(), profiles);
        if (row.isEmpty()) {
            pane.look(Optional.empty(), Optional.empty(), profiles.size());
            return;
        }
        FileLine line = model.line(row.get());
        hand.run(
                LOOKING,
                work -> new TryFiles(archive).look(line.file(), line.profile(), LINES_SHOWN),
                (Look look) -> pane.look(Optional.of(line), Optional.of(look), profiles.size()),
                problems -> pane.look(Optional.of(line), Optional.empty(), profiles.size()));
    }

    // ---- taking in

    private void takeIn() {
        if (!running && !model.ready().isEmpty()) {
            hand.person(this::takeIn);
        }
    }

    private void takeIn(PersonId person) {
        List<Chosen> ready = model.ready();
        if (running || ready.isEmpty()) {
            return;
        }
        running = true;
        stopAsked = false;
        asked = ready.size();
        said = "";
        boolean times = pane.fileTimes();
        hand.remember("take in file times", Boolean.toString(times));
        changed();
        hand.run(
                TAKING,
                work -> new TakeInFiles(archive)
                        .takeEach(ready, times, Optional.of(person), new Said(work), outcome -> {
                            Taken taken = new Taken(outcome, scanWords(outcome.scans()));
                            window.execute(() -> taken(taken));
                        })
                        .size(),
                size -> ended(),
                problems -> {
                    hand.say(problems);
                    ended();
                });
    }

    /** Names the job in the progress line whatever file is at hand. */
    private record Said(Work work) implements Work {
        @Override
        public void progress(long done, long total, String what) {
            work.progress(done, total, TEXTS.of("take-in.taking"));
        }

        @Override
        public boolean stopped() {
            return work.stopped();
        }
    }

    private void taken(Taken taken) {
        model.taken(taken).ifPresent(row -> {
            pane.show(row, model.line(row));
            summary();
        });
    }

    private void ended() {
        running = false;
        long done = model.count(Stand.TAKEN_IN);
        long left = model.ready().size();
        said = stopAsked || left > 0
                ? TEXTS.of("take-in.stopped", asked - left, asked)
                : TEXTS.of(done == 1 ? "take-in.done.one" : "take-in.done", done);
        hand.done(said);
        changed();
    }

    private void stop() {
        if (running) {
            stopAsked = true;
            hand.stop(TAKING);
            hand.stop(TRYING);
        }
    }

    private void changed() {
        pane.show(model.lines());
        summary();
        look();
    }

    private void summary() {
        pane.summary(model, running, asked, said);
    }

    /** What the pane tells the sheet. */
    final class Ear {
        void addFiles() {
            choose();
        }

        void addFolder() {
            hand.chooseFolder(TEXTS.of("take-in.choose-folder")).ifPresent(folder -> add(List.of(folder)));
        }

        void again() {
            readProfiles();
            tryAgain();
        }

        void take() {
            takeIn();
        }

        void stopIt() {
            stop();
        }

        void placeThem() {
            place.accept(model.scansTaken());
        }

        void remove() {
            if (!running) {
                model.remove(pane.selected());
                changed();
            }
        }

        void selected() {
            look();
        }

        /** A profile by its place in the choice, 0 being the best guess. */
        void profile(int choice) {
            Optional<Hash> profile = choice == 0 ? Optional.empty() : Optional.of(profiles.get(choice - 1));
            model.ask(pane.selected(), profile);
            changed();
            tryFiles();
        }
    }

    // ---- the sheet

    TakeInModel model() {
        return model;
    }

    TakeInPane pane() {
        return pane;
    }

    boolean running() {
        return running;
    }

    Ear ear() {
        return new Ear();
    }

    @Override
    public String name() {
        return NAME;
    }

    @Override
    public JComponent component() {
        return pane;
    }

    @Override
    public void focusFirst() {
        pane.focusTable();
    }

    @Override
    public List<Runnable> panes() {
        return pane.panes();
    }

    @Override
    public List<String> hints() {
        return List.of(
                TEXTS.of("take-in.hint.enter"),
                TEXTS.of("take-in.hint.profile"),
                TEXTS.of("take-in.hint.delete"),
                TEXTS.of("take-in.hint.again"));
    }

    @Override
    public void recorded() {
        readProfiles();
    }

    @Override
    public boolean escape() {
        if (running && !stopAsked) {
            stop();
            return true;
        }
        return false;
    }

    @Override
    public void left() {
        hand.stop(TRYING);
        hand.stop(LOOKING);
    }
}
