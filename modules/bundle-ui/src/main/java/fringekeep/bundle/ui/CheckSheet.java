package fringekeep.bundle.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.bundle.BundleReport;
import fringekeep.bundle.CheckBundle;
import fringekeep.bundle.Level;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Executor;
import javax.swing.JComponent;

/** Checking a bundle given as folder or zip: the level at which it holds, and every fault named. */
final class CheckSheet implements DeskSheet {
    static final String NAME = "check bundle";
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", CheckSheet.class);
    private static final String PLACE = "bundle check";

    private final DeskHand hand;
    private final Archive archive;
    private final Executor window;
    private final CheckPane pane;
    private Optional<Path> bundle = Optional.empty();
    private Optional<BundleReport> report = Optional.empty();
    private Checks checks = Checks.ofCheck();
    private boolean running;

    CheckSheet(DeskHand hand, Executor window) {
        this.hand = hand;
        this.archive = hand.archive();
        this.window = window;
        this.pane = new CheckPane(this::chooseFile, this::chooseFolder, this::again, this::stop);
        pane.levels(checks.lines());
        pane.running("", false);
    }

    private void chooseFile() {
        if (!running) {
            hand.chooseFiles(TEXTS.of("checking.choose")).stream().findFirst().ifPresent(this::check);
        }
    }

    private void chooseFolder() {
        if (!running) {
            hand.chooseFolder(TEXTS.of("checking.choose.folder")).ifPresent(this::check);
        }
    }

    private void again() {
        bundle.ifPresent(this::check);
    }

    private void stop() {
        hand.stop(PLACE);
    }

    /** What came of a check; without report and problems it was stopped. */
    private record Came(Optional<BundleReport> report, List<Problem> problems) {}

    /** Checks a folder or a zip. */
    void check(Path next) {
        if (running) {
            return;
        }
        bundle = Optional.of(next);
        report = Optional.empty();
        running = true;
        checks = Checks.ofCheck();
        pane.running(next.toString(), true);
        pane.levels(checks.lines());
        Kinds kinds = archive.kinds();
        hand.run(
                PLACE,
                work -> came(next, kinds, work),
                this::ended,
                problems -> ended(new Came(Optional.empty(), problems)));
    }

    private Came came(Path next, Kinds kinds, Work work) throws ProblemException {
        Work told = new ToldWork(work, window, (what, done, total) -> {
            checks.progress(what, done, total);
            pane.levels(checks.lines());
        });
        try {
            return new Came(
                    Optional.of(CheckBundle.check(
                            next,
                            kinds,
                            Level.RECOMPUTED,
                            told,
                            level -> window.execute(() -> {
                                checks.level(level);
                                pane.levels(checks.lines());
                            }))),
                    List.of());
        } catch (StoppedException e) {
            return new Came(Optional.empty(), List.of()); // the sheet says so
        }
    }

    private void ended(Came came) {
        running = false;
        report = came.report();
        pane.running(bundle.map(Path::toString).orElse(""), false);
        came.report().ifPresent(checks::checked);
        checks.stopped();
        pane.levels(checks.lines());
        came.report()
                .ifPresentOrElse(
                        pane::report,
                        () -> pane.ended(
                                came.problems().isEmpty() ? TEXTS.of("checking.stopped") : "", came.problems()));
        pane.focusFirst();
    }

    Optional<BundleReport> report() {
        return report;
    }

    CheckPane pane() {
        return pane;
    }

    Checks checks() {
        return checks;
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
        pane.focusFirst();
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("checking.hint"));
    }

    @Override
    public boolean escape() {
        if (running) {
            stop();
        }
        return running;
    }
}
