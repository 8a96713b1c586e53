package fringekeep.property;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.NewRecord;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** A selection of one fit that leaves out another because of a judgement. */
class SelectionKindTest {
    private final DetachedRecords records =
            new DetachedRecords(new EnteredKind("fit"), new EnteredKind("judgement"), new SelectionKind());

    private List<Problem> select(String left) throws ProblemException {
        Hash taken = records.enter("fit", JsonObject.EMPTY.with("label", "taken"));
        Hash other = records.enter("fit", JsonObject.EMPTY.with("label", "other"));
        Hash because = records.enter("judgement", JsonObject.EMPTY.with("label", "drifting"));
        String text = "{\"rule\":\"all that stand\",\"conditions\":[],\"left\":[" + left + "]}";
        JsonObject content = (JsonObject)
                JsonDocument.read(text.getBytes(StandardCharsets.UTF_8)).value();
        try {
            records.record(new NewRecord(
                    new KindName("selection"),
                    List.of(DetachedRecords.input("taken", taken), DetachedRecords.input("because", because)),
                    List.of(DetachedRecords.about("left-out", other)),
                    Map.of(PartName.CONTENT, content),
                    List.of(),
                    Optional.empty(),
                    Optional.empty(),
                    Optional.empty()));
            return List.of();
        } catch (ProblemException e) {
            return e.problems();
        }
    }

    private static String left(int about, int because) {
        return "{\"about\":" + about + ",\"reason\":\"drifting\",\"because\":" + because + "}";
    }

    @Test
    void aReasonForEachRecordLeftOutIsAccepted() throws ProblemException {
        assertThat(select(left(0, 1))).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({
        "1, 1, selection.no-subject, /content/left/0/about",
        "0, 0, selection.no-judgement, /content/left/0/because",
        "0, 2, selection.no-judgement, /content/left/0/because"
    })
    void aPositionThatFitsNothingIsRefused(int about, int because, String code, String where) throws ProblemException {
        List<Problem> problems = select(left(about, because));
        assertThat(problems).extracting(Problem::code).containsExactly(code);
        assertThat(problems.get(0).where()).isEqualTo(where);
        assertThat(problems.get(0).mend()).isNotBlank();
    }

    @Test
    void aRecordLeftOutWithoutAReasonIsRefused() throws ProblemException {
        assertThat(select("")).extracting(Problem::code).containsExactly("selection.left-out");
    }
}
