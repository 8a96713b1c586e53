package fringekeep.scan.internal.reading;

import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.List;
import java.util.Optional;

/** Finds header values by their key. A section's own value goes before one shared by all sections. */
final class HeaderLines {
    private final Profile profile;
    private final Section section;
    private final String file;

    HeaderLines(Profile profile, Section section, String file) {
        this.profile = profile;
        this.section = section;
        this.file = file;
    }

    /**
     * A value and where it stands.
     *
     * @param text without blanks around it, never empty
     * @param place file, line and column
     */
    record Value(String text, String place) {}

    /**
     * The value of a key; absent when the key is missing or has no value.
     *
     * @throws ProblemException if the section has the key twice with different values
     */
    Optional<Value> find(String key) throws ProblemException {
        Optional<Value> own = find(key, section.header());
        return own.isPresent() ? own : find(key, section.shared());
    }

    private Optional<Value> find(String key, List<Line> lines) throws ProblemException {
        Optional<Value> found = Optional.empty();
        for (Line line : lines) {
            Optional<Value> value = value(key, line);
            if (value.isPresent()
                    && found.isPresent()
                    && !found.get().text().equals(value.get().text())) {
                throw new ProblemException(ScanProblems.of(
                        "scan.header-twice",
                        value.get().place(),
                        key,
                        found.get().text(),
                        value.get().text()));
            }
            found = found.isPresent() ? found : value;
        }
        return found;
    }

    private Optional<Value> value(String key, Line line) {
        int separator = separator(line.text());
        if (separator < 0 || !line.text().substring(0, separator).strip().equalsIgnoreCase(key)) {
            return Optional.empty();
        }
        String rest = line.text().substring(separator + separatorLength());
        boolean fields = line.text().startsWith(profile.delimiter(), separator);
        String text = unquoted((fields ? rest.replace(profile.delimiter().charAt(0), ' ') : rest).strip());
        int column = separator + separatorLength() + rest.indexOf(rest.strip()) + 1;
        return text.isEmpty() ? Optional.empty() : Optional.of(new Value(text, line.place(file, column)));
    }

    private int separatorLength() {
        return profile.keySeparator().isEmpty() ? 1 : profile.keySeparator().length();
    }

    private int separator(String text) {
        if (!profile.keySeparator().isEmpty()) {
            return text.indexOf(profile.keySeparator());
        }
        String delimiter = profile.delimiter().equals(Profile.WHITE_SPACE) ? "" : profile.delimiter();
        String candidates = ":=" + delimiter;
        for (int i = 0; i < text.length(); i++) {
            if (candidates.indexOf(text.charAt(i)) >= 0) {
                return i;
            }
        }
        return -1;
    }

    private static String unquoted(String text) {
        boolean quoted = text.length() >= 2 && text.startsWith("\"") && text.endsWith("\"");
        return quoted ? text.substring(1, text.length() - 1).strip() : text;
    }
}
