package fringekeep.figure.ui;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class FigureDraftTest {
    private static final JsonObject AXIS =
            JsonObject.EMPTY.with("label", "laser power").with("unit", "W");
    private final FigureDraft draft = new FigureDraft(
            JsonObject.EMPTY
                    .with("caption", "Invented.")
                    .with("widthMillimetres", 86)
                    .with(
                            "panels",
                            new JsonArray(List.of(JsonObject.EMPTY
                                    .with("name", "a")
                                    .with("x", AXIS)
                                    .with("y", AXIS)
                                    .with("legend", Json.of(true))
                                    .with(
                                            "series",
                                            new JsonArray(List.of(JsonObject.EMPTY
                                                    .with("input", 0)
                                                    .with("series", "points")
                                                    .with("tone", "ink"))))))),
            List.of(),
            Optional.empty());

    private FigureField line(String pointer) {
        return FigureField.of(draft).stream()
                .filter(line -> line.pointer().equals(pointer) && !line.head())
                .findFirst()
                .orElseThrow();
    }

    private void type(String pointer, String words) {
        draft.set(pointer, line(pointer).typed(words));
    }

    @Test
    void everyChoiceOfFigurePanelAxisAndSeriesHasALine() {
        assertThat(FigureField.of(draft))
                .extracting(FigureField::pointer)
                .contains(
                        "/title",
                        "/panels/0/x/from",
                        "/panels/0/y/logarithmic",
                        "/panels/0/legend",
                        "/panels/0/series/0/shape");
    }

    @Test
    void aTypedNumberBecomesANumberAndADecimalCommaIsTaken() {
        type("/panels/0/x/from", "0,5");

        assertThat(draft.get("/panels/0/x/from")).contains(Json.of(0.5));
    }

    @Test
    void anEmptiedLineIsLeftOut() {
        type("/panels/0/x/to", "4");
        type("/panels/0/x/to", " ");

        assertThat(draft.get("/panels/0/x/to")).isEmpty();
    }

    @Test
    void wordsWhereANumberBelongsAreRefusedWithWords() {
        assertThatThrownBy(() -> type("/widthMillimetres", "wide"))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("wide");
        assertThat(draft.get("/widthMillimetres")).contains(Json.of(86));
    }

    @Test
    void undoAndRedoWalkThroughWhatWasTyped() {
        type("/caption", "First.");
        type("/caption", "Second.");

        assertThat(draft.undo()).isTrue();
        assertThat(draft.get("/caption")).contains(Json.of("First."));
        assertThat(draft.redo()).isTrue();
        assertThat(draft.get("/caption")).contains(Json.of("Second."));
        assertThat(draft.redo()).isFalse();
    }

    @Test
    void aFlagReadsAndWritesYesAndNo() {
        assertThat(line("/panels/0/legend").value(draft)).isEqualTo("yes");
        type("/panels/0/legend", "no");

        assertThat(draft.get("/panels/0/legend")).contains(Json.of(false));
    }
}
