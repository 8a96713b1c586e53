package fringekeep.interferometry.fringe;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The whole grid of coverage in a file, one line a cell, each written as soon as it is known, so that a run that was
 * stopped goes on where it was. A cell's seed is made of its place in the grid alone.
 */
final class CoverageGridFile {
    private static final String HEADING =
            "counts,visibility,points,background,drift,scans,failed,V68,V95,wald68,wald95,"
                    + "phase68,phase95,p05,p32,p50,meanBias,visibilityBias";

    private final Path file;
    private final int scans;

    CoverageGridFile(Path file, int scans) {
        this.file = file;
        this.scans = scans;
    }

    /** Runs the cells the file lacks; returns all lines without the heading, in the order of the grid. */
    List<String> complete() throws IOException {
        List<String> known = known();
        List<CoverageGrid.Cell> cells = CoverageGrid.whole();
        for (int k = known.size(); k < cells.size(); k++) {
            String line = line(cells.get(k), CoverageGrid.run(cells.get(k), scans, 1000 + k));
            Files.writeString(file, line + "\n", StandardOpenOption.APPEND);
            known.add(line);
        }
        return known;
    }

    private List<String> known() throws IOException {
        if (!Files.exists(file)) {
            Files.createDirectories(file.toAbsolutePath().getParent());
            Files.writeString(file, HEADING + "\n");
        }
        List<String> lines = new ArrayList<>(Files.readAllLines(file));
        if (!lines.remove(0).equals(HEADING)) {
            throw new IOException(file + " has other columns; move it away to begin anew");
        }
        for (int k = 0; k < lines.size(); k++) {
            if (!lines.get(k).startsWith(place(CoverageGrid.whole().get(k)))) {
                throw new IOException(file + ", line " + (k + 2) + ": not the cell or number of scans of this run");
            }
        }
        return lines;
    }

    private String place(CoverageGrid.Cell cell) {
        return String.format(
                Locale.ROOT,
                "%.0f,%.2f,%d,%.2f,%.2f,%d,",
                cell.counts(),
                cell.visibility(),
                cell.points(),
                cell.background(),
                cell.drift(),
                scans);
    }

    private String line(CoverageGrid.Cell cell, CoverageGrid.Shares s) {
        return place(cell)
                + String.format(
                        Locale.ROOT,
                        "%d,%.4f,%.4f,%.4f,%.4f,%.4f,%.4f,%.4f,%.4f,%.4f,%.3f,%.3f",
                        s.failed(),
                        s.visibilityOne(),
                        s.visibilityTwo(),
                        s.waldOne(),
                        s.waldTwo(),
                        s.phaseOne(),
                        s.phaseTwo(),
                        s.below5(),
                        s.below32(),
                        s.below50(),
                        s.meanBias(),
                        s.visibilityBias());
    }

    /** Runs the grid by itself: file and number of scans a cell. */
    public static void main(String[] arguments) throws IOException {
        new CoverageGridFile(Path.of(arguments[0]), Integer.parseInt(arguments[1])).complete();
    }
}
