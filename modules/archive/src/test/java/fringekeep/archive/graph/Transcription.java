package fringekeep.archive.graph;

import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.ThingId;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;

/**
 * Record format 1, sections 7 and 8, written down line by line over plain maps, without regard to speed. Judges the graph in
 * tests; shares with it only the bytes of heads.
 */
final class Transcription {
    record Known(Head head, Optional<JsonObject> content, Optional<Instant> start) {}

    private final Map<Hash, Known> records = new LinkedHashMap<>();

    void add(Hash hash, Known known) {
        records.put(hash, known);
    }

    Set<Hash> all() {
        return records.keySet();
    }

    private Head head(Hash u) {
        return facts(u).head();
    }

    private Known facts(Hash u) {
        return Objects.requireNonNull(records.get(u));
    }

    private boolean atHand(Hash u) {
        return records.containsKey(u);
    }

    private boolean is(Hash u, String kind) {
        return atHand(u) && head(u).kind().text().equals(kind);
    }

    private Optional<ThingId> thing(Hash u) {
        return atHand(u) ? Optional.of(head(u).thing()) : Optional.empty();
    }

    private boolean sameThing(Hash t, Hash u) {
        return thing(t).isPresent() && thing(t).equals(thing(u));
    }

    // ---- chains and disputes

    private Set<Hash> correctors(Hash u) {
        Set<Hash> found = new HashSet<>();
        records.forEach((hash, known) -> {
            if (known.head().corrects().equals(Optional.of(u))) {
                found.add(hash);
            }
        });
        return found;
    }

    private Set<Hash> forward(Hash u) {
        Set<Hash> found = new HashSet<>(Set.of(u));
        correctors(u).forEach(c -> found.addAll(forward(c)));
        return found;
    }

    private Hash first(Hash u) {
        return atHand(u) && head(u).corrects().isPresent()
                ? first(head(u).corrects().get())
                : u;
    }

    private Set<Hash> chain(Hash u) {
        return forward(first(u));
    }

    private Instant begin(Hash u) {
        return head(u).after().map(after -> after.from()).orElse(Instant.MIN);
    }

    private boolean placesSameScan(Hash u, Hash v) {
        return scans(u).stream().anyMatch(a -> scans(v).stream().anyMatch(b -> a.equals(b) || sameThing(a, b)));
    }

    private List<Hash> scans(Hash placement) {
        return about(placement, "scan");
    }

    private List<Hash> about(Hash u, String role) {
        return head(u).about().stream()
                .filter(about -> about.role().equals(role))
                .map(AboutReference::record)
                .toList();
    }

    private Optional<Hash> chosenOf(Set<Hash> group) {
        Set<Hash> chosen = new HashSet<>();
        for (Hash j : records.keySet()) {
            boolean amongJudgements = group.stream().anyMatch(g -> is(g, "judgement"));
            if (!verdict(j).equals("preferred") || group.size() < 2 || amongJudgements) {
                continue;
            }
            Set<Hash> over = aboutExactly(j, "over");
            Set<Hash> standIns = new HashSet<>();
            aboutExactly(j, "chosen").forEach(c -> standIns.addAll(forward(c)));
            List<Hash> winners = group.stream().filter(standIns::contains).toList();
            boolean touches = group.stream().anyMatch(over::contains);
            if (touches
                    && winners.size() == 1
                    && group.stream().allMatch(g -> winners.contains(g) || over.contains(g))
                    && live(j)) {
                chosen.add(winners.get(0));
            }
        }
        return chosen.size() == 1 ? Optional.of(chosen.iterator().next()) : Optional.empty();
    }

    private Set<Hash> aboutExactly(Hash j, String role) {
        Set<Hash> found = new HashSet<>();
        head(j).about().stream()
                .filter(about -> about.role().equals(role) && about.reach() == Reach.RECORD)
                .forEach(about -> found.add(about.record()));
        return found;
    }

