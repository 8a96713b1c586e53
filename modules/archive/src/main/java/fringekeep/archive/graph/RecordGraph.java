package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.time.Instant;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.Collection;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** The graph at one watermark over frozen columns. */
final class RecordGraph implements Graph {
    private final GraphData data;
    private final Succession succession;
    private final Judging judging;
    private final long watermark;
    private volatile @org.jspecify.annotations.Nullable Set<Hash> outdated;

    RecordGraph(GraphData data, long watermark) {
        this.data = data;
        this.succession = new Succession(data);
        this.judging = succession.judging();
        this.watermark = watermark;
    }

    @Override
    public long watermark() {
        return watermark;
    }

    @Override
    public Set<StateName> states(Hash record) {
        int node = data.node(record);
        EnumSet<StateName> states = EnumSet.noneOf(StateName.class);
        if (node == NONE || !data.atHand(node)) {
            return states;
        }
        if (!succession.current(node)) {
            states.add(StateName.CORRECTED);
        }
        if (succession.disputed(node)) {
            states.add(StateName.DISPUTED);
        }
        judged(node, states);
        if (!new CauseSearch(data, succession, node, true).causes().isEmpty()) {
            states.add(StateName.OUTDATED);
        }
        return states;
    }

    private void judged(int node, Set<StateName> states) {
        for (int link : judging.links(node)) {
            int judgement = data.linkSource.get(link);
            JudgementFacts facts = data.judgements.get(judgement);
            if (facts != null && judging.live(judgement)) {
                state(facts, data.roleName(link)).ifPresent(states::add);
            }
        }
    }

    private static Optional<StateName> state(JudgementFacts facts, String role) {
        if (facts.is(JudgementFacts.PREFERRED)) {
            return role.equals(Judging.CHOSEN) ? Optional.of(StateName.PREFERRED) : Optional.empty();
        }
        if (!role.equals(Judging.TARGET)) {
            return Optional.empty();
        }
        return switch (facts.verdict()) {
            case JudgementFacts.WITHDRAWN -> Optional.of(StateName.WITHDRAWN);
            case JudgementFacts.MASKED -> Optional.of(StateName.MASKED);
            case JudgementFacts.DOUBTED -> Optional.of(StateName.DOUBTED);
            default -> Optional.empty();
        };
    }

    @Override
    public List<Cause> causes(Hash record) {
        int node = data.node(record);
        return node == NONE ? List.of() : new CauseSearch(data, succession, node, false).causes();
    }

    @Override
    public Set<Hash> outdated() {
        Set<Hash> known = outdated;
        if (known == null) {
            known = Set.copyOf(findOutdated());
            outdated = known;
        }
        return known;
    }

    private Set<Hash> findOutdated() {
        BitSet reached = new BitSet(data.nodes.count());
        for (int node = 0; node < data.nodes.count(); node++) {
            if (mayOutdate(node)) {
                Spread.over(data, node, reached);
            }
        }
        Set<Hash> found = new LinkedHashSet<>();
        for (int node = reached.nextSetBit(0); node >= 0; node = reached.nextSetBit(node + 1)) {
            if (!new CauseSearch(data, succession, node, true).causes().isEmpty()) {
                found.add(data.hash(node));
            }
        }
        return found;
    }

    /** Whether something happened to a record that may reach those made from it. */
    private boolean mayOutdate(int node) {
        int thing = data.thing.get(node);
        return data.corrector.get(node) != NONE
                || data.judging.get(node) != NONE
                || data.isKind(node, GraphData.JUDGEMENT)
                || (thing != NONE && data.thingFirst.get(thing) != data.thingLast.get(thing));
    }

    @Override
    public List<Hash> upstream(Hash record) {
        int node = data.node(record);
        return node == NONE ? List.of() : hashes(Walk.upstream(data, node));
    }

    @Override
    public List<Hash> downstream(Hash record) {
        int node = data.node(record);
        return node == NONE ? List.of() : hashes(Walk.downstream(data, node));
    }

    @Override
    public List<Link> links(Hash record) {
        int node = data.node(record);
        return node == NONE ? List.of() : new LinkReading(data).links(node);
    }

