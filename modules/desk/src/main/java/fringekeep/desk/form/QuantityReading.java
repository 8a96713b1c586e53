package fringekeep.desk.form;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.archive.quantity.Uncertainty;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;
import java.util.Optional;

/**
 * A quantity as it is being typed: what it is in SI, or what cannot be read, in the words the headless program uses.
 *
 * @param text as typed
 * @param quantity what it says, where it can be read
 * @param problems what is wrong with it
 */
public record QuantityReading(String text, Optional<Quantity> quantity, List<Problem> problems) {
    private static final String RAISED = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    /** Copies. */
    public QuantityReading {
        problems = List.copyOf(problems);
    }

    /**
     * Reads a text; an empty one says nothing and is no problem.
     *
     * @param siUnit UCUM code of the SI unit it must reduce to; empty = any
     */
    public static QuantityReading of(String text, Optional<String> siUnit) {
        if (text.isBlank()) {
            return new QuantityReading(text, Optional.empty(), List.of());
        }
        try {
            Quantity quantity = QuantityText.parse(text);
            List<Problem> problems = QuantityJson.examine(quantity, siUnit, "");
            return new QuantityReading(text, problems.isEmpty() ? Optional.of(quantity) : Optional.empty(), problems);
        } catch (ProblemException e) {
            return new QuantityReading(text, Optional.empty(), e.problems());
        }
    }

    /** The SI value with its uncertainty, powers of ten in steps of three: {@code 105.000(50) × 10⁻³}. */
    public String si() {
        return quantity.map(QuantityReading::si).orElse("");
    }

    /** The SI unit as people read it: the asked one, else in base units. */
    public String siUnit(Optional<String> asked) {
        return quantity.map(one -> shown(asked.orElse(Units.of(one.unit()).siCode())))
                .orElse("");
    }

    private static String shown(String code) {
        return code.equals("1") ? "" : Units.of(code).shown();
    }

    private static String si(Quantity quantity) {
        BigDecimal value = BigDecimal.valueOf(quantity.si());
        int power = power(value);
        double mantissa = value.movePointLeft(power).doubleValue();
        String tail = power == 0 ? "" : " × 10" + raised(power);
        Uncertainty uncertainty = quantity.uncertainty();
        if (uncertainty instanceof Uncertainty.Stated stated) {
            double deviation =
                    BigDecimal.valueOf(stated.si()).movePointLeft(power).doubleValue();
            return ValueText.estimate(mantissa, deviation) + tail;
        }
        String digits = digits(quantity, mantissa) + tail;
        if (uncertainty instanceof Uncertainty.Bounds bounds) {
            return digits + " ["
                    + end(bounds.lower().isPresent(), bounds.lower().orElse(0)) + " … "
                    + end(bounds.upper().isPresent(), bounds.upper().orElse(0)) + "]";
        }
        return digits + " " + (uncertainty instanceof Uncertainty.Exact ? ValueText.EXACT : ValueText.NOT_STATED);
    }

    private static String end(boolean present, double si) {
        return present ? ValueText.number(si) : "";
    }

    /** As many digits as were typed, at most fifteen. */
    private static String digits(Quantity quantity, double mantissa) {
        int typed = Math.max(1, Math.min(15, new BigDecimal(quantity.text()).precision()));
        BigDecimal rounded = new BigDecimal(mantissa).round(new MathContext(typed, RoundingMode.HALF_EVEN));
        return rounded.toPlainString().replace('-', '−');
    }

    private static int power(BigDecimal value) {
        if (value.signum() == 0) {
            return 0;
        }
        int exponent = value.precision() - value.scale() - 1;
        return exponent >= 0 && exponent < 3 ? 0 : Math.floorDiv(exponent, 3) * 3;
    }

    private static String raised(int number) {
        StringBuilder text = new StringBuilder();
        for (char c : Integer.toString(number).toCharArray()) {
            text.append(c == '-' ? '⁻' : RAISED.charAt(c - '0'));
        }
        return text.toString();
    }

    /** How much it changed from an earlier one, in that one's unit: {@code −94.5 mm}; empty where it cannot be said. */
    public String change(QuantityReading before) {
        if (quantity.isEmpty() || before.quantity.isEmpty()) {
            return "";
        }
        Unit unit = Units.of(before.quantity.get().unit());
        if (!unit.sameDimension(Units.of(quantity.get().unit()))) {
            return "";
        }
        BigDecimal difference = BigDecimal.valueOf(quantity.get().si())
                .subtract(BigDecimal.valueOf(before.quantity.get().si()));
        if (difference.signum() == 0) {
            return "";
        }
        double shown = unit.differenceFromSi(difference.doubleValue());
        String number = ValueText.number(shown);
        return (shown > 0 ? "+" : "") + number + (unit.code().equals("1") ? "" : " " + unit.shown());
    }

    /** A quantity as it may be typed, the deviation in brackets where that says the same. */
    static String text(Quantity quantity) throws ProblemException {
        String shown = ValueText.entered(quantity);
        boolean stated = quantity.uncertainty() instanceof Uncertainty.Stated;
        boolean plain = stated && shown.indexOf('\u2009') < 0 && shown.indexOf('±') < 0;
        return plain && QuantityText.parse(shown).equals(quantity) ? shown : QuantityText.write(quantity);
    }

    /** The same quantity with its decimal sign moved, uncertainty moved with it; as typed. */
    Optional<String> moved(int places) {
        return quantity.flatMap(one -> {
            try {
                BigDecimal number = new BigDecimal(one.text()).movePointRight(places);
                Optional<String> deviation = one.uncertainty() instanceof Uncertainty.Stated stated
                        ? Optional.of(new BigDecimal(stated.text())
                                .movePointRight(places)
                                .toPlainString())
                        : Optional.empty();
                Quantity moved = QuantityText.of(number.toPlainString(), one.unit(), deviation);
                return Optional.of(text(moved));
            } catch (ProblemException e) {
                return Optional.empty(); // no such quantity can be written: then it is not offered
            }
        });
    }
}
