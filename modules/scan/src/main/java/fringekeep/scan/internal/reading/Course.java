package fringekeep.scan.internal.reading;

import java.util.ArrayList;
import java.util.List;

/** How an axis runs over the rows, and where it runs against what is expected. */
final class Course {
    private final String expected;

    /** Expected course: {@code up}, {@code down}, {@code either}, {@code up-down} (one turn) or {@code any}. */
    Course(String expected) {
        this.expected = expected;
    }

    /** Rows that are reached by a step against the expected course, ascending; equal positions are never against it. */
    List<Integer> against(double[] x) {
        return switch (expected) {
            case "up" -> against(x, 1, x.length, 1);
            case "down" -> against(x, 1, x.length, -1);
            case "either" -> against(x, 1, x.length, x.length > 0 && x[x.length - 1] < x[0] ? -1 : 1);
            case "up-down" -> upDown(x);
            case "any" -> List.of();
            default -> throw new IllegalArgumentException("course " + expected);
        };
    }

    private static List<Integer> upDown(double[] x) {
        int turn = 0;
        for (int i = 1; i < x.length; i++) {
            turn = x[i] > x[turn] ? i : turn;
        }
        List<Integer> rows = new ArrayList<>(against(x, 1, turn + 1, 1));
        rows.addAll(against(x, turn + 1, x.length, -1));
        return rows;
    }

    private static List<Integer> against(double[] x, int from, int to, int sign) {
        List<Integer> rows = new ArrayList<>();
        for (int i = Math.max(1, from); i < to; i++) {
            if (sign * (x[i] - x[i - 1]) < 0) {
                rows.add(i);
            }
        }
        return rows;
    }
}
