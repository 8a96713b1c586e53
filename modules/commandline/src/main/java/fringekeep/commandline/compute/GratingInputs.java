package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.interferometry.nearfield.BeamGrating;
import fringekeep.interferometry.nearfield.DepletionKernel;
import fringekeep.interferometry.nearfield.DepletionLightGrating;
import fringekeep.interferometry.nearfield.EikonalSlitKernel;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.LightKernel;
import fringekeep.interferometry.nearfield.MaterialGrating;
import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.RecoilKernel;
import fringekeep.interferometry.nearfield.SlitKernel;
import fringekeep.interferometry.nearfield.StandingLightGrating;
import fringekeep.interferometry.nearfield.TalbotKernel;
import fringekeep.interferometry.nearfield.WallPotential;
import java.util.List;
import java.util.Optional;

/** Gratings as documents give them. */
final class GratingInputs {
    private static final Field SORT =
            Field.choice("sort", "slits, standing light or depleting light", "slits", "light", "depletion");
    private static final Field OPEN =
            Field.number("openFraction", 0.42, "open fraction of slits").seldom();
    private static final Field RECOIL =
            Field.choice("recoil", RecoilKernel.class, "recoil of absorption; standing-mode-coherent if not given");
    /** Wall potential of slits. */
    static final List<Field> WALL = List.of(
            Field.quantity("slitWidth", "m", "112 nm", "width of the slits, with a wall potential")
                    .seldom(),
            Field.quantity("c3", "J.m3", "2.0 meV.nm3", "van der Waals coefficient of the walls")
                    .seldom(),
            Field.quantity("c4", "J.m4", "30 meV.nm4", "retarded coefficient of the walls")
                    .seldom(),
            Field.quantity("thickness", "m", "160 nm", "thickness of the bars along the beam")
                    .seldom(),
            Field.quantity("cutoff", "m", "8 nm", "distance from a wall below which molecules are lost")
                    .seldom());

    /** A grating by its action: phase and photons at the antinode. */
    static final List<Field> KERNEL = List.of(
            SORT,
            OPEN,
            WALL.get(0),
            WALL.get(1),
            WALL.get(2),
            WALL.get(3),
            WALL.get(4),
            Field.quantity("phase", "rad", "3.0 rad", "peak phase of light at the antinode")
                    .seldom(),
            Field.number("photons", 1.0, "mean number of photons absorbed at the antinode")
                    .seldom(),
            RECOIL);

    /** A grating in a beam: what makes its action. */
    static final List<Field> IN_BEAM = List.of(
            SORT,
            Field.quantity("period", "m", "266 nm", "period"),
            OPEN,
            WALL.get(1),
            WALL.get(2),
            WALL.get(3),
            WALL.get(4),
            Field.quantity("wavelength", "m", "532 nm", "laser wavelength; twice the period if not given")
                    .seldom(),
            Field.quantity("waist", "m", "0.9 mm", "1/e² intensity radius across the molecular beam")
                    .seldom(),
            Field.quantity("power", "W", "6 W", "incident laser power").seldom(),
            Field.number("reflectivity", 1, "of the mirror").seldom(),
            Field.quantity("polarizabilityVolume", "m3", "120 Ao3", "polarizability volume at the wavelength")
                    .seldom(),
            Field.quantity("crossSection", "m2", "1e-21 m2", "absorption cross section at the wavelength")
                    .seldom(),
            RECOIL);

    private GratingInputs() {}

    static JsonObject slits(double openFraction) {
        return JsonObject.EMPTY.with("sort", "slits").with("openFraction", Json.of(openFraction));
    }

    static JsonObject slitsInBeam() {
        return slits(0.42).with("period", "266 nm");
    }

    static JsonObject light() {
        return JsonObject.EMPTY.with("sort", "light").with("phase", "3.0 rad");
    }

    static JsonObject lightInBeam() {
        return JsonObject.EMPTY
                .with("sort", "light")
                .with("period", "266 nm")
                .with("waist", "0.9 mm")
                .with("power", "6 W")
                .with("polarizabilityVolume", "120 Ao3");
    }

    /** Action of one grating at a velocity, which only a wall potential needs. */
    static TalbotKernel kernel(Inputs in, double period, double velocity) {
        double phase = in.number("phase", 0);
        double photons = in.number("photons", 0);
        return switch (in.word("sort", "slits")) {
            case "light" -> new LightKernel(phase, photons, in.choice("recoil", RecoilKernel.STANDING_MODE_COHERENT));
            case "depletion" -> new DepletionKernel(phase, photons);
            default ->
                wall(in).<TalbotKernel>map(
                                wall -> new EikonalSlitKernel(period, in.number("slitWidth"), wall, velocity))
                        .orElseGet(() -> new SlitKernel(
                                in.has("openFraction") ? in.number("openFraction") : in.number("slitWidth") / period));
        };
    }

    static boolean hasWall(Inputs in) {
        return wall(in).isPresent();
    }

    static Optional<WallPotential> wall(Inputs in) {
        if (!in.has("c3") && !in.has("c4")) {
            return Optional.empty();
        }
        int exponent = in.has("c3") ? 3 : 4;
        double coefficient = in.number("c" + exponent);
        return Optional.of(new WallPotential(coefficient, exponent, in.number("thickness"), in.number("cutoff")));
    }

    static BeamGrating inBeam(Inputs in) {
        double period = in.number("period");
        String sort = in.word("sort", "slits");
        if (sort.equals("slits")) {
            return new MaterialGrating(period, in.number("openFraction"), wall(in));
        }
        LaserBeam laser = laser(in, period);
        OpticalResponse response =
                new OpticalResponse(in.number("polarizabilityVolume", 0), in.number("crossSection", 0));
        return sort.equals("light")
                ? new StandingLightGrating(period, laser, in.number("power"), response)
                : new DepletionLightGrating(period, laser, in.number("power"), response);
    }

    static LaserBeam laser(Inputs in, double period) {
        return new LaserBeam(
                in.number("wavelength", 2 * period),
                in.number("waist"),
                in.number("reflectivity", 1),
                in.choice("recoil", RecoilKernel.STANDING_MODE_COHERENT));
    }
}
