package fringekeep.figure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Picture;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Figures computed from what a test kind offers. Unit conversions are those of the SI Brochure, 9th edition, table 7. */
class FigureKindTest {
    private static final String PANELS = "{\"caption\":\"A test\",\"widthMillimetres\":80,\"heightMillimetres\":60,"
            + "\"panelsInRow\":1,\"panels\":[{\"name\":\"a\",\"legend\":true,"
            + "\"x\":{\"label\":\"power\",\"unit\":\"%s\"},\"y\":{\"label\":\"ordinate\",\"unit\":\"%s\"},"
            + "\"series\":[%s]}]}";

    private final DetachedRecords records = new DetachedRecords(new OfferingKind(), new FigureKind());

    private static String series(int input, String name, String more) {
        return "{\"input\":" + input + ",\"series\":\"" + name + "\",\"tone\":\"ink\"" + more + "}";
    }

    private static JsonObject choices(String xUnit, String yUnit, String... series) throws ProblemException {
        String text = PANELS.formatted(xUnit, yUnit, String.join(",", series));
        return (JsonObject)
                JsonDocument.read(text.getBytes(StandardCharsets.UTF_8)).value();
    }

    private List<InputReference> offering() throws ProblemException {
        return List.of(DetachedRecords.input("series", records.enter("offering", JsonObject.EMPTY)));
    }

    private double[] column(Hash figure, String name) throws ProblemException {
        return CsvPayload.read(records.view(figure).payload("numbers"))
                .numbers(name)
                .orElseThrow();
    }

    @Test
    void numbersStandInTheUnitsOfTheAxes() throws ProblemException {
        Hash figure = records.compute(
                "figure",
                choices("mW", "%", series(0, "points", ""), series(0, "model", ""), series(0, "range", "")),
                offering());
        assertThat(column(figure, "x")).containsExactly(new double[] {1, 2, 1, 2, 1, 2}, within(1e-12));
        assertThat(column(figure, "y")).containsExactly(new double[] {25, 50, 12.5, 37.5, 12.5, 25}, within(1e-12));
        assertThat(column(figure, "other"))
                .containsExactly(new double[] {1, 2, Double.NaN, Double.NaN, 50, 75}, within(1e-12));
    }

    @Test
    void aValueCarriesItsCombinedUncertaintyAsLevelAndAsPoint() throws ProblemException {
        Hash figure = records.compute(
                "figure", choices("mW", "nm", series(0, "value", ""), series(0, "value", ",\"at\":3")), offering());
        assertThat(column(figure, "x")).containsExactly(Double.NaN, 3);
        assertThat(column(figure, "y")).containsExactly(new double[] {2, 2}, within(1e-12));
        assertThat(column(figure, "other")).containsExactly(new double[] {0.05, 0.05}, within(1e-12));
    }

    @Test
    void theDrawingHasOneLayerForEachSeries() throws ProblemException {
        Hash figure = records.compute(
                "figure",
                choices(
                        "mW",
                        "%",
                        series(0, "points", ""),
                        series(0, "model", ""),
                        series(0, "range", ""),
                        series(0, "value", ",\"estimate\":\"visibility\"")),
                offering());
        List<Picture> pictures = new FigureKind().drawings(records.view(figure), records.inputs(figure));
        assertThat(pictures).hasSize(1);
        List<Layer> layers = pictures.get(0).panels().get(0).layers();
        assertThat(layers).hasSize(4);
        assertThat(layers.get(0)).isInstanceOf(Layer.Points.class);
        assertThat(layers.get(1)).isInstanceOf(Layer.Curve.class);
        assertThat(layers.get(2)).isInstanceOf(Layer.Band.class);
        assertThat(((Layer.Ruler) layers.get(3)).at()).isEqualTo(50, within(1e-12));
    }

    @Test
    void theSameChoicesGiveTheSameBytes() throws ProblemException {
        List<InputReference> inputs = offering();
        JsonObject choices = choices("mW", "%", series(0, "points", ""), series(0, "range", ""));
        Hash first = records.compute("figure", choices, inputs);
        Hash second = records.compute("figure", choices, inputs);
        assertThat(records.view(second).payload("numbers"))
                .isEqualTo(records.view(first).payload("numbers"));
        assertThat(records.view(second).result()).isEqualTo(records.view(first).result());
    }

