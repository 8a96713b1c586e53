package fringekeep.archive.json;

/** A JSON value without null (record format 1 refuses null). Immutable. */
public sealed interface Json permits JsonObject, JsonArray, JsonText, JsonNumber, JsonBoolean {
    /** A text. */
    static Json of(String text) {
        return new JsonText(text);
    }

    /** A finite number; -0 becomes 0. */
    static Json of(double number) {
        return new JsonNumber(number);
    }

    /** True or false. */
    static Json of(boolean value) {
        return new JsonBoolean(value);
    }
}
