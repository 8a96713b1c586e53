package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** Works out why one record is outdated: causes(r) of record format 1, section 8. */
final class CauseSearch {
    private static final String SETUP = "setup";
    private static final String CALIBRATION = "calibration";
    private static final Set<String> SCAN_ROLES = Set.of("scan", "reference", "background");

    private final GraphData data;
    private final Succession succession;
    private final Judging judging;
    private final IntSet known;
    private final boolean firstOnly;
    private final Set<Found> found = new LinkedHashSet<>();

    private record Found(Cause.Sort sort, int upstream, int by) {}

    CauseSearch(GraphData data, Succession succession, int record, boolean firstOnly) {
        this.data = data;
        this.succession = succession;
        this.judging = succession.judging();
        this.firstOnly = firstOnly;
        this.known = known(data, record);
    }

    /** A record and everything reached over inputs, records and raw files. */
    static IntSet known(GraphData data, int record) {
        IntSet known = new IntSet();
        known.add(record);
        for (int i = 0; i < known.size(); i++) {
            int node = known.get(i);
            int first = data.firstLink.get(node);
            for (int link = first; link < first + data.inputCount.get(node); link++) {
                known.add(data.linkTarget.get(link));
            }
        }
        return known;
    }

    List<Cause> causes() {
        for (int i = 1; i < known.size() && !enough(); i++) {
            upstream(known.get(i));
        }
        if (!enough()) {
            timed();
        }
        return found.stream()
                .sorted(Comparator.comparing(Found::sort)
                        .thenComparingInt(Found::upstream)
                        .thenComparingInt(Found::by))
                .map(cause -> new Cause(cause.sort, data.hash(cause.upstream), data.hash(cause.by)))
                .toList();
    }

    private boolean enough() {
        return firstOnly && !found.isEmpty();
    }

    private void upstream(int node) {
        if (data.isRaw(node)) {
            return;
        }
        corrected(node);
        judged(node);
        if (data.isKind(node, GraphData.JUDGEMENT)) {
            undone(node);
        }
    }

    private void corrected(int node) {
        for (int end : succession.ends(node)) {
            if (end != node && !knows(end) && !sameWords(end, node)) {
                found.add(new Found(Cause.Sort.CORRECTED, node, end));
            }
        }
    }

    private void judged(int node) {
        for (int link : judging.links(node)) {
            int judgement = data.linkSource.get(link);
            if (judging.live(judgement) && outdates(link, judgement, node) && !knows(judgement)) {
                found.add(new Found(Cause.Sort.JUDGED, node, judgement));
            }
        }
    }

    private boolean outdates(int link, int judgement, int node) {
        JudgementFacts facts = data.judgements.get(judgement);
        String role = data.roleName(link);
        if (facts == null) {
            return false;
        }
        if (facts.is(JudgementFacts.PREFERRED)) {
            return role.equals(Judging.OVER)
                    && succession.subjects(judgement, Judging.CHOSEN).stream()
                            .noneMatch(chosen -> sameWords(chosen, node));
        }
        if (!role.equals(Judging.TARGET)) {
            return false;
        }
        return facts.is(JudgementFacts.WITHDRAWN)
                || (facts.is(JudgementFacts.MASKED) && takesChannel(node, facts.channel()));
    }

    /** Whether some link to a record, from this one or what it knows, names the channel or none. */
    private boolean takesChannel(int node, Optional<String> channel) {
        if (channel.isEmpty()) {
            return true;
        }
        int asked = data.channels.find(channel.get());
        for (int i = 0; i < known.size(); i++) {
            int user = known.get(i);
            int first = data.firstLink.get(user);
            for (int link = first; link < first + data.inputCount.get(user); link++) {
                int named = data.channel(link);
                if (data.linkTarget.get(link) == node && (named == NONE || named == asked)) {
                    return true;
                }
            }
        }
        return false;
    }

