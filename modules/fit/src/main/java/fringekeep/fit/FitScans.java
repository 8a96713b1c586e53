package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.internal.FitProblems;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Fits scans of an archive: one fit of some scans together, or one of each of many, with progress and a stop. */
public final class FitScans {
    /** Fits gathered before they are committed together. */
    private static final int GATHERED = 25;

    private final Archive archive;

    /** Fits scans of an archive. */
    public FitScans(Archive archive) {
        this.archive = archive;
    }

    /**
     * What is asked of one fit.
     *
     * @param scans scans that are fitted together, in order
     * @param channel channel that is fitted
     * @param choices choices, possibly incomplete
     * @param references reference scans
     * @param backgrounds background scans
     * @param notwithstanding judgements in spite of which withdrawn records are used
     * @param again whether the new fit corrects the current one that answers the same question
     */
    public record Request(
            List<Hash> scans,
            String channel,
            JsonObject choices,
            List<Hash> references,
            List<Hash> backgrounds,
            List<Hash> notwithstanding,
            boolean again) {
        /** Copies. */
        public Request {
            scans = List.copyOf(scans);
            references = List.copyOf(references);
            backgrounds = List.copyOf(backgrounds);
            notwithstanding = List.copyOf(notwithstanding);
        }

        /** One scan with no more than choices. */
        public static Request of(Hash scan, String channel, JsonObject choices) {
            return new Request(List.of(scan), channel, choices, List.of(), List.of(), List.of(), false);
        }
    }

    /**
     * What became of one request.
     *
     * @param request the request
     * @param fit the recorded fit; empty when there is none
     * @param problems why there is none
     */
    public record FitOutcome(Request request, Optional<Hash> fit, List<Problem> problems) {
        /** Copies. */
        public FitOutcome {
            problems = List.copyOf(problems);
        }
    }

    /** Fits and records one. */
    public Hash fit(Request request, Optional<PersonId> person, Work work) throws ProblemException, StoppedException {
        NewRecord computed = compute(request, person, work);
        return archive.record(computed).fingerprint();
    }

    /** Fits without recording: choices completed, result and payloads as they would be recorded. */
    public NewRecord compute(Request request, Optional<PersonId> person, Work work)
            throws ProblemException, StoppedException {
        return archive.compute(request(request, person), List.of(), work);
    }

    /**
     * Fits many, one after the other. A request that has no fit is an outcome and the others go on; a stop keeps what is
     * recorded.
     *
     * @return one outcome a request, in order
     */
    public List<FitOutcome> fitEach(List<Request> requests, Optional<PersonId> person, Work work) {
        List<FitOutcome> outcomes = new ArrayList<>();
        List<FitOutcome> pending = new ArrayList<>();
        List<Prepared> prepared = new ArrayList<>();
        for (Request request : requests) {
            if (work.stopped()) {
                break;
            }
            pending.add(prepare(request, person, prepared));
            if (prepared.size() >= GATHERED) {
                outcomes.addAll(commit(pending, prepared));
            }
            work.progress(outcomes.size() + pending.size(), requests.size(), "fits");
        }
        outcomes.addAll(commit(pending, prepared));
        for (Request request : requests.subList(outcomes.size(), requests.size())) {
            outcomes.add(new FitOutcome(request, Optional.empty(), List.of(FitProblems.of("fit.stopped", ""))));
        }
        return outcomes;
    }

    private FitOutcome prepare(Request request, Optional<PersonId> person, List<Prepared> prepared) {
        try {
            Prepared next = archive.prepare(compute(request, person, Work.QUIET), List.of());
            prepared.add(next);
            return new FitOutcome(request, Optional.of(next.fingerprint()), List.of());
        } catch (ProblemException e) {
            String scans = String.join(
                    ", ", request.scans().stream().map(archive::label).toList());
            List<Problem> located = e.problems().stream()
                    .map(problem ->
                            problem.where().startsWith("/") || problem.where().isEmpty()
                                    ? problem.at((scans + " " + problem.where()).strip())
                                    : problem)
                    .toList();
            return new FitOutcome(request, Optional.empty(), located);
        } catch (StoppedException e) {
            throw new IllegalStateException("quiet work is never stopped", e);
        }
    }

    private List<FitOutcome> commit(List<FitOutcome> pending, List<Prepared> prepared) {
        List<FitOutcome> outcomes = List.copyOf(pending);
        try {
            if (!prepared.isEmpty()) {
                archive.record(List.copyOf(prepared));
            }
        } catch (ProblemException e) {
            outcomes = pending.stream()
                    .map(each -> each.fit().isEmpty()
                            ? each
                            : new FitOutcome(each.request(), Optional.empty(), e.problems()))
                    .toList();
        }
        pending.clear();
        prepared.clear();
        return outcomes;
    }

    /** The request as a record to be: its inputs gathered, nothing computed. */
    NewRecord request(Request request, Optional<PersonId> person) throws ProblemException {
        GatherInputs.Asked asked = new GatherInputs.Asked(
                request.scans(),
                request.references(),
                request.backgrounds(),
                request.channel(),
                Calibrations.targets(request.choices()),
                request.notwithstanding());
        List<InputReference> inputs = new GatherInputs(archive).of(asked);
        return new NewRecord(
                FitKind.NAME,
                inputs,
                List.of(),
                Map.of(PartName.CHOICES, request.choices()),
                List.of(),
                request.again() ? replaced(inputs) : Optional.empty(),
                Optional.empty(),
                person);
    }

    /** Current fits that answer the question these inputs ask. */
    List<Hash> rivals(List<InputReference> inputs) {
        String question = question(inputs);
        Graph graph = archive.graph();
        List<Hash> rivals = new ArrayList<>();
        for (Hash scan : scans(inputs)) {
            for (Hash fit : SameQuestion.fits(archive, graph, scan)) {
                if (!rivals.contains(fit)
                        && FitKind.question(archive.inputs(fit)).equals(question)) {
                    rivals.add(fit);
                }
            }
        }
        return rivals;
    }

    /** The one current fit that answers the same question; empty if there is none. */
    private Optional<Hash> replaced(List<InputReference> inputs) throws ProblemException {
        List<Hash> rivals = rivals(inputs);
        if (rivals.size() > 1) {
            List<String> labels = rivals.stream().map(archive::label).toList();
            throw new ProblemException(
                    FitProblems.of("fit.question-several", "", rivals.size(), String.join(", ", labels)));
        }
        return rivals.stream().findFirst();
    }

    private static List<Hash> scans(List<InputReference> inputs) {
        return inputs.stream()
                .filter(input -> input.role().equals("scan"))
                .map(input -> ((InputReference.OfRecord) input).record())
                .toList();
    }

    private String question(List<InputReference> inputs) {
        List<String> asked = new ArrayList<>();
        for (InputReference input : inputs) {
            if (input instanceof InputReference.OfRecord record && input.role().equals("scan")) {
                String thing = archive.record(record.record())
                        .map(RecordView::head)
                        .map(head -> head.thing().hex())
                        .orElse(record.record().hex());
                asked.add(thing + " " + record.channel().orElse("counts"));
            }
        }
        return FitKind.question(asked);
    }
}
