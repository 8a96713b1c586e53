package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The command against values by independent numerics: documents with the file's numbers and units go in, printed results are
 * compared within the file's tolerances. Source: src/test/reference/public-checks/ORIGIN.txt.
 */
class ComputeReferenceTest {
    private static final Path CHECKS = Path.of("src/test/reference/public-checks/checks.json");
    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final Map<String, String> UNITS = Map.ofEntries(
            Map.entry("angstrom^3", "Ao3"),
            Map.entry("m^2", "m2"),
            Map.entry("m/s^2", "m/s2"),
            Map.entry("V^2/m^3", "V2/m3"),
            Map.entry("T^2/m", "T2/m"),
            Map.entry("counts", "1"),
            Map.entry("1 = open", "1"),
            Map.entry("a.u. (hartree bohr^6)", "1"),
            Map.entry("meV nm^3", "meV.nm3"));

    @TempDir
    Path folder;

    /**
     * A kind of check.
     *
     * @param prefix start of the cases' ids
     * @param method the method
     * @param inputs pairs of our input and the file's, a path into groups with dots
     * @param more inputs the kind takes for granted
     * @param results pairs of our result and the file's
     */
    record Kind(String prefix, String method, String inputs, String more, String results) {
        @Override
        public String toString() {
            return prefix + " by " + method + " " + more;
        }
    }

    static Stream<Kind> kinds() {
        return Stream.of(
                        beams(),
                        fringes(),
                        talbotCoefficients(),
                        interferometers(),
                        properties(),
                        reductions(),
                        farField())
                .flatMap(kinds -> kinds);
    }

    private static Kind kind(String prefix, String method, String inputs, String more, String results) {
        return new Kind(prefix, method, inputs, more, results);
    }

    private static Stream<Kind> beams() {
        return Stream.of(
                kind(
                        "a.debroglie",
                        "de-broglie",
                        "mass=mass velocity=velocity period=grating_period",
                        "{}",
                        "wavelength=lambda_dB talbotLength=talbot_length talbotTime=talbot_time"),
                kind(
                        "a.effusive",
                        "thermal-velocities",
                        "mass=mass temperature=temperature",
                        "{}",
                        "gasMode=v_mp_gas gasMean=v_mean_gas beamMode=v_mp_flux beamMean=v_mean_flux"
                                + " beamRootMeanSquare=v_rms_flux"),
                kind(
                        "a.supersonic",
                        "supersonic-velocity",
                        "mass=mass temperature=T0 heatCapacityRatio=gamma",
                        "{}",
                        "terminalVelocity=v_inf"),
                kind("a.three_slit", "three-slit-velocity", "distances=z heights=y gravity=g", "{}", "velocity=v"),
                kind(
                        "a.shifted_flux",
                        "shifted-flux-velocities",
                        "centre=v0 width=vw flightLength=flight_length",
                        "{}",
                        "mode=v_mode mean=v_mean standardDeviation=v_std harmonicMean=v_harmonic"
                                + " arrivalPeakTime=t_peak_of_arrival_density lengthOverArrivalPeakTime=L_over_t_peak"),
                kind(
                        "a.prbs",
                        "pseudo-random-decoding",
                        "sequence=sequence counts=counts_per_bin",
                        "{\"background\":7}",
                        "signal=tof autocorrelationAtZero=autocorrelation_zero_lag_pm1"
                                + " autocorrelationElsewhere=autocorrelation_other_lags_pm1"
                                + " offsetOfBackground=uniform_offset_from_flat_background_7_per_bin"),
                kind(
                        "a.prbs",
                        "pseudo-random-decoding",
                        "counts=counts_per_bin",
                        "{\"stages\":4,\"taps\":[4,3],\"seed\":1}",
                        "signal=tof"),
                kind(
                        "g.oven",
                        "oven",
                        "a=A b=B temperature=T area=area mass=mass diameter=diameter",
                        "{}",
                        "vapourPressure=p_vap enthalpy=enthalpy effusionRate=effusion_rate"
                                + " freePathInVapour=mean_free_path_self_in_vapour"),
                kind(
                        "g.oven",
                        "mean-free-path",
                        "pressure=p_gas temperature=T_gas",
                        "{\"crossSection\":\"6.157521601035994e-18 m2\"}",
                        "freePathOfFastBeam=mean_free_path_fast_beam_sigma_piD2"));
    }

