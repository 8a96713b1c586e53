package fringekeep.interferometry.molecule;

/**
 * Measured values of one quantity against another, with standard uncertainties that are independent of each other.
 *
 * <p>Thread rule: immutable.
 */
public final class MeasuredCurve {
    private final double[] places;
    private final double[] values;
    private final double[] uncertainties;

    /**
     * Checks and keeps the points.
     *
     * @param places        where each value was measured: power (W), voltage (V), pressure (Pa), &hellip;, finite
     * @param values        measured values, finite
     * @param uncertainties standard uncertainty of each value, &gt; 0
     * @throws IllegalArgumentException if lengths differ, there is no point, or a number is out of range
     */
    public MeasuredCurve(double[] places, double[] values, double[] uncertainties) {
        if (places.length == 0 || places.length != values.length || places.length != uncertainties.length) {
            throw new IllegalArgumentException("a curve needs as many places as values and uncertainties: "
                    + places.length + ", " + values.length + ", " + uncertainties.length);
        }
        for (int k = 0; k < places.length; k++) {
            requirePoint(k, places[k], values[k], uncertainties[k]);
        }
        this.places = places.clone();
        this.values = values.clone();
        this.uncertainties = uncertainties.clone();
    }

    private static void requirePoint(int index, double place, double value, double uncertainty) {
        boolean positive = uncertainty > 0.0 && uncertainty < Double.POSITIVE_INFINITY;
        if (!Double.isFinite(place) || !Double.isFinite(value) || !positive) {
            throw new IllegalArgumentException("point " + index + " (" + place + ", " + value + ", uncertainty "
                    + uncertainty + ") is not finite or has no positive uncertainty");
        }
    }

    /**
     * Number of points.
     *
     * @return at least one
     */
    public int size() {
        return places.length;
    }

    /**
     * Where a value was measured.
     *
     * @param index from 0
     * @return the place
     */
    public double place(int index) {
        return places[index];
    }

    /**
     * A measured value.
     *
     * @param index from 0
     * @return the value
     */
    public double value(int index) {
        return values[index];
    }

    /**
     * Uncertainty of a value.
     *
     * @param index from 0
     * @return one standard deviation
     */
    public double uncertainty(int index) {
        return uncertainties[index];
    }

    /**
     * Largest place.
     *
     * @return the maximum of all places
     */
    public double largestPlace() {
        double largest = places[0];
        for (double place : places) {
            largest = Math.max(largest, place);
        }
        return largest;
    }

    /**
     * The same places and uncertainties with other values.
     *
     * @param other new values, one per point
     * @return the curve
     */
    public MeasuredCurve withValues(double[] other) {
        return new MeasuredCurve(places, other, uncertainties);
    }
}
