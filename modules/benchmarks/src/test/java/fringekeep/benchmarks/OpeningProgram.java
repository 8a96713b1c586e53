package fringekeep.benchmarks;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.listing.Listing;
import java.nio.file.Path;
import java.util.Locale;

/** A cold process that opens an archive and asks for the first page of a list; says what took how long. */
final class OpeningProgram {
    private OpeningProgram() {}

    /** Argument: the archive's folder. Prints milliseconds to open, to the first page and to the graph, and how many rows. */
    public static void main(String[] arguments) throws Exception {
        long begin = System.nanoTime();
        try (Archive archive = Archives.open(Path.of(arguments[0]), PlainKind.all(), Circumstances.real("benchmark"))) {
            long opened = System.nanoTime();
            int rows = archive.list(Listing.newest("scan_list", 50)).rows().size();
            long listed = System.nanoTime();
            int outdated = archive.graph().outdated().size();
            long known = System.nanoTime();
            System.out.println(String.format(
                    Locale.ROOT,
                    "%.3f %.3f %.3f %d %d",
                    1e-6 * (opened - begin),
                    1e-6 * (listed - opened),
                    1e-6 * (known - begin),
                    rows,
                    outdated));
        }
    }
}
