package fringekeep.bundle;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.testsupport.OtherProgram;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;

/** A program that exports under one name after another until it halts at a random report of progress or moment. */
final class HaltedExport {
    private static final int MOST_REPORTS = 300;
    private static final int MILLISECONDS = 900;

    private HaltedExport() {}

    /** Arguments: a folder that is there, the round. Writes each record it has recorded. */
    public static void main(String[] arguments) throws Exception {
        PrintStream out = new PrintStream(System.out, true, StandardCharsets.UTF_8);
        Path folder = Path.of(arguments[0]);
        int round = Integer.parseInt(arguments[1]);
        Random random = new Random(20310514L + round);
        boolean byReports = round % 2 == 0;
        Work work = byReports ? halting(1 + random.nextInt(MOST_REPORTS)) : Work.QUIET;
        SmallArchive small = SmallArchive.found(folder.resolve("archive"));
        try (Archive archive = small.archive()) {
            Hash root = ExportedOnce.root(small);
            out.println("done " + root);
            if (!byReports) {
                OtherProgram.haltWithin(random, MILLISECONDS);
            }
            for (int i = 0; ; i++) {
                ExportBundle.export(
                        archive,
                        List.of(root),
                        ExportedOnce.settings("export-" + i),
                        folder.resolve("out"),
                        i % 2 == 1,
                        work);
            }
        }
    }

    private static Work halting(int reports) {
        return new Work() {
            private int left = reports;

            @Override
            public void progress(long done, long total, String what) {
                if (left-- == 0) {
                    Runtime.getRuntime().halt(0);
                }
            }

            @Override
            public boolean stopped() {
                return false;
            }
        };
    }
}
