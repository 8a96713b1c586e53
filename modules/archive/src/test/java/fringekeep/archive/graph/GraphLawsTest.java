package fringekeep.archive.graph;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.ThingId;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

/** The graph against the slow transcription of the format, on random records with corrections, disputes and judgements. */
class GraphLawsTest {
    private static final int GRAPHS = 600;
    private static final Instant DAY = Instant.parse("2031-05-14T00:00:00Z");
    private static final List<String> ENTERED = List.of("setup", "calibration", "placement", "scan", "fit", "property");

    @Test
    void statesAndCausesAgreeWithTheTranscription() throws Exception {
        Map<Cause.Sort, Integer> seen = new TreeMap<>();
        int disputes = 0;
        int ended = 0;
        for (int seed = 0; seed < GRAPHS; seed++) {
            Sample sample = new Sample(new Random(seed));
            Graph graph = sample.build();
            Set<Hash> outdated = new HashSet<>();
            for (Hash hash : sample.slow.all()) {
                Set<Cause> expected = sample.slow.causes(hash);
                assertThat(new HashSet<>(graph.causes(hash)))
                        .as("seed %d", seed)
                        .isEqualTo(expected);
                assertThat(graph.states(hash).contains(StateName.OUTDATED)).isEqualTo(!expected.isEmpty());
                assertThat(graph.states(hash).contains(StateName.CORRECTED))
                        .as("seed %d", seed)
                        .isEqualTo(!sample.slow.current(hash));
                assertThat(graph.states(hash).contains(StateName.DISPUTED))
                        .as("seed %d", seed)
                        .isEqualTo(sample.slow.disputed(hash));
                expected.forEach(cause -> seen.merge(cause.sort(), 1, Integer::sum));
                disputes += sample.slow.disputed(hash) ? 1 : 0;
                ended += sample.setAside(hash) ? 1 : 0;
                if (!expected.isEmpty()) {
                    outdated.add(hash);
                }
            }
            assertThat(graph.outdated()).as("seed %d", seed).isEqualTo(outdated);
            for (ThingId thing : sample.things) {
                Instant time = sample.time();
                assertThat(graph.at(thing, time)).as("seed %d", seed).isEqualTo(sample.slow.at(thing, time));
            }
        }
        assertThat(seen.keySet()).containsExactlyInAnyOrder(Cause.Sort.values());
        assertThat(seen.values()).allSatisfy(count -> assertThat(count).isGreaterThan(100));
        assertThat(disputes).isGreaterThan(100);
        assertThat(ended).isGreaterThan(10);
    }

    @Test
    void aSnapshotDoesNotChangeWhileTheGraphGrows() throws Exception {
        for (int seed = 0; seed < 100; seed++) {
            Sample sample = new Sample(new Random(seed));
            GraphBuilder builder = sample.builder();
            Map<Hash, List<Cause>> before = new LinkedHashMap<>();
            Graph early = builder.snapshot();
            for (int i = 0; i < sample.order.size(); i++) {
                sample.addTo(builder, i);
                if (i == sample.order.size() / 2) {
                    early = builder.snapshot();
                    for (Hash hash : sample.order) {
                        before.put(hash, early.causes(hash));
                    }
                }
            }
            Graph fresh = sample.half();
            for (Hash hash : sample.order) {
                assertThat(early.causes(hash)).isEqualTo(before.get(hash)).isEqualTo(fresh.causes(hash));
                assertThat(early.links(hash)).isEqualTo(fresh.links(hash));
                assertThat(early.states(hash)).isEqualTo(fresh.states(hash));
            }
        }
    }

    @Test
    void walksAreInOrderOfDependence() throws Exception {
        for (int seed = 0; seed < 100; seed++) {
            Sample sample = new Sample(new Random(seed));
            Graph graph = sample.build();
            for (Hash hash : sample.order) {
                assertInOrder(sample, graph.upstream(hash));
                assertInOrder(sample, graph.downstream(hash));
                for (Hash below : graph.downstream(hash)) {
                    assertThat(graph.upstream(below)).contains(hash);
                }
            }
        }
    }

    private static void assertInOrder(Sample sample, List<Hash> walk) {
        Set<Hash> seen = new HashSet<>();
        Set<Hash> all = new HashSet<>(walk);
        assertThat(all).hasSameSizeAs(walk);
        for (Hash hash : walk) {
            if (sample.heads.containsKey(hash)) {
                for (InputReference input : sample.head(hash).inputs()) {
                    if (input instanceof InputReference.OfRecord record && all.contains(record.record())) {
                        assertThat(seen).contains(record.record());
                    }
                }
            }
            seen.add(hash);
        }
    }

