package fringekeep.audit;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.List;
import org.junit.jupiter.api.Test;

class ShiftTest {
    @Test
    void aMovedEstimateIsToldInItsOldStandardUncertainty() {
        List<Shift> shifts = Shift.between(one(10, 0.5), one(11, 0.25));

        assertThat(shifts).containsExactly(new Shift("/mass", 10, 11, 0.5));
        assertThat(shifts.get(0).inDeviations()).hasValue(2);
    }

    private static JsonObject one(double value, double u) {
        return JsonObject.EMPTY.with(
                "mass", JsonObject.EMPTY.with("value", value).with("u", u));
    }

    @Test
    void withoutAnUncertaintyThereIsNoRatio() {
        assertThat(new Shift("/mass", 1, 2, 0).inDeviations()).isEmpty();
    }

    @Test
    void listsAreMatchedByNameAndTheVarianceStandsOnTheDiagonal() {
        JsonObject before = list(List.of("a", "b"), new double[] {1, 2}, 4, 1, 9);
        JsonObject after = list(List.of("b", "a"), new double[] {5, 3}, 1, 0, 1);

        assertThat(Shift.between(before, after)).containsExactly(new Shift("/a", 1, 3, 2), new Shift("/b", 2, 5, 3));
    }

    private static JsonObject list(List<String> names, double[] values, double... covariance) {
        return JsonObject.EMPTY
                .with("estimates", JsonArray.ofTexts(names))
                .with("values", JsonArray.ofNumbers(values))
                .with("covariance", JsonArray.ofNumbers(covariance));
    }

    @Test
    void whatOnlyOneResultHasIsNoShift() {
        assertThat(Shift.between(one(1, 1), JsonObject.EMPTY)).isEmpty();
        assertThat(Shift.between(JsonObject.EMPTY, one(1, 1))).isEmpty();
    }
}
