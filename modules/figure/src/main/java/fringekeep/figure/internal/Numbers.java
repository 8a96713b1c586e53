package fringekeep.figure.internal;

import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * Numbers of one series in the units of its axes.
 *
 * @param sort points, curve, band or level
 * @param label words in the legend
 * @param x abscissae; of a level line none
 * @param y ordinates
 * @param other standard uncertainties (empty when unknown), or the upper edge of a band
 * @param sources the record each row comes from
 */
record Numbers(String sort, String label, double[] x, double[] y, double[] other, List<Optional<Hash>> sources) {
    Numbers {
        x = x.clone();
        y = y.clone();
        other = other.clone();
        sources = List.copyOf(sources);
    }

    int rows() {
        return y.length;
    }
}
