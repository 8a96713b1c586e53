package fringekeep.scan.ui;

import fringekeep.archive.record.Hash;
import fringekeep.scan.PlaceOffers.Offer;
import fringekeep.scan.PlaceOffers.Offered;
import fringekeep.scan.PlaceOffers.Placed;
import fringekeep.scan.PlaceOffers.Step;
import fringekeep.scan.PlaceScans.Place;
import fringekeep.scan.PlacementFacet.Purpose;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** What a person says about the scans that are placed together. Lives on the window thread; asks nothing. */
final class PlaceModel {
    /** What the archive offers, read before the sheet is filled. */
    record Choices(
            List<Offer> setups,
            List<Offer> runs,
            List<Offer> series,
            List<Offer> batches,
            Offered offered,
            String from,
            List<Optional<Placed>> placed) {
        /** Copies. */
        Choices {
            setups = List.copyOf(setups);
            runs = List.copyOf(runs);
            series = List.copyOf(series);
            batches = List.copyOf(batches);
            placed = List.copyOf(placed);
        }
    }

    /** What hangs on the chosen run. */
    record OfRun(List<Offer> velocities, List<Hash> batches) {
        static final OfRun NONE = new OfRun(List.of(), List.of());

        /** Copies. */
        OfRun {
            velocities = List.copyOf(velocities);
            batches = List.copyOf(batches);
        }
    }

    private final List<Hash> scans;
    private Purpose purpose = Purpose.SIGNAL;
    private boolean purposeOfSteps;
    private boolean purposeAsPlaced;
    private boolean stepAsPlaced;
    private List<Optional<Placed>> placed = List.of();
    private Optional<Hash> setup = Optional.empty();
    private Optional<Hash> run = Optional.empty();
    private List<Hash> velocities = List.of();
    private Optional<Hash> series = Optional.empty();
    private List<Step> steps = List.of();
    private OptionalInt firstStep = OptionalInt.empty();
    private boolean sameStep;
    private Optional<Hash> batch = Optional.empty();
    private OfRun ofRun = OfRun.NONE;

    PlaceModel(List<Hash> scans) {
        this.scans = List.copyOf(scans);
    }

    List<Hash> scans() {
        return scans;
    }

    /** Takes what is offered. */
    void take(Offered offered, List<Optional<Placed>> now) {
        placed = List.copyOf(now);
        purpose = offered.purpose();
        setup = offered.setup();
        run = offered.run();
        velocities = offered.velocities();
        series = offered.series();
        firstStep = offered.step();
        batch = offered.batch();
        purposeAsPlaced = allPlaced();
        stepAsPlaced = canKeepSteps();
    }

    /** Whether every scan is placed already, so that each may keep its purpose. */
    boolean allPlaced() {
        return !placed.isEmpty() && placed.stream().allMatch(Optional::isPresent);
    }

    /** Whether every scan is placed in the chosen series, so that each may keep its step. */
    boolean canKeepSteps() {
        return allPlaced()
                && series.isPresent()
                && placed.stream().allMatch(one -> one.orElseThrow().series().equals(series));
    }

    /** Each scan keeps the purpose it has. */
    void purposeAsPlaced() {
        purposeAsPlaced = allPlaced();
        purposeOfSteps = false;
    }

    boolean isPurposeAsPlaced() {
        return purposeAsPlaced;
    }

    /** Each scan keeps the step it has. */
    void stepAsPlaced(boolean keep) {
        stepAsPlaced = keep && canKeepSteps();
    }

    boolean isStepAsPlaced() {
        return stepAsPlaced && canKeepSteps();
    }

    void purpose(Purpose next) {
        purpose = next;
        purposeOfSteps = false;
        purposeAsPlaced = false;
    }

    Purpose purpose() {
        return purpose;
    }

    /** Each scan is taken for what its step of the series says; signal where it says nothing. */
    void purposeOfSteps() {
        purposeAsPlaced = false;
        purposeOfSteps = true;
    }

    boolean isPurposeOfSteps() {
        return purposeOfSteps && stepsTellPurposes();
    }

    boolean stepsTellPurposes() {
        return (firstStep.isPresent() || isStepAsPlaced())
                && steps.stream().anyMatch(step -> step.purpose().isPresent());
    }

    void setup(Optional<Hash> next) {
        setup = next;
    }

    Optional<Hash> setup() {
        return setup;
    }

    /** Another run: what was chosen of the one before does not belong to it. */
    void run(Optional<Hash> next) {
        if (!next.equals(run)) {
            velocities = List.of();
            batch = Optional.empty();
        }
        run = next;
    }

    Optional<Hash> run() {
        return run;
    }

    void ofRun(OfRun next) {
        ofRun = next;
    }

    OfRun ofRun() {
        return ofRun;
    }

    /** Whether the run names its one batch, so that placements name none. */
    boolean batchIsTold() {
        return run.isPresent() && ofRun.batches().size() == 1;
    }

    void velocities(List<Hash> next) {
        velocities = List.copyOf(next);
    }

    List<Hash> velocities() {
        return velocities;
    }

    void batch(Optional<Hash> next) {
        batch = next;
    }

    Optional<Hash> batch() {
        return batchIsTold() ? Optional.empty() : batch;
    }

    void series(Optional<Hash> next) {
        if (!next.equals(series)) {
            firstStep = OptionalInt.empty();
            steps = List.of();
        }
        series = next;
    }

    Optional<Hash> series() {
        return series;
    }

    void steps(List<Step> next) {
        steps = List.copyOf(next);
        if (firstStep.isPresent() && firstStep.getAsInt() >= steps.size()) {
            firstStep = OptionalInt.empty();
        }
    }

    List<Step> steps() {
        return steps;
    }

    void firstStep(OptionalInt next) {
        stepAsPlaced = false;
        firstStep = next;
    }

    OptionalInt firstStep() {
        return firstStep;
    }

    void sameStep(boolean same) {
        stepAsPlaced = false;
        sameStep = same;
    }

    boolean isSameStep() {
        return sameStep;
    }

    /** The step of a scan by its place. */
    OptionalInt step(int scan) {
        if (isStepAsPlaced()) {
            return placed.get(scan).orElseThrow().step();
        }
        return firstStep.isEmpty() || series.isEmpty()
                ? OptionalInt.empty()
                : OptionalInt.of(firstStep.getAsInt() + (sameStep ? 0 : scan));
    }

    /** How many scans have no step left. */
    int withoutStep() {
        return firstStep.isEmpty() || sameStep || isStepAsPlaced()
                ? 0
                : Math.max(0, firstStep.getAsInt() + scans.size() - Math.max(steps.size(), firstStep.getAsInt()));
    }

    Purpose purpose(int scan) {
        if (purposeAsPlaced) {
            return placed.get(scan).orElseThrow().purpose();
        }
        OptionalInt step = step(scan);
        boolean told = isPurposeOfSteps() && step.isPresent() && step.getAsInt() < steps.size();
        return told ? steps.get(step.getAsInt()).purpose().orElse(Purpose.SIGNAL) : purpose;
    }

    /** Whether there is enough to place by. */
    boolean complete() {
        return setup.isPresent() && withoutStep() == 0;
    }

    /** One place a scan, in order; only when complete. */
    List<Place> places() {
        Hash bench = setup.orElseThrow(() -> new IllegalStateException("no setup is chosen"));
        List<Place> places = new ArrayList<>();
        for (int i = 0; i < scans.size(); i++) {
            places.add(new Place(
                    scans.get(i), purpose(i), bench, run, velocities, series, step(i), batch(), Optional.empty()));
        }
        return places;
    }
}
