package fringekeep.bundle;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.util.List;

/** A program that exports under one name after another and dies at a given report of progress. */
final class HaltedExport {
    /** Exit value of one that died as it was told. */
    static final int HALTED = 7;

    private HaltedExport() {}

    /** Arguments: a folder that is there, the number of reports before the end. */
    public static void main(String[] arguments) throws Exception {
        Path folder = Path.of(arguments[0]);
        Work work = halting(Integer.parseInt(arguments[1]));
        SmallArchive small = SmallArchive.found(folder.resolve("archive"));
        try (Archive archive = small.archive()) {
            Hash root = ExportedOnce.root(small);
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
                    Runtime.getRuntime().halt(HALTED);
                }
            }

            @Override
            public boolean stopped() {
                return false;
            }
        };
    }
}
