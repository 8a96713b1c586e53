package fringekeep.bundle.stated;

import java.time.LocalDate;
import java.util.List;
import java.util.regex.Pattern;

/**
 * What people state about a bundle; nothing in it is taken from a clock, so that two exports of the same records agree.
 *
 * @param name name of the folder: lower-case letters, digits, hyphens, at most 60
 * @param title title of the dataset
 * @param description what it is, one paragraph
 * @param published day of publication
 * @param license licence of the data
 * @param authors at least one
 * @param publisher who answers for it
 * @param keywords for search
 */
public record BundleSettings(
        String name,
        String title,
        String description,
        LocalDate published,
        License license,
        List<Author> authors,
        String publisher,
        List<String> keywords) {
    private static final Pattern NAME = Pattern.compile("[a-z0-9][a-z0-9-]{0,59}");

    /** Checks the name and that nothing required is empty. */
    public BundleSettings {
        authors = List.copyOf(authors);
        keywords = List.copyOf(keywords);
        if (!NAME.matcher(name).matches()) {
            throw new IllegalArgumentException(
                    "not a name for a bundle: " + name + "; lower-case letters, digits and hyphens, at most 60");
        }
        require("title", title);
        require("description", description);
        require("publisher", publisher);
        if (authors.isEmpty()) {
            throw new IllegalArgumentException("a bundle has at least one author");
        }
    }

    private static void require(String member, String text) {
        if (text.isBlank()) {
            throw new IllegalArgumentException("the " + member + " of a bundle is not empty");
        }
    }
}
