package fringekeep.archive.quantity;

/**
 * A quantity as entered.
 *
 * @param text the decimal as typed, {@code .} as decimal sign
 * @param unit UCUM code
 * @param si SI value, the exact decimal times the exact factor, rounded once
 * @param uncertainty in one of four sorts
 */
public record Quantity(String text, String unit, double si, Uncertainty uncertainty) {}
