package fringekeep.archive.internal.store;

import static fringekeep.archive.internal.store.Filled.labelled;
import static fringekeep.archive.internal.store.Filled.thing;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.Archive.PurgeTarget;
import fringekeep.archive.Archives;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.making.MemorySource;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.RecordSource;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Plain copies, restoring and receiving (record format 1, section 13). */
class CopyAndReceiveTest {
    @TempDir
    private Path folder;

    private static Map<String, String> contents(Path root) throws IOException {
        Map<String, String> contents = new TreeMap<>();
        try (Stream<Path> files = Files.walk(root)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                contents.put(
                        root.relativize(file).toString(),
                        Hash.of(Files.readAllBytes(file)).hex());
            }
        }
        return contents;
    }

    private static String code(org.assertj.core.api.ThrowableAssert.ThrowingCallable work) {
        List<String> codes = new java.util.ArrayList<>();
        assertThatThrownBy(work)
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> codes.add(e.problems().get(0).code()));
        return codes.get(0);
    }

    private static Hash remark(byte[] head) throws ProblemException {
        return Objects.requireNonNull(HeadCodec.read(head).sealed().get("remark"));
    }

    @Test
    void aCopyHoldsTheGoldenBytesLineByLine() throws Exception {
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.copyTo(folder.resolve("copy"), Work.QUIET);
        }

        List<String> journal = Files.readAllLines(folder.resolve("copy/journal/000000.txt"));
        List<String> records = Files.readAllLines(folder.resolve("copy/records/000000.txt"));
        assertThat(journal).hasSize(11);
        assertThat(journal.get(10).getBytes(StandardCharsets.UTF_8))
                .isEqualTo(RecordVectors.bytes(Hash.of(journal.get(10).getBytes(StandardCharsets.UTF_8))));
        assertThat(records)
                .allSatisfy(line -> assertThat(Hash.of(line.substring(65).getBytes(StandardCharsets.UTF_8)))
                        .hasToString(line.substring(0, 64)));
        assertThat(records.stream().map(line -> line.substring(0, 64)))
                .contains(RecordVectors.SETUP2.hex(), RecordVectors.FIT.hex())
                .doesNotHaveDuplicates();
        assertThat(folder.resolve("copy/raw/24").resolve(RecordVectors.RAW.hex()))
                .exists();
        assertThat(folder.resolve("copy/payloads/6a").resolve(RecordVectors.TABLE.hex()))
                .exists();
    }

    @Test
    void restoringGivesTheSameJournalNumbersAndIdAndCopiesToTheSameBytes() throws Exception {
        Path copy = folder.resolve("copy");
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.drafts().save("ab".repeat(16), JsonObject.EMPTY.with("kind", "note"));
            archive.copyTo(copy, Work.QUIET);
            Path restored = folder.resolve("restored");

            try (Archive again =
                    Archives.restore(copy, restored, OpenKind.all(), new Script().circumstances(), Work.QUIET)) {
                assertThat(again.journal(1, 100))
                        .usingElementComparator(java.util.Arrays::compare)
                        .containsExactlyElementsOf(archive.journal(1, 100));
                assertThat(again.facts().id()).isEqualTo(archive.facts().id());
                assertThat(again.label(RecordVectors.SETUP2)).isEqualTo("setup 0001 b");
                assertThat(again.counts()).isEqualTo(archive.counts());
                assertThat(again.persons()).isEqualTo(archive.persons());
                assertThat(again.check(Work.QUIET)).isEmpty();
                again.copyTo(folder.resolve("copy of restored"), Work.QUIET);
                assertThat(again.record(labelled("setup", "next")).label()).isEqualTo("setup 0002");
            }
        }
        assertThat(contents(folder.resolve("copy of restored"))).isEqualTo(contents(copy));
    }

    @Test
    void aSecondCopyAddsAndAPurgeRewritesOnlyItsLine() throws Exception {
        Path copy = folder.resolve("copy");
        try (Archive archive = Filled.found(folder.resolve("archive"), new Script())) {
            var remarked = Filled.with(
                    labelled("note", "plain"), PartName.REMARK, JsonObject.EMPTY.with("text", "secret remark"));
            Hash note = archive.record(remarked).fingerprint();
            Hash raw = archive.takeIn("raw".getBytes(StandardCharsets.UTF_8)).hash();
            archive.record(Filled.madeFrom(
                    labelled("scan", "s"), new fringekeep.archive.record.InputReference.OfRaw("raw", raw, 3)));
            archive.copyTo(copy, Work.QUIET);
            Hash remark = remark(archive.stored(note).orElseThrow());

            archive.purge(PurgeTarget.PART, remark, "privacy", "asked for by the person");
            archive.purge(PurgeTarget.RAW, raw, "privacy", "asked for by the person");
            archive.copyTo(copy, Work.QUIET);

            assertThat(archive.stored(remark)).isEmpty();
            assertThat(archive.record(note).orElseThrow().withheld(PartName.REMARK))
                    .isTrue();
            assertThat(Files.readString(copy.resolve("records/000000.txt")))
                    .contains(remark.hex() + "\n")
                    .doesNotContain("secret remark");
            assertThat(copy.resolve("raw").resolve(raw.hex().substring(0, 2)).resolve(raw.hex()))
                    .doesNotExist();
            assertThat(code(() -> archive.takeIn("raw".getBytes(StandardCharsets.UTF_8))))
                    .isEqualTo("bytes.purged");
            assertThat(archive.check(Work.QUIET)).isEmpty();
            try (Archive again = Archives.restore(
                    copy, folder.resolve("restored"), OpenKind.all(), new Script().circumstances(), Work.QUIET)) {
                assertThat(again.journalHead()).isEqualTo(archive.journalHead());
                assertThat(again.check(Work.QUIET)).isEmpty();
                assertThat(code(() -> again.takeIn("raw".getBytes(StandardCharsets.UTF_8))))
                        .isEqualTo("bytes.purged");
            }
        }
    }

    @Test
    void receivedRecordsKeepTheNumberOfTheirOriginAndItsTitle() throws Exception {
        Path copy = folder.resolve("copy");
        try (Archive golden = Filled.golden(folder.resolve("golden"))) {
            golden.copyTo(copy, Work.QUIET);
        }
        try (Archive other = Archives.found(
                folder.resolve("other"),
                new Archives.Founding("other lab", "06:00", "Etc/UTC", true, List.of(), java.util.Optional.empty()),
                OpenKind.all(),
                new Script().circumstances())) {
            other.record(labelled("scan", "own"));

            assertThat(other.receive(copy, false, Work.QUIET)).isEqualTo(new Archive.Received(10, 0, 0));
            assertThat(other.receive(copy, true, Work.QUIET)).isEqualTo(new Archive.Received(0, 10, 0));

            assertThat(other.label(RecordVectors.SCAN)).isEqualTo("scan 0001 (demo lab)");
            assertThat(other.find("scan 1 (demo lab)")).isEqualTo(RecordVectors.SCAN);
            assertThat(other.find("scan 1")).isNotEqualTo(RecordVectors.SCAN);
            assertThat(other.find("fit 1")).isEqualTo(RecordVectors.FIT);
            assertThat(other.persons()).hasSize(1);
            assertThat(other.raw(RecordVectors.RAW)).isPresent();
            assertThat(other.check(Work.QUIET)).isEmpty();
            assertThat(other.graph().causes(RecordVectors.FIT)).hasSize(2);
        }
    }

    @Test
    void aPartThatWasWithheldIsSuppliedLater() throws Exception {
        RecordSource whole = golden();
        Hash remark = remark(RecordVectors.bytes(RecordVectors.MASK));
        RecordSource withheld = new Without(whole, remark);
        var origin = new Archive.Origin(
                new fringekeep.archive.record.ArchiveId("d9baf236e10ad5bd745fb8001fe97479"), "demo lab");
        try (Archive archive = Filled.found(folder.resolve("archive"), new Script())) {
            archive.receive(Filled.GOLDEN, withheld, origin, Work.QUIET);
            assertThat(archive.record(RecordVectors.MASK).orElseThrow().withheld(PartName.REMARK))
                    .isTrue();

            Archive.Received second = archive.receive(Filled.GOLDEN, whole, origin, Work.QUIET);

            // The vectors hold one part "who"; those of the other records stay withheld.
            assertThat(second).isEqualTo(new Archive.Received(0, 10, 1));
            assertThat(archive.record(RecordVectors.MASK)
                            .orElseThrow()
                            .part(PartName.REMARK)
                            .orElseThrow()
                            .text("text"))
                    .contains("laser jumped");
            assertThat(archive.check(Work.QUIET)).isEmpty();
            archive.copyTo(folder.resolve("copy"), Work.QUIET);
            try (Archive again = Archives.restore(
                    folder.resolve("copy"),
                    folder.resolve("restored"),
                    OpenKind.all(),
                    new Script().circumstances(),
                    Work.QUIET)) {
                assertThat(again.journalHead()).isEqualTo(archive.journalHead());
                assertThat(again.check(Work.QUIET)).isEmpty();
            }
        }
    }

    private static RecordSource golden() {
        MemorySource source = new MemorySource();
        RecordSource files = new RecordSource() {
            private java.util.Optional<byte[]> get(Hash hash) {
                return java.util.Optional.ofNullable(RecordVectors.all().get(hash));
            }

            @Override
            public java.util.Optional<byte[]> head(Hash fingerprint) {
                return get(fingerprint);
            }

            @Override
            public java.util.Optional<byte[]> part(Hash part) {
                return get(part);
            }

            @Override
            public java.util.Optional<byte[]> payload(Hash payload) {
                return get(payload);
            }

            @Override
            public java.util.Optional<byte[]> raw(Hash raw) {
                return get(raw);
            }
        };
        return source.or(files);
    }

    @Test
    void anArchiveContinuedInTwoPlacesIsNotPutTogether() throws Exception {
        Path copy = folder.resolve("copy");
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.copyTo(copy, Work.QUIET);
            try (Archive twin = Archives.restore(
                    copy, folder.resolve("twin"), OpenKind.all(), new Script().circumstances(), Work.QUIET)) {
                twin.record(labelled("note", "there"));
                twin.copyTo(folder.resolve("twin copy"), Work.QUIET);
            }
            archive.record(labelled("note", "here"));

            assertThat(code(() -> archive.receive(folder.resolve("twin copy"), false, Work.QUIET)))
                    .isEqualTo("receive.fork");
            assertThat(code(() -> archive.copyTo(folder.resolve("twin copy"), Work.QUIET)))
                    .isEqualTo("copy.fork");
        }
    }

    @Test
    void aFolderOfFilesByHashIsReceivedAndADamagedOneIsNot() throws Exception {
        Path bundle = folder.resolve("bundle");
        Files.createDirectories(bundle.resolve("records"));
        Files.createDirectories(bundle.resolve("raw"));
        Files.createDirectories(bundle.resolve("payloads"));
        for (String form : List.of("head/1", "part/1")) {
            for (Map.Entry<Hash, byte[]> one : RecordVectors.ofForm(form).entrySet()) {
                Files.write(bundle.resolve("records").resolve(one.getKey().hex()), one.getValue());
            }
        }
        Files.write(bundle.resolve("raw").resolve(RecordVectors.RAW.hex()), RecordVectors.bytes(RecordVectors.RAW));
        Files.write(
                bundle.resolve("payloads").resolve(RecordVectors.TABLE.hex()),
                RecordVectors.bytes(RecordVectors.TABLE));
        Files.writeString(
                bundle.resolve("archive.json"),
                "{\"archive\":\"d9baf236e10ad5bd745fb8001fe97479\",\"title\":\"demo lab\"}");
        try (Archive archive = Filled.found(folder.resolve("archive"), new Script())) {
            Path table = bundle.resolve("payloads").resolve(RecordVectors.TABLE.hex());
            Files.writeString(table, "position_m,counts\n0,999\n");
            assertThat(code(() -> archive.receive(bundle, false, Work.QUIET))).isEqualTo("receive.hash");
            assertThat(archive.facts().watermark()).isEqualTo(1);

            Files.write(table, RecordVectors.bytes(RecordVectors.TABLE));
            assertThat(archive.receive(bundle, false, Work.QUIET).records()).isEqualTo(10);
            assertThat(archive.check(Work.QUIET)).isEmpty();
        }
    }

    @Test
    void anyByteChangedInACopyIsFoundAndNothingIsRestored() throws Exception {
        Path copy = folder.resolve("copy");
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.copyTo(copy, Work.QUIET);
        }
        for (String name : List.of(
                "journal/000000.txt",
                "records/000000.txt",
                "raw/24/" + RecordVectors.RAW,
                "payloads/6a/" + RecordVectors.TABLE)) {
            Path file = copy.resolve(name);
            assertThat(file.toFile().setWritable(true)).isTrue();
            byte[] whole = Files.readAllBytes(file);
            for (int at = 0; at < whole.length; at += Math.max(1, whole.length / 12)) {
                byte[] damaged = whole.clone();
                damaged[at] ^= 1;
                Files.write(file, damaged);
                assertThatThrownBy(() -> Archives.restore(
                                copy, folder.resolve("x"), OpenKind.all(), new Script().circumstances(), Work.QUIET))
                        .as("byte %d of %s", at, name)
                        .isInstanceOfSatisfying(
                                ProblemException.class,
                                e -> assertThat(e.problems())
                                        .extracting(Problem::where)
                                        .allMatch(where -> !where.isEmpty()));
                assertThat(folder.resolve("x")).doesNotExist();
            }
            Files.write(file, whole);
        }
    }

    @Test
    void recordsOfThingsInUseAreReceivedTwiceOnlyOnce() throws Exception {
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.copyTo(folder.resolve("copy"), Work.QUIET);

            assertThat(archive.receive(folder.resolve("copy"), false, Work.QUIET))
                    .isEqualTo(new Archive.Received(0, 10, 0));
            assertThat(archive.record(labelled("batch", "DC-2", thing("compound", RecordVectors.COMPOUND)))
                            .label())
                    .isEqualTo("batch 0002");
        }
    }
}
