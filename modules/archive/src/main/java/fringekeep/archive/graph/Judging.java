package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/** Which judgements stand, are live, and hit what (record format 1, section 8). */
final class Judging {
    static final String TARGET = "target";
    static final String OVER = "over";
    static final String CHOSEN = "chosen";
    static final String UNDOES = "undoes";

    private final GraphData data;
    private final Succession succession;
    private final Map<Integer, Boolean> standing = new ConcurrentHashMap<>();

    Judging(GraphData data, Succession succession) {
        this.data = data;
        this.succession = succession;
    }

    /** A judgement, current, and no standing judgement undoes it. Judgements are only undone by later ones. */
    boolean stands(int node) {
        Boolean known = standing.get(node);
        if (known == null) {
            known = data.isKind(node, GraphData.JUDGEMENT)
                    && succession.current(node)
                    && undoing(node).isEmpty();
            standing.put(node, known);
        }
        return known;
    }

    /** Standing judgements that undo one. */
    List<Integer> undoing(int judgement) {
        List<Integer> found = new ArrayList<>();
        for (int link = data.judging.get(judgement); link != NONE; link = data.linkNext.get(link)) {
            if (data.roleName(link).equals(UNDOES) && stands(data.linkSource.get(link))) {
                found.add(data.linkSource.get(link));
            }
        }
        return found;
    }

    /** Stands, and its content is at hand. */
    boolean live(int node) {
        return data.judgements.containsKey(node) && stands(node);
    }

    boolean liveWith(int node, String verdict) {
        JudgementFacts facts = data.judgements.get(node);
        return facts != null && facts.is(verdict) && stands(node);
    }

    /** Links of judgements to a record: those that name it, and those that reach its thing. */
    List<Integer> links(int node) {
        List<Integer> found = new ArrayList<>(0);
        for (int link = data.judging.get(node); link != NONE; link = data.linkNext.get(link)) {
            found.add(link);
        }
        int thing = data.thing.get(node);
        if (thing == NONE || data.thingFirst.get(thing) == data.thingLast.get(thing)) {
            return found;
        }
        for (int other : succession.records(thing)) {
            for (int link = data.judging.get(other); link != NONE; link = data.linkNext.get(link)) {
                if (other != node && data.reachesThing(link)) {
                    found.add(link);
                }
            }
        }
        return found;
    }

    /** Live judgements of a verdict that hit a record by a role. */
    boolean hit(int node, String verdict, String role) {
        for (int link : links(node)) {
            if (data.roleName(link).equals(role) && liveWith(data.linkSource.get(link), verdict)) {
                return true;
            }
        }
        return false;
    }
}
