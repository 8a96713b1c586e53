package fringekeep.bundle.ui;

import fringekeep.bundle.BundleReport;
import fringekeep.bundle.CheckBundle.LevelChecked;
import fringekeep.bundle.Level;
import fringekeep.bundle.ui.CheckLine.Stand;
import fringekeep.desk.look.Texts;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** The table of checks as work goes on. Lives on the window thread; asks nothing. */
final class Checks {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", Checks.class);
    private static final List<String> LEVELS =
            List.of("files_intact", "metadata_valid", "lineage_follows", "recomputed");

    private final List<CheckLine> lines = new ArrayList<>();
    private final int firstLevel;

    private Checks(List<String> before) {
        before.forEach(key -> lines.add(CheckLine.waiting(key)));
        firstLevel = lines.size();
        LEVELS.forEach(key -> lines.add(CheckLine.waiting(key)));
    }

    /** What an export does: writing, then the check a stranger would make. */
    static Checks ofExport(boolean zip) {
        return new Checks(zip ? List.of("records", "raw", "sums", "packing") : List.of("records", "raw", "sums"));
    }

    /** What a check does. */
    static Checks ofCheck() {
        return new Checks(List.of());
    }

    List<CheckLine> lines() {
        return List.copyOf(lines);
    }

    /** Work reports how far it is with something. */
    void progress(String what, long done, long total) {
        int now = row(what);
        if (now < 0) {
            return;
        }
        for (int i = 0; i < now; i++) {
            Stand stand = lines.get(i).stand();
            if (stand == Stand.WAITS || stand == Stand.RUNS) {
                lines.set(i, lines.get(i).ended(Stand.HOLDS, i < firstLevel ? TEXTS.of("checks.written") : ""));
            }
        }
        if (lines.get(now).stand() == Stand.WAITS || lines.get(now).stand() == Stand.RUNS) {
            lines.set(now, lines.get(now).at(done, total));
        }
    }

    /** The row of what work is at: the names that the export and the check give to their parts. */
    private int row(String what) {
        return switch (what) {
            case "records" -> find("records");
            case "raw files" -> find("raw");
            case "checksums" -> sumsAreWritten() ? firstLevel : find("sums");
            case "packing" -> find("packing");
            case "unpacking" -> firstLevel;
            case "recomputing" -> firstLevel + 3;
            default -> -1;
        };
    }

    /** The same checksums are reckoned twice: when the bag is closed, and when it is read back. */
    private boolean sumsAreWritten() {
        return find("sums") < 0
                || lines.get(firstLevel).stand() == Stand.RUNS
                || find("packing") >= 0 && lines.get(find("packing")).stand() != Stand.WAITS
                || lines.get(find("sums")).total() > 0
                        && lines.get(find("sums")).done() + 1
                                >= lines.get(find("sums")).total();
    }

    private int find(String key) {
        return IntStream.range(0, firstLevel)
                .filter(i -> lines.get(i).key().equals(key))
                .findFirst()
                .orElse(-1);
    }

    /** A level was checked. */
    void level(LevelChecked checked) {
        if (checked.level() == Level.NONE) {
            return;
        }
        int row = firstLevel + checked.level().ordinal() - 1;
        for (int i = 0; i < row; i++) {
            if (lines.get(i).stand() == Stand.RUNS || lines.get(i).stand() == Stand.WAITS) {
                lines.set(i, lines.get(i).ended(Stand.HOLDS, i < firstLevel ? TEXTS.of("checks.written") : ""));
            }
        }
        int faults = checked.faults().size();
        lines.set(
                row,
                faults == 0
                        ? lines.get(row).ended(Stand.HOLDS, "")
                        : lines.get(row)
                                .ended(
                                        Stand.FAILS,
                                        faults == 1 ? TEXTS.of("checks.fault") : TEXTS.of("checks.faults", faults)));
        if (faults == 0 && row + 1 < lines.size() && lines.get(row + 1).stand() == Stand.WAITS) {
            lines.set(row + 1, lines.get(row + 1).at(0, 0));
        }
    }

    /** All is done: what came out again is said in words. */
    void finished(BundleReport report) {
        for (int i = 0; i < lines.size(); i++) {
            if (lines.get(i).stand() == Stand.RUNS || lines.get(i).stand() == Stand.WAITS) {
                lines.set(i, lines.get(i).ended(Stand.HOLDS, ""));
            }
        }
        int last = lines.size() - 1;
        CheckLine recomputed = lines.get(last);
        boolean asked = !report.recomputed().isEmpty();
        int faults = report.allFaults().size();
        if (asked) {
            int records = report.recomputed().values().stream()
                    .mapToInt(Integer::intValue)
                    .sum();
            Stand stand = faults == 0 ? Stand.HOLDS : Stand.NOTED;
            lines.set(last, new CheckLine(recomputed.key(), stand, records, records, verdicts(report)));
        }
    }

    /** A check came to its end: how much of what came out again. */
    void checked(BundleReport report) {
        int last = lines.size() - 1;
        if (!report.recomputed().isEmpty() && lines.get(last).stand() == Stand.HOLDS) {
            finished(report);
        }
    }

    /** {@code 147 same bits, 4 last places}: records that are entered are not recomputed. */
    private static String verdicts(BundleReport report) {
        return String.join(
                ", ",
                report.recomputed().entrySet().stream()
                        .filter(each -> !each.getKey().contains("(entered)"))
                        .map(each -> each.getValue() + " " + each.getKey())
                        .toList());
    }

    /** Nothing more is done. */
    void stopped() {
        for (int i = 0; i < lines.size(); i++) {
            if (lines.get(i).stand() == Stand.RUNS || lines.get(i).stand() == Stand.WAITS) {
                lines.set(i, lines.get(i).ended(Stand.LEFT, ""));
            }
        }
    }
}
