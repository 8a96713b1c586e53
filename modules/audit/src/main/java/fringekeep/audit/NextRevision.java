package fringekeep.audit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.Regathering;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.ServiceLoader;
import java.util.Set;

/**
 * Makes the next revision of outdated records: each is asked for anew with what stands for its inputs now and corrects the old
 * one. Worked out first, so that the same code answers "suppose", and recorded only on request.
 */
public final class NextRevision {
    /** Code of the reason of a record that has nothing left to be made from; no failure of the others. */
    public static final String FALLS_AWAY = "audit.falls-away";

    private final Archive archive;
    private final Graph graph;
    private final Supposed supposed;
    private final Map<KindName, Regathering> own;
    private final Optional<PersonId> person;
    private final Map<Hash, Optional<Hash>> revised = new HashMap<>();
    private final List<Prepared> prepared = new ArrayList<>();

    private NextRevision(
            Archive archive, Supposed supposed, Map<KindName, Regathering> own, Optional<PersonId> person) {
        this.archive = archive;
        this.graph = archive.graph();
        this.supposed = supposed;
        this.own = own;
        this.person = person;
    }

    /** The rules of their own that kinds announce. */
    public static Map<KindName, Regathering> announced(ClassLoader loader) {
        Map<KindName, Regathering> rules = new HashMap<>();
        ServiceLoader.load(Regathering.class, loader).forEach(rule -> rules.put(rule.kind(), rule));
        return Map.copyOf(rules);
    }

    /**
     * Works out the next revisions of the targets and of everything they rest on, in the order of dependence; records nothing.
     *
     * @param rules see {@link #announced}
     * @param person who answers for revised records that people enter, such as selections
     * @return one entry for each record that has to change; empty when all is as it should be
     */
    public static List<Revision> prepare(
            Archive archive,
            List<Hash> targets,
            Supposed supposed,
            Map<KindName, Regathering> rules,
            Optional<PersonId> person,
            Work work)
            throws ProblemException, StoppedException {
        return new NextRevision(archive, supposed, rules, person).run(targets, work);
    }

    /**
     * Records revisions in their order, at most a hundred in one transaction.
     *
     * @throws ProblemException if a revision could not be made; nothing was recorded then
     */
    public static List<Archive.Recorded> record(Archive archive, List<Revision> revisions) throws ProblemException {
        List<Prepared> all = new ArrayList<>();
        for (Revision revision : revisions) {
            revision.after().ifPresent(all::add);
        }
        List<Archive.Recorded> recorded = new ArrayList<>();
        for (int from = 0; from < all.size(); from += 100) {
            recorded.addAll(archive.record(all.subList(from, Math.min(all.size(), from + 100))));
        }
        return List.copyOf(recorded);
    }

    private List<Revision> run(List<Hash> targets, Work work) throws ProblemException, StoppedException {
        Set<Hash> order = new LinkedHashSet<>();
        for (Hash target : targets) {
            order.addAll(graph.upstream(target));
            order.add(target);
        }
        List<Revision> revisions = new ArrayList<>();
        int done = 0;
        for (Hash record : order) {
            work.check();
            work.progress(done++, order.size(), "revisions");
            if (mustChange(record)) {
                revisions.add(revise(record, work));
            }
        }
        return List.copyOf(revisions);
    }

    /** Entered facts of the lab are corrected by people; only what was made from records is made anew. */
    private boolean mustChange(Hash record) {
        RecordView view = archive.record(record).orElse(null);
        if (view == null
                || view.head().inputs().isEmpty()
                || graph.current(record).map(now -> !now.equals(record)).orElse(true)) {
            return false;
        }
        boolean inputMoved = view.head().inputs().stream()
                .filter(InputReference.OfRecord.class::isInstance)
                .map(InputReference.OfRecord.class::cast)
                .anyMatch(input -> !standIn(input.record()).equals(Optional.of(input.record())));
        return inputMoved || !graph.causes(record).isEmpty();
    }

    private Optional<Hash> standIn(Hash input) {
        if (revised.containsKey(input)) {
            return revised.get(input);
        }
        if (supposed.withdrawn().contains(input) || graph.states(input).contains(StateName.WITHDRAWN)) {
            return Optional.empty();
        }
        if (supposed.replaced().containsKey(input)) {
            return Optional.of(supposed.replaced().get(input));
        }
        return Optional.of(graph.current(input).orElse(input));
    }

    private Revision revise(Hash record, Work work) throws StoppedException {
        String label = archive.label(record);
        try {
            Regathering rule =
                    own.getOrDefault(archive.record(record).orElseThrow().head().kind(), PlainRegathering.INSTANCE);
            Optional<NewRecord> request = rule.regather(archive, record, standIns(), List.copyOf(prepared));
            if (request.isEmpty()) {
                revised.put(record, Optional.empty());
                return new Revision(
                        record,
                        label,
                        Optional.empty(),
                        List.of(),
                        List.of(new Problem(
                                FALLS_AWAY,
                                "Nothing is left to make " + label + " from.",
                                label,
                                "Judge it withdrawn, or restore what it was made from.")));
            }
            return make(record, label, request.get(), work);
        } catch (ProblemException e) {
            revised.put(record, Optional.empty());
            return new Revision(record, label, Optional.empty(), List.of(), e.problems());
        }
    }

    private Revision make(Hash record, String label, NewRecord request, Work work)
            throws ProblemException, StoppedException {
        NewRecord whole = request.parts().containsKey(PartName.CHOICES)
                ? archive.compute(request, List.copyOf(prepared), work)
                : signed(request);
        Prepared ready = archive.prepare(whole, List.copyOf(prepared));
        prepared.add(ready);
        revised.put(record, Optional.of(ready.fingerprint()));
        JsonObject before = archive.record(record).orElseThrow().result();
        JsonObject after = whole.parts().getOrDefault(PartName.RESULT, JsonObject.EMPTY);
        return new Revision(record, label, Optional.of(ready), Shift.between(before, after), List.of());
    }

    private NewRecord signed(NewRecord request) {
        return new NewRecord(
                request.kind(),
                request.inputs(),
                request.about(),
                request.parts(),
                request.payloads(),
                request.corrects(),
                request.after(),
                request.person().or(() -> person));
    }

    private Regathering.StandIn standIns() {
        return new Regathering.StandIn() {
            @Override
            public Optional<Hash> of(Hash input) {
                return standIn(input);
            }

            @Override
            public List<Hash> because(Hash input) {
                return graph.judgements(input);
            }
        };
    }
}
