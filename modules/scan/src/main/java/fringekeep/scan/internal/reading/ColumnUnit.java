package fringekeep.scan.internal.reading;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import java.math.BigDecimal;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Unit of a column or header value: how its decimals become SI, exactly and rounded once.
 *
 * @param code UCUM code in the file
 * @param siCode UCUM code of the SI unit, with the name of its own where it has one ({@code W}, not {@code m2.kg.s-3})
 */
record ColumnUnit(String code, String siCode, Unit unit) {
    private static final List<Unit> NAMED = List.of("W", "J", "Pa", "V", "N", "C", "T", "Ohm", "1/s").stream()
            .map(Units::of)
            .toList();

    /** The pure number. */
    static final ColumnUnit ONE = of("1");

    /**
     * The unit of a code that was examined before.
     *
     * @throws IllegalArgumentException if there is no such unit
     */
    static ColumnUnit of(String code) {
        return of(Units.of(code));
    }

    private static ColumnUnit of(Unit unit) {
        String si = NAMED.stream()
                .filter(unit::sameDimension)
                .map(Unit::code)
                .findFirst()
                .orElse(unit.siCode());
        return new ColumnUnit(unit.code(), si, unit);
    }

    /** The unit that people write, such as {@code µm} or {@code °C}; empty if it is not known. */
    static Optional<ColumnUnit> written(String text) {
        String code = text.replace('\u00b5', 'u')
                .replace('\u03bc', 'u')
                .replace("\u00b0C", "Cel")
                .replace("\u00b0", "deg")
                .replace("\u00c5", "Ao")
                .replace("\u00b2", "2")
                .replace("\u00b3", "3")
                .replace('\u00b7', '.');
        try {
            return Optional.of(of(Units.parse(code)));
        } catch (ProblemException e) {
            return Optional.empty();
        }
    }

    /** SI value of a decimal with {@code .} as decimal sign; infinite when too large. */
    double si(String decimal) {
        return siCode.equals(code) ? Double.parseDouble(decimal) + 0.0 : unit.toSi(new BigDecimal(decimal));
    }

    /** SI value of a difference, such as an uncertainty. */
    double siDifference(String decimal) {
        return unit.differenceToSi(new BigDecimal(decimal));
    }

    /** The SI unit as the end of a column name; empty for pure numbers. */
    String suffix() {
        if (siCode.equals("1")) {
            return "";
        }
        StringBuilder suffix = new StringBuilder();
        for (String factor : siCode.replace("1/s", "s-1").split("\\.")) {
            String[] parts = factor.split("-");
            suffix.append(suffix.isEmpty() ? "" : "_")
                    .append(parts.length > 1 ? "per_" : "")
                    .append(parts[0]);
            suffix.append(parts.length > 1 && !parts[1].equals("1") ? parts[1] : "");
        }
        return suffix.toString().toLowerCase(Locale.ROOT);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof ColumnUnit same && same.code.equals(code);
    }

    @Override
    public int hashCode() {
        return code.hashCode();
    }
}