    /** Who was chosen over u in one of the first so many groups. */
    private Optional<Hash> lostIn(Hash u, int sorts) {
        if (!atHand(u)) {
            return Optional.empty();
        }
        for (int sort = 0; sort < sorts; sort++) {
            Optional<Hash> chosen = chosenOf(group(u, sort));
            if (chosen.isPresent() && !chosen.get().equals(u)) {
                return chosen;
            }
        }
        return Optional.empty();
    }

    private Set<Hash> group(Hash u, int sort) {
        if (sort == 0) {
            Set<Hash> leaves = new HashSet<>();
            chain(u).stream().filter(v -> correctors(v).isEmpty() && atHand(v)).forEach(leaves::add);
            return leaves;
        }
        Set<Hash> members = new HashSet<>();
        for (Hash v : records.keySet()) {
            boolean beside = sort == 1
                    ? sameThing(u, v) && begin(u).equals(begin(v))
                    : is(u, "placement") && is(v, "placement") && placesSameScan(u, v);
            if (beside && correctors(v).isEmpty() && lostIn(v, sort).isEmpty()) {
                members.add(v);
            }
        }
        return members;
    }

    boolean current(Hash u) {
        return correctors(u).isEmpty() && lostIn(u, 3).isEmpty();
    }

    boolean disputed(Hash u) {
        if (!current(u)) {
            return false;
        }
        for (int sort = 0; sort < 3; sort++) {
            Set<Hash> group = group(u, sort);
            if (group.size() > 1 && chosenOf(group).isEmpty()) {
                return true;
            }
        }
        return false;
    }

    private Set<Hash> ends(Hash u) {
        Set<Hash> ends = new HashSet<>();
        forward(u).stream().filter(v -> correctors(v).isEmpty()).forEach(v -> ends.add(standIn(v, new HashSet<>())));
        return ends;
    }

    private Hash standIn(Hash v, Set<Hash> seen) {
        Optional<Hash> chosen = lostIn(v, 3);
        return chosen.isPresent() && seen.add(chosen.get()) ? standIn(chosen.get(), seen) : v;
    }

    Optional<Hash> at(ThingId thing, Instant t) {
        Optional<Hash> latest = Optional.empty();
        for (Hash v : records.keySet()) {
            if (head(v).thing().equals(thing)
                    && current(v)
                    && !begin(v).isAfter(t)
                    && (latest.isEmpty() || begin(v).isAfter(begin(latest.get())))) {
                latest = Optional.of(v);
            }
        }
        return latest.filter(v -> !disputed(v));
    }

    // ---- section 8

    private String verdict(Hash j) {
        return is(j, "judgement")
                ? facts(j).content().flatMap(c -> c.text("verdict")).orElse("")
                : "";
    }

    private Set<Hash> undoing(Hash j) {
        Set<Hash> found = new HashSet<>();
        for (Hash k : records.keySet()) {
            if (is(k, "judgement") && about(k, "undoes").contains(j) && stands(k)) {
                found.add(k);
            }
        }
        return found;
    }

    private boolean stands(Hash j) {
        return is(j, "judgement") && current(j) && undoing(j).isEmpty();
    }

    private boolean live(Hash j) {
        return stands(j) && facts(j).content().isPresent();
    }

    private boolean reaches(Hash j, String role, Hash u) {
        return head(j).about().stream()
                .filter(about -> about.role().equals(role))
                .anyMatch(about ->
                        about.record().equals(u) || (about.reach() == Reach.THING && sameThing(about.record(), u)));
    }

    private Set<Hash> known(Hash r) {
        Set<Hash> known = new HashSet<>(Set.of(r));
        if (atHand(r)) {
            for (InputReference input : head(r).inputs()) {
                known.addAll(known(target(input)));
            }
        }
        return known;
    }

    private static Hash target(InputReference input) {
        if (input instanceof InputReference.OfRecord record) {
            return record.record();
        }
        return ((InputReference.OfRaw) input).raw();
    }

    private boolean sameWords(Hash a, Hash b) {
        return a.equals(b) || (atHand(a) && atHand(b) && HeadCodec.says(head(a)).equals(HeadCodec.says(head(b))));
    }

    private boolean knows(Set<Hash> known, Hash c) {
        return known.contains(c) || chain(c).stream().anyMatch(x -> known.contains(x) && sameWords(x, c));
    }

