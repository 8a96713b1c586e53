package fringekeep.archive.record;

import java.util.regex.Pattern;

/** Name of a kind, such as {@code source-run}: lower-case words joined by hyphens, at most 40 characters. */
public record KindName(String text) implements Comparable<KindName> {
    private static final Pattern FORM = Pattern.compile("[a-z]+(-[a-z]+)*");

    /** Checks the form. */
    public KindName {
        if (text.length() > 40 || !FORM.matcher(text).matches()) {
            throw new IllegalArgumentException("not a kind name: " + text);
        }
    }

    @Override
    public int compareTo(KindName other) {
        return text.compareTo(other.text);
    }

    @Override
    public String toString() {
        return text;
    }
}
