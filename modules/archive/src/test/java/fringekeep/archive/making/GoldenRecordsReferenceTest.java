package fringekeep.archive.making;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Circumstances;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.internal.records.StoredPart;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.Role;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.EnumMap;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/**
 * All ten golden records made anew from their values: told what the person typed, the clock, the zone and the random bytes,
 * preparing gives the same heads, parts and payloads byte for byte.
 */
class GoldenRecordsReferenceTest {
    private static final List<Hash> IN_ORDER = List.of(
            RecordVectors.COMPOUND,
            RecordVectors.BATCH,
            RecordVectors.SETUP,
            RecordVectors.RUN,
            RecordVectors.PROFILE,
            RecordVectors.SCAN,
            RecordVectors.PLACEMENT,
            RecordVectors.FIT,
            RecordVectors.MASK,
            RecordVectors.SETUP2);

    private static final Kinds KINDS = new Kinds(List.of(
            any("compound"),
            any("batch", "compound"),
            any("setup"),
            any("source-run", "batch"),
            any("reading-profile"),
            any("scan"),
            any("placement", "scan", "setup", "run"),
            any("fit"),
            any("judgement", "target")));

    private static RecordKind any(String name, String... about) {
        List<Role> inputs = List.of(
                Role.ofRaw("raw", 0, 1),
                Role.anyKind("profile", 0, 1),
                Role.anyKind("scan", 0, 1),
                Role.anyKind("placement", 0, 1),
                Role.anyKind("setup", 0, 1),
                Role.anyKind("run", 0, 1),
                Role.anyKind("batch", 0, 1),
                Role.anyKind("compound", 0, 1));
        List<Role> subjects = new ArrayList<>();
        for (String role : about) {
            subjects.add(Role.anyKind(role, 0, 1));
        }
        return DemoKind.open(name, inputs, subjects);
    }

    @Test
    void everyGoldenRecordIsMadeByteForByte() throws Exception {
        MemorySource source = new MemorySource();
        assertThat(source.addRaw(RecordVectors.bytes(RecordVectors.RAW))).isEqualTo(RecordVectors.RAW);
        Set<Hash> made = new TreeSet<>();
        for (Hash fingerprint : IN_ORDER) {
            Head head = HeadCodec.read(RecordVectors.bytes(fingerprint));
            Prepared prepared = prepare(head, source);

            assertThat(prepared.fingerprint()).isEqualTo(fingerprint);
            assertThat(prepared.headBytes()).isEqualTo(RecordVectors.bytes(fingerprint));
            made.add(fingerprint);
            prepared.parts().forEach((hash, bytes) -> {
                made.add(hash);
                assertThat(bytes).isEqualTo(vector(hash));
            });
            prepared.payloads().forEach(payload -> {
                made.add(payload.hash());
                assertThat(payload.bytes()).isEqualTo(RecordVectors.bytes(payload.hash()));
            });
            source.add(prepared);
        }
        // heads, parts that are kept as files, the table; the raw file and the 11 entries are not made here
        assertThat(RecordVectors.all().keySet().stream().filter(made::contains)).hasSize(47 - 11 - 1);
    }

    private static byte[] vector(Hash hash) {
        return RecordVectors.bytes(hash);
    }

    private static Prepared prepare(Head head, MemorySource source) throws Exception {
        Deque<String> random = new ArrayDeque<>();
        if (head.corrects().isEmpty()) {
            random.add(head.thing().hex());
        }
        Map<PartName, StoredPart> parts = new EnumMap<>(PartName.class);
        TreeMap<String, Hash> all = new TreeMap<>(head.parts());
        all.putAll(head.sealed());
        for (Hash hash : all.values()) {
            StoredPart part = PartCodec.read(RecordVectors.bytes(hash));
            parts.put(part.name(), part);
        }
        parts.values().forEach(part -> part.salt().ifPresent(salt -> random.add(salt.hex())));
        Circumstances circumstances = new Circumstances(
                () -> Instant.parse("2031-05-14T09:03:11.250Z"),
                () -> HexFormat.of().parseHex(random.remove()),
                ZoneId.of("Etc/GMT-2"),
                "1.0.0");
        Prepared prepared =
                new Preparing(new Resolver(KINDS, source), circumstances).prepare(newRecord(head, parts), List.of());
        assertThat(random).isEmpty();
        return prepared;
    }

    private static NewRecord newRecord(Head head, Map<PartName, StoredPart> parts) {
        Map<PartName, JsonObject> values = new EnumMap<>(PartName.class);
        parts.forEach((name, part) -> {
            if (name != PartName.MADE && name != PartName.WHO) {
                values.put(name, part.value());
            }
        });
        Optional<PersonId> person = Optional.ofNullable(parts.get(PartName.WHO))
                .flatMap(who -> who.value().text("person"))
                .map(PersonId::new);
        List<NewPayload> payloads = head.payloads().stream()
                .map(payload -> new NewPayload(payload.name(), payload.form(), RecordVectors.bytes(payload.sha256())))
                .toList();
        return new NewRecord(
                head.kind(), head.inputs(), head.about(), values, payloads, head.corrects(), head.after(), person);
    }
}
