package fringekeep.sample;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Masses against values from outside. */
class CompoundMassReferenceTest {
    private final CompoundMass computation = new CompoundMass();

    private JsonObject result(JsonObject choices) throws ProblemException {
        JsonObject complete = computation.complete(choices, Records.NO_INPUTS);
        Outcome outcome = computation.compute(complete, Records.NO_INPUTS, Work.QUIET);
        assertThat(outcome).isInstanceOf(Outcome.Computed.class);
        return ((Outcome.Computed) outcome).result();
    }

    private static JsonObject formula(String formula) {
        return JsonObject.EMPTY.with(
                "composition", JsonObject.EMPTY.with("sort", "formula").with("formula", formula));
    }

    private static double value(JsonObject result, String estimate) {
        return result.object(estimate).orElseThrow().number("value").orElseThrow();
    }

    private static double u(JsonObject result, String estimate) {
        return result.object(estimate).orElseThrow().number("u").orElseThrow();
    }

    /** Record format 1, section 17: choices and result of the golden compound. */
    @Test
    void givesTheGoldenResultByteForByte() throws Exception {
        JsonObject choices = Records.golden("compound-choices");

        assertThat(computation.complete(choices, Records.NO_INPUTS)).isEqualTo(choices);
        assertThat(CanonicalJson.write(result(choices)))
                .isEqualTo(CanonicalJson.write(Records.golden("compound-result")));
    }

    /** masses-check.json: tolerances as the file names them, 5e-5 for averages, 1e-7 for single isotopes. */
    @Test
    void agreesWithTwoLibrariesOfOthers() throws IOException, ProblemException {
        JsonNode file =
                new ObjectMapper().readTree(Files.readString(Path.of("src/test/reference/masses/masses-check.json")));
        List<String> seen = new ArrayList<>();
        for (Map.Entry<String, JsonNode> molecule : file.get("molecules").properties()) {
            FormulaMass mass = FormulaMass.of(Formula.parse(molecule.getKey())).orElseThrow();
            double npm = molecule.getValue()
                    .get("average_u_npm_chemical-elements_2.3.3")
                    .asDouble();
            double python = molecule.getValue()
                    .get("average_u_python3-periodictable_1.6.0")
                    .asDouble();
            double light = molecule.getValue().get("monoisotopic_u_npm").asDouble();
            assertThat(mass.mean().doubleValue())
                    .isCloseTo(npm, within(5e-5 * npm))
                    .isCloseTo(python, within(5e-5 * python));
            assertThat(mass.monoisotopic().orElseThrow()).isCloseTo(light, within(1e-7 * light));
            seen.add(molecule.getKey());
        }
        assertThat(seen).hasSizeGreaterThanOrEqualTo(11).contains("C60", "C284H190F320N4S12", "Cs");
    }

    /**
     * AME2020, M. Wang et al., Chinese Phys. C 45, 030003 (2021), doi:10.1088/1674-1137/abddaf, table I (values as carried
     * by several public programs); our table is the evaluation of 2012, whose uncertainties reach 8e-9 for uranium.
     */
    @ParameterizedTest
    @CsvSource({
        "[1H], 1.007825031898",
        "D, 2.014101777844",
        "T, 3.01604928132",
        "[12C], 12",
        "[13C], 13.00335483534",
        "[14N], 14.00307400425",
        "[15N], 15.00010889827",
        "[16O], 15.99491461926",
        "[18O], 17.99915961214",
        "[19F], 18.99840316207",
        "[31P], 30.97376199768",
        "[32S], 31.97207117354",
        "[39K], 38.96370648482",
        "[235U], 235.043928117"
    })
    void isotopeMassesAreThoseOfTheLaterEvaluation(String formula, double mass) throws ProblemException {
        FormulaMass ours = FormulaMass.of(Formula.parse(formula)).orElseThrow();

        assertThat(ours.mean().doubleValue()).isCloseTo(mass, within(1e-8 * mass));
    }

    /** CIAAW standard atomic weights: values and brackets as published, u = bracket/√3 (doi:10.1515/pac-2017-1002). */
    @ParameterizedTest
    @CsvSource({
        "He, 4.002602, 0.000002",
        "F, 18.998403162, 0.000000005",
        "Na, 22.98976928, 0.00000002",
        "Cs, 132.90545196, 0.00000006",
        "Au, 196.966570, 0.000004",
        "Pt, 195.084, 0.009"
    })
    void weightsCarryThePublishedUncertainty(String symbol, double weight, double bracket) throws ProblemException {
        FormulaMass ours = FormulaMass.of(Formula.parse(symbol)).orElseThrow();

        assertThat(ours.mean().doubleValue()).isEqualTo(weight);
        assertThat(ours.deviation()).isCloseTo(bracket / Math.sqrt(3), within(1e-12));
    }

    /** J. Meija et al., Pure Appl. Chem. 88, 265 (2016), table 3: conventional weights lie in or beside their interval. */
    @Test
    void weightsOfVaryingElementsCoverTheWholeInterval() {
        for (String[] one : new String[][] {
            {"H", "1.00784", "1.00811"}, {"C", "12.0096", "12.0116"}, {"N", "14.00643", "14.00728"},
            {"O", "15.99903", "15.99977"}, {"Cl", "35.446", "35.457"}, {"S", "32.059", "32.076"}
        }) {
            Element.Weight weight =
                    Elements.symbol(one[0]).flatMap(Element::weight).orElseThrow();
            double half = weight.deviation() * Math.sqrt(3);
            assertThat(weight.value().doubleValue() - half).isLessThanOrEqualTo(Double.parseDouble(one[1]) + 1e-12);
            assertThat(weight.value().doubleValue() + half).isGreaterThanOrEqualTo(Double.parseDouble(one[2]) - 1e-12);
        }
    }

