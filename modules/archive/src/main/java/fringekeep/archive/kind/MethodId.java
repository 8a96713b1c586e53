package fringekeep.archive.kind;

import java.util.regex.Pattern;

/** A method and its number, such as {@code fringe.poisson-likelihood/2}; the number rises when any bit may change. */
public record MethodId(String text) {
    private static final Pattern FORM = Pattern.compile("[a-z]+(\\.[a-z0-9]+(-[a-z0-9]+)*)+/[1-9][0-9]*");

    /** Checks the form. */
    public MethodId {
        if (!FORM.matcher(text).matches()) {
            throw new IllegalArgumentException("not a method id: " + text);
        }
    }

    /** The id without its number. */
    public String family() {
        return text.substring(0, text.indexOf('/'));
    }

    @Override
    public String toString() {
        return text;
    }
}
