package fringekeep.desk.window;

import com.formdev.flatlaf.FlatDarkLaf;
import com.formdev.flatlaf.FlatLaf;
import com.formdev.flatlaf.FlatLightLaf;
import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Person;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import fringekeep.desk.run.Runner;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.InventedLab;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureFiles;
import java.awt.Component;
import java.awt.KeyboardFocusManager;
import java.awt.Window;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javax.swing.JFileChooser;
import javax.swing.SwingUtilities;
import org.jspecify.annotations.Nullable;
import org.openide.LifecycleManager;
import org.openide.modules.Places;
import org.openide.util.Lookup;

/** The one desk of the program, and what it needs of files and dialogs. Lives on the window thread. */
public final class Program implements DeskHost {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", Program.class);
    private static final String BUILD = "1.0.0";
    private static final Supplier<Program> ONLY = once(Program::new);

    private final Runner runner = Runner.forWindow();
    private final Memory memory = Memory.ofUser();
    private final Desk desk = new Desk(runner, Stops.shipped(), this, memory, DeskStages.announced());

    private Program() {}

    private static Supplier<Program> once(Supplier<Program> maker) {
        return new Supplier<>() {
            private Optional<Program> made = Optional.empty();

            @Override
            public Program get() {
                if (made.isEmpty()) {
                    made = Optional.of(maker.get());
                }
                return made.get();
            }
        };
    }

    /** The program; made at the first call, on the window thread. */
    public static Program only() {
        return ONLY.get();
    }

    /** Its desk. */
    public Desk desk() {
        return desk;
    }

    /** What the program does once its window is up: the archive named at the start, else the last one. */
    void started() {
        Optional<String> named = Optional.ofNullable(System.getProperty("fringekeep.open"));
        if (named.isPresent()) {
            openArchive(Path.of(named.get()));
            return;
        }
        memory.get("archive").map(Path::of).filter(Files::isDirectory).ifPresent(this::openArchive);
    }

    /** Opens an archive. */
    public void openArchive(Path folder) {
        Path whole = folder.toAbsolutePath().normalize();
        boolean open = desk.archive()
                .filter(archive ->
                        archive.facts().folder().toAbsolutePath().normalize().equals(whole))
                .isPresent();
        if (!open) {
            desk.say(List.of());
            runner.run("open", work -> open(whole, work), archive -> opened(whole, archive), this::trouble);
        }
    }

    private static Archive open(Path folder, Work work) throws ProblemException, StoppedException {
        work.progress(0, 0, TEXTS.of("status.opening", String.valueOf(folder.getFileName())));
        Archive archive = Archives.open(folder, kinds(), Circumstances.real(BUILD));
        if (work.stopped()) {
            archive.close(); // another one was asked for meanwhile
            throw new StoppedException();
        }
        return archive;
    }

    private void opened(Path folder, Archive archive) {
        memory.put("archive", folder.toAbsolutePath().toString());
        desk.open(archive);
        desk.focusRows();
    }

    private static Kinds kinds() {
        ClassLoader all = Optional.ofNullable(Lookup.getDefault().lookup(ClassLoader.class))
                .orElseGet(Program.class::getClassLoader);
        return Kinds.announced(all);
    }

    @Override
    public void chooseArchive() {
        JFileChooser chooser = new JFileChooser();
        chooser.setDialogTitle(TEXTS.of("open.title"));
        chooser.setFileSelectionMode(JFileChooser.DIRECTORIES_ONLY);
        if (opened(chooser)) {
            openArchive(chooser.getSelectedFile().toPath());
        }
    }

    /** Files were dropped: an archive's folder is opened, the rest goes to the stages. */
    boolean dropped(List<Path> files) {
        boolean folder = files.size() == 1 && Files.isDirectory(files.get(0));
        if (folder && (desk.archive().isEmpty() || Files.exists(files.get(0).resolve("archive.json")))) {
            openArchive(files.get(0));
            return true;
        }
        return desk.dropped(files);
    }

    @Override
    public void foundArchive(FoundingPane.Answers answers) {
        runner.run(
                "open",
                work -> {
                    if (!FoundingPane.free(answers.folder())) {
                        throw new ProblemException(new Problem(
                                "desk.folder-taken",
                                TEXTS.of("found.taken"),
                                answers.folder().toString(),
                                TEXTS.of("found.taken.mend")));
                    }
                    Person first = new Person(
                            DeskPersons.fresh(), Optional.of(answers.person()), Optional.empty(), Optional.empty());
                    return Archives.found(
                            answers.folder(),
                            new Archives.Founding(
                                    answers.title(),
                                    answers.dayBoundary(),
                                    answers.zone(),
                                    false,
                                    List.of(first),
                                    Optional.empty()),
                            kinds(),
                            Circumstances.real(BUILD));
                },
                archive -> opened(answers.folder(), archive),
                this::trouble);
    }

