package fringekeep.instrument;

import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import java.util.List;

/** The SI unit a quantity is stored in, under its usual code where it has one. */
final class SiUnits {
    private static final List<String> NAMED =
            List.of("Pa", "W", "V", "J", "A", "T", "Hz", "N", "C", "K", "m", "s", "kg", "mol", "rad");

    private SiUnits() {}

    /** UCUM code of the coherent SI unit. */
    static String code(Unit unit) {
        for (String name : NAMED) {
            if (unit.sameDimension(Units.of(name))) {
                return name;
            }
        }
        return unit.siCode();
    }

    /** The code as the end of a column's name: {@code pa}, {@code m_s_1}; empty for pure numbers. */
    static String suffix(String code) {
        if (code.equals("1")) {
            return "";
        }
        StringBuilder suffix = new StringBuilder("_");
        code.chars().forEach(c -> {
            boolean letter = c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z' || c >= '0' && c <= '9';
            suffix.append(letter ? (char) Character.toLowerCase(c) : '_');
        });
        return suffix.toString();
    }
}
