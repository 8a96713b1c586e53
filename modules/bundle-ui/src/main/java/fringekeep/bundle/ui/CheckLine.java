package fringekeep.bundle.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.part.RuledTable.Cell;
import fringekeep.desk.part.RuledTable.Col;
import fringekeep.drawing.NumberText;
import java.util.List;
import java.util.Optional;

/**
 * A line of the table of checks.
 *
 * @param key what is done, a key of the texts
 * @param stand where it stands
 * @param done how far it is
 * @param total of how many; 0 when unknown
 * @param words what came out of it
 */
record CheckLine(String key, Stand stand, long done, long total, String words) {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", CheckLine.class);

    /** Where a line stands. */
    enum Stand {
        /** Not begun. */
        WAITS,
        /** Going on. */
        RUNS,
        /** As it should be. */
        HOLDS,
        /** Something is to be known. */
        NOTED,
        /** A fault was found. */
        FAILS,
        /** Not done, for something before it failed or was stopped. */
        LEFT
    }

    static CheckLine waiting(String key) {
        return new CheckLine(key, Stand.WAITS, 0, 0, "");
    }

    CheckLine at(long now, long of) {
        return new CheckLine(key, Stand.RUNS, now, of, "");
    }

    CheckLine ended(Stand next, String said) {
        long all = total > 0 && next == Stand.HOLDS ? total : done;
        return new CheckLine(key, next, all, total, said);
    }

    static List<Col> columns() {
        return List.of(
                new Col(TEXTS.of("checks.check"), 230, false, false),
                new Col(TEXTS.of("checks.done"), 120, true, false),
                new Col(TEXTS.of("checks.result"), 200, false, true));
    }

    List<Cell> cells() {
        String how = stand == Stand.WAITS || stand == Stand.LEFT
                ? "\u2013"
                : total > 0
                        ? TEXTS.of("checks.of", NumberText.count(done), NumberText.count(total))
                        : done > 0 ? NumberText.count(done) : "";
        return List.of(
                Cell.of(TEXTS.of("check." + key), stand == Stand.WAITS ? Ink.INK2 : Ink.INK), Cell.of(how), result());
    }

    private Cell result() {
        return switch (stand) {
            case WAITS -> new Cell(Optional.of(Mark.DASHES), TEXTS.of("checks.waits"), Ink.INK3, false);
            case RUNS -> Cell.of(Mark.DASHED_RING, TEXTS.of("checks.runs"));
            case HOLDS -> Cell.of(Mark.SAME, words.isEmpty() ? TEXTS.of("checks.holds") : words);
            case NOTED -> Cell.of(Mark.RING, words);
            case FAILS -> Cell.of(Mark.DIFFERENT, words);
            case LEFT -> new Cell(Optional.of(Mark.DASHES), TEXTS.of("checks.left"), Ink.INK3, false);
        };
    }
}
