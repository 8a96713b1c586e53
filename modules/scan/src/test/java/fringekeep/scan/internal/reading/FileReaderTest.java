package fringekeep.scan.internal.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.List;
import org.junit.jupiter.api.Test;

class FileReaderTest {
    private static final String TAB_FILE = """
            # short bench, invented data
            # start: 2031-05-14T09:03:11+02:00
            # end: 2031-05-14T09:04:11+02:00
            # points: 4
            # dwell: 10 s
            # laser power: 7.300 W
            # operator: N. N.
            position_nm\tcounts
            0.0\t120
            66.5\t100
            133.0\t80
            199.5\t100
            """;

    private static List<Problem> refused(String profile, String text) throws ProblemException {
        FileReader reader = Profiles.reader(profile, text);
        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> reader.read(0));
        assertThat(thrown).as("refused").isNotNull();
        return thrown.problems();
    }

    private static double[] column(Reading reading, String name) {
        return reading.table().columns().stream()
                .filter(column -> column.name().equals(name))
                .findFirst()
                .orElseThrow()
                .values();
    }

    private static List<String> codes(Reading reading) {
        return reading.findings().stream().map(Finding::code).toList();
    }

    @Test
    void readsTabFilesWithCommentHeader() throws ProblemException {
        Reading reading = Profiles.read(Profiles.TAB, TAB_FILE);

        assertThat(column(reading, "position_m")).containsExactly(0, 6.65e-8, 1.33e-7, 1.995e-7);
        assertThat(column(reading, "counts")).containsExactly(120, 100, 80, 100);
        assertThat(reading.exposure().perRow()).containsOnly(10);
        assertThat(reading.header().start().orElseThrow().at()).hasToString("2031-05-14T07:03:11Z");
        assertThat(reading.header().start().orElseThrow().offset()).isEqualTo("+02:00");
        assertThat(reading.header().personal()).containsExactly("operator: N. N.");
        JsonObject quantity =
                reading.header().settings().get(0).object("quantity").orElseThrow();
        assertThat(quantity.text("text")).contains("7.300");
        assertThat(quantity.number("si")).hasValue(7.3);
        assertThat(quantity.object("uncertainty").orElseThrow().number("si")).hasValue(0.02);
        assertThat(reading.findings()).isEmpty();
    }

    @Test
    void readsSemicolonFilesWithDecimalCommaAndLatinLetters() throws ProblemException {
        String text = """
                Lange Bank, erfundene Daten\r
                Beginn = 14.05.2031 22:41:05\r
                Punkte = 3\r
                Messzeit / s = 2,5\r
                Laserleistung / W = 3,250\r
                Quelle / °C = 568,9\r
                Daten\r
                Position / µm;Zählung;Monitor / V;Dunkel\r
                0,00000;33;1,25;1\r
                0,03325;40;1,24;0\r
                0,06650;51;;2\r
                """;

        Reading reading = Profiles.read(Profiles.SEMICOLON, text);

        assertThat(column(reading, "position_m")).containsExactly(0, 3.325e-8, 6.65e-8);
        assertThat(column(reading, "counts")).containsExactly(33, 40, 51);
        assertThat(column(reading, "monitor_v")).containsExactly(1.25, 1.24, Double.NaN);
        assertThat(reading.exposure().perRow()).containsOnly(2.5);
        assertThat(reading.header().start().orElseThrow().at()).hasToString("2031-05-14T20:41:05Z");
        JsonObject source =
                reading.header().settings().get(1).object("quantity").orElseThrow();
        assertThat(source.number("si")).hasValue(842.05);
        assertThat(codes(reading)).containsExactly("no-value");
    }

    @Test
    void readsSectionsOfOneFileEachWithItsOwnHeader() throws ProblemException {
        String text = """
                pulsed bench; invented data
                [scan 1]
                start,2031-05-14T09:00:00Z
                shots,500
                pulse energy 2 (mJ),1.200
                position (nm),resonant,off-resonant
                0.00,10,1
                26.60,12,0
                [scan 2]
                start,2031-05-14T09:10:00Z
                shots,400
                pulse energy 2 (mJ),1.400
                position (nm),resonant,off-resonant
                0.00,20,2
                26.60,22,3
                53.20,22,3
                """;

        FileReader reader = Profiles.reader(Profiles.SECTIONS, text);

        assertThat(reader.sections()).isEqualTo(2);
        assertThat(column(reader.read(0), "resonant")).containsExactly(10, 12);
        assertThat(column(reader.read(1), "off_resonant")).containsExactly(2, 3, 3);
        assertThat(reader.read(1).exposure().shots()).isTrue();
        assertThat(reader.read(1).exposure().perRow()).containsOnly(400);
        assertThat(reader.read(1).header().start().orElseThrow().at()).hasToString("2031-05-14T09:10:00Z");
    }

    @Test
    void refusesAFileCutOffInARowUnlessTheProfileDropsIt() throws ProblemException {
        String cut = TAB_FILE + "266.0";

        assertThat(refused(Profiles.TAB, cut)).singleElement().satisfies(problem -> {
            assertThat(problem.code()).isEqualTo("scan.cut-off");
            assertThat(problem.where()).isEqualTo("test.txt, line 13, column 6");
            assertThat(problem.mend()).contains("Nothing was stored");
        });
        String dropping = Profiles.TAB.replace("'skip':1", "'skip':1,'unfinishedRow':'drop'");
        Reading reading = Profiles.read(dropping, cut);
        assertThat(reading.table().rows()).isEqualTo(4);
        assertThat(codes(reading)).containsExactly("truncated");
    }

    @Test
    void findsFewerRowsThanTheHeaderAnnounces() throws ProblemException {
        Reading reading = Profiles.read(Profiles.TAB, TAB_FILE.replace("points: 4", "points: 31"));

        assertThat(codes(reading)).containsExactly("truncated");
        assertThat(reading.findings().get(0).json().number("limit")).hasValue(31);
    }

    @Test
    void collectsAllThatIsWrongWithLineAndColumn() throws ProblemException {
        String text = TAB_FILE.replace("66.5\t100", "66,5\t100").replace("133.0\t80", "133.0\t8.5") + "1\t2\t3\n";

        List<Problem> problems = refused(Profiles.TAB, text);

        assertThat(problems)
                .extracting(Problem::code)
                .containsExactly("scan.not-a-number", "scan.not-a-count", "scan.row-length");
        assertThat(problems.get(0).where()).isEqualTo("test.txt, line 10, column 1");
        assertThat(problems.get(1).where()).isEqualTo("test.txt, line 11, column 7");
        assertThat(problems.get(2).where()).isEqualTo("test.txt, line 13, column 5");
    }

    @Test
    void refusesBytesOfAnotherEncodingWithTheirPlace() throws ProblemException {
        Profile profile = Profile.of(Profiles.content(Profiles.GOLDEN));
        byte[] bytes = "pos/nm,counts\n0,1\n\u00e4,2\n".getBytes(java.nio.charset.StandardCharsets.ISO_8859_1);

        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> new FileReader(profile, bytes, "a.csv"));

        assertThat(thrown.problems()).singleElement().satisfies(problem -> {
            assertThat(problem.code()).isEqualTo("scan.encoding");
            assertThat(problem.where()).isEqualTo("a.csv, line 3, column 1");
        });
    }

    @Test
    void namesColumnsThatAreNotThere() throws ProblemException {
        String profile = Profiles.GOLDEN.replace("{'channel':'counts'}", "{'channel':'counts','header':'clicks'}");

        assertThat(refused(profile, "pos,counts\n0,1\n"))
                .extracting(Problem::code)
                .containsExactly("scan.column-name");
    }

    @Test
    void findsSaturatedRows() throws ProblemException {
        Reading reading = Profiles.read(Profiles.TAB, TAB_FILE.replace("133.0\t80", "133.0\t1000"));

        assertThat(codes(reading)).containsExactly("saturated");
        assertThat(reading.findings().get(0).json().array("rows").items()).hasSize(1);
    }

    @Test
    void findsPositionsThatTurnBackAndStepsLeftOut() throws ProblemException {
        Reading reading =
                Profiles.read(Profiles.GOLDEN, "pos/nm,counts\n0,1\n10,1\n20,1\n5,1\n30,1\n40,1\n50,1\n60,1\n");

        assertThat(codes(reading)).containsExactly("not-monotonic", "gap");
    }

    @Test
    void suspectsAWrongUnitFromTheSpanAndFromTheHeader() throws ProblemException {
        assertThat(codes(Profiles.read(Profiles.GOLDEN, "pos/um,counts\n0,1\n0.0266,1\n0.0532,1\n")))
                .containsExactly("wrong-unit-suspected", "wrong-unit-suspected");
        assertThat(codes(Profiles.read(Profiles.GOLDEN, "pos (mm),counts\n0,1\n26,1\n53,1\n")))
                .containsExactly("wrong-unit-suspected");
        assertThat(codes(Profiles.read(Profiles.GOLDEN, "pos/nm,counts\n0,1\n26,1\n53,1\n")))
                .isEmpty();
    }

    @Test
    void findsDarkCountsAboveTheUsual() throws ProblemException {
        String text = "Beginn = 14.05.2031 22:41:05\nMesszeit / s = 1\nDaten\nx;Zählung;m;d\n0;1;1;5\n0,1;1;1;5\n";

        Reading reading = Profiles.read(Profiles.SEMICOLON, text);

        assertThat(codes(reading)).contains("dark-too-high");
    }

    @Test
    void takesRowExposureFromAColumnAndRefusesZero() throws ProblemException {
        String profile =
                Profiles.GOLDEN.replace("{'channel':'counts'}]", "{'channel':'counts'},{'exposure':true,'unit':'ms'}]");

        assertThat(Profiles.read(profile, "a,b,c\n0,1,500\n9,1,250\n")
                        .exposure()
                        .perRow())
                .containsExactly(0.5, 0.25);
        assertThat(refused(profile, "a,b,c\n0,1,500\n9,1,0\n"))
                .extracting(Problem::code)
                .containsExactly("scan.exposure-not-positive");
    }

    @Test
    void leavesDeadRowsOut() throws ProblemException {
        String profile = Profiles.GOLDEN.replace("'skip':1", "'skip':1,'dropFirst':1,'dropLast':1");

        assertThat(column(Profiles.read(profile, "a,b\n0,9\n10,1\n20,2\n30,9\n"), "counts"))
                .containsExactly(1, 2);
    }

    @Test
    void refusesAHeaderThatTellsOneKeyTwice() throws ProblemException {
        assertThat(refused(Profiles.TAB, TAB_FILE.replace("# points: 4", "# dwell: 5 s")))
                .extracting(Problem::code)
                .containsExactly("scan.header-twice");
    }

    @Test
    void knowsALocalTimeThatTheClockShowsTwice() throws ProblemException {
        String profile = Profiles.SEMICOLON.replace("Etc/GMT-2", "Europe/Berlin");
        String text = "Beginn = 27.10.2024 02:30:00\nMesszeit / s = 1\nDaten\nx;Zählung;m;d\n0;1;1;0\n0,1;1;1;0\n";

        Reading reading = Profiles.read(profile, text);

        assertThat(codes(reading)).contains("time-ambiguous");
        assertThat(reading.header().start().orElseThrow().at()).hasToString("2024-10-27T00:30:00Z");
        assertThat(refused(profile, text.replace("27.10.2024", "31.03.2024")))
                .extracting(Problem::code)
                .containsExactly("scan.header-moment");
    }
}
