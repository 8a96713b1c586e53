package fringekeep.bundle.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.BundleReport;
import fringekeep.bundle.CheckBundle.LevelChecked;
import fringekeep.bundle.ExportBundle;
import fringekeep.bundle.ExportBundle.CheckedExport;
import fringekeep.bundle.ExportBundle.Exported;
import fringekeep.bundle.ExportBundle.KindShare;
import fringekeep.bundle.stated.BundleSettings;
import fringekeep.bundle.ui.BundleDraft.Writer;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import java.nio.charset.StandardCharsets;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.concurrent.Executor;
import java.util.function.Consumer;
import javax.swing.JComponent;
import javax.swing.Timer;

/** Exporting a dataset: what goes in, what is said about it, checks one by one, how strangers check it. */
final class ExportSheet implements DeskSheet {
    static final String NAME = "export";
    /** The one draft of what is said about datasets of an archive: the next export begins with it. */
    static final String DRAFT = Hash.of("what is said about a dataset".getBytes(StandardCharsets.UTF_8))
            .hex()
            .substring(0, 32);

    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", ExportSheet.class);
    private static final String PLACE = "bundle export";
    private static final int QUIET = 500;

    private final DeskHand hand;
    private final Archive archive;
    private final Executor window;
    private final List<Hash> roots;
    private final ExportPane pane;
    private final Timer saving = new Timer(QUIET, event -> saveDraft());
    private Checks checks = Checks.ofExport(false);
    private boolean running;
    private Optional<Exported> exported = Optional.empty();

    /** A sheet for records, usually a figure and its statements; at least one. */
    ExportSheet(DeskHand hand, Executor window, List<Hash> roots) {
        this.hand = hand;
        this.archive = hand.archive();
        this.window = window;
        this.roots = List.copyOf(roots);
        saving.setRepeats(false);
        pane = new ExportPane(this::changed, this::chooseFolder, this::export, this::stop);
        pane.checks(checks.lines());
        read();
    }

    private Optional<String> chooseFolder() {
        return hand.chooseFolder(TEXTS.of("export.choose.title")).map(Path::toString);
    }

    private void read() {
        record Read(SortedMap<String, KindShare> shares, String root, BundleDraft draft) {}
        Optional<String> person = hand.personName();
        hand.run(
                PLACE,
                work -> {
                    work.progress(0, 0, TEXTS.of("export.reading"));
                    BundleDraft fresh = fresh(person);
                    Optional<JsonObject> kept = archive.drafts().get(DRAFT);
                    String root = archive.label(roots.get(0));
                    String words = roots.size() == 1 ? root : root + " +" + (roots.size() - 1);
                    return new Read(
                            ExportBundle.shares(archive, roots),
                            words,
                            kept.map(json -> fresh.taking(json, roots.get(0).hex()))
                                    .orElse(fresh));
                },
                read -> {
                    pane.goesIn(read.shares(), read.root());
                    pane.fields().fill(read.draft());
                    shown();
                });
    }

    /** What can be said without being asked. Asks the archive. */
    private BundleDraft fresh(Optional<String> person) {
        Hash root = roots.get(0);
        String label = archive.label(root);
        String title = archive.record(root)
                .map((RecordView record) -> Names.title(archive, record).text())
                .orElse("");
        String name = label.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-");
        String day = new Clock(archive.facts()).date(Instant.now());
        return new BundleDraft(
                name.length() > 60 ? name.substring(0, 60) : name,
                title,
                "",
                day,
                "CC-BY-4.0",
                archive.facts().title(),
                archive.facts().invented() ? "invented data" : "",
                List.of(new Writer(person.orElse(""), "", "")),
                hand.remembered("bundle folder").orElse(""),
                false);
    }

    private void changed() {
        shown();
        saving.restart();
    }

    private void shown() {
        Map<String, String> faults = pane.fields().draft().faults();
        pane.fields().faults(faults);
        exported = Optional.empty();
        pane.ready(faults.size());
    }

