package fringekeep.bundle.internal;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Graphs made by hand that break one constraint each (W3C PROV-CONSTRAINTS, 30 April 2013). */
class ProvFaultsTest {
    private static final JsonObject SOUND = JsonObject.EMPTY
            .with("entity", names("a", "b"))
            .with("activity", names("making", "other"))
            .with("wasGeneratedBy", JsonObject.EMPTY.with("g1", generated("b", "making")))
            .with("wasDerivedFrom", JsonObject.EMPTY.with("d1", derived("b", "a")));

    private static JsonObject names(String... names) {
        JsonObject object = JsonObject.EMPTY;
        for (String name : names) {
            object = object.with(name, JsonObject.EMPTY);
        }
        return object;
    }

    private static JsonObject generated(String entity, String activity) {
        return JsonObject.EMPTY.with("prov:entity", entity).with("prov:activity", activity);
    }

    private static JsonObject derived(String entity, String from) {
        return JsonObject.EMPTY.with("prov:generatedEntity", entity).with("prov:usedEntity", from);
    }

    private static List<String> codes(JsonObject document) {
        return ProvFaults.of(document).stream().map(Problem::code).toList();
    }

    @Test
    void aSoundGraphHasNoFault() {
        assertThat(codes(SOUND)).isEmpty();
    }

    @Test
    void anEntityIsGeneratedOnce() {
        JsonObject twice = JsonObject.EMPTY.with("g1", generated("b", "making")).with("g2", generated("b", "other"));

        assertThat(codes(SOUND.with("wasGeneratedBy", twice))).containsExactly("prov.generated-twice");
    }

    @Test
    void whatIsNamedIsDeclared() {
        JsonObject used = JsonObject.EMPTY.with("u1", generated("nowhere", "making"));

        assertThat(codes(SOUND.with("used", used))).containsExactly("prov.undeclared");
    }

    @Test
    void nothingIsDerivedFromItselfRoundACircle() {
        JsonObject circle = JsonObject.EMPTY.with("d1", derived("b", "a")).with("d2", derived("a", "b"));

        assertThat(codes(SOUND.with("wasDerivedFrom", circle))).containsExactly("prov.circle", "prov.circle");
    }

    @Test
    void anEntityIsNoActivity() {
        assertThat(codes(SOUND.with("activity", names("making", "a")))).containsExactly("prov.both");
    }
}
