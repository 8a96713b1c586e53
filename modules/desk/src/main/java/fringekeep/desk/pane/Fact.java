package fringekeep.desk.pane;

/**
 * One ruled fact.
 *
 * @param name what
 * @param entered as entered, empty where nothing was entered as text
 * @param value value in SI with its uncertainty, or the text
 * @param unit unit of the value, empty for pure numbers and texts
 */
public record Fact(String name, String entered, String value, String unit) {
    /** A text. */
    public static Fact text(String name, String value) {
        return new Fact(name, "", value, "");
    }

    /** The same with a unit. */
    Fact withUnit(String words) {
        return new Fact(name, entered, value, words);
    }
}