    private static Stream<Kind> fringes() {
        String scan = "positions=position counts=counts period=period backgroundRate=background_known";
        return Stream.of(
                kind(
                        "b.sigma_V",
                        "fringe-errors-expected",
                        "points=points_per_one_period meanSignal=mean_signal_per_point visibility=V"
                                + " background=background_per_point_known phase=phase",
                        "{}",
                        "visibilityByLikelihood=sigma_V_ML phaseByLikelihood=sigma_phi_ML"
                                + " visibilityByLeastSquares=sigma_V_LSQ phaseByLeastSquares=sigma_phi_LSQ"),
                kind(
                        "b.rice",
                        "visibility-noise",
                        "visibility=true_V quadratureNoise=sigma_quadrature",
                        "{}",
                        "meanOfFitted=mean_Vhat meanSquareOfFitted=mean_Vhat_squared"
                                + " secondMomentCorrected=second_moment_corrected"),
                kind(
                        "b.upper_limit",
                        "visibility-limits",
                        "visibility=V_hat quadratureNoise=sigma_quadrature level=confidence",
                        "{}",
                        "classicalUpperLimit=classical_upper_limit flatPriorUpperLimit=bayes_flat_prior_upper_limit"
                                + " noFringeThreshold=no_fringe_threshold"),
                kind(
                        "b.jitter",
                        "fringe-scan-reductions",
                        "jitter=sigma_phi period=period travel=travel_per_dwell",
                        "{}",
                        "jitterFactor=jitter_factor travelFactor=travel_factor"),
                kind(
                        "b.fringe_fit",
                        "fringe-fit",
                        scan,
                        "{}",
                        "mean=N_ML visibility=V_ML phase=phi_ML visibility.u=sigma_V_ML phase.u=sigma_phi_ML"
                                + " deviance=deviance_ML"),
                kind(
                        "b.fringe_fit",
                        "fringe-fit",
                        scan,
                        "{\"estimator\":\"unweighted\",\"covariance\":\"observed\"}",
                        "mean=N_LSQ visibility=V_LSQ phase=phi_LSQ visibility.u=sigma_V_LSQ_from_counts"),
                kind(
                        "b.fringe_fit",
                        "fringe-fit",
                        scan,
                        "{\"estimator\":\"weighted-by-counts\",\"covariance\":\"observed\"}",
                        "visibility=V_WLSQ phase=phi_WLSQ visibility.u=sigma_V_WLSQ chiSquare=chi2_WLSQ"),
                kind(
                        "b.fringe_fit",
                        "fringe-contrast",
                        "counts=counts background=background_known",
                        "{}",
                        "contrastOfExtremes=V_minmax_raw"),
                kind(
                        "b.harmonics",
                        "fringe-contrast",
                        "first=c1 second=c2 secondPhase=p",
                        "{}",
                        "contrastOfCurve=V_minmax"));
    }

    private static Stream<Kind> talbotCoefficients() {
        String light = "order=n separation=xi phase=phi0";
        String both = "quantum=B classical=B_classical";
        return Stream.of(
                kind("c.B_phase", "talbot-coefficient", light, "{\"sort\":\"light\"}", both),
                kind(
                        "c.B_absorb",
                        "talbot-coefficient",
                        light + " photons=n0_antinode",
                        "{\"sort\":\"light\"}",
                        "quantum=B_standing_mode_coherent"),
                kind(
                        "c.B_absorb",
                        "talbot-coefficient",
                        light + " photons=n0_antinode",
                        "{\"sort\":\"light\",\"recoil\":\"random-walk\"}",
                        "quantum=B_poisson_random_walk"),
                kind(
                        "c.B_degenerate",
                        "talbot-coefficient",
                        light + " photons=n0_antinode",
                        "{\"sort\":\"light\",\"recoil\":\"random-walk\"}",
                        "quantum=B_poisson_random_walk"),
                kind(
                        "c.B_deplete",
                        "talbot-coefficient",
                        light + " photons=n0_antinode",
                        "{\"sort\":\"depletion\"}",
                        both));
    }

