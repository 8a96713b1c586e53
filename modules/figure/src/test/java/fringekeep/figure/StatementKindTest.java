package fringekeep.figure;

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
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Printed numbers against records; the mass is the example of JCGM 100:2008, 7.2.2: 100.02147 g with u = 0.35 mg. Parts of 30
 * and 40 pm combine to 50 pm (JCGM 100:2008, 5.1.2).
 */
class StatementKindTest {
    private static final String CONTENT = "{\"mass\":{\"si\":0.10002147,\"uncertainty\":{\"si\":3.5e-7}},"
            + "\"answer\":{\"value\":0.10002147,\"u\":3.5e-7,\"statistical\":2.1e-7},"
            + "\"estimates\":[\"first\",\"second\"],\"values\":[0.5,0.25],\"covariance\":[0.0001,0,0.0004],"
            + "\"plain\":0.125,\"word\":\"none\","
            + "\"apart\":{\"value\":2e-9,\"u\":5e-11,\"statistical\":3e-11,\"shared\":4e-11},"
            + "\"list\":{\"estimates\":[\"length\",\"visibility\"],\"values\":[2e-9,0.5],\"covariance\":[9e-22,0,1e-4]},"
            + "\"rival\":{\"estimates\":[\"length\"],\"values\":[3e-9],\"covariance\":[9e-22]},"
            + "\"entered\":{\"text\":\"100.02147\",\"unit\":\"g\",\"si\":0.10002147,\"uncertainty\":{\"si\":3.5e-7}}}";

    private final DetachedRecords records = new DetachedRecords(new OfferingKind(), new StatementKind());
    private Hash of = Hash.of(new byte[0]);

    @BeforeEach
    void enterTheValues() throws ProblemException {
        of = records.enter("offering", json(CONTENT));
    }

    private static JsonObject json(String text) throws ProblemException {
        return (JsonObject)
                JsonDocument.read(text.getBytes(StandardCharsets.UTF_8)).value();
    }

    private List<Problem> state(String pointer, String printed, String unit, String sort, int digits, String which) {
        JsonObject content = JsonObject.EMPTY
                .with("pointer", pointer)
                .with("printed", printed)
                .with("unit", unit)
                .with("rounding", JsonObject.EMPTY.with("sort", sort).with("digits", digits))
                .with("uncertainty", which)
                .with("where", "table 1");
        try {
            records.record(new NewRecord(
                    new KindName("statement"),
                    List.of(DetachedRecords.input("of", of)),
                    List.of(),
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

    @ParameterizedTest
    @CsvSource({
        "/mass, 100.02147(35), g, uncertainty-digits, 2, combined",
        "/mass, 100.02147 ± 0.00035, g, uncertainty-digits, 2, combined",
        "/answer, 100.02147(35), g, uncertainty-digits, 2, combined",
        "/answer, 100.02147(21), g, uncertainty-digits, 2, statistical",
        "/answer, 0.10002, kg, significant, 5, none",
        "/estimates/first, 0.50(1), 1, uncertainty-digits, 1, combined",
        "/estimates/second, 0.250(20), 1, uncertainty-digits, 2, combined",
        "/plain, 0.12, 1, decimals, 2, none",
        "/apart, 2.00(5), nm, uncertainty-digits, 1, combined",
        "/apart, 2.00(3), nm, uncertainty-digits, 1, statistical",
        "/apart, 2.00(4), nm, uncertainty-digits, 1, shared",
        "/list/estimates/length, 2.00(5), nm, uncertainty-digits, 1, combined",
        "/list/estimates/length, 2.00(3), nm, uncertainty-digits, 1, statistical",
        "/list/estimates/length, 2.00(4), nm, uncertainty-digits, 1, shared",
        "/list/estimates/visibility, 50(1), %, uncertainty-digits, 1, combined",
        "/rival/estimates/length, 3.00(3), nm, uncertainty-digits, 1, statistical",
        "/entered, 100.0, g, decimals, 1, none"
    })
    void whatIsTheRoundingOfTheValueIsAccepted(
            String pointer, String printed, String unit, String sort, int digits, String which) {
        assertThat(state(pointer, printed, unit, sort, digits, which)).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({
        "/absent, 1.0, g, decimals, 1, none, statement.no-value, /content/pointer",
        "/word, 1.0, g, decimals, 1, none, statement.no-value, /content/pointer",
        "/estimates/third, 1.0, 1, decimals, 1, none, statement.no-value, /content/pointer",
        "/mass, about 100, g, decimals, 1, none, statement.not-a-number, /content/printed",
        "/plain, 0.125(1), 1, uncertainty-digits, 1, combined, statement.no-uncertainty, /content/rounding",
        "/mass, 100.02148(35), g, uncertainty-digits, 2, combined, statement.not-rounded, /content/printed",
        "/mass, 100.02147(34), g, uncertainty-digits, 2, combined, statement.not-rounded, /content/printed",
        "/answer, 100.02147(35), g, uncertainty-digits, 2, statistical, statement.not-rounded, /content/printed",
        "/plain, 0.13, 1, decimals, 2, none, statement.not-rounded, /content/printed",
        "/list/estimates/length, 2.00(3), nm, uncertainty-digits, 1, combined, statement.not-rounded, /content/printed",
        "/rival/estimates/length, 3.00(3), nm, uncertainty-digits, 1, combined, statement.no-uncertainty, /content/rounding",
        "/rival/estimates/length, 3.00(3), nm, decimals, 2, shared, statement.no-uncertainty, /content/uncertainty",
        "/apart, 2.00(5), nm, decimals, 2, none, statement.no-uncertainty, /content/uncertainty",
        "/list/estimates/length, 2.00(5), W, uncertainty-digits, 1, combined, statement.unit, /content/unit",
        "/list/estimates/visibility, 0.50(1), m, uncertainty-digits, 1, combined, statement.unit, /content/unit",
        "/entered, 100.0, mm, decimals, 1, none, statement.unit, /content/unit"
    })
    void whatIsNotIsRefusedWithPlaceAndMend(
            String pointer,
            String printed,
            String unit,
            String sort,
            int digits,
            String which,
            String code,
            String where) {
        List<Problem> problems = state(pointer, printed, unit, sort, digits, which);
        assertThat(problems).extracting(Problem::code).containsExactly(code);
        assertThat(problems.get(0).where()).isEqualTo(where);
        assertThat(problems.get(0).mend()).isNotBlank();
    }

    @Test
    void aUnitThatIsNoneIsRefusedAtItsMember() {
        List<Problem> problems = state("/mass", "100.0", "furlongs?", "decimals", 1, "none");
        assertThat(problems).isNotEmpty();
        assertThat(problems.get(0).where()).isEqualTo("/content/unit");
        assertThat(problems.get(0).mend()).isNotBlank();
    }
}
