package fringekeep.instrument;

import fringekeep.archive.json.JsonObject;
import fringekeep.sample.Caution;
import fringekeep.sample.Entered;
import java.util.LinkedHashSet;
import java.util.Set;
import java.util.stream.Stream;

/**
 * Cautions of a setup: those stated, then those that follow from what is stated.
 *
 * <p>Source of the limits: a continuous laser above 0.5 W is of class 4 (IEC 60825-1:2014, table 8, from memory); ultraviolet
 * below 400 nm, infrared above 700 nm (IEC 60825-1:2014, 3.1, from memory).
 */
final class SetupCautions {
    private static final double CLASS_4_WATTS = 0.5;
    private static final double ULTRAVIOLET_METRES = 400e-9;
    private static final double INFRARED_METRES = 700e-9;

    private SetupCautions() {}

    static Set<Caution> of(JsonObject content) {
        Set<Caution> cautions = new LinkedHashSet<>(CautionRules.stated(content));
        SetupFacet setup = SetupReader.read(content);
        Stream.concat(
                        setup.gratings().stream().flatMap(grating -> grating.laser().stream()),
                        setup.recoilLaser().stream().map(SetupFacet.RecoilLaser::laser))
                .forEach(laser -> laser(laser, cautions));
        if (setup.fieldPlates().isPresent()) {
            cautions.add(Caution.HIGH_VOLTAGE);
        }
        if (setup.vacuum().isPresent()) {
            cautions.add(Caution.VACUUM);
        }
        return cautions;
    }

    private static void laser(Laser laser, Set<Caution> cautions) {
        if (laser.power().map(Entered::si).orElse(0.0) > CLASS_4_WATTS) {
            cautions.add(Caution.CLASS_4_LASER);
        }
        if (laser.wavelength().si() < ULTRAVIOLET_METRES) {
            cautions.add(Caution.ULTRAVIOLET_LASER);
        }
        if (laser.wavelength().si() > INFRARED_METRES) {
            cautions.add(Caution.INFRARED_LASER);
        }
    }
}
