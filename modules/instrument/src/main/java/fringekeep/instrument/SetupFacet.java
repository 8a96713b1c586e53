package fringekeep.instrument;

import fringekeep.sample.Entered;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What later stages ask a setup for; all SI.
 *
 * @param label what people call it
 * @param gratings as entered; where a setup of three equal gratings lists one, that one stands for all
 * @param separations distances between successive gratings (m); one may stand for all
 * @param delays pulsed gratings: times between successive pulses (s)
 * @param beam height along the grating lines and width of the beam
 * @param detector the detector
 * @param fieldPlates plates for a deflecting field
 * @param recoilLaser running laser beam between the gratings
 * @param vacuum the vacuum
 * @param slits slits that limit the beam
 */
public record SetupFacet(
        String label,
        List<Grating> gratings,
        List<Entered> separations,
        List<Entered> delays,
        Optional<Beam> beam,
        Optional<Detector> detector,
        Optional<FieldPlates> fieldPlates,
        Optional<RecoilLaser> recoilLaser,
        Optional<Vacuum> vacuum,
        List<Slit> slits) {
    /** Copies. */
    public SetupFacet {
        gratings = List.copyOf(gratings);
        separations = List.copyOf(separations);
        delays = List.copyOf(delays);
        slits = List.copyOf(slits);
    }

    /** Grating by its place from 0; the only one listed stands for all. */
    public Optional<Grating> grating(int place) {
        if (gratings.size() == 1) {
            return Optional.of(gratings.get(0));
        }
        return place < gratings.size() ? Optional.of(gratings.get(place)) : Optional.empty();
    }

    /** Distance (m) from grating {@code place} to the next, from 0; the only one listed stands for all. */
    public Optional<Entered> separation(int place) {
        if (separations.size() == 1) {
            return Optional.of(separations.get(0));
        }
        return place < separations.size() ? Optional.of(separations.get(place)) : Optional.empty();
    }

    /** Period (m) of the fringes: of the last material grating, which scans them, else of the last grating. */
    public OptionalDouble fringePeriod() {
        Optional<Entered> period = Optional.empty();
        boolean material = false;
        for (Grating grating : gratings) {
            boolean scans = grating.sort() == GratingSort.MATERIAL;
            if (grating.period().isPresent() && (scans || !material)) {
                period = grating.period();
                material = scans;
            }
        }
        return period.map(Entered::si).map(OptionalDouble::of).orElse(OptionalDouble.empty());
    }

    /** Size of the beam where it passes the gratings (m). */
    public record Beam(Optional<Entered> height, Optional<Entered> width) {}

    /**
     * The detector.
     *
     * @param sort code of the schema
     * @param density whether it counts particles that are there instead of particles that pass
     * @param deadTime dead time (s)
     * @param deadTimeSort none, fixed or prolonged
     * @param efficiency share of the particles that are counted
     * @param position distance from the first grating (m)
     */
    public record Detector(
            String sort,
            boolean density,
            Optional<Entered> deadTime,
            DeadTimeSort deadTimeSort,
            Optional<Entered> efficiency,
            Optional<Entered> position) {}

    /** How a dead time acts. */
    public enum DeadTimeSort {
        /** Not corrected. */
        NONE,
        /** A lost count does not prolong it. */
        FIXED,
        /** Every count prolongs it. */
        PROLONGED
    }

    /**
     * Plates for a deflecting field.
     *
     * @param position where the field begins: distance from the first grating (m)
     * @param length along the beam (m)
     * @param gap distance of the plates (m)
     * @param fieldFactor (E&middot;&nabla;)E over the square of the voltage (1/m&sup3;)
     */
    public record FieldPlates(
            Optional<Entered> position,
            Optional<Entered> length,
            Optional<Entered> gap,
            Optional<Entered> fieldFactor) {}

    /** A running laser beam at a distance from the first grating (m), sent back on itself or not. */
    public record RecoilLaser(Laser laser, Optional<Entered> position, boolean twoDirections) {}

    /** Pressure (Pa), gas and temperature (K). */
    public record Vacuum(Optional<Entered> pressure, Optional<String> gas, Optional<Entered> temperature) {}

    /** A slit: distance from the first grating, vertical place of its middle, vertical and horizontal opening (m). */
    public record Slit(
            String name,
            Optional<Entered> position,
            Optional<Entered> height,
            Optional<Entered> opening,
            Optional<Entered> width) {}
}
