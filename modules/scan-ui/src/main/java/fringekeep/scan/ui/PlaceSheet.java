package fringekeep.scan.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.look.Texts;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.scan.PlaceOffers;
import fringekeep.scan.PlaceOffers.Offer;
import fringekeep.scan.PlaceOffers.Step;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.PlaceScans.Effect;
import fringekeep.scan.PlaceScans.Foreseen;
import fringekeep.scan.PlaceScans.Place;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import javax.swing.JComponent;

/** Saying where many scans belong in one act, with what the archive knows offered. */
final class PlaceSheet implements DeskSheet {
    static final String NAME = "place";
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", PlaceSheet.class);
    private static final String PLACING = "place";

    private final DeskHand hand;
    private final Archive archive;
    private final PlaceModel model;
    private final PlacePane pane;
    private boolean running;
    private boolean placedAll;
    private String said = "";

    /**
     * A scan on the sheet.
     *
     * @param label what it is called
     * @param file its file
     * @param begin when it began
     * @param placed how it is placed now; empty when it is not
     */
    record ScanLine(String label, String file, String begin, String placed) {}

    /**
     * What placing would do, in words.
     *
     * @param effects one a scan
     * @param kinds how many records of which kind would become outdated
     */
    record Consequence(List<Effect> effects, Map<String, Integer> kinds) {
        /** Copies. */
        Consequence {
            effects = List.copyOf(effects);
            kinds = java.util.Collections.unmodifiableMap(new TreeMap<>(kinds));
        }
    }

    /** A sheet for at least one scan, in the order in which steps are counted. */
    PlaceSheet(DeskHand hand, List<Hash> scans) {
        this.hand = hand;
        this.archive = hand.archive();
        this.model = new PlaceModel(scans);
        this.pane = new PlacePane(model, this::asked, this::place, this::stop);
        read();
    }

    private void read() {
        record Read(PlaceModel.Choices choices, List<ScanLine> lines, PlaceModel.OfRun ofRun, List<Step> steps) {}
        hand.run(
                "place offers",
                work -> {
                    PlaceOffers offers = new PlaceOffers(archive);
                    PlaceOffers.Offered offered = offers.offer(model.scans());
                    PlaceModel.Choices choices = new PlaceModel.Choices(
                            offers.offers("setup"),
                            offers.offers("source-run"),
                            offers.offers("series"),
                            offers.offers("batch"),
                            offered,
                            offered.neighbour().map(archive::label).orElse(""),
                            model.scans().stream().map(offers::placed).toList());
                    return new Read(
                            choices,
                            lines(archive, model.scans()),
                            ofRun(offers, offered.run()),
                            offered.series().map(offers::steps).orElse(List.of()));
                },
                read -> {
                    model.take(read.choices().offered(), read.choices().placed());
                    model.ofRun(read.ofRun());
                    model.steps(read.steps());
                    pane.offer(read.choices(), read.lines());
                    foresee();
                });
    }

    private PlaceModel.OfRun ofRun(PlaceOffers offers, Optional<Hash> run) {
        return run.map(one -> {
                    List<Hash> own = offers.velocities(one);
                    List<Offer> named = offers.offers("velocity").stream()
                            .filter(offer -> own.contains(offer.record()))
                            .toList();
                    return new PlaceModel.OfRun(named, offers.batches(one));
                })
                .orElse(PlaceModel.OfRun.NONE);
    }

    static List<ScanLine> lines(Archive archive, List<Hash> scans) {
        Clock clock = new Clock(archive.facts());
        List<ScanLine> lines = new ArrayList<>();
        for (Hash scan : scans) {
            Optional<RecordView> view = archive.record(scan);
            lines.add(new ScanLine(
                    archive.label(scan),
                    view.flatMap(record -> record.choices().object("file"))
                            .flatMap(file -> file.text("name"))
                            .orElse(""),
                    view.flatMap(record -> archive.kinds()
                                    .get(record.head().kind())
                                    .flatMap(kind -> kind.facet(TimeSpan.class, record, archive.inputs(scan))))
                            .map(span -> clock.moment(span.start().at()))
                            .orElse("\u2013"),
                    view.map(record -> placed(archive, record)).orElse("")));
        }
        return lines;
    }

