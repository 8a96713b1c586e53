package fringekeep.archive.graph;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.Optional;
import java.util.function.Function;

/**
 * Builds the graph of records, one after another in journal order, and hands out snapshots that do not change. One writer at
 * a time; a snapshot may be read by any number of threads while building goes on.
 */
public final class GraphBuilder {
    private final GraphData data = new GraphData();
    private final Function<Hash, Optional<Head>> heads;
    private int links;
    private long watermark;

    /**
     * An empty graph.
     *
     * @param heads gives the head of a record that was added; asked only where a record is corrected or preferred
     */
    public GraphBuilder(Function<Hash, Optional<Head>> heads) {
        this.heads = heads;
    }

    /**
     * Adds a record.
     *
     * @param n its journal entry, ascending; 1, 2, 3 … where there is no journal
     * @param head its head
     * @param fingerprint its fingerprint; one that was added before is left as it is
     * @param judgementContent value of part content if it is a judgement and the part is at hand, otherwise empty
     * @param scanStart {@code result.start.at} if the record has one
     */
    public void add(
            long n, Head head, Hash fingerprint, Optional<JsonObject> judgementContent, Optional<Instant> scanStart) {
        int node = node(fingerprint);
        watermark = Math.max(watermark, n);
        if (data.atHand(node)) {
            return;
        }
        data.kind.set(node, data.kinds.findOrAdd(head.kind().text()));
        data.entry.set(node, Math.toIntExact(n));
        thing(node, head);
        boolean judgement = data.isKind(node, GraphData.JUDGEMENT);
        data.firstLink.set(node, links);
        data.inputCount.set(node, head.inputs().size());
        data.aboutCount.set(node, head.about().size());
        head.inputs().forEach(input -> input(node, input));
        head.about().forEach(about -> about(node, about, judgement));
        head.corrects().ifPresent(earlier -> corrects(node, node(earlier)));
        head.after().ifPresent(after -> after(node, after));
        scanStart.ifPresent(start -> start(node, start));
        if (judgement) {
            judgementContent.ifPresent(content -> data.judgements.put(node, JudgementFacts.of(content)));
        }
        says(node, head, judgement);
    }

    /** Adds a record as it is seen: reads what it needs from content and result. */
    public void add(long n, RecordView record) {
        boolean judgement = record.head().kind().text().equals(GraphData.JUDGEMENT);
        Optional<JsonObject> content = judgement ? record.part(PartName.CONTENT) : Optional.empty();
        add(n, record.head(), record.fingerprint(), content, scanStart(record.result()));
    }

    /** {@code start.at} of a result, if it has one. */
    public static Optional<Instant> scanStart(JsonObject result) {
        Optional<String> at = result.object("start").flatMap(start -> start.text("at"));
        try {
            return at.map(Instant::parse);
        } catch (DateTimeException e) {
            throw new IllegalArgumentException("start.at is not an instant: " + at.orElse(""), e);
        }
    }

    /** Supplies the content of a judgement that was received without it. */
    public void supply(Hash judgement, JsonObject content) {
        int node = data.node(judgement);
        if (node != GraphData.NONE && data.isKind(node, GraphData.JUDGEMENT)) {
            data.judgements.put(node, JudgementFacts.of(content));
        }
    }

    /** Says up to which journal entry the graph is complete: entries that record nothing raise it too. */
    public void watermark(long n) {
        watermark = Math.max(watermark, n);
    }

    /** The graph as it is now. */
    public Graph snapshot() {
        return new RecordGraph(data.frozen(), watermark);
    }

    private int node(Hash hash) {
        return data.nodes.findOrAdd(GraphData.key(hash));
    }

    private void thing(int node, Head head) {
        int thing = data.things.findOrAdd(GraphData.key(head.thing()));
        data.thing.set(node, thing);
        int last = data.thingLast.get(thing);
        if (last == GraphData.NONE) {
            data.thingFirst.set(thing, node);
        } else {
            data.thingNext.set(last, node);
        }
        data.thingLast.set(thing, node);
    }

    private void input(int node, InputReference input) {
        int role = data.roles.findOrAdd(input.role());
        if (input instanceof InputReference.OfRecord record) {
            int channel = record.channel().map(data.channels::findOrAdd).orElse(Names.NONE);
            link(node, node(record.record()), GraphData.meaning(false, false, role, channel), data.users);
        } else if (input instanceof InputReference.OfRaw raw) {
            int target = node(raw.raw());
            data.raw.set(target, 1);
            link(node, target, GraphData.meaning(false, false, role, Names.NONE), data.users);
        } else {
            throw new AssertionError(input);
        }
    }

    private void about(int node, AboutReference about, boolean judgement) {
        boolean thing = about.reach() == AboutReference.Reach.THING;
        int meaning = GraphData.meaning(true, thing, data.roles.findOrAdd(about.role()), Names.NONE);
        link(node, node(about.record()), meaning, judgement ? data.judging : data.users);
    }

    private void link(int source, int target, int meaning, IntVector chain) {
        int link = links++;
        data.linkSource.set(link, source);
        data.linkTarget.set(link, target);
        data.linkMeaning.set(link, meaning);
        data.linkNext.set(link, chain.get(target));
        chain.set(target, link);
    }

    private void corrects(int node, int earlier) {
        data.corrects.set(node, earlier);
        data.correctorNext.set(node, data.corrector.get(earlier));
        data.corrector.set(earlier, node);
    }

    private void after(int node, After after) {
        int earlier = node(after.record());
        data.after.set(node, earlier);
        data.followerNext.set(node, data.follower.get(earlier));
        data.follower.set(earlier, node);
        data.from.put(node, after.from());
    }

    private void start(int node, Instant start) {
        data.startSecond.set(node, start.getEpochSecond());
        data.startNano.set(node, start.getNano());
    }

    /** What a record says is compared only within chains and between preferred and passed over, so only there is it kept. */
    private void says(int node, Head head, boolean judgement) {
        boolean chained = head.corrects().isPresent()
                || data.corrector.get(node) != GraphData.NONE
                || data.judging.get(node) != GraphData.NONE;
        if (chained) {
            data.says.put(node, HeadCodec.says(head));
        }
        head.corrects().ifPresent(this::saysOf);
        if (judgement) {
            head.about().forEach(about -> saysOf(about.record()));
            head.about().stream()
                    .filter(about -> about.reach() == AboutReference.Reach.THING)
                    .forEach(about -> saysOfThing(node(about.record())));
        } else if (thingIsJudged(node)) {
            data.says.put(node, HeadCodec.says(head));
        }
    }

    private void saysOf(Hash hash) {
        int node = node(hash);
        if (data.atHand(node) && !data.says.containsKey(node)) {
            heads.apply(hash).ifPresent(head -> data.says.put(node, HeadCodec.says(head)));
        }
    }

    private void saysOfThing(int target) {
        if (data.atHand(target)) {
            int node = data.thingFirst.get(data.thing.get(target));
            while (node != GraphData.NONE) {
                saysOf(data.hash(node));
                node = data.thingNext.get(node);
            }
        }
    }

    private boolean thingIsJudged(int node) {
        int other = data.thingFirst.get(data.thing.get(node));
        while (other != GraphData.NONE) {
            if (data.judging.get(other) != GraphData.NONE) {
                return true;
            }
            other = data.thingNext.get(other);
        }
        return false;
    }
}
