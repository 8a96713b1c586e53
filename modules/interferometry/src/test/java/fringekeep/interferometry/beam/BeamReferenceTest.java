package fringekeep.interferometry.beam;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.interferometry.constants.Codata2018;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;

/** Beams, sources and flight times against values by independent numerics; see ORIGIN.txt beside the files. */
class BeamReferenceTest {
    private static final Path CHECKS = Path.of("src/test/reference/beam-and-fringe-checks/checks.json");
    private static final Path FITS = Path.of("src/test/reference/fringe-fits");

    private static List<JsonNode> cases(String kind) throws IOException {
        List<JsonNode> found = new ArrayList<>();
        for (JsonNode node : new ObjectMapper().readTree(CHECKS.toFile()).get("cases")) {
            if (node.get("id").textValue().startsWith(kind)) {
                found.add(node);
            }
        }
        assertThat(found).as(kind).isNotEmpty();
        return found;
    }

    private static double in(JsonNode node, String name) {
        return node.get("inputs").get(name).get("value").doubleValue();
    }

    private static double[] array(JsonNode values) {
        return StreamSupport.stream(values.spliterator(), false)
                .mapToDouble(JsonNode::doubleValue)
                .toArray();
    }

    private static void check(JsonNode node, String name, double value) {
        double theirs = node.get("expected").get(name).get("value").doubleValue();
        JsonNode tolerance = node.get("tolerance");
        double allowed = tolerance.get("absolute").doubleValue()
                + tolerance.get("relative").doubleValue() * Math.abs(theirs);
        assertThat(value).as(node.get("id").textValue() + " " + name).isCloseTo(theirs, within(allowed));
    }

    @Test
    void wavelengthsAndTalbotScales() throws IOException {
        for (JsonNode node : cases("a.debroglie")) {
            double mass = in(node, "mass") * Codata2018.ATOMIC_MASS_CONSTANT;
            double velocity = in(node, "velocity");
            double period = in(node, "grating_period");
            check(node, "lambda_dB", MatterWave.wavelength(mass, velocity));
            check(node, "talbot_length", MatterWave.talbotLength(mass, velocity, period));
            check(node, "talbot_time", MatterWave.talbotTime(mass, period));
        }
    }

    @Test
    void thermalAndSupersonicSources() throws IOException {
        for (JsonNode node : cases("a.effusive")) {
            ThermalSource source =
                    new ThermalSource(in(node, "mass") * Codata2018.ATOMIC_MASS_CONSTANT, in(node, "temperature"));
            check(node, "v_mp_gas", source.gasMode());
            check(node, "v_mean_gas", source.gasMean());
            check(node, "v_mp_flux", source.beamMode());
            check(node, "v_mean_flux", source.beamMean());
            check(node, "v_rms_flux", source.beamRootMeanSquare());
            check(node, "v_mp_gas", source.gas().mode());
            check(node, "v_mean_gas", source.gas().mean());
            check(node, "v_mp_flux", source.beam().mode());
            check(node, "v_mean_flux", source.beam().mean());
            check(node, "v_rms_flux", Math.sqrt(source.beam().moment(2)));
        }
        for (JsonNode node : cases("a.supersonic")) {
            ThermalSource source =
                    new ThermalSource(in(node, "mass") * Codata2018.ATOMIC_MASS_CONSTANT, in(node, "T0"));
            check(node, "v_inf", source.supersonicLimit(in(node, "gamma")));
        }
    }

    @Test
    void threeSlitSelection() throws IOException {
        for (JsonNode node : cases("a.three_slit")) {
            GravitySelector selector = new GravitySelector(
                    array(node.get("inputs").get("z").get("value")),
                    array(node.get("inputs").get("y").get("value")),
                    in(node, "g"));
            check(node, "v", selector.velocity());
        }
    }

    @Test
    void shiftedFlux() throws IOException {
        for (JsonNode node : cases("a.shifted_flux")) {
            VelocityLaw law = new VelocityLaw(3, in(node, "v0"), in(node, "vw"));
            check(node, "v_mode", law.mode());
            check(node, "v_mean", law.mean());
            check(node, "v_std", law.standardDeviation());
            check(node, "v_harmonic", law.harmonicMean());
            check(node, "t_peak_of_arrival_density", law.arrivalPeakTime(in(node, "flight_length")));
            check(node, "L_over_t_peak", law.arrivalPeakVelocity());
        }
    }

