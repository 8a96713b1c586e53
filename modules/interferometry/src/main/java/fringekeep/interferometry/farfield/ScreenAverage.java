package fringekeep.interferometry.farfield;

import fringekeep.interferometry.nearfield.WeightedNodes;

/**
 * A far-field pattern on a screen, averaged over speeds and over the width of collimated beam and detector.
 *
 * <p>Thread rule: immutable.
 *
 * @param mass       mass (kg)
 * @param velocities speeds, weighted as detected (m/s)
 * @param period     grating period d (m)
 * @param distance   distance from grating to screen (m)
 * @param offsets    displacement on the screen by collimation and detector width (m); zero alone if they are negligible
 */
public record ScreenAverage(
        double mass, WeightedNodes velocities, double period, double distance, WeightedNodes offsets) {
    /** Checks the numbers. */
    public ScreenAverage {
        if (!(mass > 0.0 && period > 0.0 && distance > 0.0)) {
            throw new IllegalArgumentException(
                    "mass " + mass + " kg, period " + period + " m and distance " + distance + " m must be positive");
        }
    }

    /** The pattern of the grating for one speed. */
    @FunctionalInterface
    public interface ByVelocity {
        /**
         * Pattern of one speed.
         *
         * @param velocity speed (m/s)
         * @return relative intensity against orders
         */
        SlitArray.Pattern pattern(double velocity);
    }

    /**
     * Averaged relative intensity.
     *
     * @param grating pattern of the grating for each speed
     * @param places  places on the screen (m)
     * @return one mean intensity per place
     */
    public double[] intensities(ByVelocity grating, double[] places) {
        double[] sums = new double[places.length];
        for (int i = 0; i < velocities.size(); i++) {
            double velocity = velocities.value(i);
            SlitArray.Pattern pattern = grating.pattern(velocity);
            double perSine = period / Diffraction.wavelength(mass, velocity);
            for (int k = 0; k < places.length; k++) {
                double place = places[k];
                sums[k] += velocities.weight(i) * offsets.mean(offset -> pattern.at(perSine * sine(place - offset)));
            }
        }
        return sums;
    }

    private double sine(double place) {
        return place / StrictMath.hypot(place, distance);
    }
}
