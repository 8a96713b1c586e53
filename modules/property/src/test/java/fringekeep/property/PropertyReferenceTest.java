package fringekeep.property;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import fringekeep.archive.facet.Estimates;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The whole way from scans to a property against fits of the same data by other programs (src/test/reference/power-curves).
 * Tolerances: the programs stop at about 1e-6 of the values and averaged speeds over other nodes, which moves estimates by less
 * than a hundredth of their standard uncertainty.
 */
class PropertyReferenceTest {
    private static final double CUBIC_ANGSTROM = 1e-30;
    private static final double OF_A_SIGMA = 0.01;
    private static final String PLAIN = "{'bias':'none','heightNodes':1,'factor':{'sort':'free'}";

    private static PropertyLab lab;

    @BeforeAll
    static void found(@TempDir Path folder) throws ProblemException {
        lab = PropertyLab.found(folder.resolve("archive"));
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    /** All points of a file, with the same standard uncertainty of each power; none where the text is empty. */
    private static Hash measured(String file, String deviation) throws Exception {
        PropertyLab.Series series = lab.series(file);
        PropertyLab.Series stating = deviation.isEmpty() ? series : lab.stating(series, deviation);
        List<Hash> fits = new ArrayList<>();
        for (PropertyLab.Point point : series.points()) {
            fits.add(lab.fit(stating, point, point.power() + " W"));
        }
        return lab.listed(fits);
    }

    private static double[] volume(JsonObject result) {
        JsonObject stated = result.object("polarizabilityVolume").orElseThrow();
        return new double[] {
            stated.number("value").orElseThrow() / CUBIC_ANGSTROM,
            stated.number("statistical").orElseThrow() / CUBIC_ANGSTROM,
            stated.number("shared").orElseThrow() / CUBIC_ANGSTROM
        };
    }

    @ParameterizedTest
    @ValueSource(strings = {"vp_01", "vp_02"})
    void polarizabilityAndFactorAreThoseOfOtherPrograms(String file) throws Exception {
        JsonNode expected = file.equals("vp_02")
                ? PropertyLab.reference("normal.json")
                : PropertyLab.expected().get("fits").get(file).get("alpha_scale_free_nr_fixed");
        Hash property = lab.property(measured(file, ""), PLAIN + "}");
        JsonObject result = lab.result(property);

        double sigma = expected.get("sigma_alpha_A3").asDouble();
        assertThat(volume(result)[0]).isCloseTo(expected.get("alpha_A3").asDouble(), within(OF_A_SIGMA * sigma));
        assertThat(volume(result)[1]).isCloseTo(sigma, within(0.01 * sigma));
        assertThat(volume(result)[2]).as("everything the points share is exact").isZero();
        JsonObject factor = result.object("visibilityFactor").orElseThrow();
        double sigmaFactor = expected.get("sigma_scale").asDouble();
        assertThat(factor.number("value").orElseThrow())
                .isCloseTo(expected.get("scale").asDouble(), within(OF_A_SIGMA * sigmaFactor));
        JsonObject quantum = result.object("quantum").orElseThrow();
        assertThat(quantum.number("chiSquare").orElseThrow())
                .isCloseTo(expected.get("chi2").asDouble(), within(0.03));
        assertThat(quantum.integer("degreesOfFreedom"))
                .hasValue(expected.get("dof").asLong());

        Estimates offered = lab.archive
                .kinds()
                .get(new fringekeep.archive.record.KindName("property"))
                .orElseThrow()
                .facet(Estimates.class, lab.archive.record(property).orElseThrow(), lab.archive.inputs(property))
                .orElseThrow();
        int alpha = offered.position("polarizabilityVolume").orElseThrow();
        int scale = offered.position("visibilityFactor").orElseThrow();
        double correlation = offered.covariance(alpha, scale)
                / Math.sqrt(offered.covariance(alpha, alpha) * offered.covariance(scale, scale));
        assertThat(correlation).isCloseTo(expected.get("correlation").asDouble(), within(5e-3));
    }

    @Test
    void absorptionCrossSectionIsThatOfOtherPrograms() throws Exception {
        JsonNode expected = PropertyLab.reference("absorbing.json");
        JsonObject result = lab.result(lab.property(
                measured("vp_03", ""),
                "{'bias':'none','heightNodes':1,'factor':{'sort':'given','value':1},'crossSection':{'sort':'free'}}"));

        double sigma = expected.get("sigma_alpha_A3").asDouble();
        assertThat(volume(result)[0]).isCloseTo(expected.get("alpha_A3").asDouble(), within(0.02 * sigma));
        JsonObject section = result.object("absorptionCrossSection").orElseThrow();
        assertThat(section.number("value").orElseThrow()
                        / expected.get("sigma_abs_m2").asDouble())
                .isCloseTo(
                        1,
                        within(0.01
                                        * expected.get("sigma_nr").asDouble()
                                        / expected.get("nr").asDouble()
                                + 0.002));
    }

    /** Atomic units and C m2/V against the pair of one volume (CODATA 2018: 1 a.u. = 1.64877727436e-41 C2 m2/J). */
    @Test
    void unitsOfPolarizabilityBelongTogether() throws Exception {
        JsonObject result = lab.result(lab.property(measured("vp_01", ""), PLAIN + "}"));

        double si =
                result.object("polarizability").orElseThrow().number("value").orElseThrow();
        double atomic = result.object("polarizabilityAtomic")
                .orElseThrow()
                .number("value")
                .orElseThrow();
        assertThat(si / atomic).isCloseTo(1.64877727436e-41, within(1e-50));
        assertThat(si / (volume(result)[0] * CUBIC_ANGSTROM)).isCloseTo(4 * Math.PI * 8.8541878128e-12, within(1e-19));
        assertThat(result.text("verdict")).hasValue("cannot-tell");
    }

    /**
     * Powers with an uncertainty of their own, against orthogonal distance regression by another program. The two are equal to
     * first order in the uncertainties: a tenth of a standard uncertainty is allowed where the powers are uncertain.
     */
    @ParameterizedTest
    @CsvSource({"0, '', 0.01", "1, 0.05, 0.1", "2, 0.1, 0.1"})
    void uncertainPowersWidenAsOrthogonalRegressionDoes(int at, String stated, double ofSigma) throws Exception {
        JsonNode expected = PropertyLab.reference("odr.json").get("cases").get(at);
        JsonObject result = lab.result(lab.property(measured("vp_01", stated), PLAIN + "}"));

        double sigma = expected.get("sigma_alpha_A3").asDouble();
        assertThat(volume(result)[0]).isCloseTo(expected.get("alpha_A3").asDouble(), within(ofSigma * sigma));
        assertThat(volume(result)[1]).isCloseTo(sigma, within(ofSigma * sigma));
        assertThat(volume(result)[2]).isZero();
        assertThat(result.array("notStated").texts().contains("power as read (10 of 10 fits)"))
                .isEqualTo(stated.isEmpty());
    }

    /**
     * Readings that err together by 2 % of a power each: with the phase proportional to polarizability times power, a common
     * relative error of the power is that of the polarizability (JCGM 100:2008, 5.1.6).
     */
    @Test
    void readingsThatErrTogetherAreShared() throws Exception {
        PropertyLab.Series series = lab.series("vp_01");
        List<Hash> fits = new ArrayList<>();
        for (PropertyLab.Point point : series.points()) {
            String deviation = String.format(Locale.ROOT, "%.3f", 0.02 * point.power());
            PropertyLab.Series stating = point.power() > 0 ? lab.stating(series, deviation) : series;
            fits.add(lab.fit(stating, point, point.power() + " W"));
        }
        Hash selection = lab.listed(fits);
        JsonObject together = lab.result(lab.property(selection, PLAIN + ",'powers':'together'}"));
        JsonObject asRead = lab.result(lab.property(selection, PLAIN + ",'powers':'as-read'}"));

        assertThat(volume(together)[0]).isEqualTo(volume(asRead)[0]);
        assertThat(volume(together)[1]).isEqualTo(volume(asRead)[1]);
        assertThat(volume(together)[2] / volume(together)[0]).isCloseTo(0.02, within(1e-3));
        assertThat(volume(asRead)[2]).isZero();
        assertThat(together.array("sensitivities").objects())
                .extracting(each -> each.text("parameter").orElse(""))
                .contains("powerReadings");
    }

    @Test
    void silentReadingsAreNamed() throws Exception {
        JsonObject result = lab.result(lab.property(measured("vp_01", ""), PLAIN + "}"));

        assertThat(result.array("notStated").texts()).contains("power as read (10 of 10 fits)");
    }

    /** Dividing all visibilities by one number leaves the polarizability and divides the free factor. */
    @Test
    void visibilitiesRelativeToReferencesScaleTheFactorAlone() throws Exception {
        PropertyLab.Series series = lab.series("vp_02");
        List<Hash> fits = new ArrayList<>();
        for (PropertyLab.Point point : series.points()) {
            fits.add(lab.fit(series, point, point.power() + " W", new PropertyLab.OptionalReference(0.25)));
        }
        Hash selection = lab.listed(fits);
        JsonObject plain = lab.result(lab.property(selection, PLAIN + "}"));
        JsonObject relative = lab.result(lab.property(selection, PLAIN + ",'visibility':'relative'}"));

        assertThat(volume(relative)[0]).isCloseTo(volume(plain)[0], within(1e-6));
        assertThat(volume(relative)[1]).isCloseTo(volume(plain)[1], within(1e-6));
        assertThat(relative.object("visibilityFactor")
                        .orElseThrow()
                        .number("value")
                        .orElseThrow())
                .isCloseTo(
                        plain.object("visibilityFactor")
                                        .orElseThrow()
                                        .number("value")
                                        .orElseThrow()
                                / 0.25,
                        within(1e-6));
    }

    @Test
    void relativeVisibilitiesNeedReferencesAndAFreeFactor() throws Exception {
        Hash selection = measured("vp_01", "");
        ProblemException none = catchThrowableOfType(
                ProblemException.class, () -> lab.property(selection, PLAIN + ",'visibility':'relative'}"));
        assertThat(none.problems()).extracting(Problem::code).containsOnly("property.no-reference");
        assertThat(none.problems().get(0).mend()).isNotBlank();
    }

    @Test
    void theVerbPinsVelocityCompoundAndCalibration() throws Exception {
        Instant begin = lab.aWeekLater();
        Hash selection = measured("vp_01", "");
        Hash scale = lab.enter(
                "scale",
                "{'kind':'calibration','content':{'what':'power-scale','model':'calibration.scale/1',"
                        + "'parameters':[{'name':'scale','value':0.5,'unit':'1'}],'covariance':[0.0001],"
                        + "'valid':{'from':'" + begin + "','to':'" + lab.aWeekLater() + "'}}}");
        Hash property = lab.property(selection, PLAIN + "}");
        List<String> roles = new ArrayList<>();
        lab.archive.inputs(property).all().forEach(input -> roles.add(input.role()));
        JsonNode expected = PropertyLab.expected().get("fits").get("vp_01").get("alpha_scale_free_nr_fixed");

        assertThat(roles).containsExactly("selection", "velocity", "compound", "calibration");
        assertThat(lab.archive.inputs(property).role("calibration").get(0).target())
                .isEqualTo(scale);
        double[] volume = volume(lab.result(property));
        assertThat(volume[0])
                .as("half the power is twice the polarizability")
                .isCloseTo(
                        2 * expected.get("alpha_A3").asDouble(),
                        within(0.02 * expected.get("sigma_alpha_A3").asDouble()));
        assertThat(volume[2] / volume[0]).as("2 % of the scale").isCloseTo(0.02, within(1e-3));
    }

    @Test
    void fitsOfTwoCompoundsMakeNoProperty() throws Exception {
        PropertyLab.Series first = lab.series("vp_01");
        Hash one = lab.fit(first, first.points().get(3), "1.2 W");
        PropertyLab.Series second = lab.series("vp_02");
        Hash other = lab.fit(second, second.points().get(3), "1.3 W");
        Hash selection = lab.listed(List.of(one, other));

        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> lab.property(selection, PLAIN + "}"));

        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("property.compounds");
    }

    @Test
    void aWithdrawnSelectionMakesNoProperty() throws Exception {
        Hash selection = measured("vp_01", "");
        lab.judge("withdrawn", "entered-in-error", Map.of("target", selection));

        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> lab.property(selection, PLAIN + "}"));

        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("property.withdrawn");
    }
}