    private void undone(int judgement) {
        if (judging.stands(judgement)) {
            return;
        }
        boolean knowsWhy = judging.undoing(judgement).stream().anyMatch(this::knows);
        boolean follows = data.corrector.get(judgement) != NONE
                && succession.ends(judgement).stream()
                        .anyMatch(end -> judging.stands(end) && (sameWords(end, judgement) || knows(end)));
        if (!knowsWhy && !follows) {
            found.add(new Found(Cause.Sort.UNDONE, judgement, judgement));
        }
    }

    private boolean knows(int node) {
        if (known.contains(node)) {
            return true;
        }
        return succession.chain(node).stream().anyMatch(other -> known.contains(other) && sameWords(other, node));
    }

    private boolean sameWords(int record, int another) {
        Hash said = data.says.get(record);
        return record == another || (said != null && said.equals(data.says.get(another)));
    }

    private void timed() {
        Set<Integer> calibrations = new TreeSet<>();
        for (int i = 0; i < known.size(); i++) {
            int user = known.get(i);
            int first = data.firstLink.get(user);
            for (int link = first; link < first + data.inputCount.get(user); link++) {
                int target = data.linkTarget.get(link);
                if (!severalRecords(target)) {
                    continue;
                }
                String role = data.roleName(link);
                if (role.equals(SETUP)) {
                    changed(target, setupTimes(user, target));
                } else if (role.equals(CALIBRATION)) {
                    calibrations.add(target);
                }
            }
        }
        if (!calibrations.isEmpty()) {
            List<Instant> starts = starts();
            calibrations.forEach(calibration -> changed(calibration, starts));
        }
    }

    private boolean severalRecords(int node) {
        int thing = data.thing.get(node);
        return thing != NONE && data.thingFirst.get(thing) != data.thingLast.get(thing);
    }

    private List<Instant> starts() {
        List<Instant> starts = new ArrayList<>();
        for (int i = 0; i < known.size(); i++) {
            data.start(known.get(i)).ifPresent(starts::add);
        }
        return starts;
    }

    /** Starts of the scans a record pins whose pinned placement is about the setup's thing. */
    private List<Instant> setupTimes(int user, int setup) {
        Set<Integer> placedScanThings = new TreeSet<>();
        Set<Integer> placedScans = new TreeSet<>();
        int first = data.firstLink.get(user);
        int end = first + data.inputCount.get(user);
        for (int link = first; link < end; link++) {
            int placement = data.linkTarget.get(link);
            if (data.isKind(placement, "placement") && speaksOf(placement, setup)) {
                for (int scan : succession.subjects(placement, "scan")) {
                    placedScans.add(scan);
                    placedScanThings.add(data.thing.get(scan));
                }
            }
        }
        placedScanThings.remove(NONE);
        List<Instant> times = new ArrayList<>();
        for (int link = first; link < end; link++) {
            int scan = data.linkTarget.get(link);
            boolean placed = placedScans.contains(scan) || placedScanThings.contains(data.thing.get(scan));
            if (placed && SCAN_ROLES.contains(data.roleName(link))) {
                data.start(scan).ifPresent(times::add);
            }
        }
        return times;
    }

    private boolean speaksOf(int placement, int setup) {
        return succession.subjects(placement, SETUP).stream()
                .anyMatch(one ->
                        one == setup || (data.thing.get(one) != NONE && data.thing.get(one) == data.thing.get(setup)));
    }

    private void changed(int node, List<Instant> times) {
        int root = succession.root(node);
        for (Instant time : times) {
            Optional<Integer> segment = succession.at(data.thing.get(node), time);
            if (segment.isPresent() && succession.root(segment.get()) != root && !knowsChain(segment.get())) {
                found.add(new Found(Cause.Sort.CHANGED, node, segment.get()));
            }
        }
    }

    private boolean knowsChain(int node) {
        return succession.chain(node).stream().anyMatch(known::contains);
    }
}
