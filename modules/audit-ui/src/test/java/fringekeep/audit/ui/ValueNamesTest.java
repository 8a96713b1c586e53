package fringekeep.audit.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.List;
import org.junit.jupiter.api.Test;

class ValueNamesTest {
    private static final JsonObject RESULT = JsonObject.EMPTY
            .with(
                    "estimates",
                    new JsonArray(List.<Json>of(JsonObject.EMPTY
                            .with("name", "polarizabilityVolume")
                            .with("value", 4.2e-28)
                            .with("u", 7e-30))))
            .with("reducedDeviance", 1.02);

    @Test
    void aNamedEstimateIsCalledByItsName() {
        assertThat(ValueNames.words(RESULT, "/estimates/0/value")).isEqualTo("estimates, polarizability volume");
    }

    @Test
    void aPlainMemberIsSpelledOut() {
        assertThat(ValueNames.words(RESULT, "/reducedDeviance")).isEqualTo("reduced deviance");
    }

    @Test
    void placesInPayloadsStayAsTheyAre() {
        assertThat(ValueNames.words(RESULT, "payload table, row 3, column counts"))
                .isEqualTo("payload table, row 3, column counts");
    }

    @Test
    void numbersAreCountedAtAnyDepth() {
        assertThat(ValueNames.numbers(RESULT)).isEqualTo(3);
    }

    @Test
    void longWordsAreShortenedAndNumbersRounded() {
        assertThat(ValueNames.brief("4.20512345678e-28")).startsWith("4.20512");
        assertThat(ValueNames.brief("a very long word that stands in no row")).hasSize(14);
    }
}
