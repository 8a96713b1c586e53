package fringekeep.desk.form;

import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import fringekeep.desk.look.Texts;
import java.util.Map;
import java.util.Optional;

/**
 * What earlier records of the same thing said, so that a value far from them can be questioned.
 *
 * @param ranges least and greatest value at each place
 */
record Earlier(Map<String, Range> ranges) {
    /** Nothing is known yet. */
    static final Earlier NOTHING = new Earlier(Map.of());

    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", Earlier.class);
    private static final double FAR = 2;
    private static final int LARGEST_SLIP = 3;

    /** Copies. */
    Earlier {
        ranges = Map.copyOf(ranges);
    }

    /**
     * The values at one place.
     *
     * @param least least (SI)
     * @param greatest greatest (SI)
     * @param count in how many records
     * @param unit UCUM code in which they are told
     */
    record Range(double least, double greatest, int count, String unit) {
        Range with(Quantity next) {
            return new Range(Math.min(least, next.si()), Math.max(greatest, next.si()), count + 1, unit);
        }

        static Range of(Quantity one) {
            return new Range(one.si(), one.si(), 1, one.unit());
        }

        boolean far(double si) {
            double low = least > 0 ? least / FAR : least * FAR;
            double high = greatest > 0 ? greatest * FAR : greatest / FAR;
            return si < low || si > high;
        }

        String words(String kind) {
            Unit shown = Units.of(unit);
            String behind = unit.equals("1") ? "" : " " + shown.shown();
            String low = ValueText.number(shown.fromSi(least));
            String high = ValueText.number(shown.fromSi(greatest));
            if (low.equals(high)) {
                return TEXTS.of(count == 1 ? "earlier.one" : "earlier.same", count, kind, low + behind);
            }
            return TEXTS.of("earlier.many", count, kind, low, high + behind);
        }
    }

    /** A question about a value, and what else it may have been meant to be. */
    record Question(String words, Optional<String> instead) {}

    /** What is to be asked about a value, if anything. */
    Optional<Question> question(String pointer, Asked.Leaf leaf, QuantityReading now, String before, String kinds) {
        if (now.quantity().isEmpty()) {
            return Optional.empty();
        }
        Quantity quantity = now.quantity().get();
        String said = ValueText.brief(quantity);
        Optional<Range> range = Optional.ofNullable(ranges.get(pointer))
                .filter(one -> Units.of(one.unit()).sameDimension(Units.of(quantity.unit())));
        if (range.filter(one -> one.far(quantity.si())).isPresent()) {
            return Optional.of(new Question(
                    TEXTS.of("question.far", said, range.get().words(kinds)), instead(now, range.get(), before)));
        }
        double si = quantity.si();
        boolean usual =
                si >= leaf.usualFrom().orElse(si) && si <= leaf.usualTo().orElse(si);
        return usual
                ? Optional.empty()
                : Optional.of(new Question(
                        TEXTS.of("question.unusual", said, end(leaf.usualFrom()), end(leaf.usualTo()), unit(leaf)),
                        Optional.of(before).filter(text -> !text.isEmpty())));
    }

    private static String end(java.util.OptionalDouble end) {
        return end.isPresent() ? ValueText.number(end.getAsDouble()) : "…";
    }

    private static String unit(Asked.Leaf leaf) {
        return leaf.siUnit()
                .filter(code -> !code.equals("1"))
                .map(code -> " " + Units.of(code).shown())
                .orElse("");
    }

    /** A slip of the decimal sign is offered first, then what stood before. */
    private static Optional<String> instead(QuantityReading now, Range range, String before) {
        for (int slip = 1; slip <= LARGEST_SLIP; slip++) {
            for (int places : new int[] {slip, -slip}) {
                Optional<String> moved = now.moved(places);
                boolean near = moved.map(text -> QuantityReading.of(text, Optional.empty()))
                        .flatMap(QuantityReading::quantity)
                        .filter(quantity -> !range.far(quantity.si()))
                        .isPresent();
                if (near) {
                    return moved;
                }
            }
        }
        return Optional.of(before).filter(text -> !text.isEmpty());
    }
}
