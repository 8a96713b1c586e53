package fringekeep.archive.making;

import fringekeep.archive.Circumstances;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.internal.records.StoredPart;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.Salt;
import fringekeep.archive.record.ThingId;
import java.time.Instant;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Examines new records and turns them into bytes: everything that one record and what it refers to can decide. Draws from
 * the random source first the thing (if new), then the salts of who, remark and identity. Stores nothing.
 */
public final class Preparing {
    private final Resolver resolver;
    private final Circumstances circumstances;
    private final PartRules parts = new PartRules();

    /** Prepares on what a resolver sees. */
    public Preparing(Resolver resolver, Circumstances circumstances) {
        this.resolver = resolver;
        this.circumstances = circumstances;
    }

    /**
     * Prepares a record.
     *
     * @param earlier prepared records that this one may refer to
     * @throws ProblemException all that is wrong, each with a JSON pointer ({@code /content/…}, {@code /inputs/0/role} …)
     */
    public Prepared prepare(NewRecord record, List<Prepared> earlier) throws ProblemException {
        Resolver seen = earlier.isEmpty() ? resolver : resolver.before(MemorySource.of(earlier));
        RecordKind kind = kind(record);
        refuseAny(examine(record, kind, seen));
        return bytes(record, kind, thing(record, seen));
    }

    private RecordKind kind(NewRecord record) throws ProblemException {
        return resolver.kinds()
                .get(record.kind())
                .orElseThrow(() -> new ProblemException(new Problem(
                        "record.kind-unknown",
                        "This program knows no kind \"" + record.kind() + "\".",
                        "/kind",
                        "Use one of: "
                                + String.join(
                                        ", ",
                                        resolver.kinds().all().stream()
                                                .map(known -> known.kind().text())
                                                .toList())
                                + ". Nothing has been stored.")));
    }

    private List<Problem> examine(NewRecord record, RecordKind kind, Resolver seen) throws ProblemException {
        Inputs inputs = seen.inputs(record.inputs(), record.about());
        List<Problem> problems = new ArrayList<>(parts.examine(record, kind));
        problems.addAll(RoleRules.examine(kind, inputs));
        problems.addAll(rawFiles(record, seen));
        problems.addAll(PayloadRules.examine(record.payloads()));
        problems.addAll(SuccessionRules.examine(record, kind, seen));
        if (problems.isEmpty()) {
            problems.addAll(kind.examine(new Parts(record.parts()), inputs));
        }
        return problems;
    }

    private static List<Problem> rawFiles(NewRecord record, Resolver seen) throws ProblemException {
        List<Problem> problems = new ArrayList<>();
        for (int i = 0; i < record.inputs().size(); i++) {
            if (record.inputs().get(i) instanceof InputReference.OfRaw raw) {
                OptionalLong length = seen.source().rawLength(raw.raw());
                if (length.isEmpty() || length.getAsLong() != raw.bytes()) {
                    problems.add(new Problem(
                            "record.raw-not-at-hand",
                            length.isEmpty()
                                    ? "The raw file " + raw.raw().shortForm() + " has not been taken in."
                                    : "The raw file has " + length.getAsLong() + " bytes, not " + raw.bytes() + ".",
                            "/inputs/" + i,
                            "Take the file in first. Nothing has been stored."));
                }
            }
        }
        return problems;
    }

    private ThingId thing(NewRecord record, Resolver seen) {
        Optional<Hash> earlier = record.corrects().or(() -> record.after().map(After::record));
        return earlier.flatMap(seen::record).map(view -> view.head().thing()).orElseGet(() -> new ThingId(drawn()));
    }

    private String drawn() {
        return HexFormat.of().formatHex(circumstances.random().get());
    }

    private Prepared bytes(NewRecord record, RecordKind kind, ThingId thing) throws ProblemException {
        Map<Hash, byte[]> stored = new LinkedHashMap<>();
        SortedMap<String, Hash> open = new TreeMap<>();
        SortedMap<String, Hash> sealed = new TreeMap<>();
        for (Map.Entry<PartName, JsonObject> part : values(record).entrySet()) {
            PartName name = part.getKey();
            Optional<Salt> salt = name.salted() ? Optional.of(new Salt(drawn())) : Optional.empty();
            byte[] bytes = PartCodec.write(new StoredPart(name, salt, part.getValue()));
            Hash hash = Hash.of(bytes);
            stored.put(hash, bytes);
            (name.salted() ? sealed : open).put(name.text(), hash);
        }
        Head head = new Head(
                record.kind(),
                kind.schema(),
                thing,
                record.inputs(),
                record.about(),
                references(record.payloads()),
                open,
                sealed,
                record.corrects(),
                record.after());
        byte[] headBytes = HeadCodec.write(head);
        return new Prepared(Hash.of(headBytes), head, headBytes, stored, payloads(record.payloads()));
    }

    private SortedMap<PartName, JsonObject> values(NewRecord record) {
        SortedMap<PartName, JsonObject> values = new TreeMap<>(record.parts());
        values.put(PartName.MADE, made());
        record.person().ifPresent(person -> values.put(PartName.WHO, JsonObject.EMPTY.with("person", person.hex())));
        return values;
    }

    private JsonObject made() {
        Instant at = circumstances.clock().get();
        ZoneId zone = circumstances.zone();
        JsonObject made = JsonObject.EMPTY
                .with("at", at.toString())
                .with("build", circumstances.build())
                .with("offset", zone.getRules().getOffset(at).getId());
        return zone instanceof ZoneOffset ? made : made.with("zone", Json.of(zone.getId()));
    }

    private static List<PayloadReference> references(List<NewPayload> payloads) {
        return payloads.stream()
                .map(payload -> new PayloadReference(
                        payload.name(), Hash.of(payload.bytes()), payload.bytes().length, payload.form()))
                .toList();
    }

    private static List<Prepared.PayloadBytes> payloads(List<NewPayload> payloads) {
        return payloads.stream()
                .map(payload -> new Prepared.PayloadBytes(Hash.of(payload.bytes()), payload.bytes()))
                .toList();
    }

    private static void refuseAny(List<Problem> problems) throws ProblemException {
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
    }
}