    /** Some thirty random records. */
    private static final class Sample {
        private final Random random;
        private final List<Hash> order = new ArrayList<>();
        private final Map<Hash, Head> heads = new HashMap<>();
        private final Map<Hash, Transcription.Known> facts = new HashMap<>();
        private final Set<ThingId> things = new HashSet<>();
        private final Transcription slow = new Transcription();
        private int counter;

        Sample(Random random) throws ProblemException {
            this.random = random;
            int count = 12 + random.nextInt(20);
            while (order.size() < count) {
                if (random.nextInt(3) == 0 && !order.isEmpty()) {
                    judgement();
                } else {
                    entered();
                }
            }
        }

        Head head(Hash hash) {
            return Objects.requireNonNull(heads.get(hash));
        }

        Instant time() {
            return DAY.plusSeconds(random.nextInt(10));
        }

        private ThingId thing() {
            String hex = Hash.of(("thing " + random.nextLong()).getBytes(StandardCharsets.UTF_8))
                    .hex();
            return new ThingId(hex.substring(0, 32));
        }

        private Hash content() {
            return Hash.of(("content " + random.nextInt(2)).getBytes(StandardCharsets.UTF_8));
        }

        private Hash any() {
            return order.get(random.nextInt(order.size()));
        }

        private List<Hash> ofKind(String kind) {
            return order.stream()
                    .filter(hash -> head(hash).kind().text().equals(kind))
                    .toList();
        }

        private Optional<Hash> oneOfKind(String kind) {
            List<Hash> all = ofKind(kind);
            return all.isEmpty() ? Optional.empty() : Optional.of(all.get(random.nextInt(all.size())));
        }

        private void entered() throws ProblemException {
            String kind = ENTERED.get(random.nextInt(ENTERED.size()));
            Optional<Hash> earlier = random.nextInt(3) == 0 ? oneOfKind(kind) : Optional.empty();
            boolean follow =
                    earlier.isPresent() && Set.of("setup", "calibration").contains(kind) && random.nextBoolean();
            Optional<After> after = follow ? Optional.of(new After(earlier.get(), time())) : repeated(earlier);
            List<AboutReference> about = kind.equals("placement") ? placing() : List.of();
            add(kind, inputs(kind), about, follow ? Optional.empty() : earlier, after, earlier, Optional.empty());
        }

        private Optional<After> repeated(Optional<Hash> earlier) {
            return earlier.flatMap(hash -> head(hash).after()).map(after -> new After(after.record(), time()));
        }

        private List<AboutReference> placing() {
            List<AboutReference> about = new ArrayList<>();
            oneOfKind("scan").ifPresent(scan -> about.add(new AboutReference("scan", scan, Reach.THING)));
            oneOfKind("setup").ifPresent(setup -> about.add(new AboutReference("setup", setup, Reach.THING)));
            return about;
        }

        private List<InputReference> inputs(String kind) {
            Map<String, InputReference> inputs = new LinkedHashMap<>();
            List<String> roles =
                    switch (kind) {
                        case "fit" -> List.of("scan", "scan", "placement", "setup", "calibration", "judgement");
                        case "property" -> List.of("fit", "fit", "calibration", "judgement", "scan");
                        case "scan" -> List.of();
                        default -> List.of();
                    };
            for (String role : roles) {
                Optional<Hash> target = oneOfKind(role);
                if (target.isPresent() && random.nextInt(4) > 0) {
                    Optional<String> channel = role.equals("scan") && random.nextBoolean()
                            ? Optional.of("c" + random.nextInt(2))
                            : Optional.empty();
                    inputs.put(role + target.get() + channel, new InputReference.OfRecord(role, target.get(), channel));
                }
            }
            if (kind.equals("scan")) {
                inputs.put("raw", new InputReference.OfRaw("raw", content(), 1));
            }
            if (kind.equals("fit") && random.nextInt(10) == 0) {
                Hash absent = Hash.of(("absent " + random.nextInt()).getBytes(StandardCharsets.UTF_8));
                inputs.put("absent", new InputReference.OfRecord("scan", absent));
            }
            return List.copyOf(inputs.values());
        }

