package fringekeep.sample;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.PartName;
import java.io.IOException;
import java.util.List;
import java.util.ServiceLoader;
import org.junit.jupiter.api.Test;

class CompoundKindTest {
    private static final String CLUSTER = """
            {"charge":0,"constants":"CODATA 2018","method":"compound.mass/1","composition":{"sort":"cluster","unit":"C60",
            "sizes":{"sort":"list","shares":[{"size":1,"share":3},{"size":2,"share":1}]}}}""";
    private final CompoundKind kind = new CompoundKind();

    private RecordView computed(JsonObject choices) throws Exception {
        Outcome outcome = kind.computation().orElseThrow().compute(choices, Records.NO_INPUTS, Work.QUIET);
        return Records.record(
                "compound",
                Records.parts(PartName.CHOICES, choices, PartName.RESULT, ((Outcome.Computed) outcome).result()));
    }

    private List<Problem> examine(String choices) {
        return kind.examine(Records.parts(PartName.CHOICES, Records.json(choices)), Records.NO_INPUTS);
    }

    @Test
    void isAnnounced() {
        assertThat(ServiceLoader.load(RecordKind.class).stream().map(ServiceLoader.Provider::type))
                .map(Class::getSimpleName)
                .contains("CompoundKind", "BatchKind");
    }

    @Test
    void acceptsTheGoldenRecord() throws IOException {
        JsonObject choices = Records.golden("compound-choices");
        JsonObject result = Records.golden("compound-result");
        JsonObject identity = Records.golden("compound-identity");
        PublishedSchema schema = new PublishedSchema(CompoundKind.class, "compound-1.schema.json");

        assertThat(schema.faults(JsonObject.EMPTY
                        .with("choices", choices)
                        .with("result", result)
                        .with("identity", identity)))
                .isEmpty();
        assertThat(kind.examine(
                        Records.parts(PartName.CHOICES, choices, PartName.RESULT, result, PartName.IDENTITY, identity),
                        Records.NO_INPUTS))
                .isEmpty();
    }

    @Test
    void everyComputedSortFitsTheSchema() throws Exception {
        PublishedSchema schema = new PublishedSchema(CompoundKind.class, "compound-1.schema.json");
        for (JsonObject choices : DocumentsTest.compounds()) {
            RecordView record = computed(choices);
            assertThat(schema.faults(JsonObject.EMPTY.with("choices", choices).with("result", record.result())))
                    .isEmpty();
        }
    }

    @Test
    void schemaRefusesUnknownMembersAndWrongSorts() throws IOException {
        PublishedSchema schema = new PublishedSchema(CompoundKind.class, "compound-1.schema.json");
        JsonObject choices = Records.golden("compound-choices");

        assertThat(schema.faults(JsonObject.EMPTY.with("choices", choices.with("colour", "red"))))
                .isNotEmpty();
        assertThat(schema.faults(JsonObject.EMPTY.with("choices", choices.with("charge", "none"))))
                .isNotEmpty();
    }

    @Test
    void offersTheMassInFlight() throws Exception {
        MassFacet mass = kind.facet(MassFacet.class, computed(Records.golden("compound-choices")), Records.NO_INPUTS)
                .orElseThrow();

        assertThat(mass.nodes()).containsExactly(mass.mean());
        assertThat(mass.mean())
                .isCloseTo(720.66 * 1.66053906660e-27, org.assertj.core.api.Assertions.withinPercentage(1e-9));
        assertThat(mass.monoisotopic().orElseThrow()).isEqualTo(720 * 1.66053906660e-27);
        assertThat(mass.spread()).isZero();
    }

    @Test
    void offersClustersAsADistribution() throws Exception {
        Distribution masses = kind.facet(Distribution.class, computed(Records.json(CLUSTER)), Records.NO_INPUTS)
                .orElseThrow();

        assertThat(masses.weights()).containsExactly(0.75, 0.25);
        assertThat(masses.quantity()).isEqualTo("mass");
        assertThat(masses.mean())
                .isCloseTo(1.25 * masses.nodes()[0], org.assertj.core.api.Assertions.withinPercentage(1e-9));
        assertThat(kind.drawings(computed(Records.json(CLUSTER)), Records.NO_INPUTS))
                .hasSize(1);
    }

    @Test
    void listsNameMassAndUncertainty() throws Exception {
        RecordView record = Records.record(
                "compound",
                Records.parts(
                        PartName.CHOICES, Records.golden("compound-choices"),
                        PartName.RESULT, Records.golden("compound-result"),
                        PartName.IDENTITY, Records.golden("compound-identity")));

        Row row = kind.rows(kind.projections().get(0), record, Records.NO_INPUTS)
                .findFirst()
                .orElseThrow();

        assertThat(row.values())
                .containsEntry("name", "demo cage")
                .containsEntry("composition", "C60")
                .containsEntry("molar_mass_kg_per_mol", 0.72066)
                .containsEntry("molar_mass_u_kg_per_mol", 0.000048);
        assertThat(kind.title(record, Records.NO_INPUTS).text()).isEqualTo("demo cage");
        assertThat(kind.words(record)).contains("demo cage", "C60");
        assertThat(kind.tables(record, Records.NO_INPUTS)).hasSize(2);
    }

    @Test
    void namesNothingOfAWithheldIdentity() throws Exception {
        RecordView record = computed(Records.golden("compound-choices"));

        assertThat(kind.title(record, Records.NO_INPUTS).text()).isEqualTo("C60");
    }

    @Test
    void reportsAllProblemsAtOnceEachWithItsPlace() {
        List<Problem> problems = examine("""
                {"charge":0.5,"method":"compound.mass/1","constants":"CODATA 2018","composition":{"sort":"particle",
                "formula":"C60","radius":{"si":-1,"text":"-1","unit":"m","uncertainty":{"sort":"exact"}}}}""");

        assertThat(problems)
                .extracting(Problem::where)
                .contains(
                        "/choices/charge",
                        "/choices/composition/formula",
                        "/choices/composition/material",
                        "/choices/composition/radius",
                        "/choices/composition/density");
        assertThat(problems).allSatisfy(problem -> assertThat(problem.mend()).isNotBlank());
    }

    @Test
    void refusesAChargeThatTheFormulaContradicts() {
        assertThat(examine("""
                {"charge":0,"method":"compound.mass/1","constants":"CODATA 2018",
                "composition":{"sort":"formula","formula":"C60+"}}""")).extracting(Problem::code).containsExactly("sample.charge-differs");
    }

    @Test
    void asksForTheIsotopeOfElementsWithoutStandardWeight() {
        assertThat(examine("""
                {"charge":0,"method":"compound.mass/1","constants":"CODATA 2018",
                "composition":{"sort":"formula","formula":"TcO2"}}""")).extracting(Problem::code).containsExactly("sample.no-weight");
        assertThat(examine("""
                {"charge":0,"method":"compound.mass/1","constants":"CODATA 2018",
                "composition":{"sort":"formula","formula":"[99Tc]O2"}}""")).isEmpty();
    }
}
