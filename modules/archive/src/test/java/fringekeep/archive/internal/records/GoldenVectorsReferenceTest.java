package fringekeep.archive.internal.records;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.RecordVectors;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** Against the golden vectors of record format 1, section 17. */
class GoldenVectorsReferenceTest {
    @Test
    void everyVectorIsNamedByItsHash() {
        Map<Hash, byte[]> all = RecordVectors.all();

        assertThat(all).hasSize(47);
        all.forEach((hash, bytes) -> assertThat(Hash.of(bytes)).isEqualTo(hash));
    }

    @Test
    void headsReadAndWriteTheSameBytes() throws Exception {
        Map<Hash, byte[]> heads = RecordVectors.ofForm("head/1");

        assertThat(heads).hasSize(10);
        for (byte[] bytes : heads.values()) {
            Head head = HeadCodec.read(bytes);
            assertThat(HeadCodec.write(head)).isEqualTo(bytes);
        }
    }

    @Test
    void partsReadAndWriteTheSameBytes() throws Exception {
        Map<Hash, byte[]> parts = RecordVectors.ofForm("part/1");

        assertThat(parts).hasSize(24);
        for (byte[] bytes : parts.values()) {
            StoredPart part = PartCodec.read(bytes);
            assertThat(PartCodec.write(part)).isEqualTo(bytes);
        }
    }

    @Test
    void journalEntriesAreCanonical() throws Exception {
        Map<Hash, byte[]> entries = RecordVectors.ofForm("entry/1");

        assertThat(entries).hasSize(11);
        for (byte[] bytes : entries.values()) {
            assertThat(CanonicalJson.write(CanonicalJson.read(bytes, CanonicalJson.LARGEST_ENTRY)))
                    .isEqualTo(bytes);
        }
    }

    @Test
    void shortFormsAreAsTheSpecificationGivesThem() {
        assertThat(RecordVectors.COMPOUND.shortForm()).isEqualTo("DGU6 XGQD");
        assertThat(RecordVectors.BATCH.shortForm()).isEqualTo("C5DC OYNI");
        assertThat(RecordVectors.SETUP.shortForm()).isEqualTo("6NLS 74JE");
        assertThat(RecordVectors.RUN.shortForm()).isEqualTo("IANP 2XHE");
        assertThat(RecordVectors.PROFILE.shortForm()).isEqualTo("HTAU PA5X");
        assertThat(RecordVectors.SCAN.shortForm()).isEqualTo("UPBC NOU3");
        assertThat(RecordVectors.PLACEMENT.shortForm()).isEqualTo("YEY5 47TW");
        assertThat(RecordVectors.FIT.shortForm()).isEqualTo("BGSO QBIA");
        assertThat(RecordVectors.MASK.shortForm()).isEqualTo("CLEL GFCC");
        assertThat(RecordVectors.SETUP2.shortForm()).isEqualTo("VOZH XL3V");
    }
}
