package fringekeep.desk.pane;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.desk.list.Joined;
import fringekeep.desk.pane.RecordPage.Beside;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.Picture;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Reads the page of a record of any kind. Not to be used on the window thread. */
public final class ReadRecord {
    private static final int OTHERS = 4;

    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;
    private final Joined joined;
    private final PageFacts facts;

    /**
     * Reads from an archive at the register's watermark.
     *
     * @param joined what was read at that register before, or a new one
     */
    public ReadRecord(Archive archive, Register register, Stops stops, Joined joined) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = new Clock(archive.facts());
        this.joined = joined;
        this.facts = new PageFacts(archive, register, stops, clock, joined);
    }

    /** The page of a record; empty when it is not at hand. */
    public Optional<RecordPage> read(Hash record) {
        return archive.record(record).map(this::page);
    }

    private RecordPage page(RecordView view) {
        Hash record = view.fingerprint();
        Optional<RecordView> beside = beside(view);
        List<Picture> pictures = new ArrayList<>();
        beside.ifPresent(other -> pictures.addAll(pictures(other)));
        if (pictures.isEmpty()) {
            pictures.addAll(pictures(view));
        }
        return new RecordPage(
                record,
                Names.shortLabel(archive.label(record), clock),
                identity(view),
                States.sentences(archive, register.graph(), clock, record),
                pictures,
                besides(view, beside),
                facts.tables(view),
                facts.groups(view),
                new PageNotes(archive, register, stops, clock).of(record),
                new PageKnots(archive, register, stops, clock).of(view));
    }

    /** What tells it from its like: told linked records first, then its own title. */
    private String identity(RecordView view) {
        List<String> words = new ArrayList<>();
        for (String way : stops.entry(view.head().kind().text(), "identity")) {
            facts.linkedTitle(view.fingerprint(), way).ifPresent(words::add);
        }
        Title title = Names.title(archive, view);
        String own = title.detail().isEmpty() ? title.text() : title.text() + ", " + title.detail();
        return words.isEmpty() ? own : own.isEmpty() ? String.join(", ", words) : String.join(", ", words) + "; " + own;
    }

    private List<Picture> pictures(RecordView view) {
        return Names.kind(archive, view)
                .map(kind -> kind.drawings(view, archive.inputs(view.fingerprint())))
                .orElse(List.of());
    }

    private Optional<RecordView> beside(RecordView view) {
        return stops.entry(view.head().kind().text(), "beside").stream()
                .findFirst()
                .flatMap(kind -> joined.linked(view.fingerprint(), kind))
                .flatMap(archive::record);
    }

    /** The one whose drawing is shown in full, then the newest others that answer for the same record. */
    private List<Beside> besides(RecordView view, Optional<RecordView> first) {
        List<Beside> besides = new ArrayList<>();
        first.ifPresent(one -> besides.add(beside(one, "beside")));
        String kind = stops.entry(view.head().kind().text(), "beside").stream()
                .findFirst()
                .orElse("");
        List<Hash> all = joined.allLinked(view.fingerprint(), kind);
        for (int i = all.size() - 1; i >= 0 && besides.size() <= OTHERS; i--) {
            Hash other = all.get(i);
            if (first.filter(one -> one.fingerprint().equals(other)).isEmpty()) {
                archive.record(other).ifPresent(one -> besides.add(beside(one, "brief")));
            }
        }
        return besides;
    }

    private Beside beside(RecordView view, String order) {
        Set<StateName> states = register.states(view.fingerprint());
        Optional<StateName> state = States.first(states);
        List<Fact> all = new ArrayList<>();
        facts.part(view, PartName.RESULT).forEach(group -> all.addAll(group.facts()));
        return new Beside(
                view.fingerprint(),
                Names.shortLabel(archive.label(view.fingerprint()), clock),
                state.map(States::mark),
                state.map(States::word).orElse(""),
                PageFacts.ordered(all, FactWords.of(view.head().kind().text()).order(order)));
    }
}