    /** Opens the invented laboratory; makes it where it is not there yet. */
    @Override
    public void tryInvented() {
        Path folder = Places.getUserDirectory().toPath().resolve("invented-lab");
        Optional<InventedLab> maker = Optional.ofNullable(Lookup.getDefault().lookup(InventedLab.class));
        runner.run(
                "open",
                work -> {
                    if (!Files.exists(folder.resolve("archive.json"))) {
                        maker.orElseThrow(() -> new IllegalStateException("no module makes the invented laboratory"))
                                .make(folder, kinds(), BUILD, work);
                    }
                    return open(folder, work);
                },
                archive -> opened(folder, archive),
                this::trouble);
    }

    @Override
    public void save(Picture picture) {
        JFileChooser chooser = new JFileChooser();
        chooser.setDialogTitle(TEXTS.of("save.title"));
        chooser.setSelectedFile(new File("drawing.svg"));
        if (saved(chooser)) {
            Path file = chooser.getSelectedFile().toPath();
            runner.run("save", work -> write(picture, file), done -> {}, this::trouble);
        }
    }

    @Override
    public List<Path> chooseFiles(String title) {
        JFileChooser chooser = chooser(title);
        chooser.setMultiSelectionEnabled(true);
        return opened(chooser) ? kept(List.of(chooser.getSelectedFiles())) : List.of();
    }

    @Override
    public Optional<Path> chooseFolder(String title) {
        JFileChooser chooser = chooser(title);
        chooser.setFileSelectionMode(JFileChooser.DIRECTORIES_ONLY);
        return opened(chooser)
                ? kept(List.of(chooser.getSelectedFile())).stream().findFirst()
                : Optional.empty();
    }

    @Override
    public Optional<Path> chooseToSave(String title, String suggested) {
        JFileChooser chooser = chooser(title);
        chooser.setSelectedFile(new File(suggested));
        return saved(chooser)
                ? kept(List.of(chooser.getSelectedFile())).stream().findFirst()
                : Optional.empty();
    }

    private boolean opened(JFileChooser chooser) {
        @Nullable Component before = focused();
        return answered(chooser.showOpenDialog(desk), before);
    }

    private boolean saved(JFileChooser chooser) {
        @Nullable Component before = focused();
        return answered(chooser.showSaveDialog(desk), before);
    }

    private static @Nullable Component focused() {
        return KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner();
    }

    /** What had the focus gets it back, also where no window manager sees to that. */
    private boolean answered(int answer, @Nullable Component before) {
        window().toFront();
        window().requestFocus();
        if (before != null) {
            before.requestFocusInWindow();
        }
        return answer == JFileChooser.APPROVE_OPTION;
    }

    private JFileChooser chooser(String title) {
        JFileChooser chooser = new JFileChooser(memory.get("folder").orElse(null));
        chooser.setDialogTitle(title);
        return chooser;
    }

    /** The files as paths; the next question begins where this one ended. */
    private List<Path> kept(List<File> files) {
        files.stream()
                .findFirst()
                .map(File::getAbsoluteFile)
                .map(File::getParent)
                .ifPresent(folder -> memory.put("folder", folder));
        return files.stream().map(File::toPath).toList();
    }

    @Override
    public void askPerson(List<Person> persons, Consumer<String> then) {
        PersonSheet.ask(window(), persons, then);
    }

    static Path write(Picture picture, Path file) throws ProblemException {
        String name = String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
        PictureFiles.Form form = List.of(PictureFiles.Form.values()).stream()
                .filter(one -> name.endsWith("." + one.ending()))
                .findFirst()
                .orElse(PictureFiles.Form.SVG);
        try {
            return Files.write(file, PictureFiles.write(picture, form));
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "desk.save-drawing",
                    TEXTS.of("save.failed") + " " + e.getMessage(),
                    file.toString(),
                    TEXTS.of("save.mend")));
        }
    }

    @Override
    public void trouble(List<Problem> problems) {
        desk.say(problems);
    }

    /** Says something in words. */
    void say(String title, List<Problem> words) {
        ProblemDialog.show(window(), title, words);
    }

    /** Shows that something unforeseen happened, with the place of the log. */
    void crashed(Throwable fault, String log) {
        Problem problem = new Problem(
                "desk.crash", TEXTS.of("crash.what", String.valueOf(fault)), "", TEXTS.of("crash.mend", log));
        ProblemDialog.show(window(), TEXTS.of("crash.title"), List.of(problem));
    }

    /** Changes between the light and the dark theme. */
    void switchTheme() {
        theme(!Ink.dark());
        memory.put("dark", Boolean.toString(Ink.dark()));
    }

    /** Sets the theme that was left. */
    void rememberedTheme() {
        memory.get("dark")
                .map(Boolean::parseBoolean)
                .filter(dark -> dark != Ink.dark())
                .ifPresent(Program::theme);
    }

    private static void theme(boolean dark) {
        if (dark) {
            FlatDarkLaf.setup();
        } else {
            FlatLightLaf.setup();
        }
        FlatLaf.updateUI();
    }

    /** Ends the program. */
    void quit() {
        LifecycleManager.getDefault().exit();
    }

    private Window window() {
        return SwingUtilities.getWindowAncestor(desk);
    }
}
