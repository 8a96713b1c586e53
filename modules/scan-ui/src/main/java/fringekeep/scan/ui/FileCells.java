package fringekeep.scan.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.part.RuledTable.Cell;
import fringekeep.desk.part.RuledTable.Col;
import fringekeep.drawing.NumberText;
import fringekeep.scan.FilePlace;
import fringekeep.scan.TryFiles.Tried;
import fringekeep.scan.ui.FileLine.Stand;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Files as rows of the table. */
final class FileCells {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", FileCells.class);

    private FileCells() {}

    static List<Col> columns() {
        return List.of(
                new Col(TEXTS.of("files.file"), 170, false, false),
                new Col(TEXTS.of("files.size"), 66, true, false),
                new Col(TEXTS.of("files.state"), 160, false, false),
                new Col(TEXTS.of("files.profile"), 240, false, false),
                new Col(TEXTS.of("files.points"), 64, true, false),
                new Col(TEXTS.of("files.channels"), 170, false, false),
                new Col(TEXTS.of("files.noticed"), 260, false, true));
    }

    static List<Cell> of(FileLine line) {
        Optional<Tried> tried = line.trial().map(FileLine.Trial::tried);
        List<Cell> cells = new ArrayList<>();
        Ink ink = line.stand() == Stand.WAITS ? Ink.INK3 : Ink.INK;
        cells.add(Cell.of(String.valueOf(line.file().getFileName()), ink));
        cells.add(Cell.of(
                tried.map(each -> NumberText.significant(each.bytes() / 1000.0, 3))
                        .orElse(""),
                Ink.INK2));
        cells.add(state(line));
        cells.add(profile(line));
        boolean read = tried.filter(each -> each.sections() > 0).isPresent();
        cells.add(Cell.of(read ? NumberText.count(tried.get().rows()) : tried.isPresent() ? "\u2013" : "", Ink.INK));
        cells.add(Cell.of(tried.map(FileCells::channels).orElse(""), Ink.INK2));
        cells.add(noticed(line));
        return cells;
    }

    private static String channels(Tried tried) {
        String names = String.join(", ", tried.channels());
        return tried.sections() > 1 ? TEXTS.of("files.sections", names, tried.sections()) : names;
    }

    private static Cell state(FileLine line) {
        return switch (line.stand()) {
            case WAITS -> new Cell(Optional.of(Mark.DASHES), TEXTS.of("files.waits"), Ink.INK3, false);
            case READS -> Cell.of(TEXTS.of("files.reads"));
            case KNOWN -> new Cell(Optional.of(Mark.SAME), TEXTS.of("files.known", scans(line)), Ink.INK2, false);
            case REFUSED -> Cell.of(Mark.DASHES, TEXTS.of("files.refused"));
            case TAKEN_IN -> Cell.of(Mark.LINKED, TEXTS.of("files.taken", scans(line)));
        };
    }

    private static String scans(FileLine line) {
        return line.outcome()
                .map(FileLine.Taken::scans)
                .or(() -> line.trial().map(FileLine.Trial::scans))
                .orElse("");
    }

    private static Cell profile(FileLine line) {
        String name = line.trial().map(FileLine.Trial::profile).orElse("");
        boolean guessed = line.asked().isEmpty() && !name.isEmpty();
        if (guessed && line.stand() == Stand.REFUSED) {
            return Cell.of(TEXTS.of("files.nearest", name), Ink.INK2);
        }
        return guessed ? Cell.of(TEXTS.of("files.guessed", name), Ink.INK2) : Cell.of(name);
    }

    private static Cell noticed(FileLine line) {
        List<Problem> problems = line.problems();
        if (!problems.isEmpty()) {
            Problem first = problems.stream()
                    .filter(problem -> FilePlace.of(problem).isPresent())
                    .findFirst()
                    .orElse(problems.get(0));
            long places = problems.stream()
                    .filter(problem -> FilePlace.of(problem).isPresent())
                    .count();
            String more = places > 1 ? TEXTS.of("files.more", places - 1) : "";
            String place = FilePlace.of(first)
                    .map(at -> TEXTS.of("files.place", at.line(), at.column()))
                    .orElse("");
            return Cell.of(place + first.what() + more);
        }
        List<String> said = new ArrayList<>(
                line.trial().map(trial -> findings(trial.tried())).orElse(List.of()));
        boolean otherwise = line.stand() == Stand.READS
                && line.trial()
                        .filter(trial -> !trial.tried().otherwise().isEmpty())
                        .isPresent();
        if (otherwise) {
            said.add(TEXTS.of("files.otherwise", scans(line)));
        }
        return said.isEmpty() ? Cell.of("") : Cell.of(Mark.QUESTION, String.join(", ", said));
    }

    static List<String> findings(Tried tried) {
        return tried.findings().stream()
                .map(code -> TEXTS.orElse("finding." + code, code.replace('-', ' ')))
                .toList();
    }
}
