package fringekeep.archive.internal.store;

import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Orders records so that each comes after all it refers to. References cannot form a circle, for they are hashes. */
final class Dependence {
    private final Map<Hash, Head> heads;
    private final Set<Hash> order = new LinkedHashSet<>();

    private Dependence(Map<Hash, Head> heads) {
        this.heads = heads;
    }

    /** Fingerprints in order of dependence; otherwise as they were given. */
    static List<Hash> order(Map<Hash, Head> heads) {
        Dependence dependence = new Dependence(heads);
        heads.keySet().forEach(dependence::visit);
        return new ArrayList<>(dependence.order);
    }

    /** Depth first without recursion: chains may be longer than a thread's stack is deep. */
    private void visit(Hash start) {
        Deque<Hash> open = new ArrayDeque<>();
        Set<Hash> entered = new HashSet<>();
        open.push(start);
        while (!open.isEmpty()) {
            Hash here = open.peek();
            Head head = heads.get(here);
            if (head == null || order.contains(here)) {
                open.pop();
            } else if (entered.add(here)) {
                List<Hash> targets = targets(head);
                for (int i = targets.size() - 1; i >= 0; i--) {
                    open.push(targets.get(i));
                }
            } else {
                open.pop();
                order.add(here);
            }
        }
    }

    /** Everything a head refers to that is a record. */
    static List<Hash> targets(Head head) {
        List<Hash> targets = new ArrayList<>();
        for (InputReference input : head.inputs()) {
            if (input instanceof InputReference.OfRecord record) {
                targets.add(record.record());
            }
        }
        for (AboutReference about : head.about()) {
            targets.add(about.record());
        }
        head.corrects().ifPresent(targets::add);
        head.after().ifPresent(after -> targets.add(after.record()));
        return targets;
    }
}
