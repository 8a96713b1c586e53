package fringekeep.instrument;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.PartName;
import fringekeep.sample.Caution;
import java.io.IOException;
import java.util.List;
import java.util.ResourceBundle;
import java.util.ServiceLoader;
import org.junit.jupiter.api.Test;

class SetupKindTest {
    static final String BENCH = """
            {"label":"short bench","gratings":[
            {"sort":"material","name":"first","period":%1$s,"openFraction":%2$s,"wallPotential":{"sort":"none"}},
            {"sort":"standing-wave","name":"light","laser":{"wavelength":%3$s,"power":%4$s,"waistAcross":%5$s}},
            {"sort":"material","name":"third","period":%1$s,"openFraction":%2$s}],
            "separations":[%6$s,%6$s],"beam":{"height":%5$s},
            "detector":{"sort":"counter","responds":"density","deadTime":%7$s,"deadTimeSort":"fixed"},
            "fieldPlates":{"position":%6$s,"length":%6$s,"fieldFactor":%8$s},
            "slits":[{"name":"entry","position":%9$s,"opening":%5$s}],
            "recoilLaser":{"wavelength":%3$s,"position":%6$s,"directions":"two"},
            "vacuum":{"pressure":%10$s,"gas":"residual gas"},
            "cautions":["class-4-laser","oven"],"words":[{"name":"table","text":"granite"}]}""".formatted(
                    quantity("2.66e-7", "m", "1e-10"),
                    quantity("0.42", "1", "0.005"),
                    quantity("5.32e-7", "m", "1e-10"),
                    quantity("4", "W", ""),
                    quantity("0.0009", "m", "0.000009"),
                    quantity("0.1", "m", "0.0001"),
                    quantity("0.00006", "s", "0.000002"),
                    quantity("100", "m-3", "1"),
                    quantity("-0.5", "m", ""),
                    quantity("0.000002", "Pa", ""));
    private final SetupKind kind = new SetupKind();

    static String quantity(String si, String unit, String u) {
        return "{\"si\":" + si + ",\"text\":\"" + si + "\",\"unit\":\"" + unit + "\",\"uncertainty\":"
                + (u.isEmpty()
                        ? "{\"sort\":\"unstated\"}"
                        : "{\"sort\":\"stated\",\"si\":" + u + ",\"text\":\"" + u + "\"}")
                + "}";
    }

    private static RecordView setup(JsonObject content) {
        return Records.record("setup", Records.parts(PartName.CONTENT, content));
    }

    private List<Problem> examine(JsonObject content) {
        return kind.examine(Records.parts(PartName.CONTENT, content), Records.NO_INPUTS);
    }

    @Test
    void isAnnounced() {
        assertThat(ServiceLoader.load(RecordKind.class).stream().map(ServiceLoader.Provider::type))
                .map(Class::getSimpleName)
                .contains("SetupKind", "CalibrationKind", "MonitorLogKind");
    }

    @Test
    void acceptsTheGoldenRecordsAndAFullBench() throws IOException {
        PublishedSchema schema = new PublishedSchema(SetupKind.class, "setup-1.schema.json");
        for (JsonObject content : List.of(
                Records.golden("setup-content"), Records.golden("setup-corrected-content"), Records.json(BENCH))) {
            assertThat(schema.faults(JsonObject.EMPTY.with("content", content))).isEmpty();
            assertThat(examine(content)).isEmpty();
        }
        assertThat(schema.faults(
                        JsonObject.EMPTY.with("content", Records.json(BENCH).with("colour", "red"))))
                .isNotEmpty();
    }

    @Test
    void offersTheGoldenSetupWithItsUncertainties() throws IOException {
        SetupFacet setup = kind.facet(SetupFacet.class, setup(Records.golden("setup-content")), Records.NO_INPUTS)
                .orElseThrow();

        assertThat(setup.label()).isEqualTo("short bench");
        assertThat(setup.grating(2).orElseThrow().period().orElseThrow().si()).isEqualTo(2.66e-7);
        assertThat(setup.grating(0).orElseThrow().period().orElseThrow().deviation())
                .hasValue(1e-10);
        assertThat(setup.separation(1).orElseThrow().si()).isEqualTo(0.1002);
        assertThat(setup.separation(0).orElseThrow().deviation()).isEmpty();
        assertThat(setup.fringePeriod()).hasValue(2.66e-7);
    }

    @Test
    void aStandingWaveHasHalfTheWavelengthAsPeriod() {
        SetupFacet setup = kind.facet(SetupFacet.class, setup(Records.json(BENCH)), Records.NO_INPUTS)
                .orElseThrow();

        Grating light = setup.grating(1).orElseThrow();
        assertThat(light.period().orElseThrow().si()).isEqualTo(2.66e-7);
        assertThat(light.period().orElseThrow().deviation()).hasValue(5e-11);
        assertThat(light.laser().orElseThrow().power().orElseThrow().si()).isEqualTo(4);
        assertThat(setup.detector().orElseThrow().density()).isTrue();
        assertThat(setup.detector().orElseThrow().deadTimeSort()).isEqualTo(SetupFacet.DeadTimeSort.FIXED);
        assertThat(setup.recoilLaser().orElseThrow().twoDirections()).isTrue();
        assertThat(setup.fieldPlates().orElseThrow().fieldFactor().orElseThrow().si())
                .isEqualTo(100);
        assertThat(setup.slits()).hasSize(1);
    }

