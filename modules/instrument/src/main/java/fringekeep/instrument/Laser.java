package fringekeep.instrument;

import fringekeep.sample.Entered;
import java.util.Optional;

/**
 * A laser beam at the bench; all SI.
 *
 * @param wavelength vacuum wavelength (m)
 * @param power incident power, single pass (W)
 * @param pulseEnergy energy of a pulse, single pass (J)
 * @param pulseLength length of a pulse, full width at half maximum (s)
 * @param waistAcross 1/e&sup2; intensity radius across the particle beam, along the grating lines, w_y (m)
 * @param waistAlong 1/e&sup2; intensity radius along the particle beam, w_z (m)
 * @param area area of a beam with flat profile (m&sup2;)
 * @param reflectivity reflectivity of the mirror (1); absent = 1
 * @param polarization code of the schema
 */
public record Laser(
        Entered wavelength,
        Optional<Entered> power,
        Optional<Entered> pulseEnergy,
        Optional<Entered> pulseLength,
        Optional<Entered> waistAcross,
        Optional<Entered> waistAlong,
        Optional<Entered> area,
        Optional<Entered> reflectivity,
        Optional<String> polarization) {}
