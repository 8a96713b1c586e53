package fringekeep.instrument;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.sample.Entered;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;

/** Reads the content of a setup; what is not of the form asked for is left out. */
final class SetupReader {
    private SetupReader() {}

    static SetupFacet read(JsonObject content) {
        return new SetupFacet(
                content.text("label").orElse(""),
                objects(content.array("gratings"))
                        .flatMap(one -> grating(one).stream())
                        .toList(),
                quantities(content.array("separations")),
                quantities(content.array("delays")),
                content.object("beam")
                        .map(one -> new SetupFacet.Beam(Entered.of(one, "height"), Entered.of(one, "width"))),
                content.object("detector").map(SetupReader::detector),
                content.object("fieldPlates").map(SetupReader::plates),
                content.object("recoilLaser").flatMap(SetupReader::recoil),
                content.object("vacuum")
                        .map(one -> new SetupFacet.Vacuum(
                                Entered.of(one, "pressure"), one.text("gas"), Entered.of(one, "temperature"))),
                objects(content.array("slits")).map(SetupReader::slit).toList());
    }

    static Stream<JsonObject> objects(JsonArray array) {
        return array.items().stream().filter(JsonObject.class::isInstance).map(JsonObject.class::cast);
    }

    static List<Entered> quantities(JsonArray array) {
        return objects(array).flatMap(one -> Entered.of(one).stream()).toList();
    }

    private static Optional<Grating> grating(JsonObject one) {
        Optional<GratingSort> sort = one.text("sort").flatMap(GratingSort::of);
        Optional<Laser> laser = one.object("laser").flatMap(SetupReader::laser);
        Optional<Entered> period = Entered.of(one, "period").or(() -> laser.map(light -> half(light.wavelength())));
        return sort.map(known -> new Grating(
                known,
                one.text("name").orElse(""),
                period,
                Entered.of(one, "openFraction"),
                Entered.of(one, "thickness"),
                one.object("wallPotential").flatMap(SetupReader::wall),
                laser,
                Entered.of(one, "position")));
    }

    private static Entered half(Entered wavelength) {
        OptionalDouble u = wavelength.deviation();
        return new Entered(
                wavelength.si() / 2, u.isPresent() ? OptionalDouble.of(u.getAsDouble() / 2) : OptionalDouble.empty());
    }

    private static Optional<Grating.WallPotential> wall(JsonObject one) {
        int exponent = one.text("sort").equals(Optional.of("retarded")) ? 4 : 3;
        boolean none = one.text("sort").equals(Optional.of("none"));
        Optional<Entered> coefficient = none ? Optional.empty() : Entered.of(one, "c" + exponent);
        return coefficient.map(c -> new Grating.WallPotential(exponent, c, Entered.of(one, "cutoff")));
    }

    static Optional<Laser> laser(JsonObject one) {
        return Entered.of(one, "wavelength")
                .map(wavelength -> new Laser(
                        wavelength,
                        Entered.of(one, "power"),
                        Entered.of(one, "pulseEnergy"),
                        Entered.of(one, "pulseLength"),
                        Entered.of(one, "waistAcross"),
                        Entered.of(one, "waistAlong"),
                        Entered.of(one, "area"),
                        Entered.of(one, "reflectivity"),
                        one.text("polarization")));
    }

    private static SetupFacet.Detector detector(JsonObject one) {
        SetupFacet.DeadTimeSort sort =
                switch (one.text("deadTimeSort").orElse("none")) {
                    case "fixed" -> SetupFacet.DeadTimeSort.FIXED;
                    case "prolonged" -> SetupFacet.DeadTimeSort.PROLONGED;
                    default -> SetupFacet.DeadTimeSort.NONE;
                };
        return new SetupFacet.Detector(
                one.text("sort").orElse(""),
                one.text("responds").equals(Optional.of("density")),
                Entered.of(one, "deadTime"),
                sort,
                Entered.of(one, "efficiency"),
                Entered.of(one, "position"));
    }

    private static SetupFacet.FieldPlates plates(JsonObject one) {
        return new SetupFacet.FieldPlates(
                Entered.of(one, "position"),
                Entered.of(one, "length"),
                Entered.of(one, "gap"),
                Entered.of(one, "fieldFactor"));
    }

    private static Optional<SetupFacet.RecoilLaser> recoil(JsonObject one) {
        return laser(one)
                .map(light -> new SetupFacet.RecoilLaser(
                        light,
                        Entered.of(one, "position"),
                        one.text("directions").equals(Optional.of("two"))));
    }

    private static SetupFacet.Slit slit(JsonObject one) {
        return new SetupFacet.Slit(
                one.text("name").orElse(""),
                Entered.of(one, "position"),
                Entered.of(one, "height"),
                Entered.of(one, "opening"),
                Entered.of(one, "width"));
    }
}
