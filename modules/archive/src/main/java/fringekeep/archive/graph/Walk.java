package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;

/** Walks over inputs, up or down, in order of dependence; without recursion, so that long lineages cannot exhaust the stack. */
final class Walk {
    private final GraphData data;
    private final boolean up;
    private final IntSet seen = new IntSet();
    private final List<Integer> finished = new ArrayList<>();
    private int[] nodes = new int[32];
    private int[] links = new int[32];
    private int depth;

    private Walk(GraphData data, boolean up) {
        this.data = data;
        this.up = up;
    }

    /** What a record was made from, records only, inputs before users, without itself. */
    static List<Integer> upstream(GraphData data, int node) {
        Walk walk = new Walk(data, true);
        walk.from(node);
        walk.finished.remove(walk.finished.size() - 1);
        return walk.finished;
    }

    /** What was made from a record, inputs before users, without itself. */
    static List<Integer> downstream(GraphData data, int node) {
        Walk walk = new Walk(data, false);
        walk.from(node);
        walk.finished.remove(walk.finished.size() - 1);
        Collections.reverse(walk.finished);
        return walk.finished;
    }

    private void from(int node) {
        push(node);
        while (depth > 0) {
            int here = nodes[depth - 1];
            int link = links[depth - 1];
            if (link == NONE) {
                finished.add(here);
                depth--;
            } else {
                links[depth - 1] = next(here, link);
                int other = up ? data.linkTarget.get(link) : data.linkSource.get(link);
                if (!data.isRaw(other) && !seen.contains(other)) {
                    push(other);
                }
            }
        }
    }

    private void push(int node) {
        seen.add(node);
        if (depth == nodes.length) {
            nodes = Arrays.copyOf(nodes, 2 * depth);
            links = Arrays.copyOf(links, 2 * depth);
        }
        nodes[depth] = node;
        links[depth++] = up ? firstInput(node) : inputLink(data.users.get(node));
    }

    private int firstInput(int node) {
        return data.inputCount.get(node) == 0 ? NONE : data.firstLink.get(node);
    }

    private int next(int node, int link) {
        if (up) {
            return link + 1 < data.firstLink.get(node) + data.inputCount.get(node) ? link + 1 : NONE;
        }
        return inputLink(data.linkNext.get(link));
    }

    private int inputLink(int link) {
        int here = link;
        while (here != NONE && data.isAbout(here)) {
            here = data.linkNext.get(here);
        }
        return here;
    }
}
