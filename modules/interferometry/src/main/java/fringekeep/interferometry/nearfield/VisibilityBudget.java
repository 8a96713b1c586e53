package fringekeep.interferometry.nearfield;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * From the visibility an ideal instrument would show to the one to be expected: every reduction, and which dominate.
 *
 * <p>Independent reductions multiply; the share of one is its part of the logarithm of the total. Thread rule:
 * immutable.
 *
 * @param ideal   visibility without reductions, 0 to 1
 * @param entries reductions in the order given
 */
public record VisibilityBudget(double ideal, List<Entry> entries) {
    /** Checks the ideal visibility and keeps an own list. */
    public VisibilityBudget {
        if (!(ideal >= 0.0 && ideal <= 1.0)) {
            throw new IllegalArgumentException("a visibility lies between 0 and 1, not " + ideal);
        }
        entries = List.copyOf(entries);
    }

    /**
     * One reduction.
     *
     * @param cause    what reduces, in the trade's words
     * @param factor   remaining visibility, 0 to 1
     * @param standing how well the formula is established
     */
    public record Entry(String cause, double factor, Standing standing) {
        /** Checks the factor. */
        public Entry {
            if (!(factor >= 0.0 && factor <= 1.0)) {
                throw new IllegalArgumentException("a reduction lies between 0 and 1, not " + factor + " by " + cause);
            }
        }
    }

    /**
     * A reduction with its part in the whole.
     *
     * @param entry the reduction
     * @param share its part of the logarithm of the total, 0 to 1; zero if nothing is reduced
     */
    public record Share(Entry entry, double share) {}

    /**
     * Product of all factors.
     *
     * @return 0 to 1
     */
    public double reduction() {
        double product = 1.0;
        for (Entry entry : entries) {
            product *= entry.factor();
        }
        return product;
    }

    /**
     * Visibility to be expected.
     *
     * @return ideal visibility times all factors
     */
    public double expected() {
        return ideal * reduction();
    }

    /**
     * Reductions by what they take, the largest first; equal ones in the order given.
     *
     * @return one share per entry
     */
    public List<Share> byShare() {
        double total = 0.0;
        boolean vanished = false;
        for (Entry entry : entries) {
            vanished |= entry.factor() == 0.0;
            total -= entry.factor() > 0.0 ? StrictMath.log(entry.factor()) : 0.0;
        }
        List<Share> shares = new ArrayList<>();
        for (Entry entry : entries) {
            shares.add(new Share(entry, share(entry.factor(), total, vanished)));
        }
        shares.sort(Comparator.comparingDouble((Share share) -> share.entry().factor()));
        return shares;
    }

    private static double share(double factor, double total, boolean vanished) {
        if (vanished) {
            return factor == 0.0 ? 1.0 : 0.0;
        }
        return total > 0.0 ? -StrictMath.log(factor) / total : 0.0;
    }
}
