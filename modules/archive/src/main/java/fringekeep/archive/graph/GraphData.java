package fringekeep.archive.graph;

import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.nio.ByteBuffer;
import java.time.Instant;
import java.util.HexFormat;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * The columns of the graph. A node is a record at hand, a record referred to, or a raw file; its links of one record stand
 * side by side, inputs first; links to one target are chained, those of judgements apart from the others.
 */
final class GraphData {
    static final int NONE = -1;
    static final String JUDGEMENT = "judgement";
    private static final int CHANNEL_BITS = 15;
    private static final int ROLE_BITS = 14;
    private static final int ABOUT = 1 << 30;
    private static final int THING = 1 << 29;

    final KeyIndex nodes;
    final KeyIndex things;
    final Names kinds;
    final Names roles;
    final Names channels;
    final IntVector kind;
    final IntVector entry;
    final IntVector thing;
    final IntVector thingFirst;
    final IntVector thingLast;
    final IntVector thingNext;
    final IntVector firstLink;
    final IntVector inputCount;
    final IntVector aboutCount;
    final IntVector linkTarget;
    final IntVector linkSource;
    final IntVector linkMeaning;
    final IntVector linkNext;
    final IntVector users;
    final IntVector judging;
    final IntVector corrects;
    final IntVector corrector;
    final IntVector correctorNext;
    final IntVector after;
    final IntVector follower;
    final IntVector followerNext;
    final IntVector raw;
    final Map<Integer, Instant> from;
    final Map<Integer, JudgementFacts> judgements;
    final Map<Integer, Hash> says;
    final LongVector startSecond;
    final IntVector startNano;

    GraphData() {
        nodes = new KeyIndex(4);
        things = new KeyIndex(2);
        kinds = new Names(Integer.MAX_VALUE);
        roles = new Names((1 << ROLE_BITS) - 1);
        channels = new Names((1 << CHANNEL_BITS) - 1);
        kind = new IntVector(NONE);
        entry = new IntVector(NONE);
        thing = new IntVector(NONE);
        thingFirst = new IntVector(NONE);
        thingLast = new IntVector(NONE);
        thingNext = new IntVector(NONE);
        firstLink = new IntVector(NONE);
        inputCount = new IntVector(0);
        aboutCount = new IntVector(0);
        linkTarget = new IntVector(NONE);
        linkSource = new IntVector(NONE);
        linkMeaning = new IntVector(0);
        linkNext = new IntVector(NONE);
        users = new IntVector(NONE);
        judging = new IntVector(NONE);
        corrects = new IntVector(NONE);
        corrector = new IntVector(NONE);
        correctorNext = new IntVector(NONE);
        after = new IntVector(NONE);
        follower = new IntVector(NONE);
        followerNext = new IntVector(NONE);
        raw = new IntVector(0);
        from = new TreeMap<>();
        judgements = new TreeMap<>();
        says = new TreeMap<>();
        startSecond = new LongVector();
        startNano = new IntVector(NONE);
    }

    private GraphData(GraphData other) {
        nodes = other.nodes.frozen();
        things = other.things.frozen();
        kinds = other.kinds.frozen();
        roles = other.roles.frozen();
        channels = other.channels.frozen();
        kind = other.kind.frozen();
        entry = other.entry.frozen();
        thing = other.thing.frozen();
        thingFirst = other.thingFirst.frozen();
        thingLast = other.thingLast.frozen();
        thingNext = other.thingNext.frozen();
        firstLink = other.firstLink.frozen();
        inputCount = other.inputCount.frozen();
        aboutCount = other.aboutCount.frozen();
        linkTarget = other.linkTarget.frozen();
        linkSource = other.linkSource.frozen();
        linkMeaning = other.linkMeaning.frozen();
        linkNext = other.linkNext.frozen();
        users = other.users.frozen();
        judging = other.judging.frozen();
        corrects = other.corrects.frozen();
        corrector = other.corrector.frozen();
        correctorNext = other.correctorNext.frozen();
        after = other.after.frozen();
        follower = other.follower.frozen();
        followerNext = other.followerNext.frozen();
        raw = other.raw.frozen();
        from = Map.copyOf(other.from);
        judgements = Map.copyOf(other.judgements);
        says = Map.copyOf(other.says);
        startSecond = other.startSecond.frozen();
        startNano = other.startNano.frozen();
    }

    GraphData frozen() {
        return new GraphData(this);
    }

    static int meaning(boolean about, boolean reachThing, int role, int channel) {
        return (about ? ABOUT : 0) | (reachThing ? THING : 0) | (role << CHANNEL_BITS) | (channel + 1);
    }

    boolean isAbout(int link) {
        return (linkMeaning.get(link) & ABOUT) != 0;
    }

    boolean reachesThing(int link) {
        return (linkMeaning.get(link) & THING) != 0;
    }

    int role(int link) {
        return (linkMeaning.get(link) >>> CHANNEL_BITS) & ((1 << ROLE_BITS) - 1);
    }

    String roleName(int link) {
        return roles.name(role(link));
    }

    /** Number of the channel a link names, or {@link #NONE}. */
    int channel(int link) {
        return (linkMeaning.get(link) & ((1 << CHANNEL_BITS) - 1)) - 1;
    }

    int firstAbout(int node) {
        return firstLink.get(node) + inputCount.get(node);
    }

    boolean atHand(int node) {
        return kind.get(node) != NONE;
    }

    boolean isKind(int node, String name) {
        int number = kind.get(node);
        return number != NONE && number == kinds.find(name);
    }

    boolean isRaw(int node) {
        return raw.get(node) != 0;
    }

    Optional<Instant> start(int node) {
        int nano = startNano.get(node);
        return nano == NONE ? Optional.empty() : Optional.of(Instant.ofEpochSecond(startSecond.get(node), nano));
    }

    /** The instant a record holds from; the least there is when it follows none. */
    Instant begin(int node) {
        return from.getOrDefault(node, Instant.MIN);
    }

    int node(Hash hash) {
        return nodes.find(key(hash));
    }

    Hash hash(int node) {
        ByteBuffer bytes = ByteBuffer.allocate(32);
        for (long word : nodes.key(node)) {
            bytes.putLong(word);
        }
        return Hash.fromBytes(bytes.array());
    }

    static long[] key(Hash hash) {
        ByteBuffer bytes = ByteBuffer.wrap(hash.bytes());
        return new long[] {bytes.getLong(), bytes.getLong(), bytes.getLong(), bytes.getLong()};
    }

    static long[] key(ThingId thing) {
        ByteBuffer bytes = ByteBuffer.wrap(HexFormat.of().parseHex(thing.hex()));
        return new long[] {bytes.getLong(), bytes.getLong()};
    }
}
