package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.desk.form.FormState.Way;
import fringekeep.desk.look.Texts;
import java.time.Instant;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Says before recording what keeps the earlier record and what becomes outdated. Never to be asked on the window thread. */
final class Effects {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", Effects.class);

    private final Archive archive;
    private final Graph graph;
    private final Work work;
    private final Map<Hash, Optional<Instant>> starts = new HashMap<>();

    Effects(Archive archive, Graph graph, Work work) {
        this.archive = archive;
        this.graph = graph;
        this.work = work;
    }

    /**
     * What recording would do, in sentences.
     *
     * @param keeps what keeps the earlier record; empty where nothing is to be said
     * @param outdates what becomes outdated
     */
    record Said(String keeps, String outdates) {}

    /** What follows from a newer record of the thing. */
    Said said(Hash base, Way way, Optional<Instant> from) throws StoppedException {
        if (way == Way.CORRECTS) {
            return new Said("", outdated(standing(graph.downstream(base))));
        }
        if (way == Way.AFTER && from.isPresent()) {
            return continued(base, from.get());
        }
        return new Said("", "");
    }

    private Said continued(Hash base, Instant from) throws StoppedException {
        Set<Hash> before = new LinkedHashSet<>();
        Set<Hash> later = new LinkedHashSet<>();
        Set<Hash> changed = new LinkedHashSet<>();
        for (Hash user : standing(users(base))) {
            if (work.stopped()) {
                throw new StoppedException();
            }
            for (Hash timed : timing(user, base)) {
                boolean after = start(timed).filter(at -> !at.isBefore(from)).isPresent();
                (after ? later : before).add(timed);
                if (after) {
                    changed.add(user);
                }
            }
        }
        Set<Hash> all = new LinkedHashSet<>(changed);
        changed.forEach(user -> all.addAll(graph.downstream(user)));
        return new Said(keeps(before, later), outdated(standing(all)));
    }

    private List<Hash> users(Hash base) {
        return graph.links(base).stream()
                .filter(link -> link.sort() == LinkSort.INPUT && link.to().equals(base))
                .map(Link::from)
                .distinct()
                .toList();
    }

    /** The records whose start says which segment a user of the thing means. */
    private List<Hash> timing(Hash user, Hash base) {
        Optional<RecordView> view = archive.record(user);
        Optional<RecordKind> kind =
                view.flatMap(one -> archive.kinds().get(one.head().kind()));
        if (kind.isEmpty()) {
            return List.of();
        }
        List<InputReference> inputs = view.get().head().inputs();
        Optional<String> by = inputs.stream()
                .filter(input -> input instanceof InputReference.OfRecord of
                        && of.record().equals(base))
                .map(InputReference::role)
                .flatMap(role -> kind.get().inputRoles().stream()
                        .filter(one -> one.name().equals(role))
                        .flatMap(one -> one.timedBy().stream()))
                .findFirst();
        return inputs.stream()
                .filter(input -> by.equals(Optional.of(input.role())))
                .filter(InputReference.OfRecord.class::isInstance)
                .map(input -> ((InputReference.OfRecord) input).record())
                .toList();
    }

    private Optional<Instant> start(Hash record) {
        return starts.computeIfAbsent(
                record,
                hash -> archive.record(hash).flatMap(view -> {
                    Inputs inputs = archive.inputs(hash);
                    return archive.kinds()
                            .get(view.head().kind())
                            .flatMap(kind -> kind.facet(TimeSpan.class, view, inputs))
                            .map(span -> span.start().at());
                }));
    }

    private List<Hash> standing(Collection<Hash> records) {
        return records.stream()
                .filter(record -> {
                    Set<StateName> states = graph.states(record);
                    return !states.contains(StateName.CORRECTED) && !states.contains(StateName.WITHDRAWN);
                })
                .toList();
    }

    private String keeps(Set<Hash> before, Set<Hash> later) {
        if (before.isEmpty() && later.isEmpty()) {
            return TEXTS.of("keeps.none");
        }
        return later.isEmpty()
                ? TEXTS.of("keeps.all", counted(before))
                : TEXTS.of("keeps", counted(before), later.size());
    }

    private String outdated(Collection<Hash> records) {
        return records.isEmpty() ? TEXTS.of("outdates.none") : TEXTS.of("outdates", counted(records));
    }

    /** {@code 118 fits, 3 properties and 1 figure}. */
    private String counted(Collection<Hash> records) {
        Map<String, Integer> counts = new LinkedHashMap<>();
        for (Hash record : records) {
            archive.record(record)
                    .ifPresent(view -> counts.merge(view.head().kind().text(), 1, Integer::sum));
        }
        List<String> words = counts.entrySet().stream()
                .map(count -> count.getValue() + " " + plural(count.getKey(), count.getValue()))
                .toList();
        if (words.isEmpty()) {
            return TEXTS.of("nothing");
        }
        int last = words.size() - 1;
        return last == 0
                ? words.get(0)
                : String.join(", ", words.subList(0, last)) + " " + TEXTS.of("and") + " " + words.get(last);
    }

    static String plural(String kind, int count) {
        FormWords words = FormWords.of(kind);
        return count == 1 ? words.kindWords() : words.several();
    }
}
