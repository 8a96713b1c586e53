package fringekeep.archive.facet;

import fringekeep.archive.record.Moment;
import java.util.List;
import java.util.Optional;

/**
 * Counts against one or more axes, as read from a raw file. All values SI; a row is a setting of the axes.
 *
 * @param axes at least one, each of the same length
 * @param channels counts and other columns, each of the same length as the axes
 * @param exposure time per row (s), of that length; or empty when {@code shots} is given
 * @param shots source shots per row, of that length; empty when the exposure is a time
 * @param start when the scan began, where known
 * @param end when it ended, where known
 */
public record CountTable(
        List<Column> axes,
        List<Column> channels,
        double[] exposure,
        double[] shots,
        Optional<Moment> start,
        Optional<Moment> end) {
    /** Copies. */
    public CountTable {
        axes = List.copyOf(axes);
        channels = List.copyOf(channels);
        exposure = exposure.clone();
        shots = shots.clone();
    }

    /** Number of rows. */
    public int rows() {
        return axes.get(0).values().length;
    }

    /** The axis of that name. */
    public Optional<Column> axis(String name) {
        return axes.stream().filter(column -> column.name().equals(name)).findFirst();
    }

    /** The channel of that name. */
    public Optional<Column> channel(String name) {
        return channels.stream().filter(column -> column.name().equals(name)).findFirst();
    }

    /**
     * One column.
     *
     * @param name such as {@code position} or {@code counts}
     * @param unit UCUM code of the SI unit
     * @param values one per row, NaN where absent
     */
    public record Column(String name, String unit, double[] values) {
        /** Copies. */
        public Column {
            values = values.clone();
        }
    }
}
