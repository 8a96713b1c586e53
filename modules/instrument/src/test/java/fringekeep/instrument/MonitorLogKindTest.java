package fringekeep.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;

class MonitorLogKindTest {
    static final String DEMO = """
            {"method":"monitor.read/1","constants":"CODATA 2018","file":{"name":"log-1.csv"},"encoding":"UTF-8",
            "delimiter":",","decimal":".","header":true,"time":{"column":0,"form":"iso","offset":"+02:00"},
            "columns":[{"column":1,"name":"laser power","unit":"W"},{"column":2,"name":"chamber pressure","unit":"mbar"},
            {"column":3,"name":"hall temperature","unit":"Cel"}],
            "clockOffset":{"text":"138","unit":"s","si":138,"uncertainty":{"sort":"stated","text":"2","si":2}}}""";
    private final MonitorLogKind kind = new MonitorLogKind();

    private static Inputs file(byte[] bytes) {
        return Records.inputs(List.of(Records.raw("raw", bytes)), List.of());
    }

    private Outcome outcome(String choices, byte[] bytes) throws Exception {
        JsonObject complete = kind.computation().orElseThrow().complete(Records.json(choices), file(bytes));
        return kind.computation().orElseThrow().compute(complete, file(bytes), Work.QUIET);
    }

    private Outcome.Computed computed(String choices, String text) throws Exception {
        Outcome outcome = outcome(choices, text.getBytes(StandardCharsets.UTF_8));
        assertThat(outcome).isInstanceOf(Outcome.Computed.class);
        return (Outcome.Computed) outcome;
    }

    private List<Problem> refused(String choices, String text) throws Exception {
        Outcome outcome = outcome(choices, text.getBytes(StandardCharsets.UTF_8));
        assertThat(outcome).isInstanceOf(Outcome.NoResult.class);
        return ((Outcome.NoResult) outcome).reasons();
    }

    private RecordView record(Outcome.Computed computed) {
        return Records.record(
                "monitor-log",
                Records.parts(PartName.CHOICES, Records.json(DEMO), PartName.RESULT, computed.result()),
                computed.payloads());
    }

    /** The demo lab's first log: clock 138 s fast, so 19:42:17 by the log is 17:39:59 UTC. */
    @Test
    void readsTheDemoLogOnTrueTime() throws Exception {
        String text = Files.readString(Path.of("src/test/reference/logs/log-1.csv"));
        Outcome.Computed computed = computed(DEMO, text);

        PublishedSchema schema = new PublishedSchema(MonitorLogKind.class, "monitor-log-1.schema.json");
        assertThat(schema.faults(
                        JsonObject.EMPTY.with("choices", Records.json(DEMO)).with("result", computed.result())))
                .isEmpty();
        assertThat(computed.result().text("start")).hasValue("2031-10-14T17:39:59Z");
        assertThat(computed.result().integer("rows").orElseThrow())
                .isEqualTo(text.lines().count() - 1);
        assertThat(new String(computed.payloads().get(0).bytes(), StandardCharsets.UTF_8))
                .startsWith(
                        "time_s,laser_power_w,chamber_pressure_pa,hall_temperature_k\n0,0.995,0.00000218,294.56\n60,");
    }

    @Test
    void looksReadingsUpAtInstants() throws Exception {
        MonitorLog log = kind.facet(
                        MonitorLog.class,
                        record(computed(DEMO, "time,p,q,t\n2031-10-14T12:02:18,1,2,3\n2031-10-14T12:03:18,3,,4\n")),
                        Records.NO_INPUTS)
                .orElseThrow();

        assertThat(log.start()).isEqualTo(Instant.parse("2031-10-14T10:00:00Z"));
        assertThat(log.at("laser power", Instant.parse("2031-10-14T10:00:15Z"))).hasValue(1.5);
        assertThat(log.at("laser power", Instant.parse("2031-10-14T10:01:00Z"))).hasValue(3);
        assertThat(log.at("laser power", Instant.parse("2031-10-14T10:01:01Z"))).isEmpty();
        assertThat(log.at("chamber pressure", Instant.parse("2031-10-14T10:00:15Z")))
                .isEmpty();
        assertThat(log.at("nothing", Instant.parse("2031-10-14T10:00:15Z"))).isEmpty();
        assertThat(log.mean("hall temperature", log.start(), log.start().plusSeconds(60))
                        .orElseThrow())
                .isCloseTo(276.65, within(1e-9));
        assertThat(log.clockDeviation()).isEqualTo(2);
    }

