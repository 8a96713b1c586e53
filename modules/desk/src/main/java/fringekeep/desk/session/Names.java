package fringekeep.desk.session;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.Hash;
import java.util.Optional;

/** What records are called; asks the archive, so not to be used on the window thread. */
public final class Names {
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
    public static String named(Archive archive, Hash record) {
        String label = archive.label(record);
        String words =
                archive.record(record).map(view -> title(archive, view).text()).orElse("");
        return words.isEmpty() || label.contains(words) ? label : label + " (" + words + ")";
    }

    /** The label without its kind: {@code 0412} of {@code scan 0412}. */
    public static String number(String label, String kind) {
        String prefix = Stops.label(kind) + " ";
        return label.startsWith(prefix)
                ? label.substring(prefix.length())
                : label.startsWith(kind + " ") ? label.substring(kind.length() + 1) : label;
    }
}