        private void judgement() throws ProblemException {
            String verdict = List.of("withdrawn", "masked", "doubted", "restored", "preferred", "preferred", "restored")
                    .get(random.nextInt(7));
            Map<Hash, AboutReference> about = new LinkedHashMap<>();
            Optional<Hash> judged = oneOfKind("judgement");
            if (verdict.equals("restored") && judged.isEmpty()) {
                return;
            }
            switch (verdict) {
                case "restored" -> about.put(judged.get(), new AboutReference("undoes", judged.get(), Reach.RECORD));
                case "preferred" -> preferring(about);
                default -> {
                    Hash target = any();
                    Reach reach = verdict.equals("masked") || random.nextBoolean() ? Reach.RECORD : Reach.THING;
                    about.put(target, new AboutReference("target", target, reach));
                }
            }
            JsonObject content = JsonObject.EMPTY.with("verdict", verdict);
            if (verdict.equals("masked") && random.nextBoolean()) {
                content = content.with("channel", Json.of("c" + random.nextInt(2)));
            }
            Optional<Hash> earlier = random.nextInt(6) == 0 ? judged : Optional.empty();
            Optional<JsonObject> atHand = random.nextInt(8) == 0 ? Optional.empty() : Optional.of(content);
            add("judgement", List.of(), List.copyOf(about.values()), earlier, Optional.empty(), earlier, atHand);
        }

        private void preferring(Map<Hash, AboutReference> about) {
            List<Hash> severalOfThing = order.stream()
                    .filter(hash -> order.stream()
                            .anyMatch(other -> !other.equals(hash)
                                    && head(other).thing().equals(head(hash).thing())))
                    .toList();
            boolean pick = !severalOfThing.isEmpty() && random.nextInt(4) > 0;
            Hash chosen = pick ? severalOfThing.get(random.nextInt(severalOfThing.size())) : any();
            Reach reach = random.nextInt(4) == 0 ? Reach.THING : Reach.RECORD;
            about.put(chosen, new AboutReference("chosen", chosen, reach));
            for (Hash other : order) {
                boolean kin = head(other).thing().equals(head(chosen).thing())
                        || (head(other).kind().equals(head(chosen).kind()) && random.nextInt(3) == 0);
                if (kin && random.nextInt(6) > 0) {
                    about.putIfAbsent(other, new AboutReference("over", other, reach));
                }
            }
        }

        private void add(
                String kind,
                List<InputReference> inputs,
                List<AboutReference> about,
                Optional<Hash> corrects,
                Optional<After> after,
                Optional<Hash> earlier,
                Optional<JsonObject> judgementContent)
                throws ProblemException {
            ThingId thing = earlier.map(hash -> head(hash).thing()).orElseGet(this::thing);
            Hash made = Hash.of(("made " + counter++).getBytes(StandardCharsets.UTF_8));
            Head head = new Head(
                    new KindName(kind),
                    1,
                    thing,
                    inputs,
                    about,
                    List.of(),
                    new TreeMap<>(Map.of("content", content(), "made", made)),
                    new TreeMap<>(),
                    corrects,
                    after);
            Hash hash = Hash.of(HeadCodec.write(head));
            Optional<Instant> start =
                    kind.equals("scan") && random.nextInt(5) > 0 ? Optional.of(time()) : Optional.empty();
            Transcription.Known known = new Transcription.Known(head, judgementContent, start);
            order.add(hash);
            heads.put(hash, head);
            facts.put(hash, known);
            things.add(thing);
            slow.add(hash, known);
        }

        boolean setAside(Hash hash) {
            return !slow.current(hash)
                    && heads.values().stream().noneMatch(head -> head.corrects().equals(Optional.of(hash)));
        }

        GraphBuilder builder() {
            return new GraphBuilder(hash -> Optional.ofNullable(heads.get(hash)));
        }

        void addTo(GraphBuilder builder, int index) {
            Hash hash = order.get(index);
            Transcription.Known known = Objects.requireNonNull(facts.get(hash));
            builder.add(index + 1, known.head(), hash, known.content(), known.start());
        }

        Graph build() {
            GraphBuilder builder = builder();
            for (int i = 0; i < order.size(); i++) {
                addTo(builder, i);
            }
            return builder.snapshot();
        }

        Graph half() {
            GraphBuilder builder = builder();
            for (int i = 0; i <= order.size() / 2; i++) {
                addTo(builder, i);
            }
            return builder.snapshot();
        }
    }
}