    @Test
    void notesJumpsGapsAndAbsentReadings() throws Exception {
        StringBuilder text = new StringBuilder("time,p,q,t\n");
        for (int i = 0; i < 20; i++) {
            text.append("2031-10-14T12:02:")
                    .append(10 + i)
                    .append(",1,")
                    .append(i == 5 || i == 6 ? "" : "2")
                    .append(",3\n");
        }
        text.append("2031-10-14T12:01:00,1,2,3\n2031-10-14T14:00:00,1,2,3\n");
        Outcome.Computed computed = computed(DEMO, text.toString());

        assertThat(computed.result().array("findings").objects())
                .extracting(finding -> finding.text("code").orElse("") + finding.array("rows"))
                .containsExactly(
                        "time-not-ascending" + Records.json("{\"a\":[19,20]}").array("a"),
                        "gap" + Records.json("{\"a\":[20,21]}").array("a"),
                        "cell-absent" + Records.json("{\"a\":[5,6]}").array("a"));
    }

    @Test
    void refusesBadCellsWithLineAndColumn() throws Exception {
        assertThat(refused(DEMO, "time,p,q,t\n2031-10-14T12:02:18,1,x,3\n2031-10-14,1,2,3\n2031-10-14T12:02:18,1\n"))
                .extracting(problem -> problem.code() + " " + problem.where())
                .containsExactly(
                        "instrument.cell-number line 2, column 3",
                        "instrument.time-form line 3, column 1",
                        "instrument.cell-missing line 4, column 3",
                        "instrument.cell-missing line 4, column 4");
        assertThat(refused(DEMO, "time,p,q,t\n")).extracting(Problem::code).containsExactly("instrument.log-empty");
    }

    @Test
    void readsOtherDialects() throws Exception {
        String german = DEMO.replace("\"delimiter\":\",\"", "\"delimiter\":\";\"")
                .replace("\"decimal\":\".\"", "\"decimal\":\",\",\"comment\":\"#\"")
                .replace("\"form\":\"iso\"", "\"form\":\"day-first\"");
        Outcome.Computed computed = computed(german, "# a comment\nZeit;p;q;t\n14.10.2031 12:02:18;1,5;2e-8;20,5\n");
        assertThat(computed.result().text("start")).hasValue("2031-10-14T10:00:00Z");
        assertThat(new String(computed.payloads().get(0).bytes(), StandardCharsets.UTF_8))
                .endsWith("\n0,1.5,0.000002,293.65\n");
        String seconds = DEMO.replace(
                "\"form\":\"iso\",\"offset\":\"+02:00\"", "\"form\":\"seconds\",\"start\":\"2031-10-14T10:02:18Z\"");
        assertThat(computed(seconds, "t,p,q,t\n0.25,1,2,3\n").result().text("start"))
                .hasValue("2031-10-14T10:00:00.250Z");
        String epoch = DEMO.replace("\"form\":\"iso\"", "\"form\":\"epoch-seconds\"");
        assertThat(computed(epoch, "t,p,q,t\n138,1,2,3\n").result().text("start"))
                .hasValue("1970-01-01T00:00:00Z");
    }

    @Test
    void longLogsBecomeArraysAndReadBackTheSame() throws Exception {
        StringBuilder text = new StringBuilder("t,p,q,t\n");
        for (int i = 0; i < 10_001; i++) {
            text.append(i).append(',').append(i % 7).append(",,3\n");
        }
        Outcome.Computed computed =
                computed(DEMO.replace("\"form\":\"iso\"", "\"form\":\"epoch-seconds\""), text.toString());

        assertThat(computed.payloads().get(0).form()).isEqualTo("npy/1.0");
        byte[] bytes = computed.payloads().get(0).bytes();
        int header = 10 + (bytes[8] & 0xFF) + 256 * (bytes[9] & 0xFF);
        assertThat(header % 64).isZero();
        assertThat(bytes).hasSize(header + 8 * 4 * 10_001);
        MonitorLog log = kind.facet(MonitorLog.class, record(computed), Records.NO_INPUTS)
                .orElseThrow();
        assertThat(log.series("laser power").orElseThrow().values()[10_000]).isEqualTo(10_000 % 7);
        assertThat(log.series("chamber pressure").orElseThrow().values()).containsOnly(Double.NaN);
    }

    @Test
    void choicesAreExaminedAsAWhole() {
        String bad = DEMO.replace("\"decimal\":\".\"", "\"decimal\":\",\"")
                .replace("\"offset\":\"+02:00\"", "\"offset\":\"+99:00\"")
                .replace("\"mbar\"", "\"mbarr\"")
                .replace("\"hall temperature\"", "\"laser  power\"");
        assertThat(kind.examine(Records.parts(PartName.CHOICES, Records.json(bad)), Records.NO_INPUTS))
                .extracting(Problem::where)
                .containsExactlyInAnyOrder(
                        "/choices/decimal",
                        "/choices/time/offset",
                        "/choices/columns/1/unit",
                        "/choices/columns/2/name");
    }

    @Test
    void needsItsRawFile() throws ProblemException, fringekeep.archive.problem.StoppedException {
        Outcome outcome = kind.computation().orElseThrow().compute(Records.json(DEMO), Records.NO_INPUTS, Work.QUIET);

        assertThat(((Outcome.NoResult) outcome).reasons())
                .extracting(Problem::code)
                .contains("instrument.raw-missing");
    }
}
