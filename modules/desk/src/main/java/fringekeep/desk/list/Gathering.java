package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntFunction;

/** How rows are gathered under heads: by a linked record such as the run, by a column's text, by measurement day, or not. */
final class Gathering {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", Gathering.class);
    private static final String DAY = "day";

    private final IntFunction<String> key;
    private final Heads heads;
    private final boolean dated;
    private List<String> keys = List.of();

    private interface Heads {
        Group head(String key);
    }

    private Gathering(IntFunction<String> key, Heads heads, boolean dated) {
        this.key = key;
        this.heads = heads;
        this.dated = dated;
    }

    /** Gathering by a word of the table of stops. */
    static Gathering by(Archive archive, Stops stops, Clock clock, Joined joined, String kind, String by, Work work)
            throws ProblemException, StoppedException {
        if (by.isEmpty()) {
            return new Gathering(place -> "", one -> new Group(one, ""), false);
        }
        if (by.equals(DAY)) {
            return new Gathering(days(archive, clock, joined, kind, work), one -> new Group(one, ""), true);
        }
        Spec spec = Spec.of(by);
        if (spec.column().isEmpty()) {
            String other = spec.kind(kind);
            int[] over = joined.places(kind, spec.way(), work);
            return new Gathering(
                    place -> over[place] < 0 ? "" : Integer.toString(over[place]),
                    one -> record(archive, stops, clock, joined, other, one),
                    true);
        }
        Optional<Values> values = joined.values(spec.kind(kind), spec.column(), work);
        Optional<int[]> over =
                spec.way().isEmpty() ? Optional.empty() : Optional.of(joined.places(kind, spec.way(), work));
        return new Gathering(
                place -> text(values, over.map(places -> places[place]).orElse(place)),
                one -> new Group(one.isEmpty() ? TEXTS.of("group.none") : CellText.plainWords(one), ""),
                false);
    }

    private static String text(Optional<Values> values, int place) {
        return place < 0 || values.isEmpty() || Double.isNaN(values.get().numbers()[place])
                ? ""
                : values.get().words().get((int) values.get().numbers()[place]);
    }

    /** By the first instant of the kind's table; records without one stand in no group. */
    private static IntFunction<String> days(Archive archive, Clock clock, Joined joined, String kind, Work work)
            throws ProblemException, StoppedException {
        List<Values> instants = new ArrayList<>();
        for (Column column :
                Joined.table(archive, kind).map(Projection::columns).orElse(List.of())) {
            if (column.sort() == Column.Sort.INSTANT) {
                joined.values(kind, column.name(), work).ifPresent(instants::add);
            }
        }
        Register register = joined.register();
        return place -> instants.stream()
                .map(all -> all.numbers()[place])
                .filter(seconds -> !Double.isNaN(seconds))
                .findFirst()
                .map(seconds -> Instant.ofEpochSecond((long) Math.floor(seconds)))
                .or(() -> archive.recorded(register.record(kind, place)).map(Archive.Recorded::at))
                .map(at -> Clock.words(clock.day(at)))
                .orElse("");
    }

    private static Group record(Archive archive, Stops stops, Clock clock, Joined joined, String kind, String place) {
        if (place.isEmpty()) {
            return new Group(TEXTS.of("group.without", Stops.label(kind)), "");
        }
        Hash record = joined.register().record(kind, Integer.parseInt(place));
        String number = Names.shortNumber(archive.label(record), kind, clock);
        String label = stops.entry(kind, "short").stream().findFirst().orElse(Stops.label(kind));
        String words = archive.record(record)
                .map(view -> Names.title(archive, view).text())
                .orElse("");
        return new Group(
                label + " " + number.replaceFirst("^0+(?=[0-9])", "") + "   " + words,
                right(archive, stops, clock, joined, kind, record));
    }

    /** What stands at the right of a group's head: told columns of the record. */
    private static String right(Archive archive, Stops stops, Clock clock, Joined joined, String kind, Hash record) {
        Row row = joined.row(record);
        List<String> words = new ArrayList<>();
        CellText text = new CellText(clock, false);
        for (Shown one : Shown.of(archive, stops, kind, stops.entry(kind, "right"))) {
            Object value = row.values().get(one.column().name());
            if (value instanceof Instant at) {
                words.add(TEXTS.of("group.from", clock.moment(at)));
            } else if (value != null) {
                words.add(text.withUnit(one.column(), one.all(), row));
            }
        }
        return stops.entry(kind, "right").isEmpty() ? "" : String.join(", ", words);
    }

    /** Whether heads tell the day, so that times alone do in the rows. */
    boolean dated() {
        return dated;
    }

    /** What stands in each row. */
    int[] rows(int[] places) {
        Map<String, Integer> numbers = new LinkedHashMap<>();
        int[] groupOf = new int[places.length];
        for (int i = 0; i < places.length; i++) {
            String one = key.apply(places[i]);
            Integer known = numbers.get(one);
            if (known == null) {
                known = numbers.size();
                numbers.put(one, known);
            }
            groupOf[i] = known;
        }
        keys = List.copyOf(numbers.keySet());
        boolean none = keys.size() <= 1 && (keys.isEmpty() || keys.get(0).isEmpty());
        return none ? places : RowOrder.gathered(places, groupOf, keys.size());
    }

    /** Head of a group. */
    Group head(int group) {
        return heads.head(keys.get(group));
    }
}