    @ParameterizedTest
    @CsvSource({
        "1, points, length, %, figure.no-input, /choices/panels/0/series/0/input",
        "0, absent, length, %, figure.unknown-series, /choices/panels/0/series/0/series",
        "0, value, absent, nm, figure.unknown-estimate, /choices/panels/0/series/0/estimate",
        "0, points, length, nm, figure.unit, /choices/panels/0/series/0",
        "0, value, length, %, figure.unit, /choices/panels/0/series/0"
    })
    void whatIsNotOfferedIsNamedWithPlaceAndMend(
            int input, String series, String estimate, String yUnit, String code, String where)
            throws ProblemException {
        JsonObject choices = choices("mW", yUnit, series(input, series, ",\"estimate\":\"" + estimate + "\""));
        refused(choices, offering(), code, where);
    }

    @ParameterizedTest
    @CsvSource({"points, figure.no-series", "value, figure.no-value"})
    void aRecordThatOffersNothingIsNamed(String series, String code) throws ProblemException {
        Hash bare = records.enter("offering", JsonObject.EMPTY.with("bare", "yes"));
        List<InputReference> inputs = List.of(DetachedRecords.input("series", bare));
        refused(choices("mW", "%", series(0, series, "")), inputs, code, "/choices/panels/0/series/0/input");
    }

    @Test
    void twoPanelsOfOneNameAreRefused() throws ProblemException {
        JsonObject one = choices("mW", "%", series(0, "points", ""));
        JsonObject panel = one.array("panels").objects().get(0);
        refusedOnRecording(
                one.with("panels", new JsonArray(List.of(panel, panel))),
                "figure.panel-twice",
                "/choices/panels/1/name");
    }

    @ParameterizedTest
    @CsvSource({"x, 2, 2", "y, 3, 1"})
    void anAxisThatEndsBeforeItBeginsIsRefused(String axis, double from, double to) throws ProblemException {
        JsonObject one = choices("mW", "%", series(0, "points", ""));
        JsonObject panel = one.array("panels").objects().get(0);
        JsonObject range = panel.object(axis).orElseThrow().with("from", from).with("to", to);
        refusedOnRecording(
                one.with("panels", new JsonArray(List.of(panel.with(axis, range)))),
                "figure.empty-axis",
                "/choices/panels/0/" + axis);
    }

    /** A unit that no table of UCUM codes has is named at its axis when it is computed, and again when it is recorded. */
    @Test
    void aUnitThatIsNoneIsNamedAtItsAxis() throws ProblemException {
        JsonObject good = choices("mW", "%", series(0, "points", ""));
        JsonObject panel = good.array("panels").objects().get(0);
        JsonObject axis = panel.object("x").orElseThrow().with("unit", "furlong?");
        JsonObject bad = good.with("panels", new JsonArray(List.of(panel.with("x", axis))));
        Parts parts = new Parts(Map.of(PartName.CHOICES, bad));
        List<Problem> problems = new FigureKind().examine(parts, records.inputs(records.enter("offering", good)));
        assertThat(problems).extracting(Problem::where).contains("/choices/panels/0/x/unit");
        assertThat(problems).allSatisfy(problem -> assertThat(problem.mend()).isNotBlank());
    }

    /** The computation works; the rules of the kind say no before anything is stored. */
    private void refusedOnRecording(JsonObject choices, String code, String where) throws ProblemException {
        List<InputReference> inputs = offering();
        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> records.compute("figure", choices, inputs));
        assertThat(thrown).isNotNull();
        assertThat(thrown.problems()).extracting(Problem::code).containsExactly(code);
        assertThat(thrown.problems().get(0).where()).isEqualTo(where);
        assertThat(thrown.problems().get(0).mend()).isNotBlank();
    }

    private void refused(JsonObject choices, List<InputReference> inputs, String code, String where) {
        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> records.compute("figure", choices, inputs));
        assertThat(thrown).isNotNull();
        Problem problem = thrown.problems().get(0);
        assertThat(problem.code()).isEqualTo(code);
        assertThat(problem.where()).isEqualTo(where);
        assertThat(problem.mend()).isNotBlank();
    }
}
