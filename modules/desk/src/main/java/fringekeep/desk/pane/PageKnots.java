package fringekeep.desk.pane;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.pane.RecordPage.Knot;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.LinkedRecords;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.NumberText;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** Knots of a record's lineage line, from raw file to figure. */
final class PageKnots {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", PageKnots.class);
    private static final int NAMED = 2;

    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;

    PageKnots(Archive archive, Register register, Stops stops, Clock clock) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = clock;
    }

    List<Knot> of(RecordView view) {
        List<Knot> knots = new ArrayList<>();
        view.head().inputs().stream()
                .filter(InputReference.OfRaw.class::isInstance)
                .map(input -> ((InputReference.OfRaw) input).raw())
                .findFirst()
                .ifPresent(raw -> knots.add(
                        new Knot(TEXTS.of("raw"), raw.hex().substring(0, 8), List.of(), Optional.empty(), false)));
        Set<Hash> linked = LinkedRecords.of(register, view.fingerprint());
        for (Stops.Stop stop : stops.all()) {
            List<Hash> here = linked.stream()
                    .filter(record -> register.kind(record).orElse("").equals(stop.kind())
                            || (record.equals(view.fingerprint())
                                    && stop.kinds().contains(view.head().kind().text())))
                    .toList();
            if (!here.isEmpty()) {
                knots.add(knot(stop, here, view.fingerprint()));
            }
        }
        return knots;
    }

    private Knot knot(Stops.Stop stop, List<Hash> records, Hash inHand) {
        boolean here = records.contains(inHand);
        List<Hash> shown = here ? List.of(inHand) : records;
        String text = shown.size() > NAMED
                ? NumberText.count(shown.size())
                : shown.stream()
                        .map(record -> number(record, shown.size() == 1))
                        .collect(Collectors.joining("; "));
        Optional<Mark> mark = shown.stream()
                .flatMap(record -> States.first(register.states(record)).stream())
                .filter(state -> state == StateName.OUTDATED || state == StateName.WITHDRAWN)
                .findFirst()
                .map(States::mark);
        return new Knot(stop.label(), text, shown, mark, here);
    }

    private String number(Hash record, boolean alone) {
        String number =
                Names.shortNumber(archive.label(record), register.kind(record).orElse(""), clock);
        return alone ? number : number.replaceFirst("^0+(?=[0-9])", "");
    }
}
