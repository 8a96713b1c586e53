package fringekeep.desk.pane;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.desk.lab.InventedLab;
import fringekeep.desk.session.Clock;
import java.util.List;
import org.junit.jupiter.api.Test;

class FactReaderTest {
    private final Clock clock = new Clock(new InventedLab().archive().facts());

    private List<FactGroup> read(JsonObject value) {
        return new FactReader(clock, JsonObject.EMPTY, "sample", "content").read("as entered", value);
    }

    private static JsonObject quantity(String text, String unit, double si, JsonObject uncertainty) {
        return JsonObject.EMPTY
                .with("text", text)
                .with("unit", unit)
                .with("si", si)
                .with("uncertainty", uncertainty);
    }

    private static JsonObject sort(String sort) {
        return JsonObject.EMPTY.with("sort", sort);
    }

    @Test
    void aQuantityShowsWhatWasEnteredAndSiInAllFourSortsOfUncertainty() {
        JsonObject value = JsonObject.EMPTY
                .with(
                        "period",
                        quantity(
                                "266.0",
                                "nm",
                                2.66e-7,
                                sort("stated").with("text", "0.1").with("si", 1e-10)))
                .with("dwell", quantity("10", "s", 10, sort("exact")))
                .with("oven", quantity("568.9", "Cel", 842.05, sort("unstated")))
                .with("dipole", quantity("2.1", "V", 2.1, sort("bounds").with("upper", 2.1)));

        List<Fact> facts = read(value).get(0).facts();

        assertThat(facts)
                .containsExactly(
                        new Fact("dipole", "2.1 V", "< 2.1", "V"),
                        new Fact("dwell", "10 s exact", "10 exact", "s"),
                        new Fact("oven", "568.9 \u00B0C", "842.05 not stated", "K"),
                        new Fact("period", "266.0 \u00B1 0.1 nm", "266.00(10)", "nm"));
    }

    @Test
    void estimatesGetTheirUncertaintyFromTheCovarianceBesideThem() {
        JsonObject result = JsonObject.EMPTY
                .with("estimates", JsonArray.ofTexts(List.of("mean", "cosine")))
                .with("values", JsonArray.ofNumbers(100, 20))
                .with("covariance", JsonArray.ofNumbers(25, 5, 49));

        assertThat(read(result).get(0).facts())
                .containsExactly(new Fact("mean", "", "100.0(5.0)", ""), new Fact("cosine", "", "20.0(7.0)", ""));
    }

    @Test
    void namedQuantitiesOfAListBecomeRowsOfTheirOwnGroup() {
        JsonObject power = quantity("7.3", "W", 7.3, sort("exact"));
        JsonObject value = JsonObject.EMPTY.with(
                "settings",
                JsonArray.of(JsonObject.EMPTY.with("name", "laser power").with("quantity", power)));

        List<FactGroup> groups = read(value);

        assertThat(groups).hasSize(1);
        assertThat(groups.get(0).heading()).isEqualTo("settings");
        assertThat(groups.get(0).facts().get(0)).isEqualTo(new Fact("laser power", "7.3 W exact", "7.3 exact", "W"));
    }

    @Test
    void momentsAreShownInTheZoneOfTheLab() {
        JsonObject moment = JsonObject.EMPTY.with("at", "2031-05-14T23:03:11Z").with("offset", "+02:00");

        assertThat(read(JsonObject.EMPTY.with("start", moment)).get(0).facts())
                .containsExactly(Fact.text("start", "2031-05-15 00:03"));
    }

    @Test
    void namesOfMembersBecomeWords() {
        assertThat(FactWords.words("degreesOfFreedom")).isEqualTo("degrees of freedom");
    }
}
