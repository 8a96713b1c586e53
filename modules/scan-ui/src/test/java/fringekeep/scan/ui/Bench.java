package fringekeep.scan.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Person;
import fringekeep.archive.entry.EntryDocument;
import fringekeep.archive.entry.EntrySurroundings;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.making.ScriptedCircumstances;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.instrument.SetupKind;
import fringekeep.sample.BatchKind;
import fringekeep.sample.CompoundKind;
import fringekeep.scan.PlacementKind;
import fringekeep.scan.ReadingProfileKind;
import fringekeep.scan.ScanKind;
import fringekeep.scan.SeriesKind;
import fringekeep.sourcerun.SourceRunKind;
import fringekeep.sourcerun.VelocityKind;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;

/** A real archive in a temporary folder with an invented bench: two profiles, a setup, a source run, a series. */
final class Bench implements AutoCloseable {
    static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");

    final Archive archive;
    final Path folder;
    final Hash comma;
    final Hash tab;
    final Hash setup;
    final Hash run;
    final Hash series;

    Bench(Path folder) throws ProblemException {
        this.folder = folder;
        Person person = new Person(PERSON, Optional.of("N. N."), Optional.empty(), Optional.empty());
        archive = Archives.found(
                folder.resolve("lab"),
                new Archives.Founding("invented bench", "06:00", "Etc/GMT-2", true, List.of(person), Optional.empty()),
                new Kinds(List.of(
                        new CompoundKind(),
                        new BatchKind(),
                        new SetupKind(),
                        new SourceRunKind(),
                        new VelocityKind(),
                        new ReadingProfileKind(),
                        new ScanKind(),
                        new SeriesKind(),
                        new PlacementKind(),
                        new LeaningKind())),
                ScriptedCircumstances.stepping(
                        "invented bench", Instant.parse("2031-05-14T09:00:00Z"), ZoneId.of("Etc/GMT-2"), "1.0.0"));
        comma = enter("""
            {'kind':'reading-profile','content':{'label':'counter 1','form':'delimited/1','encoding':'UTF-8',
             'delimiter':',','decimal':'.','skip':1,'exposure':'1 s exact',
             'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}]}}\
            """);
        tab = enter("""
            {'kind':'reading-profile','content':{'label':'counter 2','form':'delimited/1','encoding':'UTF-8',
             'delimiter':'\\t','decimal':'.','comment':'#','skip':1,'keySeparator':':','exposure':'1 s exact',
             'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}],
             'header':[{'key':'start','moment':'start'}]}}\
            """);
        setup = enter("""
            {'kind':'setup','content':{'label':'short bench',
             'gratings':[{'sort':'material','period':'266.0 nm exact'}],'separations':['100 mm']}}\
            """);
        run = enter("""
            {'kind':'source-run','content':{'label':'day 1','source':'effusive','cautions':['oven'],
             'acknowledged':true,'settings':[],'started':{'at':'2031-05-14T08:00:00Z','offset':'+02:00'},
             'ended':{'at':'2031-05-14T12:00:00Z','offset':'+02:00'}}}\
            """);
        series = enter("""
            {'kind':'series','content':{'label':'power','varied':'laser power',
             'steps':[{'quantity':'1 W'},{'quantity':'2 W'},{'quantity':'4 W'},
              {'quantity':'1 W','purpose':'reference'}]}}\
            """);
    }

    Hash enter(String document) throws ProblemException {
        EntrySurroundings surroundings = new EntrySurroundings(archive.kinds(), archive::find, name -> PERSON, path -> {
            throw new IllegalStateException("no raw file is entered here: " + path);
        });
        byte[] bytes = document.replace('\'', '"').getBytes(StandardCharsets.UTF_8);
        String who = new String(bytes, StandardCharsets.UTF_8).replaceFirst("\\{", "{\"person\":\"N. N.\",");
        return archive.record(EntryDocument.read(who.getBytes(StandardCharsets.UTF_8), surroundings)
                        .record())
                .fingerprint();
    }

    /** A file that only the first profile reads. */
    Path commaFile(String name, int shift) throws IOException {
        StringBuilder text = new StringBuilder("pos/nm,n\n");
        for (int i = 0; i < 21; i++) {
            text.append(26 * i)
                    .append(',')
                    .append(300 + shift + (int) (90 * StrictMath.sin(i / 1.6)))
                    .append('\n');
        }
        return Files.writeString(folder.resolve(name), text);
    }

    /** A file that only the second profile reads, begun at a minute after ten of the invented day. */
    Path tabFile(String name, int minute) throws IOException {
        StringBuilder text = new StringBuilder(
                "# start: 2031-05-14T10:" + (minute < 10 ? "0" : "") + minute + ":00+02:00\nposition\tcounts\n");
        for (int i = 0; i < 21; i++) {
            text.append(26 * i)
                    .append('\t')
                    .append(200 + minute + (int) (60 * StrictMath.sin(i / 1.6)))
                    .append('\n');
        }
        return Files.writeString(folder.resolve(name), text);
    }

    /** A file with a word for a number at line 4. */
    Path brokenFile(String name) throws IOException {
        return Files.writeString(folder.resolve(name), "pos/nm,n\n0,512\n26,498\n52,five\n78,403\n");
    }

    @Override
    public void close() {
        archive.close();
    }
}