    private static Stream<Kind> interferometers() {
        String both = "quantumVisibility=V_quantum classicalVisibility=V_classical";
        String slitLightSlit = "first.openFraction=f third.openFraction=f second.phase=phi0 firstTalbotTimes=L_over_LT";
        String pulses = "first.photons=n1 second.photons=n2 third.photons=n3 second.phase=phi2";
        String depleting =
                "{\"first\":{\"sort\":\"depletion\"},\"second\":{\"sort\":\"depletion\"},\"third\":{\"sort\":\"depletion\"}}";
        String beam = "openFraction=f separation=L period=d mass=mass polarizabilityVolume=alpha_vol powers=P waist=w_y"
                + " velocity=v_mean";
        return Stream.of(
                kind(
                        "c.TLI_slits",
                        "three-grating-fringe",
                        "first.openFraction=f1 second.openFraction=f2 third.openFraction=f3 firstTalbotTimes=L_over_LT",
                        "{}",
                        both),
                kind("c.KDTL.", "three-grating-fringe", slitLightSlit, "{\"second\":{\"sort\":\"light\"}}", both),
                kind(
                        "c.KDTL_absorbing",
                        "three-grating-fringe",
                        slitLightSlit + " second.photons=n0_antinode",
                        "{\"second\":{\"sort\":\"light\",\"recoil\":\"standing-mode-coherent\"}}",
                        "quantumVisibility=V_standing_mode_coherent"),
                kind(
                        "c.KDTL_absorbing",
                        "three-grating-fringe",
                        slitLightSlit + " second.photons=n0_antinode",
                        "{\"second\":{\"sort\":\"light\",\"recoil\":\"random-walk\"}}",
                        "quantumVisibility=V_poisson_random_walk"),
                kind("c.three_pulse.", "three-grating-fringe", pulses + " firstTalbotTimes=T_over_TT", depleting, both),
                kind(
                        "c.three_pulse_unequal",
                        "three-grating-fringe",
                        pulses + " first.phase=phi1 third.phase=phi3 firstTalbotTimes=T1_over_TT"
                                + " secondTalbotTimes=T2_over_TT momentumSpread=sigma_p_over_h_per_d",
                        depleting,
                        "quantumVisibility=V quantumMeanTransmission=mean_transmission"),
                kind(
                        "c.TLI_vdW",
                        "three-grating-fringe",
                        "first.slitWidth=slit_w third.slitWidth=slit_w second.slitWidth=slit_w second.c3=C3"
                                + " second.thickness=thickness_b second.cutoff=cutoff_xc period=period velocity=velocity"
                                + " firstTalbotTimes=L_over_LT",
                        "{}",
                        "quantumVisibility=V_quantum"),
                kind("d.average", "visibility-against-power", beam, "{}", "quantumVisibilities=V_monochromatic"),
                kind(
                        "d.average",
                        "visibility-against-power",
                        beam + " velocitySpread=v_sigma",
                        "{}",
                        "quantumVisibilities=V_gaussian_velocity"),
                kind(
                        "d.average",
                        "visibility-against-power",
                        beam + " beamHeight=beam_height",
                        "{}",
                        "quantumVisibilities=V_height_averaged_monochromatic"));
    }

