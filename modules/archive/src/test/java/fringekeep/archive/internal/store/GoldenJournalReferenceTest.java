package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Hashes of entries: record format 1, section 17, computed there by another program and a JavaScript engine. */
class GoldenJournalReferenceTest {
    private static final List<String> ENTRIES = List.of(
            "dc3746b0c8ccdf9b80333e3f5125f60ba1b2f89009eb41f8a9a261f0f4bdbd71",
            "dccf785728d9c8db790ac2938d1a42eeff58a0aec9d919a1d887919853a89419",
            "8040e6b05e57adaeea2af4a908b134adc9f63c69c41d0bd13617f092dd850bf7",
            "35f1eeced1e2d531cb382e39491a1538badf4a3251c8eeb0ef46dab14aaf272e",
            "f7befe4eead00277c1ab845d0424cb07f173e0450ff331268ad0b135ebdea620",
            "115b249f39df15ba11a1d9ca9b19c8e950758319a767c2dc1e2b8b01cc5d25c8",
            "598f3942e823dfdf714e485b2e64cbdc0163c2ab5185e0ab058c6b56b5696f2f",
            "54bf128c07575c80649e289b277dffe661aed3682633cf8e187be875a40a91e2",
            "cc8b61a5fde15ce4e82d0549884066c289707fbab271b32e4c139420f1be017a",
            "6fb420d6101fe29811ae729a4200a74972ae3338e5d63206de444bfc5c7b4455",
            "ab31b1e610335d5c734385250745a1aa4ce64f275103e56dd501a37da51fa440");

    @TempDir
    private Path folder;

    @Test
    void theGoldenRecordsMakeTheGoldenJournal() throws Exception {
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            List<byte[]> entries = archive.journal(1, 100);

            assertThat(entries.stream().map(Hash::of).map(Hash::hex)).isEqualTo(ENTRIES);
            assertThat(entries).allSatisfy(entry -> assertThat(entry).isEqualTo(RecordVectors.bytes(Hash.of(entry))));
            assertThat(archive.journalHead().hex()).isEqualTo(ENTRIES.get(10));
        }
    }

    @Test
    void everyGoldenHeadAndPartIsStoredByteForByte() throws Exception {
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            RecordVectors.ofForm("head/1")
                    .forEach((hash, bytes) -> assertThat(archive.stored(hash))
                            .hasValueSatisfying(stored -> assertThat(stored).isEqualTo(bytes)));
            RecordVectors.ofForm("part/1")
                    .forEach((hash, bytes) -> assertThat(archive.stored(hash))
                            .hasValueSatisfying(stored -> assertThat(stored).isEqualTo(bytes)));
            assertThat(archive.raw(RecordVectors.RAW).orElseThrow().readAllBytes())
                    .isEqualTo(RecordVectors.bytes(RecordVectors.RAW));
        }
    }

    @Test
    void theGoldenShortFormsAndNumbersFindTheRecords() throws Exception {
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            assertThat(archive.find("DGU6 XGQD")).isEqualTo(RecordVectors.COMPOUND);
            assertThat(archive.find("upbc-nou3")).isEqualTo(RecordVectors.SCAN);
            assertThat(archive.find("VOZHXL3V")).isEqualTo(RecordVectors.SETUP2);
            assertThat(archive.find("setup 1")).isEqualTo(RecordVectors.SETUP2);
            assertThat(archive.find("Setup 0001 a")).isEqualTo(RecordVectors.SETUP);
            assertThat(archive.find("setup 1 b")).isEqualTo(RecordVectors.SETUP2);
            assertThat(archive.label(RecordVectors.SETUP2)).isEqualTo("setup 0001 b");
            assertThat(archive.label(RecordVectors.RUN)).isEqualTo("source-run 0001");
        }
    }

    @Test
    void theGoldenArchiveIsCleanAndStaysSoWhenOpenedAgain() throws Exception {
        Path place = folder.resolve("archive");
        Filled.golden(place).close();

        try (Archive archive = fringekeep.archive.Archives.open(place, OpenKind.all(), new Script().circumstances())) {
            // CHECK
            assertThat(archive.facts().watermark()).isEqualTo(11);
            assertThat(archive.counts()).containsEntry("setup", 1L).containsEntry("scan", 1L);
        }
    }
}
