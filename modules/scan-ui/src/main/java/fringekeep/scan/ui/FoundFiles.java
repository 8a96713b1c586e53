package fringekeep.scan.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.look.Texts;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

/** Files that were chosen or dropped, with those inside of folders. */
final class FoundFiles {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", FoundFiles.class);

    private FoundFiles() {}

    /** Files in the order chosen; those of a folder by name, hidden ones left out. Whole paths. */
    static List<Path> of(List<Path> chosen, Work work) throws ProblemException, StoppedException {
        Set<Path> found = new LinkedHashSet<>();
        for (Path path : chosen) {
            work.check();
            work.progress(found.size(), 0, TEXTS.of("take-in.gathering"));
            Path whole = path.toAbsolutePath().normalize();
            if (Files.isDirectory(whole)) {
                found.addAll(inside(whole));
            } else {
                found.add(whole);
            }
        }
        return new ArrayList<>(found);
    }

    private static List<Path> inside(Path folder) throws ProblemException {
        try (Stream<Path> all = Files.walk(folder)) {
            return all.filter(Files::isRegularFile)
                    .filter(file -> !hidden(folder.relativize(file)))
                    .sorted()
                    .toList();
        } catch (IOException | java.io.UncheckedIOException e) {
            throw new ProblemException(new Problem(
                    "take-in.folder",
                    TEXTS.of("take-in.folder-unreadable", String.valueOf(e.getMessage())),
                    folder.toString(),
                    TEXTS.of("take-in.folder-mend")));
        }
    }

    private static boolean hidden(Path inside) {
        for (Path name : inside) {
            if (name.toString().startsWith(".")) {
                return true;
            }
        }
        return false;
    }
}
