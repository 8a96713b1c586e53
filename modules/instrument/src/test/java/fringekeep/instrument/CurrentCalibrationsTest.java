package fringekeep.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.judgement.JudgementKind;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CurrentCalibrationsTest {
    private static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    private static final Instant CHANGE = Instant.parse("2031-10-21T10:00:00Z");
    private static final String OPEN_ENDED = CalibrationKindTest.POWER.replace(",\"to\":\"2031-10-21T10:00:00Z\"", "");

    /** One archive for all: each test speaks of a target of its own. */
    private static Archive archive;

    @BeforeAll
    static void found(@TempDir Path folder) throws ProblemException {
        Person person = new Person(PERSON, Optional.of("Ottla Vireen"), Optional.empty(), Optional.empty());
        archive = Archives.found(
                folder.resolve("archive"),
                new Archives.Founding("demo lab", "06:00", "UTC", true, List.of(person), Optional.empty()),
                new Kinds(List.of(new CalibrationKind(), new JudgementKind())),
                Circumstances.real("1.0.0"));
    }

    @AfterAll
    static void close() {
        archive.close();
    }

    private Hash record(String content, Optional<Hash> corrects, Optional<After> after) throws ProblemException {
        return archive.record(new NewRecord(
                        new KindName("calibration"),
                        List.of(),
                        List.of(),
                        Map.<PartName, JsonObject>of(PartName.CONTENT, Records.json(content)),
                        List.of(),
                        corrects,
                        after,
                        Optional.of(PERSON)))
                .fingerprint();
    }

    private Hash record(String content) throws ProblemException {
        return record(content, Optional.empty(), Optional.empty());
    }

    private static List<Hash> at(String what, String instant) throws ProblemException {
        return CurrentCalibrations.at(archive, Instant.parse(instant), what, Optional.empty());
    }

    @Test
    void theSegmentAtTheInstantHolds() throws ProblemException {
        Hash first = record(OPEN_ENDED.replace("power-scale", "voltage-scale"));
        Hash second = record(
                OPEN_ENDED
                        .replace("power-scale", "voltage-scale")
                        .replace("0.98", "1.035")
                        .replace("2031-09-01T06:00:00Z", CHANGE.toString()),
                Optional.empty(),
                Optional.of(new After(first, CHANGE)));

        assertThat(at("voltage-scale", "2031-08-31T00:00:00Z")).isEmpty();
        assertThat(at("voltage-scale", "2031-10-21T09:59:59Z")).containsExactly(first);
        assertThat(at("voltage-scale", "2031-10-21T10:00:00Z")).containsExactly(second);
    }

    @Test
    void aCorrectionTakesThePlaceOfWhatItCorrects() throws ProblemException {
        String mass = OPEN_ENDED.replace("power-scale", "mass-scale");
        Hash wrong = record(mass);
        Hash right = record(mass.replace("0.98", "0.97"), Optional.of(wrong), Optional.empty());

        assertThat(at("mass-scale", "2031-10-01T00:00:00Z")).containsExactly(right);
    }

    @Test
    void anEndedOneHoldsNoLonger() throws ProblemException {
        Hash ended = record(CalibrationKindTest.POWER.replace("power-scale", "pressure-scale"));

        assertThat(at("pressure-scale", "2031-10-21T09:59:59Z")).containsExactly(ended);
        assertThat(at("pressure-scale", "2031-10-21T10:00:00Z")).isEmpty();
    }

    @Test
    void targetAndDeviceNarrowTheAnswer() throws ProblemException {
        Hash power = record(OPEN_ENDED);
        Hash oven = record(CalibrationKindTest.LINE);
        Instant at = Instant.parse("2031-10-01T00:00:00Z");

        assertThat(CurrentCalibrations.at(archive, at)).containsSubsequence(power, oven);
        assertThat(CurrentCalibrations.at(archive, at, "temperature-scale", Optional.of("oven")))
                .containsExactly(oven);
        assertThat(CurrentCalibrations.at(archive, at, "temperature-scale", Optional.of("valve")))
                .isEmpty();
    }

    private static Hash judge(Archive in, String verdict, Map<String, Hash> about) throws ProblemException {
        String reason = verdict.equals("preferred") ? "better-calibration" : "misread";
        return in.record(new NewRecord(
                        new KindName("judgement"),
                        List.of(),
                        about.entrySet().stream()
                                .map(each ->
                                        new AboutReference(each.getKey(), each.getValue(), AboutReference.Reach.RECORD))
                                .toList(),
                        Map.of(
                                PartName.CONTENT,
                                JsonObject.EMPTY.with("verdict", verdict).with("reason", reason)),
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
    }

    @Test
    void aWithdrawnOneHoldsNoLongerAndHidesWhatItFollowed() throws ProblemException {
        String waist = OPEN_ENDED.replace("power-scale", "period-scale");
        Hash first = record(waist);
        Hash second = record(
                waist.replace("0.98", "0.97").replace("2031-09-01T06:00:00Z", CHANGE.toString()),
                Optional.empty(),
                Optional.of(new After(first, CHANGE)));

        judge(archive, "withdrawn", Map.of("target", second));

        assertThat(at("period-scale", "2031-10-21T09:59:59Z")).containsExactly(first);
        assertThat(at("period-scale", "2031-10-21T10:00:00Z")).isEmpty();
    }

    @Test
    void oneThatFollowsIsValidFromTheVeryInstant() throws ProblemException {
        Hash first = record(OPEN_ENDED.replace("power-scale", "velocity-scale"));
        ProblemException thrown = catchThrowableOfType(
                ProblemException.class,
                () -> record(
                        OPEN_ENDED.replace("power-scale", "velocity-scale"),
                        Optional.empty(),
                        Optional.of(new After(first, CHANGE))));

        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("instrument.valid-from");
        assertThat(thrown.problems()).extracting(Problem::where).containsExactly("/content/valid/from");
        assertThat(thrown.problems().get(0).mend()).isNotBlank();
    }

    @Test
    void twoCorrectionsOfOneAreNamedUntilOneIsPreferred(@TempDir Path folder) throws Exception {
        String target = OPEN_ENDED.replace("power-scale", "position-scale");
        try (Archive here = founded(folder.resolve("here"));
                Archive there = founded(folder.resolve("there"))) {
            Hash wrong = record(here, target, Optional.empty());
            here.copyTo(folder.resolve("copy-1"), Work.QUIET);
            there.receive(folder.resolve("copy-1"), false, Work.QUIET);
            Hash ours = record(here, target.replace("0.98", "0.97"), Optional.of(wrong));
            Hash theirs = record(there, target.replace("0.98", "0.96"), Optional.of(wrong));
            here.copyTo(folder.resolve("copy-2"), Work.QUIET);
            there.receive(folder.resolve("copy-2"), false, Work.QUIET);
            Instant at = Instant.parse("2031-10-01T00:00:00Z");

            ProblemException thrown =
                    catchThrowableOfType(ProblemException.class, () -> CurrentCalibrations.at(there, at));
            assertThat(thrown.problems()).extracting(Problem::code).containsExactly("instrument.calibration-disputed");
            assertThat(thrown.problems().get(0).what()).contains(there.label(theirs), there.label(ours));

            judge(there, "preferred", Map.of("chosen", theirs, "over", ours));
            assertThat(CurrentCalibrations.at(there, at)).containsExactly(theirs);
        }
    }

    private static Archive founded(Path folder) throws ProblemException {
        Person person = new Person(PERSON, Optional.of("Ottla Vireen"), Optional.empty(), Optional.empty());
        return Archives.found(
                folder,
                new Archives.Founding("demo lab", "06:00", "UTC", true, List.of(person), Optional.empty()),
                new Kinds(List.of(new CalibrationKind(), new JudgementKind())),
                Circumstances.real("1.0.0"));
    }

    private static Hash record(Archive in, String content, Optional<Hash> corrects) throws ProblemException {
        return in.record(new NewRecord(
                        new KindName("calibration"),
                        List.of(),
                        List.of(),
                        Map.<PartName, JsonObject>of(PartName.CONTENT, Records.json(content)),
                        List.of(),
                        corrects,
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
    }
}
