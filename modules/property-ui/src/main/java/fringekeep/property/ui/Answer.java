package fringekeep.property.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.drawing.NumberText;
import fringekeep.drawing.Picture;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What came out, as the sheet shows it.
 *
 * @param picture points, both curves with their bands
 * @param quantities stated values, statistical and shared uncertainty apart
 * @param shared what is shared between scans, in per cent of the polarizability
 * @param say what the data say of the two descriptions
 * @param moved estimates against the former revision
 * @param volume polarizability volume and its standard uncertainty (m3)
 * @param warnings what a reader should know
 */
record Answer(
        Picture picture,
        List<Quantity> quantities,
        List<Shared> shared,
        Say say,
        List<Moved> moved,
        double[] volume,
        List<String> warnings) {
    private static final double PER_CENT = 100;

    /** Parts of so small a share of all that is shared are gathered in one row. */
    private static final double NEGLIGIBLE = 0.01;

    private static final Inputs NONE = new Inputs() {
        @Override
        public List<Input> all() {
            return List.of();
        }

        @Override
        public List<Subject> about() {
            return List.of();
        }
    };
    private static final List<Member> MEMBERS = List.of(
            new Member("polarizabilityVolume", "Ao3", "fitted"),
            new Member("polarizability", "C.m2/V", "same.si"),
            new Member("polarizabilityAtomic", "1", "same"),
            new Member("absorptionCrossSection", "m2", "fitted"),
            new Member("visibilityFactor", "1", "fitted"));

    private record Member(String name, String unit, String how) {}

    /** A row of the table of quantities. */
    record Quantity(String name, String value, String statistical, String shared, String unit, String how) {}

    /** A row of what is shared. */
    record Shared(String name, String percent, boolean strong) {}

    /**
     * What the data say.
     *
     * @param ratio ln L of quantum less that of classical
     * @param threshold difference from which one is preferred
     * @param ifQuantum ratio to be expected if the quantum fit is true
     * @param ifClassical ratio to be expected if the classical fit is true
     * @param verdict code
     * @param words the sentence
     */
    record Say(
            double ratio,
            double threshold,
            OptionalDouble ifQuantum,
            OptionalDouble ifClassical,
            String verdict,
            String words) {}

    /** An estimate that moved. */
    record Moved(String name, String before, String after, String sigma) {}

    /** Reads the answer of a property; asks the archive for labels. */
    static Answer of(Archive archive, RecordView property, Optional<Hash> former) {
        JsonObject result = property.result();
        List<Picture> pictures = archive.kinds()
                .get(new KindName("property"))
                .map(kind -> kind.drawings(property, NONE))
                .orElse(List.of());
        return new Answer(
                pictures.get(0),
                quantities(result),
                shared(archive, result),
                say(result),
                former.flatMap(archive::record)
                        .map(old -> moved(old.result(), result))
                        .orElse(List.of()),
                volume(result),
                warnings(property));
    }

    private static double[] volume(JsonObject result) {
        JsonObject volume = result.object("polarizabilityVolume").orElse(JsonObject.EMPTY);
        return new double[] {
            volume.number("value").orElse(Double.NaN), volume.number("u").orElse(Double.NaN)
        };
    }

    private static List<Quantity> quantities(JsonObject result) {
        List<Quantity> rows = new ArrayList<>();
        for (Member member : MEMBERS) {
            result.object(member.name()).ifPresent(stated -> rows.add(quantity(member, stated)));
        }
        return rows;
    }

    /** All three brought to one power of ten, so that they can be compared by eye. */
    private static Quantity quantity(Member member, JsonObject stated) {
        double value = Units.of(member.unit()).fromSi(stated.number("value").orElse(Double.NaN));
        double statistical = difference(member, stated, "statistical");
        double shared = difference(member, stated, "shared");
        int power = exponent(value);
        int shift = power >= 5 || power < -3 ? power : 0;
        double scale = StrictMath.pow(10, -shift);
        double u = difference(member, stated, "u") * scale;
        int places = u > 0 ? Math.max(0, 1 - exponent(u)) : 4;
        String unit = Units.of(member.unit()).shown();
        String ten = shift == 0 ? "" : NumberText.power(shift).replace(" \u00D7 ", "");
        return new Quantity(
                PropertyWords.TEXTS.of("quantity." + member.name()),
                NumberText.fixed(value * scale, places),
                digits(statistical * scale),
                digits(shared * scale),
                (ten + " "
                                + (unit.equals("1") && member.name().endsWith("Atomic")
                                        ? PropertyWords.TEXTS.of("unit.atomic")
                                        : unit))
                        .strip(),
                PropertyWords.TEXTS.of("how." + member.how()));
    }

    private static double difference(Member member, JsonObject stated, String part) {
        return Units.of(member.unit()).differenceFromSi(stated.number(part).orElse(0));
    }

    /** An uncertainty with two digits. */
    private static String digits(double u) {
        return u > 0 ? NumberText.fixed(u, Math.max(0, 1 - exponent(u))) : "\u2013";
    }

    private static int exponent(double value) {
        return value == 0 || !Double.isFinite(value) ? 0 : (int) Math.floor(StrictMath.log10(Math.abs(value)));
    }

    private static List<Shared> shared(Archive archive, JsonObject result) {
        JsonObject volume = result.object("polarizabilityVolume").orElse(JsonObject.EMPTY);
        double value = Math.abs(volume.number("value").orElse(Double.NaN));
        double all = volume.number("shared").orElse(0);
        List<Shared> rows = new ArrayList<>();
        double smaller = 0;
        int count = 0;
        for (JsonObject each : result.array("sensitivities").objects()) {
            double part = Math.abs(each.array("derivatives").numbers()[0]
                    * each.number("deviation").orElse(0));
            if (part < NEGLIGIBLE * all) {
                smaller += part * part;
                count++;
            } else {
                String source = archive.label(new Hash(each.text("source").orElseThrow()));
                String parameter = PropertyWords.TEXTS.orElse(
                        "parameter." + each.text("parameter").orElse(""),
                        each.text("parameter")
                                .orElse("")
                                .replaceAll("([a-z])([A-Z0-9])", "$1 $2")
                                .toLowerCase(java.util.Locale.ROOT));
                rows.add(new Shared(source + ", " + parameter, percent(part / value), false));
            }
        }
        if (count > 0) {
            rows.add(new Shared(
                    PropertyWords.TEXTS.of("shared.smaller", count), percent(Math.sqrt(smaller) / value), false));
        }
        rows.add(new Shared(PropertyWords.TEXTS.of("shared.all"), percent(all / value), true));
        rows.add(new Shared(
                PropertyWords.TEXTS.of("shared.statistical"),
                percent(volume.number("statistical").orElse(0) / value),
                false));
        return rows;
    }

    private static String percent(double share) {
        return NumberText.significant(share * PER_CENT, 2);
    }

    private static Say say(JsonObject result) {
        return new Say(
                result.number("logLikelihoodRatio").orElse(0),
                result.number("threshold").orElse(1),
                result.number("expectedIfQuantum"),
                result.number("expectedIfClassical"),
                result.text("verdict").orElse("cannot-tell"),
                result.text("reason").orElse(""));
    }

    private static List<Moved> moved(JsonObject old, JsonObject now) {
        List<Moved> rows = new ArrayList<>();
        for (Member member : MEMBERS) {
            Optional<JsonObject> before = old.object(member.name());
            Optional<JsonObject> after = now.object(member.name());
            if (before.isPresent() && after.isPresent() && !member.how().startsWith("same")) {
                rows.add(moved(member, before.get(), after.get()));
            }
        }
        return rows;
    }

    private static Moved moved(Member member, JsonObject before, JsonObject after) {
        double u = before.number("u").orElse(0);
        double change = after.number("value").orElse(0) - before.number("value").orElse(0);
        String sigma = u > 0 ? NumberText.fixed(change / u, 2) + " \u03c3" : "\u2013";
        return new Moved(
                PropertyWords.TEXTS.of("quantity." + member.name()),
                estimate(member, before),
                estimate(member, after),
                change > 0 ? "+" + sigma : sigma);
    }

    private static String estimate(Member member, JsonObject stated) {
        return ValueText.estimate(
                stated.number("value").orElse(Double.NaN),
                stated.number("u").orElse(Double.NaN),
                Units.of(member.unit()));
    }

    private static List<String> warnings(RecordView property) {
        String description = property.choices().text("description").orElse("quantum");
        List<String> words = new ArrayList<>();
        property.result()
                .object(description)
                .ifPresent(fit -> fit.array("warnings")
                        .objects()
                        .forEach(warning -> words.add(warning.text("words").orElse(""))));
        property.result()
                .array("notStated")
                .texts()
                .forEach(name -> words.add(PropertyWords.TEXTS.of("not-stated", name)));
        return words;
    }
}
