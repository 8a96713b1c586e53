package fringekeep.desk.session;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** What records are called; asks the archive, so not to be used on the window thread. */
public final class Names {
    private static final Pattern FROM =
            Pattern.compile("(.+) from ([0-9]{4}-[0-9]{2}-[0-9]{2}T[0-9]{2}:[0-9]{2}:[0-9]{2}(?:\\.[0-9]+)?Z)(.*)");

    private static final Pattern HYPHENS = Pattern.compile("([a-z]+(?:-[a-z]+)+) ");

    private Names() {}

    /** The kind of a record, where this program knows it. */
    public static Optional<RecordKind> kind(Archive archive, RecordView record) {
        return archive.kinds().get(record.head().kind());
    }

    /** Title of a record; empty words where the kind is not known. */
    public static Title title(Archive archive, RecordView record) {
        Inputs inputs = archive.inputs(record.fingerprint());
        return kind(archive, record).map(kind -> kind.title(record, inputs)).orElseGet(() -> new Title("", ""));
    }

    /** {@code calibration 9 (power meter scale)}; the label alone where there are no words. */
    public static String named(Archive archive, Hash record, Clock clock) {
        String label = shortLabel(archive.label(record), clock);
        String words =
                archive.record(record).map(view -> title(archive, view).text()).orElse("");
        return words.isEmpty() || label.contains(words) ? label : label + " (" + words + ")";
    }

    /**
     * The label as people read it: {@code calibration 1 from 21 Oct}, not with the whole instant it begins at; leading noughts
     * stay where there are many records of a kind.
     */
    public static String shortLabel(String label, Clock clock) {
        Matcher kind = HYPHENS.matcher(label);
        if (kind.lookingAt()) {
            return shortLabel(Stops.label(kind.group(1)) + label.substring(kind.end(1)), clock);
        }
        Matcher matcher = FROM.matcher(label);
        if (!matcher.matches()) {
            return label;
        }
        Instant from = Instant.parse(matcher.group(2));
        return matcher.group(1) + " from " + clock.moment(from) + matcher.group(3);
    }

    /** The number in as few letters as it takes: {@code 1, 21 Oct} for a continuation, {@code 1 b} for a correction. */
    public static String shortNumber(String label, String kind, Clock clock) {
        String number = number(label, kind);
        Matcher matcher = FROM.matcher(number);
        if (!matcher.matches()) {
            return number;
        }
        Instant from = Instant.parse(matcher.group(2));
        String bare = matcher.group(1).replaceFirst("^0+(?=[0-9])", "");
        return bare + ", " + clock.dayAndMonth(from) + matcher.group(3);
    }

    /** The same with the clock of the archive. */
    public static String named(Archive archive, Hash record) {
        return named(archive, record, new Clock(archive.facts()));
    }

    /** The label without its kind: {@code 0412} of {@code scan 0412}. */
    public static String number(String label, String kind) {
        String prefix = Stops.label(kind) + " ";
        return label.startsWith(prefix)
                ? label.substring(prefix.length())
                : label.startsWith(kind + " ") ? label.substring(kind.length() + 1) : label;
    }
}