    /** Sum of shares times isotope masses: another way to a weight, within what nature varies (masses-check.json). */
    @Test
    void weightsAgreeWithTheIsotopesTheyAreMadeOf() {
        int compared = 0;
        for (Element element : Elements.all()) {
            double sum = 0;
            double shares = 0;
            for (Element.Isotope isotope : element.isotopes().values()) {
                sum += isotope.share() * isotope.mass().doubleValue();
                shares += isotope.share();
            }
            if (element.weight().isPresent() && Math.abs(shares - 1) < 1e-3) {
                double weight = element.weight().get().value().doubleValue();
                assertThat(sum / shares).as(element.symbol()).isCloseTo(weight, within(2e-4 * weight));
                compared++;
            }
        }
        assertThat(compared).isEqualTo(84);
    }

    /** CODATA 2018: electron mass 9.1093837015e-31 kg = 5.48579909065e-4 u. */
    @Test
    void ionsLackTheElectronsTheyLost() throws ProblemException {
        JsonObject cation = result(formula("C60+"));
        JsonObject anion = result(formula("C6H5O--"));

        double unit = 1.66053906660e-27;
        assertThat(value(cation, "ionMass")).isCloseTo((720.66 - 5.48579909065e-4) * unit, within(1e-12 * 1.2e-24));
        assertThat(value(anion, "ionMass"))
                .isCloseTo((6 * 12.011 + 5 * 1.008 + 15.999 + 2 * 5.48579909065e-4) * unit, within(1e-37));
        assertThat(value(cation, "molarMass")).isEqualTo(0.72066);
    }

    /** JCGM 100:2008, 5.1.6: relative variance of a product of powers. */
    @Test
    void particlesWeighTheirVolumeTimesDensity() throws ProblemException {
        JsonObject result = result(Records.json("""
                {"charge":0,"composition":{"sort":"particle","material":"silica",
                "radius":{"si":5e-8,"text":"50","unit":"nm","uncertainty":{"sort":"stated","text":"1","si":1e-9}},
                "density":{"si":2000,"text":"2000","unit":"kg/m3","uncertainty":{"sort":"stated","text":"80","si":80}}}}"""));

        double mass = 4.0 / 3 * Math.PI * 1.25e-22 * 2000;
        assertThat(value(result, "molarMass")).isCloseTo(mass * 6.02214076e23, within(1e-8 * mass * 6.02214076e23));
        double relative = Math.sqrt(0.06 * 0.06 + 0.04 * 0.04);
        assertThat(u(result, "molarMass") / value(result, "molarMass")).isCloseTo(relative, within(0.05 * relative));
    }

    @Test
    void clustersKeepMeanAndSpreadOfTheirSizes() throws ProblemException {
        JsonObject result = result(Records.json("""
                {"charge":1,"composition":{"sort":"cluster","unit":"Na",
                "sizes":{"sort":"normal","mean":6000,"spread":300}}}"""));

        JsonObject distribution = result.object("distribution").orElseThrow();
        double sodium = 22.98976928 * 1.66053906660e-27;
        assertThat(distribution.number("mean").orElseThrow())
                .isCloseTo(6000 * sodium - 9.1093837015e-31, within(1e-5 * 6000 * sodium));
        assertThat(distribution.number("spread").orElseThrow()).isCloseTo(300 * sodium, within(1e-3 * 300 * sodium));
        assertThat(distribution.array("nodes").items()).hasSizeLessThanOrEqualTo(402);
    }

    /** E. L. Crow, K. Shimizu, Lognormal Distributions (1988), chapter 1: mean and variance fix the two parameters. */
    @Test
    void lognormalSizesKeepMeanAndSpreadToo() throws ProblemException {
        JsonObject result = result(Records.json("""
                {"charge":0,"composition":{"sort":"cluster","unit":"Na",
                "sizes":{"sort":"lognormal","mean":500,"spread":100}}}"""));

        JsonObject distribution = result.object("distribution").orElseThrow();
        double sodium = 22.98976928 * 1.66053906660e-27;
        assertThat(distribution.number("mean").orElseThrow()).isCloseTo(500 * sodium, within(1e-4 * 500 * sodium));
        assertThat(distribution.number("spread").orElseThrow()).isCloseTo(100 * sodium, within(2e-3 * 100 * sodium));
    }

    @Test
    void aWindowCutsAndSaysHowMuchPassed() throws ProblemException {
        JsonObject result = result(Records.json("""
                {"charge":0,"composition":{"sort":"cluster","unit":"C60",
                "sizes":{"sort":"list","shares":[{"size":1,"share":1},{"size":2,"share":2},{"size":3,"share":1}]},
                "window":{"from":{"si":2e-24,"text":"2e-24","unit":"kg","uncertainty":{"sort":"exact"}},
                "to":{"si":3e-24,"text":"3e-24","unit":"kg","uncertainty":{"sort":"exact"}}}}}"""));

        JsonObject distribution = result.object("distribution").orElseThrow();
        assertThat(distribution.array("nodes").items()).hasSize(1);
        assertThat(distribution.number("passed").orElseThrow()).isEqualTo(0.5);
        assertThat(value(result, "molarMass")).isCloseTo(2 * 0.72066, within(1e-9));
    }
}