    Set<Cause> causes(Hash r) {
        Set<Cause> causes = new HashSet<>();
        Set<Hash> known = known(r);
        Set<Hash> raws = new HashSet<>();
        known.stream()
                .filter(this::atHand)
                .forEach(p -> head(p).inputs().forEach(input -> {
                    if (input instanceof InputReference.OfRaw raw) {
                        raws.add(raw.raw());
                    }
                }));
        for (Hash u : known) {
            if (u.equals(r) || raws.contains(u)) {
                continue;
            }
            for (Hash c : ends(u)) {
                if (!c.equals(u) && !knows(known, c) && !sameWords(c, u)) {
                    causes.add(new Cause(Cause.Sort.CORRECTED, u, c));
                }
            }
            for (Hash j : records.keySet()) {
                if (live(j) && !knows(known, j) && hitsToOutdate(j, u, known)) {
                    causes.add(new Cause(Cause.Sort.JUDGED, u, j));
                }
            }
            if (is(u, "judgement") && !stands(u) && !excused(u, known)) {
                causes.add(new Cause(Cause.Sort.UNDONE, u, u));
            }
        }
        changed(known, causes);
        return causes;
    }

    private boolean hitsToOutdate(Hash j, Hash u, Set<Hash> known) {
        return switch (verdict(j)) {
            case "withdrawn" -> reaches(j, "target", u);
            case "masked" -> reaches(j, "target", u) && takesChannel(j, u, known);
            case "preferred" ->
                reaches(j, "over", u) && about(j, "chosen").stream().noneMatch(c -> sameWords(c, u));
            default -> false;
        };
    }

    private boolean takesChannel(Hash j, Hash u, Set<Hash> known) {
        Optional<String> channel = facts(j).content().flatMap(c -> c.text("channel"));
        return channel.isEmpty()
                || known.stream()
                        .filter(this::atHand)
                        .flatMap(p -> head(p).inputs().stream())
                        .anyMatch(input -> input instanceof InputReference.OfRecord record
                                && record.record().equals(u)
                                && (record.channel().isEmpty()
                                        || record.channel().equals(channel)));
    }

    private boolean excused(Hash u, Set<Hash> known) {
        boolean knowsWhy = undoing(u).stream().anyMatch(k -> knows(known, k));
        boolean follows = !correctors(u).isEmpty()
                && ends(u).stream().anyMatch(c -> stands(c) && (sameWords(c, u) || knows(known, c)));
        return knowsWhy || follows;
    }

    private void changed(Set<Hash> known, Set<Cause> causes) {
        for (Hash p : known) {
            if (!atHand(p)) {
                continue;
            }
            for (InputReference input : head(p).inputs()) {
                Hash u = target(input);
                if (!atHand(u)) {
                    continue;
                }
                Set<Hash> timing = new HashSet<>();
                if (input.role().equals("calibration")) {
                    timing.addAll(known);
                } else if (input.role().equals("setup")) {
                    head(p).inputs().stream()
                            .filter(s ->
                                    Set.of("scan", "reference", "background").contains(s.role()))
                            .map(Transcription::target)
                            .filter(s -> placed(p, s, u))
                            .forEach(timing::add);
                }
                timing.stream()
                        .filter(this::atHand)
                        .forEach(s -> facts(s).start()
                                .flatMap(t -> at(head(u).thing(), t))
                                .filter(v -> !chain(v).contains(u)
                                        && chain(v).stream().noneMatch(known::contains))
                                .ifPresent(v -> causes.add(new Cause(Cause.Sort.CHANGED, u, v))));
            }
        }
    }

    private boolean placed(Hash p, Hash scan, Hash setup) {
        List<Hash> placements = new ArrayList<>();
        head(p).inputs().stream()
                .map(Transcription::target)
                .filter(x -> is(x, "placement"))
                .forEach(placements::add);
        return placements.stream()
                .anyMatch(x -> about(x, "scan").stream().anyMatch(s -> s.equals(scan) || sameThing(s, scan))
                        && about(x, "setup").stream().anyMatch(s -> s.equals(setup) || sameThing(s, setup)));
    }
}