    private static String placed(Archive archive, RecordView scan) {
        List<RecordView> placements = PlaceScans.placements(archive, archive.graph(), scan);
        List<String> words = placements.stream()
                .map(placement -> archive.kinds()
                        .get(placement.head().kind())
                        .map(kind -> kind.title(placement, archive.inputs(placement.fingerprint()))
                                .text())
                        .orElse(""))
                .toList();
        return String.join(" / ", words);
    }

    /** A person chose something: what hangs on it is read anew. */
    private void asked() {
        record Read(Optional<Hash> run, PlaceModel.OfRun ofRun, Optional<Hash> series, List<Step> steps) {}
        Optional<Hash> run = model.run();
        Optional<Hash> series = model.series();
        hand.run(
                "place offers",
                work -> {
                    PlaceOffers offers = new PlaceOffers(archive);
                    return new Read(
                            run,
                            ofRun(offers, run),
                            series,
                            series.map(offers::steps).orElse(List.of()));
                },
                read -> {
                    if (read.run().equals(model.run()) && read.series().equals(model.series())) {
                        model.ofRun(read.ofRun());
                        model.steps(read.steps());
                        pane.refresh();
                        foresee();
                    }
                });
    }

    private void foresee() {
        if (!model.complete()) {
            pane.foreseen(Optional.empty(), running, said);
            return;
        }
        List<Place> places = model.places();
        hand.run(
                "place foresee",
                work -> consequence(new PlaceScans(archive).foresee(places)),
                consequence -> pane.foreseen(Optional.of(consequence), running, said));
    }

    private Consequence consequence(List<Foreseen> foreseen) {
        Map<String, Integer> kinds = new TreeMap<>();
        foreseen.stream()
                .flatMap(each -> each.outdated().stream())
                .distinct()
                .forEach(record -> archive.record(record)
                        .map(view -> Stops.label(view.head().kind().text()))
                        .ifPresent(kind -> kinds.merge(kind, 1, Integer::sum)));
        return new Consequence(foreseen.stream().map(Foreseen::effect).toList(), kinds);
    }

    private void place() {
        if (!running && model.complete()) {
            hand.person(this::place);
        }
    }

    private void place(PersonId person) {
        List<Place> places = model.places();
        running = true;
        said = "";
        pane.running(true);
        hand.run(
                PLACING,
                work -> new PlaceScans(archive).place(places, person, new Said(work)),
                placed -> ended(placed.size(), places.size()),
                this::failed);
    }

    private record Said(fringekeep.archive.problem.Work work) implements fringekeep.archive.problem.Work {
        @Override
        public void progress(long done, long total, String what) {
            work.progress(done, total, TEXTS.of("place." + what));
        }

        @Override
        public boolean stopped() {
            return work.stopped();
        }
    }

    private void failed(List<Problem> problems) {
        running = false;
        pane.running(false);
        hand.say(problems);
    }

    private void ended(int placed, int asked) {
        running = false;
        placedAll = placed == asked;
        hand.say(List.of());
        if (placedAll) {
            hand.back();
            hand.done(TEXTS.of(placed == 1 ? "place.done.one" : "place.done", placed));
        } else {
            said = TEXTS.of("place.stopped", placed, asked);
            pane.running(false);
            read();
        }
    }

    private void stop() {
        hand.stop(PLACING);
    }

    PlaceModel model() {
        return model;
    }

    PlacePane pane() {
        return pane;
    }

    boolean placedAll() {
        return placedAll;
    }

    @Override
    public String name() {
        return NAME;
    }

    @Override
    public JComponent component() {
        return pane;
    }

    @Override
    public void focusFirst() {
        pane.focusFirst();
    }

    @Override
    public List<Runnable> panes() {
        return List.of(pane::focusFirst, pane::focusTable);
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("place.hint.keys"), TEXTS.of("place.hint.do"));
    }

    @Override
    public boolean escape() {
        if (running) {
            stop();
        }
        return running;
    }
}
