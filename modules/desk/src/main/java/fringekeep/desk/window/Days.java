package fringekeep.desk.window;

import fringekeep.archive.Archive;
import fringekeep.archive.record.Hash;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.View;
import fringekeep.desk.stage.DeskHand;
import java.time.LocalDate;
import java.util.Comparator;
import java.util.Optional;
import java.util.Set;

/** Goes from one measurement day to another on which something was recorded. */
final class Days {
    private final Desk desk;
    private final DeskHand hand;

    Days(Desk desk, DeskHand hand) {
        this.desk = desk;
        this.hand = hand;
    }

    /** The day of the record in hand, else the last one, in view. */
    void here() {
        show(0);
    }

    /** The next day with entries, or the one before. */
    void step(int by) {
        show(by);
    }

    private void show(int by) {
        Archive archive = hand.archive();
        Optional<Hash> inHand = hand.selection().inHand();
        View now = desk.view();
        desk.views()
                .ifPresent(views -> hand.run(
                        "days",
                        work -> day(views.days().keySet(), from(archive, now, inHand), by),
                        day -> day.ifPresent(one -> desk.view(new View.Day(one)))));
    }

    private static Optional<LocalDate> from(Archive archive, View now, Optional<Hash> inHand) {
        if (now instanceof View.Day day) {
            return Optional.of(day.day());
        }
        if (now instanceof View.Span span) {
            return Optional.of(span.from());
        }
        Clock clock = new Clock(archive.facts());
        return inHand.flatMap(archive::recorded).map(recorded -> clock.day(recorded.at()));
    }

    /** The nearest day with entries in a direction; the day itself when it has some and none is asked. */
    static Optional<LocalDate> day(Set<LocalDate> days, Optional<LocalDate> from, int by) {
        Optional<LocalDate> last = days.stream().max(Comparator.naturalOrder());
        if (from.isEmpty()) {
            return last;
        }
        LocalDate start = from.get();
        if (by == 0) {
            return days.contains(start) ? from : last;
        }
        return by > 0
                ? days.stream().filter(day -> day.isAfter(start)).min(Comparator.naturalOrder())
                : days.stream().filter(day -> day.isBefore(start)).max(Comparator.naturalOrder());
    }
}