    @Test
    void listsPeriodAndSeparationInSi() {
        Row row = kind.rows(kind.projections().get(0), setup(Records.json(BENCH)), Records.NO_INPUTS)
                .findFirst()
                .orElseThrow();

        assertThat(row.values())
                .containsEntry("gratings", "material · standing light wave · material")
                .containsEntry("period_m", 2.66e-7)
                .containsEntry("period_u_m", 1e-10)
                .containsEntry("separation_m", 0.1)
                .containsEntry("wavelength_m", 5.32e-7)
                .containsEntry("dead_time_s", 6e-5);
    }

    @Test
    void cautionsFollowFromWhatIsStatedAndDeferToLocalRules() {
        assertThat(SetupCautions.of(Records.json(BENCH)))
                .containsExactly(Caution.CLASS_4_LASER, Caution.OVEN, Caution.HIGH_VOLTAGE, Caution.VACUUM);
        FlatTable table = kind.tables(setup(Records.json(BENCH)), Records.NO_INPUTS).stream()
                .filter(one -> one.name().equals("cautions"))
                .findFirst()
                .orElseThrow();
        assertThat(table.rows())
                .allSatisfy(
                        row -> assertThat(row.get(1).orElseThrow().toString()).contains("Local rules"));
    }

    @Test
    void placesGratingsBySeparationsOrPositions() {
        assertThat(SetupPicture.places(SetupReader.read(Records.json(BENCH)))).containsExactly(0.0, 0.1, 0.2);
        assertThat(kind.drawings(setup(Records.json(BENCH)), Records.NO_INPUTS)).hasSize(1);
    }

    @Test
    void reportsAllProblemsAtOnceEachWithItsPlace() {
        String bad = BENCH.replace(
                        "\"openFraction\":" + quantity("0.42", "1", "0.005"),
                        "\"openFraction\":" + quantity("42", "1", ""))
                .replace("\"label\":\"short bench\"", "\"label\":\"\"")
                .replace("\"oven\"", "\"dragons\"")
                .replace("\"deadTime\":" + quantity("0.00006", "s", "0.000002") + ",", "")
                .replace("\"separations\":[", "\"separations\":[" + quantity("-0.1", "m", "") + ",");
        assertThat(examine(Records.json(bad)))
                .extracting(Problem::where)
                .containsExactlyInAnyOrder(
                        "/content/label",
                        "/content/gratings/0/openFraction",
                        "/content/gratings/2/openFraction",
                        "/content/separations",
                        "/content/separations/0",
                        "/content/detector/deadTime",
                        "/content/cautions/1");
    }

    @Test
    void refusesALaserAtAMaterialGratingAndSlitsInLight() {
        String mixed = BENCH.replace("\"sort\":\"standing-wave\"", "\"sort\":\"material\"");
        assertThat(examine(Records.json(mixed)))
                .extracting(Problem::where)
                .containsExactlyInAnyOrder("/content/gratings/1/laser", "/content/gratings/1/period");
        String light =
                BENCH.replace("\"sort\":\"material\",\"name\":\"first\"", "\"sort\":\"depletion\",\"name\":\"first\"");
        assertThat(examine(Records.json(light)))
                .extracting(Problem::where)
                .containsExactlyInAnyOrder(
                        "/content/gratings/0/openFraction",
                        "/content/gratings/0/wallPotential",
                        "/content/gratings/0/laser");
    }

    @Test
    void schemaAndRulesKnowTheSameHazards() {
        List<String> listed = kind.jsonSchema(1)
                .object("properties")
                .orElseThrow()
                .object("content")
                .orElseThrow()
                .object("properties")
                .orElseThrow()
                .object("cautions")
                .orElseThrow()
                .object("items")
                .orElseThrow()
                .array("enum")
                .texts();
        assertThat(listed)
                .containsExactlyInAnyOrderElementsOf(
                        CautionRules.WORK.stream().map(Caution::code).toList());
    }

    @Test
    void everyProblemHasBothTexts() {
        ResourceBundle words = ResourceBundle.getBundle("fringekeep.instrument.Problems", java.util.Locale.ROOT);
        assertThat(words.keySet()).allSatisfy(key -> {
            String code = key.substring(0, key.lastIndexOf('.'));
            assertThat(words.getString(code + ".what")).isNotBlank();
            assertThat(words.getString(code + ".mend")).contains("Nothing was stored.");
        });
    }
}
