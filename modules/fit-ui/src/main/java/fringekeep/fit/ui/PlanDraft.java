package fringekeep.fit.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Hash;
import fringekeep.fit.ui.FitPlan.End;
import fringekeep.fit.ui.FitPlan.Masks;
import fringekeep.fit.ui.FitPlan.Place;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.NavigableSet;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;

/** A plan as an archive's draft, so that nothing that was chosen is lost. */
final class PlanDraft {
    static final String KIND = "fit-by-hand";

    private static final int ID_LENGTH = 32;

    private PlanDraft() {}

    /** Id of the draft of these scans. */
    static String id(List<Hash> scans) {
        String named =
                KIND + " " + String.join(" ", scans.stream().map(Hash::hex).toList());
        return Hash.of(named.getBytes(StandardCharsets.UTF_8)).hex().substring(0, ID_LENGTH);
    }

    static JsonObject write(FitPlan plan) {
        return JsonObject.EMPTY
                .with("kind", KIND)
                .with("channel", plan.channel())
                .with("choices", plan.choices())
                .with("references", hashes(plan.references()))
                .with("backgrounds", hashes(plan.backgrounds()))
                .with("masked", masked(plan))
                .with("shown", shown(plan))
                .with("reason", plan.masks().reason())
                .with("undoing", plan.masks().undoing())
                .with("words", plan.masks().words())
                .with("again", Json.of(plan.end().again()))
                .with("preferred", plan.end().preferred());
    }

    private static JsonArray hashes(List<Hash> hashes) {
        return JsonArray.ofTexts(hashes.stream().map(Hash::hex).toList());
    }

    private static JsonArray masked(FitPlan plan) {
        List<Json> items = new ArrayList<>();
        plan.masks().masked().forEach((place, reason) -> items.add(place(place).with("reason", reason)));
        return new JsonArray(items);
    }

    private static JsonArray shown(FitPlan plan) {
        return new JsonArray(
                plan.masks().shown().stream().<Json>map(PlanDraft::place).toList());
    }

    private static JsonObject place(Place place) {
        return JsonObject.EMPTY.with("scan", place.scan().hex()).with("row", Json.of(place.row()));
    }

    /** The plan of a draft for these scans. */
    static FitPlan read(JsonObject draft, List<Hash> scans) {
        SortedMap<Place, String> masked = new TreeMap<>();
        draft.array("masked")
                .objects()
                .forEach(each -> masked.put(readPlace(each), each.text("reason").orElse("")));
        NavigableSet<Place> shown = new TreeSet<>();
        draft.array("shown").objects().forEach(each -> shown.add(readPlace(each)));
        return new FitPlan(
                scans,
                draft.text("channel").orElse("counts"),
                draft.object("choices").orElse(JsonObject.EMPTY),
                read(draft.array("references")),
                read(draft.array("backgrounds")),
                new Masks(
                        masked,
                        shown,
                        draft.text("reason").orElse(""),
                        draft.text("undoing").orElse(""),
                        draft.text("words").orElse("")),
                new End(
                        draft.flag("again").orElse(false),
                        draft.text("preferred").orElse("")));
    }

    private static List<Hash> read(JsonArray hashes) {
        return hashes.texts().stream().map(Hash::new).toList();
    }

    private static Place readPlace(JsonObject place) {
        return new Place(new Hash(place.text("scan").orElseThrow()), (int)
                place.integer("row").orElseThrow());
    }
}