    @Override
    public Optional<Hash> current(Hash record) {
        int node = data.node(record);
        return node == NONE || !data.atHand(node)
                ? Optional.empty()
                : succession.now(node).map(data::hash);
    }

    @Override
    public List<Hash> rivals(Hash record) {
        int node = data.node(record);
        return node == NONE ? List.of() : hashes(succession.rivals(node));
    }

    @Override
    public List<Hash> records(ThingId thing) {
        return hashes(succession.records(data.things.find(GraphData.key(thing))));
    }

    @Override
    public Optional<Hash> at(ThingId thing, Instant instant) {
        return succession.at(data.things.find(GraphData.key(thing)), instant).map(data::hash);
    }

    @Override
    public List<Hash> judgements(Hash record) {
        int node = data.node(record);
        if (node == NONE) {
            return List.of();
        }
        TreeSet<Integer> found = new TreeSet<>(inJournalOrder());
        judging.links(node).stream()
                .map(data.linkSource::get)
                .filter(judging::live)
                .forEach(found::add);
        return hashes(found);
    }

    private Comparator<Integer> inJournalOrder() {
        return Comparator.comparingInt(data.entry::get).thenComparing(Comparator.naturalOrder());
    }

    @Override
    public List<Hash> speakingOf(Hash record) {
        int node = data.node(record);
        if (node == NONE) {
            return List.of();
        }
        TreeSet<Integer> found = new TreeSet<>(inJournalOrder());
        List<Integer> others = data.atHand(node) ? succession.records(data.thing.get(node)) : List.of(node);
        for (int other : others) {
            speaking(data.users.get(other), other == node, found);
            speaking(data.judging.get(other), other == node, found);
        }
        return hashes(found);
    }

    private void speaking(int first, boolean itself, Set<Integer> found) {
        for (int link = first; link != NONE; link = data.linkNext.get(link)) {
            if (data.isAbout(link) && (itself || data.reachesThing(link))) {
                found.add(data.linkSource.get(link));
            }
        }
    }

    @Override
    public Preference preferred(Collection<Hash> sameQuestion) {
        List<Integer> candidates = sameQuestion.stream()
                .map(data::node)
                .filter(node -> node != NONE && data.atHand(node) && succession.current(node))
                .filter(node -> !judging.hit(node, JudgementFacts.WITHDRAWN, Judging.TARGET))
                .distinct()
                .sorted(inJournalOrder())
                .toList();
        if (candidates.size() == 1) {
            return new Preference(Optional.of(data.hash(candidates.get(0))), hashes(candidates), Optional.empty());
        }
        return candidates.stream()
                .flatMap(node -> judging.links(node).stream())
                .map(data.linkSource::get)
                .distinct()
                .filter(judgement -> judging.liveWith(judgement, JudgementFacts.PREFERRED))
                .sorted(inJournalOrder().reversed())
                .map(judgement -> chosen(judgement, candidates))
                .flatMap(Optional::stream)
                .findFirst()
                .orElse(new Preference(Optional.empty(), hashes(candidates), Optional.empty()));
    }

    private Optional<Preference> chosen(int judgement, List<Integer> candidates) {
        List<Integer> chosen = candidates.stream()
                .filter(node -> names(judgement, Judging.CHOSEN, node))
                .toList();
        boolean overAllOthers =
                candidates.stream().allMatch(node -> chosen.contains(node) || names(judgement, Judging.OVER, node));
        return chosen.size() == 1 && overAllOthers
                ? Optional.of(new Preference(
                        Optional.of(data.hash(chosen.get(0))), hashes(candidates), Optional.of(data.hash(judgement))))
                : Optional.empty();
    }

    private boolean names(int judgement, String role, int node) {
        return judging.links(node).stream()
                .anyMatch(link -> data.linkSource.get(link) == judgement
                        && data.roleName(link).equals(role));
    }

    private List<Hash> hashes(Collection<Integer> nodes) {
        List<Hash> hashes = new ArrayList<>(nodes.size());
        nodes.forEach(node -> hashes.add(data.hash(node)));
        return hashes;
    }
}
