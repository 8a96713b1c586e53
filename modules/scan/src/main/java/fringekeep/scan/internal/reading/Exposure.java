package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.ProfileColumn.Role;
import java.util.Arrays;

/**
 * Exposure of the rows: as the result states it, and row by row.
 *
 * @param json member {@code exposure} of the result
 * @param perRow seconds or shots of each row, &gt; 0
 * @param shots whether shots are meant
 */
public record Exposure(JsonObject json, double[] perRow, boolean shots) {
    /** Copies. */
    public Exposure {
        perRow = perRow.clone();
    }

    /** A column goes before the header, the header before the profile. */
    static Exposure of(Profile profile, HeaderValues header, ScanTable table, String file) throws ProblemException {
        int rows = table.rows();
        if (table.exposureOf("").isPresent()) {
            return column(table.exposureOf("").get(), "per-row", false);
        }
        if (!table.role(Role.SHOTS).isEmpty()) {
            return column(table.role(Role.SHOTS).get(0), "shots-per-row", true);
        }
        if (header.exposure().isPresent()
                || profile.exposure().isPresent() && header.shots().isEmpty()) {
            double si = header.exposure().orElseGet(() -> profile.exposure().getAsDouble());
            return profile.total()
                    ? constant("total", si, si / rows, rows, false)
                    : constant("per-point", si, si, rows, false);
        }
        long shots = header.shots().orElse(profile.shots().orElse(0));
        if (shots == 0) {
            throw new ProblemException(ScanProblems.of("scan.exposure-missing", file));
        }
        return constant("shots-per-point", shots, shots, rows, true);
    }

    private static Exposure column(ScanTable.TableColumn column, String sort, boolean shots) {
        return new Exposure(JsonObject.EMPTY.with("sort", sort).with("column", column.name()), column.values(), shots);
    }

    private static Exposure constant(String sort, double si, double each, int rows, boolean shots) {
        double[] perRow = new double[rows];
        Arrays.fill(perRow, each);
        return new Exposure(JsonObject.EMPTY.with("sort", sort).with("si", si), perRow, shots);
    }

    /** Sum over all rows. */
    public double total() {
        double sum = 0;
        for (double each : perRow) {
            sum += each;
        }
        return sum;
    }
}
