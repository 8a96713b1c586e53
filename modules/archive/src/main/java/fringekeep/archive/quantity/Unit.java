package fringekeep.archive.quantity;

import java.math.BigDecimal;

/**
 * A unit of the closed list: SI value = (number + offset) &times; factor, with an exact rational factor. Only the degree
 * Celsius has an offset. Immutable.
 */
public final class Unit {
    private final String code;
    private final Rational factor;
    private final Rational offset;
    private final Dimension dimension;

    Unit(String code, Rational factor, Rational offset, Dimension dimension) {
        this.code = code;
        this.factor = factor;
        this.offset = offset;
        this.dimension = dimension;
    }

    /** UCUM code as written. */
    public String code() {
        return code;
    }

    /** The code as people read it: {@code µm}, {@code Å}, {@code °C}, {@code m²}. */
    public String shown() {
        return UnitText.shown(code);
    }

    /** UCUM code of the coherent SI unit in base units, such as {@code m.kg.s-2}. */
    public String siCode() {
        return dimension.code();
    }

    /** Whether quantities in both units can be compared. */
    public boolean sameDimension(Unit other) {
        return dimension.equals(other.dimension);
    }

    /** The nearest double to a decimal in this unit, expressed in SI: exact arithmetic, one rounding. */
    public double toSi(BigDecimal number) {
        return Rational.of(number).plus(offset).times(factor).toDouble();
    }

    /** The nearest double to a difference in this unit (an uncertainty), expressed in SI: no offset. */
    public double differenceToSi(BigDecimal number) {
        return Rational.of(number).times(factor).toDouble();
    }

    /** An SI value expressed in this unit, for display. */
    public double fromSi(double si) {
        return Rational.of(new BigDecimal(si)).over(factor).minus(offset).toDouble();
    }

    /** A difference in SI (an uncertainty) expressed in this unit, for display. */
    public double differenceFromSi(double si) {
        return Rational.of(new BigDecimal(si)).over(factor).toDouble();
    }

    Rational factor() {
        return factor;
    }

    Dimension dimension() {
        return dimension;
    }

    boolean hasOffset() {
        return offset.numerator().signum() != 0;
    }

    @Override
    public String toString() {
        return code;
    }
}