    /** Keeps what was typed. */
    void saveDraft() {
        saving.stop();
        JsonObject body = pane.fields().draft().json().with("root", roots.get(0).hex());
        hand.run(
                "bundle draft",
                work -> {
                    archive.drafts().save(DRAFT, body);
                    return Boolean.TRUE;
                },
                saved -> {});
    }

    // ---- exporting

    /** What came of an export; without either, it was stopped. */
    private record Came(Optional<CheckedExport> checked, List<Problem> problems) {}

    private void export() {
        BundleDraft draft = pane.fields().draft();
        if (running || !draft.faults().isEmpty()) {
            return;
        }
        Path parent;
        try {
            parent = Path.of(draft.into().strip());
        } catch (InvalidPathException e) {
            pane.ended(
                    TEXTS.of("export.failed"),
                    List.of(new Problem(
                            "bundle.folder",
                            String.valueOf(e.getMessage()),
                            draft.into(),
                            TEXTS.of("export.choose.title"))));
            return;
        }
        saveDraft();
        hand.remember("bundle folder", parent.toString());
        BundleSettings settings = draft.settings();
        running = true;
        checks = Checks.ofExport(draft.zip());
        pane.checks(checks.lines());
        pane.running(true, settings.name());
        hand.run(
                PLACE,
                work -> came(settings, parent, draft.zip(), work),
                came -> ended(came, settings, draft.zip()),
                problems -> ended(new Came(Optional.empty(), problems), settings, draft.zip()));
    }

    private Came came(BundleSettings settings, Path parent, boolean zip, Work work) throws ProblemException {
        Work told = new ToldWork(work, window, (what, done, total) -> {
            checks.progress(what, done, total);
            pane.checks(checks.lines());
        });
        Consumer<LevelChecked> levels = level -> window.execute(() -> {
            checks.level(level);
            pane.checks(checks.lines());
        });
        try {
            return new Came(
                    Optional.of(ExportBundle.exportChecked(archive, roots, settings, parent, zip, told, levels)),
                    List.of());
        } catch (StoppedException e) {
            return new Came(Optional.empty(), List.of()); // the sheet says so
        }
    }

    private void ended(Came came, BundleSettings settings, boolean zip) {
        running = false;
        exported = came.checked().map(CheckedExport::exported);
        pane.running(false, settings.name());
        if (exported.isPresent()) {
            BundleReport report = came.checked().orElseThrow().report();
            checks.finished(report);
            pane.done(exported.get(), report, strangersLine(settings.name(), exported.get(), zip), zip);
            hand.done(TEXTS.of("export.done.status", exported.get().place()));
        } else {
            checks.stopped();
            pane.ended(TEXTS.of(came.problems().isEmpty() ? "export.stopped" : "export.failed"), came.problems());
        }
        pane.checks(checks.lines());
    }

    /** One line for a terminal, in the folder that holds the manifests. */
    static String strangersLine(String name, Exported exported, boolean zip) {
        String folder = zip ? name : exported.place().toString();
        return "cd '" + folder.replace("'", "'\\''") + "' && sha256sum -c manifest-sha256.txt";
    }

    private void stop() {
        hand.stop(PLACE);
    }

    // ---- the sheet

    ExportPane pane() {
        return pane;
    }

    Checks checks() {
        return checks;
    }

    void press() {
        export();
    }

    Optional<Exported> exported() {
        return exported;
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
        pane.fields().focusFirst();
    }

    @Override
    public List<Runnable> panes() {
        return List.of(pane.fields()::focusFirst, pane::focusChecks);
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("export.hint"));
    }

    @Override
    public boolean escape() {
        if (running) {
            stop();
        }
        return running;
    }

    @Override
    public void left() {
        if (saving.isRunning()) {
            saveDraft();
        }
    }
}
