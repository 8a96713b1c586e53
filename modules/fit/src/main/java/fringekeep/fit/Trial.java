package fringekeep.fit;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.drawing.Picture;
import java.util.List;
import java.util.Optional;

/**
 * A fit that was tried and is not recorded.
 *
 * @param choices its choices with every default written out; as asked where the fit failed
 * @param result its result; empty where the fit failed
 * @param points its rows in the order in which they were fitted; the scans' own rows where the fit failed
 * @param picture counts with a dotted curve and residuals, or counts alone
 * @param problems why there is no fit; empty where there is one
 */
public record Trial(
        JsonObject choices, Optional<JsonObject> result, List<Point> points, Picture picture, List<Problem> problems) {
    /** Copies. */
    public Trial {
        points = List.copyOf(points);
        problems = List.copyOf(problems);
    }

    /** What becomes of a point. */
    public enum Use {
        /** Fitted. */
        USED,
        /** Outside the range. */
        OUTSIDE,
        /** Masked, or without a count. */
        MASKED
    }

    /**
     * One row.
     *
     * @param scan its scan; the first of them where counts are summed row by row
     * @param row row of the scan, from 0
     * @param position as fitted (m)
     * @param read position as read (m)
     * @param counts as read, or the sum of them
     * @param use what becomes of it
     */
    public record Point(Hash scan, int row, double position, double read, double counts, Use use) {}

    /** The points of one use in their order: the order in which the picture's layer of that use has them. */
    public List<Point> points(Use use) {
        return points.stream().filter(point -> point.use() == use).toList();
    }
}
