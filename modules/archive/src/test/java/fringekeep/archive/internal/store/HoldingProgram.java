package fringekeep.archive.internal.store;

import fringekeep.archive.Archives;
import java.nio.file.Path;

/** A program of its own that has an archive open until its input ends. */
final class HoldingProgram {
    private HoldingProgram() {}

    /** Argument: the archive's folder. */
    public static void main(String[] arguments) throws Exception {
        try (var archive = Archives.open(Path.of(arguments[0]), OpenKind.all(), new Script().circumstances())) {
            System.out.println("open " + archive.facts().watermark());
            System.out.flush();
            while (System.in.read() >= 0) {
                // the other program decides how long this one holds on
            }
        }
    }
}
