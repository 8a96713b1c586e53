package fringekeep.scan;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The golden vectors of the record format, section 17: bytes in, bytes out. */
class GoldenScanReferenceTest {
    private static final String RAW = "2430a13b82f0347a4de0e1742062781b782a93af9df666fa17b27f3fff056504";
    private static final String TABLE = "6a5430803b990ff1443108e0793d983edea72bd7c5594a576a60499f8f3377cb";
    private static final String CHOICES = "f078a97c7b5945e48416de979147e27744a16def96beb89c56d31dec73b35bba";
    private static final String RESULT = "34df2d40769649a74605d71184606835ea76f1f3cea2c0f60b32a0645b68c092";
    private static final String PROFILE = "b7a01175ccf1c934d87e95c4411daa148955da3217af16b3bd6c39ea8e04ca7a";

    private final DetachedRecords records =
            new DetachedRecords(new ReadingProfileKind(), new ScanKind(), new SeriesKind(), new PlacementKind());

    static byte[] vector(String name) throws IOException {
        return Files.readAllBytes(Path.of("src/test/reference/record-vectors", name));
    }

    static JsonObject value(String name) throws IOException, ProblemException {
        return CanonicalJson.readObject(vector(name), CanonicalJson.LARGEST_PART)
                .object("value")
                .orElseThrow();
    }

    private RecordView scan() throws IOException, ProblemException {
        Hash profile = records.enter("reading-profile", value(PROFILE));
        JsonObject choices = JsonObject.EMPTY.with("file", JsonObject.EMPTY.with("name", "a0001.csv"));
        Hash scan = records.compute(
                "scan", choices, List.of(records.raw("raw", vector(RAW)), DetachedRecords.input("profile", profile)));
        return records.view(scan);
    }

    @Test
    void theGoldenRawFileGivesTheGoldenTableByteForByte() throws IOException, ProblemException {
        RecordView scan = scan();

        assertThat(new String(scan.payload("table"), StandardCharsets.UTF_8))
                .isEqualTo(new String(vector(TABLE), StandardCharsets.UTF_8));
        assertThat(scan.head().payloads().get(0).sha256()).isEqualTo(new Hash(TABLE));
        assertThat(scan.head().payloads().get(0).form()).isEqualTo("csv/1");
    }

    @Test
    void choicesAndResultAreTheGoldenPartsToTheHash() throws IOException, ProblemException {
        RecordView scan = scan();

        assertThat(scan.choices()).isEqualTo(value(CHOICES));
        assertThat(scan.result()).isEqualTo(value(RESULT));
        assertThat(scan.head().parts().get(PartName.CHOICES.text())).isEqualTo(new Hash(CHOICES));
        assertThat(scan.head().parts().get(PartName.RESULT.text())).isEqualTo(new Hash(RESULT));
    }

    @Test
    void theFacetHoldsTheCountsInSi() throws IOException, ProblemException {
        RecordView scan = scan();

        CountTable table = records.facet(scan.fingerprint(), CountTable.class).orElseThrow();

        assertThat(table.axis("position").orElseThrow().values()).containsExactly(0, 6.65e-8, 1.33e-7, 1.995e-7);
        assertThat(table.channel("counts").orElseThrow().values()).containsExactly(120, 100, 80, 100);
        assertThat(table.exposure()).containsOnly(1);
        assertThat(table.start()).isEmpty();
    }
}
