package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.farfield.CameraImage;
import fringekeep.interferometry.farfield.CoupledOrders;
import fringekeep.interferometry.farfield.Diffraction;
import fringekeep.interferometry.farfield.OrderPopulations;
import fringekeep.interferometry.farfield.ScreenAverage;
import fringekeep.interferometry.farfield.SlitArray;
import fringekeep.interferometry.nearfield.EikonalSlitKernel;
import fringekeep.interferometry.nearfield.WallPotential;
import fringekeep.interferometry.nearfield.WeightedNodes;
import fringekeep.interferometry.special.Bessel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Diffraction into the far field. */
final class FarFieldMethods {
    private static final Field PERIOD = Field.quantity("period", "m", "100 nm", "grating period");
    private static final Field SLIT = Field.quantity("slitWidth", "m", "50 nm", "width of the slits");
    private static final Field DISTANCE = Field.quantity("distance", "m", "1.25 m", "from grating to screen");

    private FarFieldMethods() {}

    static List<Method> all() {
        List<Field> pattern = new ArrayList<>(List.of(
                PERIOD,
                SLIT,
                Field.whole("slits", 10, "slits lit coherently"),
                DISTANCE,
                Field.list("places", "m", "um", "places on the screen", 0, 8.65, 17.3, 34.6, 69.2),
                Field.quantity(
                                "collimatedWidth",
                                "m",
                                "10 um",
                                "width of beam and detector at the screen; a point if left" + " out")
                        .seldom()));
        pattern.addAll(GratingInputs.WALL.subList(1, 5));
        pattern.addAll(BeamInputs.FIELDS);
        return List.of(
                Method.of(
                        "diffraction-angles",
                        "Wavelength, order positions, Bragg angle, Klein-Cook parameter and fall",
                        FarFieldMethods::angles,
                        Field.quantity("mass", "kg", "514.5 u", "mass of the molecule"),
                        Field.quantity("velocity", "m/s", "250 m/s", "velocity"),
                        Field.quantity("period", "m", "266 nm", "grating period"),
                        DISTANCE.orNothing(),
                        Field.list("orders", "1", "1", "diffraction orders", 1, 2)
                                .orNothing(),
                        Field.quantity("thickness", "m", "20 um", "length of the grating along the beam")
                                .orNothing(),
                        Field.quantity("gravity", "m/s2", "9.80665 m/s2", "acceleration of gravity")
                                .orNothing(),
                        Field.quantity("height", "m", "0.1 mm", "height fallen, to get a velocity from")
                                .seldom()),
                new Method(
                        "far-field-pattern",
                        "Intensity behind a grating of slits, averaged over velocity and the width of the beam",
                        pattern,
                        FarFieldMethods::pattern),
                Method.of(
                        "wall-orders",
                        "Order intensities behind one material grating with a wall potential (eikonal)",
                        FarFieldMethods::walls,
                        PERIOD,
                        Field.quantity("slitWidth", "m", "60 nm", "width of the slits"),
                        GratingInputs.WALL.get(1).shownAs(Json.of("2.0 meV.nm3")),
                        GratingInputs.WALL.get(2),
                        GratingInputs.WALL.get(3).shownAs(Json.of("160 nm")),
                        GratingInputs.WALL.get(4).shownAs(Json.of("4 nm")),
                        Field.quantity("velocity", "m/s", "200 m/s", "velocity"),
                        Field.whole("highestOrder", 3, "highest order")),
                Method.of(
                        "light-grating-orders",
                        "Populations of the orders behind a standing wave of any thickness, thin to Bragg",
                        FarFieldMethods::coupled,
                        Field.list("phases", "rad", "rad", "antinode phases φ0, one for each illumination", 1, 2, 3),
                        Field.number("talbotTimes", 0.001, "time in the light in Talbot times"),
                        Field.number("incidence", 0, "incident transverse momentum in grating momenta; -0.5 is Bragg")
                                .seldom(),
                        Field.whole("highestOrder", 3, "highest order shown"),
                        Field.whole("basis", 20, "highest order computed").seldom(),
                        Field.choice("shape", "of the light in time", "constant", "gaussian")),
                Method.of(
                        "camera-profile",
                        "Profile across the orders from a camera image: background, tilt, hot pixels, error of each bin",
                        FarFieldMethods::profile,
                        Field.grid("pixels", "1", "image by rows", image()),
                        Field.whole("firstRow", 2, "first row summed"),
                        Field.whole("lastRow", 7, "last row summed"),
                        Field.number("tilt", 0, "columns the pattern moves for each row")
                                .seldom(),
                        Field.number("hotDeviates", 8, "limit of hot pixels in standard deviations")
                                .seldom(),
                        Field.number("gain", 1, "variance for each unit of signal")
                                .seldom(),
                        Field.number("readNoise", 1, "standard deviation of an empty pixel")
                                .seldom(),
                        Field.whole("corner", 2, "side of the corner blocks that hold background only")
                                .seldom()),
                Method.of(
                        "order-populations",
                        "Populations of diffraction orders from a profile, each order a Gaussian of one width",
                        FarFieldMethods::populations,
                        Field.list("places", "m", "um", "place of each bin", -4, -3, -2, -1, 0, 1, 2, 3, 4, 5),
                        Field.measured(
                                "values",
                                "1",
                                "1",
                                "profile with u",
                                new double[] {25, 92, 58, 85, 210, 86, 60, 95, 24, 11},
                                new double[] {6}),
                        Field.whole("lowestOrder", -1, "lowest order"),
                        Field.whole("highestOrder", 1, "highest order"),
                        Field.quantity("orderSeparation", "m", "3 um", "distance of neighbouring orders"),
                        Field.quantity("width", "m", "0.6 um", "standard deviation of one order"),
                        Field.quantity("centre", "m", "0 um", "place of order 0")
                                .seldom()));
    }

