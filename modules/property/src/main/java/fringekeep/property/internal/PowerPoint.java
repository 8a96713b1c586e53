package fringekeep.property.internal;

import fringekeep.archive.record.Hash;
import fringekeep.instrument.CalibrationFacet;
import java.util.List;

/**
 * One fit of a power series.
 *
 * @param fit the fit
 * @param reading power as read (W)
 * @param readingDeviation its standard uncertainty as stated (W), 0 where it is exact or not used; NaN where none is stated
 * @param calibrations what the fit pins for the power, with their records, applied in order
 * @param visibility amplitude over mean, or that over the references'
 * @param deviation its standard uncertainty
 */
record PowerPoint(
        Hash fit,
        double reading,
        double readingDeviation,
        List<Pinned> calibrations,
        double visibility,
        double deviation) {
    PowerPoint {
        calibrations = List.copyOf(calibrations);
    }

    /** A calibration and the record that states it. */
    record Pinned(Hash record, CalibrationFacet calibration) {
        /** The calibration with one parameter moved. */
        CalibrationFacet moved(Shift shift) {
            double[] parameters = calibration.parameters();
            for (int i = 0; i < parameters.length; i++) {
                parameters[i] +=
                        shift.of(record, calibration.model().parameters().get(i));
            }
            return new CalibrationFacet(
                    calibration.target(),
                    calibration.model(),
                    parameters,
                    calibration.covariance(),
                    calibration.from(),
                    calibration.to(),
                    calibration.subject());
        }
    }

    /** Power at the grating (W). */
    double power(Shift shift) {
        double power = reading + shift.readings() * (Double.isNaN(readingDeviation) ? 0 : readingDeviation);
        for (Pinned pinned : calibrations) {
            power = pinned.moved(shift).apply(power).value();
        }
        return power;
    }

    /** Standard uncertainty of the power at the grating from the reading alone (W), by the slopes of the calibrations. */
    double powerDeviation() {
        double power = reading;
        double deviation = Double.isNaN(readingDeviation) ? 0 : readingDeviation;
        for (Pinned pinned : calibrations) {
            CalibrationFacet.Calibrated at = pinned.calibration().apply(power);
            power = at.value();
            deviation *= Math.abs(at.slope());
        }
        return deviation;
    }
}
