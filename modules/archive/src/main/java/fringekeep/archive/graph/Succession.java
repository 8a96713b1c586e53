package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/**
 * Which record stands for which: chains of corrections, segments of things, disputes and what ends them (record format 1,
 * section 7). Disputes are looked at in order: leaves of a chain, segments with equal begin, placements of one scan; who is
 * set aside in one does not count in the next.
 */
final class Succession {
    private static final String PLACEMENT = "placement";
    private static final String SCAN = "scan";
    private static final String CHOSEN = "chosen";
    private static final String OVER = "over";
    private static final int SORTS_OF_DISPUTE = 3;

    private final GraphData data;
    private final Judging judging;

    Succession(GraphData data) {
        this.data = data;
        this.judging = new Judging(data, this);
    }

    Judging judging() {
        return judging;
    }

    /** The first record of a chain of corrections. */
    int root(int node) {
        int here = node;
        while (data.corrects.get(here) != NONE) {
            here = data.corrects.get(here);
        }
        return here;
    }

    /** A record and all that correct it, directly or not. */
    List<Integer> forward(int node) {
        List<Integer> reached = new ArrayList<>(List.of(node));
        for (int i = 0; i < reached.size(); i++) {
            for (int next = data.corrector.get(reached.get(i)); next != NONE; next = data.correctorNext.get(next)) {
                reached.add(next);
            }
        }
        return reached;
    }

    /** All records of the chain of a record. */
    List<Integer> chain(int node) {
        return forward(root(node));
    }

    private boolean uncorrected(int node) {
        return data.corrector.get(node) == NONE;
    }

    /** Whether no record corrects it and no ended dispute sets it aside. */
    boolean current(int node) {
        return uncorrected(node) && chosenInstead(node, SORTS_OF_DISPUTE) == NONE;
    }

    /** Whether a dispute it belongs to is open. */
    boolean disputed(int node) {
        return !rivals(node).isEmpty();
    }

    /** Everyone in an open dispute with a current record, itself included; empty when there is none. */
    List<Integer> rivals(int node) {
        if (!data.atHand(node) || !current(node)) {
            return List.of();
        }
        TreeSet<Integer> all = new TreeSet<>();
        for (int sort = 0; sort < SORTS_OF_DISPUTE; sort++) {
            List<Integer> group = group(node, sort);
            if (group.size() > 1 && chosen(group) == NONE) {
                all.addAll(group);
            }
        }
        return List.copyOf(all);
    }

    /** Who was chosen over an uncorrected record in one of the first so many sorts of dispute, or none. */
    private int chosenInstead(int node, int sorts) {
        if (!data.atHand(node) || data.isKind(node, GraphData.JUDGEMENT)) {
            return NONE;
        }
        for (int sort = 0; sort < sorts; sort++) {
            List<Integer> group = group(node, sort);
            int chosen = group.size() > 1 ? chosen(group) : NONE;
            if (chosen != NONE && chosen != node) {
                return chosen;
            }
        }
        return NONE;
    }

    private List<Integer> group(int node, int sort) {
        List<Integer> candidates =
                switch (sort) {
                    case 0 -> leaves(node);
                    case 1 -> segmentsWithBeginOf(node);
                    default -> placementsBeside(node);
                };
        if (candidates.size() < 2 || sort == 0) {
            return candidates;
        }
        return candidates.stream()
                .filter(one -> chosenInstead(one, sort) == NONE)
                .toList();
    }

    private List<Integer> leaves(int node) {
        if (data.corrects.get(node) == NONE) {
            return uncorrected(node) ? List.of(node) : List.of();
        }
        return chain(node).stream().filter(this::uncorrected).toList();
    }

    private List<Integer> segmentsWithBeginOf(int node) {
        Instant begin = data.begin(node);
        return records(data.thing.get(node)).stream()
                .filter(one -> uncorrected(one) && data.begin(one).equals(begin))
                .toList();
    }

    private List<Integer> placementsBeside(int node) {
        TreeSet<Integer> placements = new TreeSet<>();
        if (data.isKind(node, PLACEMENT)) {
            for (int target : subjects(node, SCAN)) {
                placementsOf(target, placements);
            }
        }
        return List.copyOf(placements);
    }

    private void placementsOf(int scan, Set<Integer> placements) {
        for (int record : data.atHand(scan) ? records(data.thing.get(scan)) : List.of(scan)) {
            for (int link = data.users.get(record); link != NONE; link = data.linkNext.get(link)) {
                int source = data.linkSource.get(link);
                if (data.isAbout(link)
                        && data.roleName(link).equals(SCAN)
                        && data.isKind(source, PLACEMENT)
                        && uncorrected(source)) {
                    placements.add(source);
                }
            }
        }
    }