    private static double[][] image() {
        double[][] pixels = new double[10][12];
        for (int row = 0; row < pixels.length; row++) {
            for (int column = 0; column < pixels[0].length; column++) {
                boolean lit = row > 1 && row < 8 && column > 2 && column < 9;
                pixels[row][column] = 10 + (row * 7 + column * 3) % 4 + (lit && column % 3 == 1 ? 60 : 0);
            }
        }
        pixels[4][5] = 900;
        return pixels;
    }

    private static void angles(Inputs in, Results out) {
        double velocity = in.number("velocity");
        double wavelength = Diffraction.wavelength(in.number("mass"), velocity);
        double period = in.number("period");
        out.value("wavelength", "m", wavelength);
        out.value("braggAngle", "rad", Diffraction.braggAngle(wavelength, period));
        out.value("orderSeparation", "rad", 2 * Diffraction.braggAngle(wavelength, period));
        if (in.has("thickness")) {
            out.value("kleinCook", "1", Diffraction.kleinCook(wavelength, in.number("thickness"), period));
        }
        if (in.has("distance")) {
            double distance = in.number("distance");
            double[] orders = in.has("orders") ? in.numbers("orders") : new double[] {1};
            double[] places = Arrays.stream(orders)
                    .map(order -> Diffraction.orderPosition((int) order, wavelength, period, distance))
                    .toArray();
            out.values("orderPositions", "m", places);
            if (in.has("gravity")) {
                out.value("fall", "m", Diffraction.fall(distance, velocity, in.number("gravity")));
            }
            if (in.has("height")) {
                double gravity = in.number("gravity", 9.80665);
                out.value("velocityOfFall", "m/s", Diffraction.velocityOfFall(distance, in.number("height"), gravity));
            }
        }
    }

    private static void pattern(Inputs in, Results out) {
        double half = 0.5 * in.number("collimatedWidth", 0);
        WeightedNodes velocities = BeamInputs.ensemble(in).velocities();
        SlitArray grating =
                new SlitArray(in.number("period"), in.number("slitWidth"), in.whole("slits"), GratingInputs.wall(in));
        ScreenAverage screen = new ScreenAverage(
                in.number("mass"),
                velocities,
                in.number("period"),
                in.number("distance"),
                half > 0 ? WeightedNodes.uniform(-half, half, 48) : WeightedNodes.single(0));
        out.values("intensities", "1", screen.intensities(grating::pattern, in.numbers("places")));
    }

