package fringekeep.scan.ui;

import fringekeep.archive.record.Hash;
import fringekeep.scan.TakeInFiles.Chosen;
import fringekeep.scan.TakeInFiles.State;
import fringekeep.scan.ui.FileLine.Stand;
import fringekeep.scan.ui.FileLine.Taken;
import fringekeep.scan.ui.FileLine.Trial;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The files on the sheet and where each stands. Lives on the window thread; asks nothing. */
final class TakeInModel {
    private final List<FileLine> lines = new ArrayList<>();
    private final Map<Path, Integer> rowOf = new HashMap<>();

    List<FileLine> lines() {
        return List.copyOf(lines);
    }

    FileLine line(int row) {
        return lines.get(row);
    }

    int size() {
        return lines.size();
    }

    /** Adds files that are not there yet; answers how many were new. */
    int add(List<Path> files) {
        int before = lines.size();
        for (Path file : files) {
            if (rowOf.putIfAbsent(file, lines.size()) == null) {
                lines.add(new FileLine(file, Optional.empty(), Optional.empty(), Optional.empty()));
            }
        }
        return lines.size() - before;
    }

    /** Takes files from the sheet; what was taken in stays in the archive. */
    void remove(List<Integer> rows) {
        List<FileLine> kept = new ArrayList<>();
        for (int row = 0; row < lines.size(); row++) {
            if (!rows.contains(row)) {
                kept.add(lines.get(row));
            }
        }
        lines.clear();
        rowOf.clear();
        for (FileLine line : kept) {
            rowOf.put(line.file(), lines.size());
            lines.add(line);
        }
    }

    /** Chooses a profile for files, or the best guess; those not taken in yet wait for a new trial. */
    void ask(List<Integer> rows, Optional<Hash> profile) {
        for (int row : rows) {
            if (lines.get(row).stand() != Stand.TAKEN_IN) {
                lines.set(row, lines.get(row).fresh(profile));
            }
        }
    }

    /** Files that wait for a trial. */
    List<Chosen> untried() {
        return chosen(Stand.WAITS);
    }

    /** Files that give new scans as they stand. */
    List<Chosen> ready() {
        return chosen(Stand.READS);
    }

    private List<Chosen> chosen(Stand stand) {
        return lines.stream()
                .filter(line -> line.stand() == stand)
                .map(line -> new Chosen(line.file(), stand == Stand.READS ? line.profile() : line.asked()))
                .toList();
    }

    /** A trial came back; answers its row, empty when the file went or was asked for otherwise meanwhile. */
    Optional<Integer> tried(Chosen chosen, Trial trial) {
        return row(chosen.file()).filter(row -> {
            boolean asAsked = lines.get(row).asked().equals(chosen.profile());
            if (asAsked) {
                lines.set(row, lines.get(row).with(trial));
            }
            return asAsked;
        });
    }

    /** A file was taken in, recognised or refused. Those not reached before a stop stand as they stood. */
    Optional<Integer> taken(Taken taken) {
        return taken.outcome().state() == State.STOPPED
                ? Optional.empty()
                : row(taken.outcome().file()).map(row -> {
                    lines.set(row, lines.get(row).with(taken));
                    return row;
                });
    }

    private Optional<Integer> row(Path file) {
        return Optional.ofNullable(rowOf.get(file));
    }

    long count(Stand stand) {
        return lines.stream().filter(line -> line.stand() == stand).count();
    }

    /** Scans that were recorded from this sheet, in the order of the files. */
    List<Hash> scansTaken() {
        return lines.stream()
                .filter(line -> line.stand() == Stand.TAKEN_IN)
                .flatMap(line -> line.outcome().orElseThrow().outcome().scans().stream())
                .toList();
    }
}