    private static Stream<Kind> properties() {
        String field = "mass=mass velocity=v separation=L fieldStart=z_a fieldLength=length period=d temperature=T";
        return Stream.of(
                kind(
                        "e.phi0",
                        "standing-light-strength",
                        "polarizabilityVolume=alpha_vol power=P waist=w_y velocity=v wavelength=laser_wavelength"
                                + " crossSection=sigma_abs",
                        "{}",
                        "phase=phi0 photons=n0_antinode"),
                kind(
                        "e.phi0",
                        "polarizability-units",
                        "volume=alpha_vol",
                        "{}",
                        "polarizability=alpha_SI atomicUnits=alpha_au"),
                kind(
                        "e.alpha_from_V",
                        "polarizability-from-visibility",
                        "openFraction=f visibilities=V powers=P waist=w_y velocity=v mass=mass separation=L period=d",
                        "{\"visibilities\":{\"u\":0.006},\"searchFrom\":\"1 Ao3\",\"searchTo\":\"270 Ao3\"}",
                        "polarizabilityVolume=alpha_vol polarizabilityVolume.u=sigma_alpha"),
                kind(
                        "e.recoil",
                        "recoil-effect",
                        "crossSection=sigma_abs wavelength=laser_wavelength power=P waist=w_y velocity=v mass=mass"
                                + " distance=D period=d",
                        "{}",
                        "photons=nbar phasePerPhoton=phase_per_photon visibilityRatio=V_over_V0"
                                + " fringeShift=fringe_shift_phase"),
                kind(
                        "e.stark",
                        "electric-deflection",
                        field + " polarizabilityVolume=alpha_vol dipoleMoment=dipole_rms fieldTerm=E_gradE",
                        "{}",
                        "susceptibility=chi fringeShift=fringe_shift fringePhase=fringe_phase"),
                kind(
                        "e.magnetic",
                        "magnetic-deflection",
                        field + " landeFactor=g_J angularMomentum=J fieldTerm=B_gradB",
                        "{\"gradient\":\"1 T/m\"}",
                        "susceptibility=chi_m fringeShift=fringe_shift_paramagnetic"
                                + " visibilityOfUnresolvedMoments=V_factor_mJ"),
                kind(
                        "e.collision",
                        "collision-cross-section",
                        "temperature=T_gas decayPressure=p0 c6AtomicUnits=C6 gasMass=gas_mass velocity=v",
                        "{\"pathLength\":\"0.44 m\"}",
                        "crossSection=sigma_eff_from_p0 predictedCrossSection=sigma_eff_C6"
                                + " predictedDecayPressure=p0_C6"),
                kind(
                        "e.macroscopicity",
                        "macroscopicity",
                        "mass=mass time=time confirmed=f",
                        "{}",
                        "macroscopicity=mu"));
    }

    private static Stream<Kind> reductions() {
        return Stream.of(
                kind(
                        "e.dephasing.P07",
                        "dephasing",
                        "phase=phi_ref velocity=v0 velocitySpread=sigma_v power=p",
                        "{}",
                        "factor=V_factor meanPhase=mean_phase"),
                kind(
                        "e.inertial",
                        "inertial-phases",
                        "separation=L velocity=v period=d rotation=Omega_perp acceleration=g",
                        "{}",
                        "accelerationPhase=phase_gravity rotationPhase=phase_coriolis_magnitude"),
                kind(
                        "e.vibration",
                        "vibration-reduction",
                        "amplitudes=A frequency=frequency separation=L velocity=v period=d",
                        "{}",
                        "commonMode=common_mode independent=independent_product secondGratingOnly=second_grating_only"),
                kind(
                        "e.alignment",
                        "alignment-reduction",
                        "roll=roll beamHeight=beam_height beamWidth=beam_width period=d",
                        "{\"periods\":[\"266.05 nm\",\"266 nm\",\"266 nm\"]}",
                        "rollOfOuterGrating=roll_outer rollOfCentreGrating=roll_centre periodMismatch=period_outer"));
    }

    private static Stream<Kind> farField() {
        return Stream.of(
                kind(
                        "f.vdw_orders.P01",
                        "wall-orders",
                        "c3=C_n thickness=thickness_b slitWidth=slit_w period=period velocity=v cutoff=cutoff_xc",
                        "{\"highestOrder\":3}",
                        "orderIntensities=P0_to_P3"),
                kind(
                        "f.vdw_orders.P02",
                        "wall-orders",
                        "c4=C_n thickness=thickness_b slitWidth=slit_w period=period velocity=v cutoff=cutoff_xc",
                        "{\"highestOrder\":3}",
                        "orderIntensities=P0_to_P3"),
                kind(
                        "f.farfield.",
                        "diffraction-angles",
                        "mass=mass velocity=v period=d distance=distance",
                        "{\"orders\":[1]}",
                        "wavelength=lambda orderPositions=first_order_position"),
                kind(
                        "f.bragg",
                        "diffraction-angles",
                        "mass=mass velocity=v period=d thickness=thickness",
                        "{}",
                        "braggAngle=theta_B orderSeparation=order_separation kleinCook=Q"));
    }

