package fringekeep.fit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.FitScans;
import fringekeep.fit.FitScans.FitOutcome;
import fringekeep.fit.UnfittedScans;
import fringekeep.scan.PlacementFacet.Purpose;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/** Fits many scans one by one with the same choices: how far it is, what failed and why. Lives on the window thread. */
final class FitEach {
    static final String RUN = "fit-each";
    private static final double NANOSECONDS = 1e9;

    private final Archive archive;
    private final Jobs jobs;
    private final LongSupplier clock;
    private final Runnable changed;
    private volatile Count live = new Count(0, 0);
    private List<Hash> scans = List.of();
    private FitPlan plan = FitPlan.usual(List.of(), "counts");
    private Stage stage = Stage.READING;
    private List<Failure> failures = List.of();
    private int recorded;
    private int untried;
    private long began;

    /** Where it stands. */
    enum Stage {
        /** Scans are being found. */
        READING,
        /** Nothing runs. */
        READY,
        /** Fits are being made. */
        RUNNING,
        /** All are tried, or it was stopped. */
        DONE
    }

    /** How many are done of how many. */
    record Count(long done, long total) {}

    /**
     * A scan that has no fit.
     *
     * @param scan what people call it
     * @param problem why
     */
    record Failure(String scan, Problem problem) {}

    FitEach(Archive archive, Jobs jobs, LongSupplier clock, Runnable changed) {
        this.archive = archive;
        this.jobs = jobs;
        this.clock = clock;
        this.changed = changed;
    }

    /** Takes these scans. */
    void take(List<Hash> chosen) {
        scans = List.copyOf(chosen);
        plan = plan.of(scans);
        stage = Stage.READY;
        changed.run();
    }

    /** Finds the scans placed as signal or reference that have no current fit. */
    void takeUnfitted(Consumer<List<Problem>> failed) {
        jobs.run(
                RUN,
                work -> new UnfittedScans(archive)
                        .find(new UnfittedScans.Rule(
                                Set.of(Purpose.SIGNAL, Purpose.REFERENCE),
                                Optional.empty(),
                                Optional.empty(),
                                Optional.empty(),
                                Optional.empty(),
                                false)),
                this::take,
                failed);
    }

    List<Hash> scans() {
        return scans;
    }

    FitPlan plan() {
        return plan;
    }

    void plan(FitPlan next) {
        plan = next;
        changed.run();
    }

    Stage stage() {
        return stage;
    }

    List<Failure> failures() {
        return failures;
    }

    int recorded() {
        return recorded;
    }

    int untried() {
        return untried;
    }

    Count count() {
        return live;
    }

    /** Seconds still to go; empty before anything can be said. */
    Optional<Double> left() {
        Count now = live;
        double spent = (clock.getAsLong() - began) / NANOSECONDS;
        return stage != Stage.RUNNING || now.done() == 0 || spent < 1
                ? Optional.empty()
                : Optional.of(spent / now.done() * (now.total() - now.done()));
    }

    /** Makes the fits. */
    void start(PersonId person, Consumer<List<Problem>> failed) {
        List<FitScans.Request> requests =
                scans.stream().map(scan -> plan.of(List.of(scan)).request()).toList();
        stage = Stage.RUNNING;
        began = clock.getAsLong();
        live = new Count(0, requests.size());
        changed.run();
        jobs.run(
                RUN,
                work -> answers(new FitScans(archive).fitEach(requests, Optional.of(person), counting(work))),
                this::ended,
                problems -> {
                    stage = Stage.READY;
                    changed.run();
                    failed.accept(problems);
                });
    }

    private Work counting(Work work) {
        return new Work() {
            @Override
            public void progress(long done, long total, String what) {
                live = new Count(done, total);
                work.progress(done, total, what);
            }

            @Override
            public boolean stopped() {
                return work.stopped();
            }
        };
    }

    private record Answers(int recorded, int untried, List<Failure> failures) {}

    private Answers answers(List<FitOutcome> outcomes) throws ProblemException {
        List<Failure> failed = new ArrayList<>();
        int kept = 0;
        int rest = 0;
        for (FitOutcome outcome : outcomes) {
            if (outcome.fit().isPresent()) {
                kept++;
            } else if (outcome.problems().get(0).code().equals("fit.stopped")) {
                rest++;
            } else {
                failed.add(new Failure(
                        archive.label(outcome.request().scans().get(0)),
                        outcome.problems().get(0)));
            }
        }
        return new Answers(kept, rest, failed);
    }

    private void ended(Answers answers) {
        stage = Stage.DONE;
        recorded = answers.recorded();
        untried = answers.untried();
        failures = answers.failures();
        changed.run();
    }
}
