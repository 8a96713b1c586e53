package fringekeep.scan;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.scan.internal.reading.Profiles;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;

class LongTableTest {
    private static final int CSV_ROWS = 10_000;

    private final DetachedRecords records = new DetachedRecords(new ReadingProfileKind(), new ScanKind());

    private RecordView scan(int rows) throws ProblemException {
        StringBuilder text = new StringBuilder("pos/nm,counts\n");
        for (int i = 0; i < rows; i++) {
            text.append(i * 0.25).append(',').append(i % 7).append('\n');
        }
        Hash profile = records.enter("reading-profile", Profiles.content(Profiles.GOLDEN));
        JsonObject choices = JsonObject.EMPTY.with("file", JsonObject.EMPTY.with("name", "long.csv"));
        byte[] file = text.toString().getBytes(StandardCharsets.UTF_8);
        return records.view(records.compute(
                "scan", choices, List.of(records.raw("raw", file), DetachedRecords.input("profile", profile))));
    }

    @Test
    void tablesOfTenThousandRowsAreTextAndLongerOnesAreArrays() throws ProblemException {
        RecordView shorter = scan(CSV_ROWS);
        RecordView longer = scan(CSV_ROWS + 1);

        assertThat(shorter.head().payloads().get(0).form()).isEqualTo("csv/1");
        assertThat(shorter.result().get("columns")).isEmpty();
        assertThat(longer.head().payloads().get(0).form()).isEqualTo("npy/1.0");
        assertThat(longer.result().array("columns").texts()).containsExactly("position_m", "counts");
    }

    @Test
    void bothReadBackTheSameNumbers() throws ProblemException {
        CountTable table = records.facet(scan(CSV_ROWS + 1).fingerprint(), CountTable.class)
                .orElseThrow();

        assertThat(table.rows()).isEqualTo(CSV_ROWS + 1);
        assertThat(table.axes().get(0).values()[3]).isEqualTo(7.5e-10);
        assertThat(table.channels().get(0).values()[CSV_ROWS]).isEqualTo(CSV_ROWS % 7);
    }
}
