package fringekeep.archive.kind;

/**
 * Something of an input or a choice that "suppose" and the uncertainty budget may turn.
 *
 * @param name such as {@code calibration 2 scale}
 * @param input position of the input it belongs to, or -1 for a choice
 * @param pointer JSON pointer into the part that holds it
 * @param value present value (SI)
 * @param deviation its standard uncertainty (SI), 0 when exact, NaN when not stated
 * @param unit UCUM code (SI)
 */
public record Knob(String name, int input, String pointer, double value, double deviation, String unit) {}
