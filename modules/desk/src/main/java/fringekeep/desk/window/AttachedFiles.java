package fringekeep.desk.window;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.desk.look.Texts;
import fringekeep.desk.pane.RecordPage.Attached;
import fringekeep.desk.stage.DeskHand;
import java.awt.Desktop;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** Files that came with a note: saved where a person says, or opened by the program the system has for them. */
final class AttachedFiles {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", AttachedFiles.class);

    private final DeskHand hand;

    AttachedFiles(DeskHand hand) {
        this.hand = hand;
    }

    void save(Attached file) {
        Archive archive = hand.archive();
        hand.chooseToSave(TEXTS.of("attached.save"), file.name())
                .ifPresent(to -> hand.run(
                        "attached file",
                        work -> written(archive, file, to),
                        path -> hand.done(TEXTS.of("attached.saved", path.getFileName()))));
    }

    /** A copy is opened, so that no program can change what the archive keeps. */
    void open(Attached file) {
        Archive archive = hand.archive();
        hand.run("attached file", work -> opened(written(archive, file, copy(file))), path -> {});
    }

    private static Path copy(Attached file) throws ProblemException {
        try {
            String name = file.name().replaceAll("[^A-Za-z0-9._-]", "_");
            Path folder = Files.createTempDirectory("fringekeep-attached");
            Path copy = folder.resolve(name);
            copy.toFile().deleteOnExit();
            return copy;
        } catch (IOException e) {
            throw problem("attached.write", file.name(), e);
        }
    }

    static Path written(Archive archive, Attached file, Path to) throws ProblemException {
        try (InputStream bytes = archive.raw(file.raw())
                .orElseThrow(() -> new ProblemException(new Problem(
                        "desk.attached-absent",
                        TEXTS.of("attached.absent"),
                        file.name(),
                        TEXTS.of("attached.absent.mend"))))) {
            Files.copy(bytes, to, StandardCopyOption.REPLACE_EXISTING);
            return to;
        } catch (IOException e) {
            throw problem("attached.write", to.toString(), e);
        }
    }

    private static Path opened(Path file) throws ProblemException {
        if (!Desktop.isDesktopSupported() || !Desktop.getDesktop().isSupported(Desktop.Action.OPEN)) {
            throw new ProblemException(new Problem(
                    "desk.attached-open", TEXTS.of("attached.open"), file.toString(), TEXTS.of("attached.open.mend")));
        }
        try {
            Desktop.getDesktop().open(file.toFile());
            return file;
        } catch (IOException e) {
            throw problem("attached.open", file.toString(), e);
        }
    }

    private static ProblemException problem(String what, String where, IOException cause) {
        return new ProblemException(new Problem(
                "desk.attached", TEXTS.of(what) + " (" + cause.getMessage() + ")", where, TEXTS.of(what + ".mend")));
    }
}