    private static void walls(Inputs in, Results out) {
        WallPotential wall = GratingInputs.wall(in)
                .orElseThrow(() -> new IllegalArgumentException("a wall potential needs c3 or c4"));
        EikonalSlitKernel grating =
                new EikonalSlitKernel(in.number("period"), in.number("slitWidth"), wall, in.number("velocity"));
        double[] intensities = new double[in.whole("highestOrder") + 1];
        for (int n = 0; n < intensities.length; n++) {
            double[] amplitude = grating.orderAmplitude(n);
            intensities[n] = amplitude[0] * amplitude[0] + amplitude[1] * amplitude[1];
        }
        out.values("orderIntensities", "1", intensities);
    }

    private static void coupled(Inputs in, Results out) {
        int basis = in.whole("basis", 20);
        int highest = in.whole("highestOrder");
        if (highest > basis || highest < 0) {
            throw new IllegalArgumentException("orders to " + highest + " are shown of a basis to " + basis);
        }
        double duration = in.number("talbotTimes");
        CoupledOrders orders = new CoupledOrders(1.0, in.number("incidence", 0), basis);
        boolean gaussian = in.word("shape", "constant").equals("gaussian");
        double[] phases = in.numbers("phases");
        double[] reflections = new double[phases.length];
        for (int k = 0; k < phases.length; k++) {
            double phase = phases[k];
            double width = duration / 8;
            double peak = phase / (width * Math.sqrt(2 * Math.PI));
            double[] populations = gaussian
                    ? orders.populations(
                            t -> peak
                                    * StrictMath.exp(
                                            -0.5 * ((t - duration / 2) / width) * ((t - duration / 2) / width)),
                            duration,
                            400)
                    : orders.populations(t -> phase / duration, duration, 1);
            out.values(
                    "populationsAtPhase" + (k + 1),
                    "1",
                    Arrays.copyOfRange(populations, basis - highest, basis + highest + 1));
            double[] thin = new double[highest + 1];
            for (int n = 0; n < thin.length; n++) {
                double amplitude = Bessel.j(n, 0.5 * phase);
                thin[n] = amplitude * amplitude;
            }
            out.values("thinLimitAtPhase" + (k + 1), "1", thin);
            reflections[k] = orders.twoLevelReflection(phase, duration);
        }
        out.values("twoLevelReflection", "1", reflections);
    }

    private static void profile(Inputs in, Results out) {
        CameraImage.Profile profile = new CameraImage(in.rows("pixels"))
                .profile(new CameraImage.Reduction(
                        in.whole("firstRow"),
                        in.whole("lastRow"),
                        in.number("tilt", 0),
                        in.number("hotDeviates", 8),
                        in.number("gain", 1),
                        in.number("readNoise", 1),
                        in.whole("corner", 2)));
        out.estimates("profile", "1", profile.values(), profile.uncertainties());
        out.list(
                "hotPixels",
                profile.hot().stream()
                        .map(pixel -> "row " + pixel.row() + ", column " + pixel.column())
                        .toList());
    }

    private static void populations(Inputs in, Results out) throws ProblemException {
        double separation = in.number("orderSeparation");
        double width = in.number("width");
        double centre = in.number("centre", 0);
        OrderPopulations.Result result = new OrderPopulations(in.whole("lowestOrder"), in.whole("highestOrder"))
                .fit(in.numbers("places"), in.numbers("values"), in.stated("values"), (order, place) -> {
                    double deviate = (place - centre - order * separation) / width;
                    return StrictMath.exp(-0.5 * deviate * deviate);
                })
                .orElseThrow(() -> NoResult.because("The shapes of the orders cannot be told apart on these bins."));
        out.estimates("populations", "1", List.of(result.populations()));
        out.values("amplitudes", "1", result.amplitudes());
        out.estimate("background", "1", result.background());
        out.bare("covariance", "1", result.covariance());
        out.bare("chiSquare", "1", result.chiSquare());
        out.bare("degreesOfFreedom", "1", result.degreesOfFreedom());
        out.bare("pValue", "1", result.pValue());
    }
}
