package fringekeep.archive.facet;

import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * Series of numbers that a record offers to figures.
 *
 * @param series each with a name of its own within the record
 */
public record Plottable(List<Series> series) {
    /** Copies. */
    public Plottable {
        series = List.copyOf(series);
    }

    /** The series of that name. */
    public Optional<Series> series(String name) {
        return series.stream().filter(each -> each.name().equals(name)).findFirst();
    }

    /** How a series is meant. */
    public enum Sort {
        /** Measured or derived points, with standard uncertainties where they are known. */
        POINTS,
        /** A curve through its vertices. */
        CURVE,
        /** An area between a lower and an upper curve. */
        BAND
    }

    /**
     * One series, all SI.
     *
     * @param name such as {@code points}, {@code quantum}, {@code quantum-band}
     * @param label words for a legend
     * @param sort how it is meant
     * @param xName abscissa, such as {@code laser power}
     * @param xUnit UCUM code (SI)
     * @param yName ordinate
     * @param yUnit UCUM code (SI)
     * @param x abscissae
     * @param y ordinates; lower edge of a band
     * @param other standard uncertainty of each point (empty when unknown), or upper edge of a band
     * @param sources the record each point comes from; empty for curves and bands
     */
    public record Series(
            String name,
            String label,
            Sort sort,
            String xName,
            String xUnit,
            String yName,
            String yUnit,
            double[] x,
            double[] y,
            double[] other,
            List<Hash> sources) {
        /** Copies and checks lengths. */
        public Series {
            x = x.clone();
            y = y.clone();
            other = other.clone();
            sources = List.copyOf(sources);
            boolean otherFits = other.length == x.length || (other.length == 0 && sort != Sort.BAND);
            boolean sourcesFit = sources.isEmpty() || sources.size() == x.length;
            if (x.length != y.length || !otherFits || !sourcesFit) {
                throw new IllegalArgumentException("series " + name + ": " + x.length + " x, " + y.length + " y, "
                        + other.length + " uncertainties or upper edges, " + sources.size() + " sources");
            }
        }
    }
}
