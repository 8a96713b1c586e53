package fringekeep.bundle.stated;

import java.util.Optional;
import java.util.regex.Pattern;

/**
 * A person or group named as author of the dataset.
 *
 * @param name full name as printed
 * @param orcid sixteen digits in groups of four, with its check character, when known
 * @param affiliation institution, when stated
 */
public record Author(String name, Optional<String> orcid, Optional<String> affiliation) {
    private static final Pattern FORM = Pattern.compile("\\d{4}-\\d{4}-\\d{4}-\\d{3}[\\dX]");

    /** Refuses an empty name and an ORCID whose check character is wrong. */
    public Author {
        if (name.isBlank()) {
            throw new IllegalArgumentException("an author has a name");
        }
        if (orcid.isPresent() && !isOrcid(orcid.get())) {
            throw new IllegalArgumentException(
                    "not an ORCID: " + orcid.get() + "; four groups of four, the last character a check character");
        }
    }

    /**
     * Whether a text is an ORCID with the right check character.
     *
     * <p>Source: ISO/IEC 7064, MOD 11-2.
     */
    public static boolean isOrcid(String text) {
        if (!FORM.matcher(text).matches()) {
            return false;
        }
        String digits = text.replace("-", "");
        int total = 0;
        for (int i = 0; i < 15; i++) {
            total = (total + (digits.charAt(i) - '0')) * 2;
        }
        int check = (12 - total % 11) % 11;
        return digits.charAt(15) == (check == 10 ? 'X' : (char) ('0' + check));
    }
}