    /** What a record speaks of under a role. */
    List<Integer> subjects(int node, String role) {
        List<Integer> subjects = new ArrayList<>();
        int first = data.firstAbout(node);
        for (int link = first; link < first + data.aboutCount.get(node); link++) {
            if (data.roleName(link).equals(role)) {
                subjects.add(data.linkTarget.get(link));
            }
        }
        return subjects;
    }

    /**
     * The one who ends a dispute: what live preferred judgements agree on. Disputes between judgements are never ended so,
     * for two could then end each other's and nothing would say which holds; they are undone instead.
     */
    private int chosen(List<Integer> group) {
        if (data.isKind(group.get(0), GraphData.JUDGEMENT)) {
            return NONE;
        }
        TreeSet<Integer> chosen = new TreeSet<>();
        for (int judgement : preferring(group)) {
            int one = chosenBy(judgement, group);
            if (one != NONE) {
                chosen.add(one);
            }
        }
        return chosen.size() == 1 ? chosen.first() : NONE;
    }

    private Set<Integer> preferring(List<Integer> group) {
        TreeSet<Integer> found = new TreeSet<>();
        for (int member : group) {
            for (int link = data.judging.get(member); link != NONE; link = data.linkNext.get(link)) {
                int judgement = data.linkSource.get(link);
                if (data.roleName(link).equals(OVER)
                        && !data.reachesThing(link)
                        && judging.liveWith(judgement, JudgementFacts.PREFERRED)) {
                    found.add(judgement);
                }
            }
        }
        return found;
    }

    private int chosenBy(int judgement, List<Integer> group) {
        List<Integer> over = new ArrayList<>();
        int chosen = NONE;
        int first = data.firstAbout(judgement);
        for (int link = first; link < first + data.aboutCount.get(judgement); link++) {
            if (data.reachesThing(link)) {
                continue;
            }
            if (data.roleName(link).equals(OVER)) {
                over.add(data.linkTarget.get(link));
            } else if (data.roleName(link).equals(CHOSEN)) {
                chosen = data.linkTarget.get(link);
            }
        }
        if (chosen == NONE) {
            return NONE;
        }
        List<Integer> standIns = forward(chosen);
        List<Integer> winners = group.stream().filter(standIns::contains).toList();
        boolean others = group.stream().allMatch(one -> winners.contains(one) || over.contains(one));
        return winners.size() == 1 && others ? winners.get(0) : NONE;
    }

    /** The records that stand for one now: one, or each end of an open dispute. */
    List<Integer> ends(int node) {
        TreeSet<Integer> ends = new TreeSet<>();
        for (int reached : forward(node)) {
            if (uncorrected(reached)) {
                ends.add(standIn(reached));
            }
        }
        return List.copyOf(ends);
    }

    private int standIn(int node) {
        List<Integer> seen = new ArrayList<>();
        int here = node;
        int instead = chosenInstead(here, SORTS_OF_DISPUTE);
        while (instead != NONE && !seen.contains(instead)) {
            seen.add(instead);
            here = instead;
            instead = chosenInstead(here, SORTS_OF_DISPUTE);
        }
        return here;
    }

    /** The record that stands for one now, unless it is disputed. */
    Optional<Integer> now(int node) {
        List<Integer> ends = ends(node);
        return ends.size() == 1 && !disputed(ends.get(0)) ? Optional.of(ends.get(0)) : Optional.empty();
    }

    /** All records of a thing in the order they came. */
    List<Integer> records(int thing) {
        List<Integer> records = new ArrayList<>(2);
        if (thing != NONE) {
            for (int node = data.thingFirst.get(thing); node != NONE; node = data.thingNext.get(node)) {
                records.add(node);
            }
        }
        return records;
    }

    /** The segment of a thing that holds at an instant; none before the first, or when it is disputed. */
    Optional<Integer> at(int thing, Instant instant) {
        int found = NONE;
        for (int node : records(thing)) {
            boolean begun = !data.begin(node).isAfter(instant);
            if (begun && uncorrected(node) && (found == NONE || data.begin(node).isAfter(data.begin(found)))) {
                found = current(node) ? node : found;
            }
        }
        return found == NONE || disputed(found) ? Optional.empty() : Optional.of(found);
    }
}