    @Test
    void pseudoRandomDecoding() throws IOException {
        for (JsonNode node : cases("a.prbs")) {
            double[] bits = array(node.get("inputs").get("sequence").get("value"));
            boolean[] open = new boolean[bits.length];
            for (int j = 0; j < bits.length; j++) {
                open[j] = bits[j] == 1;
            }
            JsonNode register = node.get("inputs").get("lfsr").get("value");
            int[] taps = Arrays.stream(array(register.get("taps")))
                    .mapToInt(tap -> (int) tap)
                    .toArray();

            PseudoRandomSequence sequence = PseudoRandomSequence.of(open);
            PseudoRandomSequence made = PseudoRandomSequence.ofRegister(
                    register.get("stages").intValue(),
                    taps,
                    register.get("seed").intValue());
            double[] decoded = sequence.decode(
                    array(node.get("inputs").get("counts_per_bin").get("value")), 1);

            assertThat(made.open()).isEqualTo(open);
            double[] theirs = array(node.get("expected").get("tof").get("value"));
            assertThat(decoded).containsExactly(theirs, within(1e-9));
            check(node, "autocorrelation_zero_lag_pm1", sequence.autocorrelation(0));
            check(node, "autocorrelation_other_lags_pm1", sequence.autocorrelation(3));
        }
    }

    @Test
    void ovenAndVacuum() throws IOException {
        for (JsonNode node : cases("g.oven")) {
            double pressure = Oven.vapourPressure(in(node, "A"), in(node, "B"), in(node, "T"));
            double mass = in(node, "mass") * Codata2018.ATOMIC_MASS_CONSTANT;
            double diameter = in(node, "diameter");
            check(node, "p_vap", pressure);
            check(node, "enthalpy", Oven.enthalpy(in(node, "B")));
            check(node, "effusion_rate", Oven.effusionRate(pressure, in(node, "area"), mass, in(node, "T")));
            check(node, "mean_free_path_self_in_vapour", Oven.freePathInOwnGas(diameter, pressure, in(node, "T")));
            check(
                    node,
                    "mean_free_path_fast_beam_sigma_piD2",
                    Oven.freePathOfFastBeam(Math.PI * diameter * diameter, in(node, "p_gas"), in(node, "T_gas")));
        }
    }

    @Test
    void decodesAndFitsTheReferenceTraceAsTheOtherProgramsDo() throws IOException {
        double[] counts = new double[127];
        boolean[] open = new boolean[127];
        for (String line : Files.readAllLines(FITS.resolve("tof_01.csv"))) {
            if (!line.isEmpty() && Character.isDigit(line.charAt(0))) {
                List<String> cells = List.of(line.split(",", -1));
                int bin = Integer.parseInt(cells.get(0));
                open[bin] = cells.get(2).equals("1");
                counts[bin] = Double.parseDouble(cells.get(3));
            }
        }
        JsonNode theirs = new ObjectMapper()
                .readTree(FITS.resolve("reference-fits.json").toFile())
                .get("fits")
                .get("tof_01");
        PseudoRandomSequence sequence = PseudoRandomSequence.of(open);
        FlightSetup setup = new FlightSetup(1.42, 1e-4, 2e-4, 0.0011, 0, false);

        double[] decoded = sequence.decode(counts, 60);
        FlightFit cut =
                FlightTime.pseudoRandom(setup, sequence, counts, 60, false).orThrow();
        FlightFit carried = FlightTime.pseudoRandom(setup, sequence, counts, 60).orThrow();

        assertThat(open)
                .isEqualTo(
                        PseudoRandomSequence.ofRegister(7, new int[] {7, 6}, 1).open());
        assertThat(decoded).containsExactly(array(theirs.get("decoded_per_open_bin")), within(5.1e-7));
        assertThat(Math.sqrt(sequence.decodedVariance(counts, 60)))
                .isCloseTo(theirs.get("sigma_per_decoded_bin").doubleValue(), within(1e-12));
        JsonNode likelihood = theirs.get("poisson_ml_raw");
        near(cut.centre().value(), likelihood.get("v0"), 3e-3);
        near(cut.width().value(), likelihood.get("vw"), 3e-3);
        near(cut.background().value(), likelihood.get("b"), 1e-2);
        assertThat(cut.centre().standardUncertainty())
                .isCloseTo(likelihood.get("v0").get(1).doubleValue(), within(0.005));
        assertThat(cut.width().standardUncertainty())
                .isCloseTo(likelihood.get("vw").get(1).doubleValue(), within(0.005));
        // Theirs stops a ten-thousandth above the minimum and counts F inside one cycle.
        assertThat(cut.deviance()).isCloseTo(likelihood.get("deviance").doubleValue(), within(2e-4));
        near(cut.signal().value() * 0.99908, likelihood.get("F"), 5e-3);
        near(carried.centre().value(), likelihood.get("v0"), 0.1);
        assertThat(carried.centre().value()).isCloseTo(118.0, within(3 * 0.4425));
        assertThat(carried.width().value()).isCloseTo(38.0, within(3 * 0.3448));
        assertThat(carried.law().mode())
                .isCloseTo(theirs.get("fit_of_decoded").get("v_mode").doubleValue(), within(0.3));
    }

    private static void near(double ours, JsonNode theirs, double part) {
        assertThat(ours)
                .isCloseTo(
                        theirs.get(0).doubleValue(), within(part * theirs.get(1).doubleValue()));
    }
}
