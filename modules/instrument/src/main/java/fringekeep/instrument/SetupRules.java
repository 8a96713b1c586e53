package fringekeep.instrument;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.PartName;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** What is wrong with a setup beyond its schema. */
final class SetupRules {
    private static final List<String> MATERIAL = List.of("openFraction", "thickness", "wallPotential");
    private static final List<String> LASER_MEMBERS =
            List.of("wavelength", "pulseLength", "waistAcross", "waistAlong", "area");

    private final List<Problem> problems = new ArrayList<>();

    private SetupRules() {}

    static List<Problem> examine(Parts parts) {
        SetupRules rules = new SetupRules();
        Optional<JsonObject> content = parts.get(PartName.CONTENT);
        if (content.isEmpty()) {
            rules.add("missing", "/content", "content");
        } else {
            rules.content(content.get());
        }
        return rules.problems;
    }

    private void content(JsonObject content) {
        if (content.text("label").filter(label -> !label.isBlank()).isEmpty()) {
            add("label", "/content/label");
        }
        gratings(content.array("gratings"));
        int gratings = content.array("gratings").items().size();
        series(content.array("separations"), "separations", gratings);
        series(content.array("delays"), "delays", gratings);
        content.object("beam").ifPresent(beam -> positive(beam, "/content/beam", List.of("height", "width")));
        content.object("detector").ifPresent(this::detector);
        content.object("fieldPlates")
                .ifPresent(plates -> positive(plates, "/content/fieldPlates", List.of("length", "gap")));
        content.object("recoilLaser").ifPresent(laser -> laser(laser, "/content/recoilLaser"));
        content.object("vacuum")
                .ifPresent(vacuum -> positive(vacuum, "/content/vacuum", List.of("pressure", "temperature")));
        named(content.array("slits"), "/content/slits");
        named(content.array("words"), "/content/words");
        problems.addAll(CautionRules.examine(content));
    }

    private void gratings(JsonArray gratings) {
        double before = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < gratings.items().size(); i++) {
            String at = "/content/gratings/" + i;
            JsonObject grating = gratings.items().get(i) instanceof JsonObject one ? one : JsonObject.EMPTY;
            Optional<GratingSort> sort = grating.text("sort").flatMap(GratingSort::of);
            if (sort.isEmpty()) {
                add("grating-sort", at + "/sort");
            } else if (sort.get() == GratingSort.MATERIAL) {
                material(grating, at);
            } else {
                light(grating, at, sort.get());
            }
            positive(grating, at, List.of("period", "thickness"));
            Optional<Entered> position = Entered.of(grating, "position");
            if (position.isPresent() && !(position.get().si() > before)) {
                add("positions", at + "/position");
            }
            before = position.map(Entered::si).orElse(before);
        }
    }

    private void material(JsonObject grating, String at) {
        if (grating.get("laser").isPresent()) {
            add("not-of-sort", at + "/laser", "laser", GratingSort.MATERIAL.code());
        }
        if (Entered.of(grating, "period").isEmpty()) {
            add("missing", at + "/period", "period");
        }
        Entered.of(grating, "openFraction")
                .filter(fraction -> !(fraction.si() > 0 && fraction.si() < 1))
                .ifPresent(fraction -> add("open-fraction", at + "/openFraction"));
        Optional<JsonObject> wall = grating.object("wallPotential");
        String law = wall.flatMap(one -> one.text("sort")).orElse("none");
        String coefficient = law.equals("retarded") ? "c4" : "c3";
        if (wall.isPresent()
                && !law.equals("none")
                && Entered.of(wall.get(), coefficient).isEmpty()) {
            add("missing", at + "/wallPotential/" + coefficient, coefficient);
        }
    }

    private void light(JsonObject grating, String at, GratingSort sort) {
        for (String member : MATERIAL) {
            if (grating.get(member).isPresent()) {
                add("not-of-sort", at + "/" + member, member, sort.code());
            }
        }
        Optional<JsonObject> laser = grating.object("laser");
        if (laser.isEmpty()) {
            add("missing", at + "/laser", "laser");
            return;
        }
        laser(laser.get(), at + "/laser");
        Optional<Entered> wavelength = Entered.of(laser.get(), "wavelength");
        Optional<Entered> period = Entered.of(grating, "period");
        if (wavelength.isPresent()
                && period.isPresent()
                && period.get().si() < 0.499 * wavelength.get().si()) {
            add("period-short", at + "/period");
        }
    }

    private void laser(JsonObject laser, String at) {
        if (Entered.of(laser, "wavelength").isEmpty()) {
            add("missing", at + "/wavelength", "wavelength");
        }
        positive(laser, at, LASER_MEMBERS);
        for (String member : List.of("power", "pulseEnergy")) {
            Entered.of(laser, member)
                    .filter(value -> !(value.si() >= 0))
                    .ifPresent(value -> add("negative", at + "/" + member, member));
        }
        Entered.of(laser, "reflectivity")
                .filter(value -> !(value.si() >= 0 && value.si() <= 1))
                .ifPresent(value -> add("share", at + "/reflectivity", "reflectivity"));
    }

    private void detector(JsonObject detector) {
        String at = "/content/detector";
        Optional<Entered> deadTime = Entered.of(detector, "deadTime");
        deadTime.filter(value -> !(value.si() >= 0)).ifPresent(value -> add("negative", at + "/deadTime", "deadTime"));
        boolean corrected = detector.text("deadTimeSort")
                .filter(sort -> !sort.equals("none"))
                .isPresent();
        if (corrected && deadTime.isEmpty()) {
            add("missing", at + "/deadTime", "deadTime");
        }
        Entered.of(detector, "efficiency")
                .filter(value -> !(value.si() > 0 && value.si() <= 1))
                .ifPresent(value -> add("share", at + "/efficiency", "efficiency"));
    }

    /** One entry for all pairs of neighbours, or one for each. */
    private void series(JsonArray array, String member, int gratings) {
        String at = "/content/" + member;
        int size = array.items().size();
        boolean fits = size <= 1 || size == gratings - 1;
        if (!fits) {
            add("series-length", at, member, Integer.toString(size), Integer.toString(Math.max(0, gratings - 1)));
        }
        if (size == 0 && gratings > 1 && member.equals("separations")) {
            add("missing", at, member);
        }
        for (int i = 0; i < size; i++) {
            Json item = array.items().get(i);
            Optional<Entered> value = item instanceof JsonObject one ? Entered.of(one) : Optional.empty();
            if (value.filter(given -> given.si() > 0).isEmpty()) {
                add("not-positive", at + "/" + i, member);
            }
        }
    }

    private void named(JsonArray array, String at) {
        Set<String> seen = new HashSet<>();
        for (int i = 0; i < array.items().size(); i++) {
            String name = array.items().get(i) instanceof JsonObject one
                    ? one.text("name").orElse("")
                    : "";
            if (name.isBlank() || !seen.add(name)) {
                add("name", at + "/" + i + "/name", name);
            }
        }
    }

    private void positive(JsonObject holder, String at, List<String> members) {
        for (String member : members) {
            Optional<Entered> value = Entered.of(holder, member);
            if (holder.get(member).isPresent()
                    && value.filter(given -> given.si() > 0).isEmpty()) {
                add("not-positive", at + "/" + member, member);
            }
        }
    }

    private void add(String code, String where, String... arguments) {
        problems.add(Trouble.at(code, where, arguments));
    }
}
