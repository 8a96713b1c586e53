package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import java.util.ArrayDeque;
import java.util.BitSet;
import java.util.Deque;

/** Marks everything that was made from a record. */
final class Spread {
    private Spread() {}

    static void over(GraphData data, int node, BitSet reached) {
        Deque<Integer> waiting = new ArrayDeque<>();
        waiting.add(node);
        while (!waiting.isEmpty()) {
            for (int link = data.users.get(waiting.remove()); link != NONE; link = data.linkNext.get(link)) {
                int user = data.linkSource.get(link);
                if (!data.isAbout(link) && !reached.get(user)) {
                    reached.set(user);
                    waiting.add(user);
                }
            }
        }
    }
}
