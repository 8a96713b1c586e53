package fringekeep.archive.kind;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Rules of record format 1, section 10, by hand. */
class ValueComparisonTest {
    private static final JsonObject SCHEMA = JsonObject.EMPTY.with(
            "properties",
            JsonObject.EMPTY.with(
                    "result",
                    JsonObject.EMPTY.with(
                            "properties",
                            JsonObject.EMPTY
                                    .with("degrees", JsonObject.EMPTY.with("type", "integer"))
                                    .with("share", JsonObject.EMPTY.with("type", "number")))));

    @Test
    void neighboursAreOneUnitApartAlsoAcrossZero() {
        assertThat(ValueComparison.distance(1, Math.nextUp(1.0))).isEqualTo(1);
        assertThat(ValueComparison.distance(-Double.MIN_VALUE, Double.MIN_VALUE))
                .isEqualTo(2);
        assertThat(ValueComparison.distance(-1, Math.nextDown(-1.0))).isEqualTo(1);
    }

    @Test
    void estimatesAreComparedInTheirDeviations() {
        ValueComparison comparison = new ValueComparison();
        comparison.results(estimate(1.0), estimate(1.5));

        assertThat(comparison.differences()).hasSize(1);
        assertThat(comparison.differences().get(0).pointer()).isEqualTo("/a/value");
        assertThat(comparison.differences().get(0).inDeviations()).hasValue(2);
        assertThat(comparison.units()).isGreaterThan(ValueComparison.MOST_UNITS);
    }

    private static JsonObject estimate(double value) {
        return JsonObject.EMPTY.with("a", JsonObject.EMPTY.with("value", value).with("u", 0.25));
    }

    @Test
    void integersOfTheSchemaMustBeEqual() {
        JsonObject kept = JsonObject.EMPTY.with("degrees", 1).with("share", 1);
        ValueComparison share = ValueComparison.of(SCHEMA, kept);
        share.results(kept, kept.with("share", Math.nextUp(1.0)));
        ValueComparison degrees = ValueComparison.of(SCHEMA, kept);
        degrees.results(kept, kept.with("degrees", Math.nextUp(1.0)));

        assertThat(share.units()).isEqualTo(1);
        assertThat(degrees.units()).isEqualTo(-1);
    }

    @Test
    void namesLengthsTextsAndSortsMustBeEqual() {
        JsonObject kept = JsonObject.EMPTY
                .with("list", JsonArray.ofNumbers(1, 2))
                .with("text", "a")
                .with("flag", Json.of(true));
        ValueComparison comparison = new ValueComparison();
        comparison.results(
                kept,
                kept.with("list", JsonArray.ofNumbers(1))
                        .with("text", "b")
                        .without("flag")
                        .with("odd", 1));

        assertThat(comparison.differences())
                .extracting(ValueComparison.Difference::pointer)
                .containsExactly("/flag", "/list", "/odd", "/text");
        assertThat(comparison.units()).isEqualTo(-1);
    }

    @Test
    void tablesAndArraysAreComparedCellByCell() {
        ValueComparison table = new ValueComparison();
        table.payloads("table", CsvPayload.FORM, csv(1, Double.NaN, 3), csv(Math.nextUp(1.0), Double.NaN, 3));
        ValueComparison absent = new ValueComparison();
        absent.payloads("table", CsvPayload.FORM, csv(1, Double.NaN), csv(1, 2));
        ValueComparison array = new ValueComparison();
        array.payloads(
                "grid", NpyPayload.FORM, npy(1, Double.NaN, 3), npy(1, Double.NaN, Math.nextUp(Math.nextUp(3.0))));
        ValueComparison gone = new ValueComparison();
        gone.payloads("grid", NpyPayload.FORM, npy(1, Double.NaN), npy(1, 2));
        ValueComparison same = new ValueComparison();
        same.payloads("grid", NpyPayload.FORM, npy(1), npy(1));

        assertThat(table.units()).isEqualTo(1);
        assertThat(table.differences().get(0).pointer()).isEqualTo("payload table, row 0, column x");
        assertThat(absent.units()).isEqualTo(-1);
        assertThat(array.units()).isEqualTo(2);
        assertThat(array.differences().get(0).pointer()).isEqualTo("payload grid, value 2");
        assertThat(gone.units()).isEqualTo(-1);
        assertThat(same.count()).isZero();
    }

    private static byte[] csv(double... values) {
        return CsvPayload.write(List.of("x"), List.of(values));
    }

    private static byte[] npy(double... values) {
        return NpyPayload.write(values, values.length);
    }
}