    @ParameterizedTest
    @MethodSource("kinds")
    void printsWhatIndependentNumericsGive(Kind kind) throws IOException {
        int cases = 0;
        for (JsonNode node : MAPPER.readTree(CHECKS.toFile()).get("cases")) {
            if (node.get("id").textValue().startsWith(kind.prefix)) {
                check(kind, node);
                cases++;
            }
        }
        assertThat(cases).isPositive();
    }

    private void check(Kind kind, JsonNode node) throws IOException {
        JsonNode results = computed(kind.method, document(kind, node)).get("results");
        for (String pair : kind.results.split(" ")) {
            String[] names = pair.split("=");
            boolean uncertainty = names[0].endsWith(".u");
            JsonNode ours = results.get(names[0].replace(".u", "")).get(uncertainty ? "u" : "value");
            JsonNode theirs = node.get("expected").get(names[1]);
            double unit = theirs.get("unit").textValue().equals("angstrom^3") ? 1e-30 : 1;
            double[] expected = numbers(theirs.get("value"));
            double[] found = numbers(ours);
            assertThat(found).hasSameSizeAs(expected);
            for (int k = 0; k < expected.length; k++) {
                double allowed = node.get("tolerance").get("absolute").doubleValue()
                        + node.get("tolerance").get("relative").doubleValue() * Math.abs(expected[k]);
                assertThat(found[k] / unit)
                        .as(node.get("id").textValue() + " " + names[1])
                        .isCloseTo(expected[k], within(allowed));
            }
        }
    }

    private static double[] numbers(JsonNode value) {
        return value.isArray()
                ? StreamSupport.stream(value.spliterator(), false)
                        .mapToDouble(JsonNode::doubleValue)
                        .toArray()
                : new double[] {value.doubleValue()};
    }

    private static ObjectNode document(Kind kind, JsonNode node) throws IOException {
        ObjectNode document = (ObjectNode) MAPPER.readTree(kind.more);
        for (String pair : kind.inputs.split(" ")) {
            String[] names = pair.split("=");
            String[] path = names[0].split("\\.");
            ObjectNode into = path.length == 1 ? document : document.withObject("/" + path[0]);
            JsonNode given = node.get("inputs").get(names[1]);
            ObjectNode value = into.withObject("/" + path[path.length - 1]);
            value.put("unit", unit(given, node));
            value.set("value", given.get("value"));
        }
        return document;
    }

    /** The file's unit as a UCUM code; debye are turned into C·m by the value of the handbooks, 3.33564e-30 C·m. */
    private static String unit(JsonNode given, JsonNode node) {
        String unit = given.get("unit").textValue();
        if (unit.equals("debye")) {
            ObjectNode converted = (ObjectNode) given;
            converted.put("value", given.get("value").doubleValue() * 3.33564095e-30);
            converted.put("unit", "C.m");
            return "C.m";
        }
        if (unit.equals("meV nm^n")) {
            return "meV.nm" + node.get("inputs").get("n").get("value").intValue();
        }
        return UNITS.getOrDefault(unit, unit);
    }

    private JsonNode computed(String method, ObjectNode document) throws IOException {
        Path file = folder.resolve("inputs.json");
        Files.write(file, MAPPER.writeValueAsBytes(document));
        ByteArrayOutputStream data = new ByteArrayOutputStream();
        ByteArrayOutputStream words = new ByteArrayOutputStream();
        int code = Main.run(console(data, words), "compute", method, file.toString(), "--json");
        assertThat(words.toString(StandardCharsets.UTF_8))
                .as(document.toString())
                .isEmpty();
        assertThat(code).isEqualTo(Exit.DONE);
        return MAPPER.readTree(data.toByteArray());
    }

    static Console console(ByteArrayOutputStream data, ByteArrayOutputStream words) {
        return new Console(
                new PrintStream(data, true, StandardCharsets.UTF_8),
                new PrintStream(words, true, StandardCharsets.UTF_8));
    }

    @Test
    void bothKernelsOfTheLimitOfEqualStrengths() throws IOException {
        printsWhatIndependentNumericsGive(kind(
                "c.B_degenerate",
                "talbot-coefficient",
                "order=n separation=xi phase=phi0 photons=n0_antinode",
                "{\"sort\":\"light\"}",
                "quantum=B_standing_mode_coherent"));
    }
}
