package fringekeep.fit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.judgement.JudgementKind;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.making.ScriptedCircumstances;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.FitKind;
import fringekeep.instrument.CalibrationKind;
import fringekeep.instrument.SetupKind;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.PlacementKind;
import fringekeep.scan.ReadingProfileKind;
import fringekeep.scan.ScanKind;
import fringekeep.scan.SeriesKind;
import fringekeep.scan.TakeInFiles;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/** A real archive with a setup and invented scans of 16 points a quarter period apart, and no more. */
final class SmallLab implements AutoCloseable {
    static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    static final int ROWS = 16;

    private static final String PROFILE = """
            {'form':'delimited/1','encoding':'UTF-8','delimiter':',','decimal':'.','skip':1,'comment':'#',
             'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'},{'channel':'dark','means':'dark'}],
             'header':[{'key':'start','moment':'start'},{'key':'dwell','exposure':true}]}""";
    private static final String SETUP = """
            {'label':'bench','gratings':[{'sort':'material','period':{'text':'266.0','unit':'nm','si':2.66e-7,
              'uncertainty':{'sort':'exact'}}}],'separations':[{'text':'100','unit':'mm','si':0.1,
              'uncertainty':{'sort':'unstated'}}]}""";

    final Archive archive;
    private final Path folder;
    private final Hash profile;
    private final Hash setup;
    private int files;

    SmallLab(Path folder) throws ProblemException {
        this.folder = folder;
        Kinds kinds = new Kinds(List.of(
                new SetupKind(),
                new CalibrationKind(),
                new ReadingProfileKind(),
                new ScanKind(),
                new SeriesKind(),
                new PlacementKind(),
                new JudgementKind(),
                new FitKind()));
        Person person = new Person(PERSON, Optional.of("N. N."), Optional.empty(), Optional.empty());
        archive = Archives.found(
                folder.resolve("lab"),
                new Archives.Founding("small", "06:00", "Etc/GMT-2", true, List.of(person), Optional.empty()),
                kinds,
                ScriptedCircumstances.stepping(
                        "fits by hand", Instant.parse("2031-05-14T09:00:00Z"), ZoneId.of("Etc/GMT-2"), "1.0.0"));
        profile = enter("reading-profile", json(PROFILE));
        setup = enter("setup", json(SETUP));
    }

    static JsonObject json(String singleQuoted) throws ProblemException {
        byte[] bytes = singleQuoted.replace('\'', '"').getBytes(StandardCharsets.UTF_8);
        return (JsonObject) JsonDocument.read(bytes).value();
    }

    Hash enter(String kind, JsonObject content, AboutReference... about) throws ProblemException {
        return archive.record(new NewRecord(
                        new KindName(kind),
                        List.of(),
                        List.of(about),
                        Map.of(PartName.CONTENT, content),
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
    }

    /** A scan of a fringe of visibility 0.3, not placed. */
    Hash unplaced(int mean) throws ProblemException {
        StringBuilder text =
                new StringBuilder("# start: 2031-05-14T1" + files % 10 + ":00:00Z\n# dwell: 10 s\nx,n,d\n");
        for (int i = 0; i < ROWS; i++) {
            double phase = 2 * Math.PI * i * 33.25 / 266;
            long count = Math.round(mean * (1 + 0.3 * Math.cos(phase)) + (i * 7 + files) % 5);
            text.append(33.25 * i)
                    .append(',')
                    .append(count)
                    .append(',')
                    .append(3 + i % 2)
                    .append('\n');
        }
        try {
            Path file = Files.writeString(folder.resolve(files++ + ".csv"), text);
            TakeInFiles.Request request =
                    new TakeInFiles.Request(List.of(file), Optional.of(profile), false, Optional.empty());
            return new TakeInFiles(archive)
                    .takeIn(request, Work.QUIET)
                    .get(0)
                    .scans()
                    .get(0);
        } catch (IOException e) {
            throw new java.io.UncheckedIOException(e);
        }
    }

    /** A scan placed as a signal. */
    Hash scan(int mean) throws ProblemException {
        Hash scan = unplaced(mean);
        new PlaceScans(archive)
                .place(
                        List.of(new PlaceScans.Place(
                                scan,
                                Purpose.SIGNAL,
                                setup,
                                Optional.empty(),
                                List.of(),
                                Optional.empty(),
                                OptionalInt.empty(),
                                Optional.empty(),
                                Optional.empty())),
                        PERSON);
        return scan;
    }

    QuietDesk desk() {
        return new QuietDesk(archive, PERSON);
    }

    @Override
    public void close() {
        archive.close();
    }
}
