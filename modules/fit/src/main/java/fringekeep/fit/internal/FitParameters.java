package fringekeep.fit.internal;

import fringekeep.interferometry.fringe.DeadTime;
import java.util.List;

/**
 * What a fit takes as known from elsewhere and what "suppose" may turn.
 *
 * @param period fringe period, or the start of it where it is free (m)
 * @param deadTime dead time of the detector
 * @param corrections corrections of positions, applied in order
 */
public record FitParameters(double period, DeadTime deadTime, List<PositionCorrection> corrections) {
    /** Copies. */
    public FitParameters {
        corrections = List.copyOf(corrections);
    }

    /** A position as all corrections leave it (m). */
    double corrected(double position) {
        double x = position;
        for (PositionCorrection correction : corrections) {
            x = correction.offset() + correction.scale() * x;
        }
        return x;
    }

    /** The same with another period (m). */
    FitParameters period(double value) {
        return new FitParameters(value, deadTime, corrections);
    }

    /** The same with another dead time (s). */
    FitParameters deadTimeSeconds(double seconds) {
        return new FitParameters(period, new DeadTime(deadTime.sort(), Math.max(0, seconds)), corrections);
    }

    /** The same with one correction replaced. */
    FitParameters correction(int place, PositionCorrection value) {
        List<PositionCorrection> changed = new java.util.ArrayList<>(corrections);
        changed.set(place, value);
        return new FitParameters(period, deadTime, changed);
    }

    /**
     * A linear correction of positions from a calibration.
     *
     * @param input position of the calibration among the inputs
     * @param offset added (m)
     * @param offsetDeviation its standard uncertainty (m); 0 where the model has none
     * @param scale factor
     * @param scaleDeviation its standard uncertainty; 0 where the model has none
     */
    public record PositionCorrection(
            int input, double offset, double offsetDeviation, double scale, double scaleDeviation) {}
}
