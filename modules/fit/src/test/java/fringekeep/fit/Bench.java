package fringekeep.fit;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.instrument.CalibrationKind;
import fringekeep.instrument.SetupKind;
import fringekeep.scan.PlacementKind;
import fringekeep.scan.ReadingProfileKind;
import fringekeep.scan.ScanKind;
import fringekeep.scan.SeriesKind;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A bench without an archive: records profile, setup, scans, placements and fits of them in memory. */
final class Bench {
    static final String PLAIN = """
            {'form':'delimited/1','encoding':'UTF-8','delimiter':',','decimal':'.','skip':1,'comment':'#',
             'columns':[{'axis':'position','unit':'nm','header':'position_nm'},
              {'axis':'time','unit':'s','header':'elapsed_s'},
              {'channel':'counts','header':'counts'},{'exposure':true,'unit':'s','header':'dwell_s'},
              {'channel':'dark','means':'dark','header':'dark_counts'},
              {'exposure':true,'of':'dark','unit':'s','header':'dark_dwell_s'}],
             'direction':'any'}""";

    static final String SETUP = """
            {'label':'bench','gratings':[{'sort':'material','period':{'text':'266.0','unit':'nm','si':2.66e-7,
              'uncertainty':{'sort':'exact'}}}],'separations':[{'text':'100','unit':'mm','si':0.1,
              'uncertainty':{'sort':'unstated'}}]}""";

    final DetachedRecords records = new DetachedRecords(
            new ReadingProfileKind(),
            new ScanKind(),
            new SeriesKind(),
            new PlacementKind(),
            new SetupKind(),
            new CalibrationKind(),
            new MaskKind(),
            new FitKind());

    static JsonObject json(String singleQuoted) throws ProblemException {
        byte[] bytes = singleQuoted.replace('\'', '"').getBytes(StandardCharsets.UTF_8);
        return (JsonObject) JsonDocument.read(bytes).value();
    }

    static JsonObject vector(String hash) throws IOException, ProblemException {
        byte[] bytes = Files.readAllBytes(Path.of("src/test/reference/record-vectors", hash));
        return CanonicalJson.readObject(bytes, CanonicalJson.LARGEST_PART)
                .object("value")
                .orElseThrow();
    }

    Hash scan(String profile, byte[] file) throws ProblemException {
        Hash read = records.enter("reading-profile", json(profile));
        return scan(read, file);
    }

    Hash scan(Hash profile, byte[] file) throws ProblemException {
        JsonObject choices = JsonObject.EMPTY.with("file", JsonObject.EMPTY.with("name", "scan.csv"));
        return records.compute(
                "scan", choices, List.of(records.raw("raw", file), DetachedRecords.input("profile", profile)));
    }

    Hash setup(String content) throws ProblemException {
        return records.enter("setup", json(content));
    }

    Hash place(Hash scan, Hash setup, String purpose) throws ProblemException {
        return records.enter(
                "placement",
                JsonObject.EMPTY.with("purpose", purpose),
                DetachedRecords.about("scan", scan),
                DetachedRecords.about("setup", setup));
    }

    Hash mask(Hash scan, String channel, double... run) throws ProblemException {
        JsonObject content = JsonObject.EMPTY
                .with("verdict", "masked")
                .with("reason", "mode-hop")
                .with("channel", channel)
                .with("points", JsonArray.of(JsonArray.ofNumbers(run)));
        return records.enter("judgement", content, new AboutReference("target", scan, AboutReference.Reach.RECORD));
    }

    static InputReference scanInput(String role, Hash scan, String channel) {
        return new InputReference.OfRecord(role, scan, Optional.of(channel));
    }

    /** Fits scans that are placed here as signals, with more inputs behind. */
    RecordView fit(String choices, Hash setup, List<Hash> scans, InputReference... more) throws ProblemException {
        List<InputReference> inputs = new ArrayList<>();
        for (Hash scan : scans) {
            inputs.add(scanInput("scan", scan, "counts"));
            inputs.add(DetachedRecords.input("placement", place(scan, setup, "signal")));
        }
        inputs.add(DetachedRecords.input("setup", setup));
        inputs.addAll(List.of(more));
        return records.view(records.compute("fit", json(choices), inputs));
    }

    static byte[] reference(String name) throws IOException {
        return Files.readAllBytes(Path.of("src/test/reference/fringes", name));
    }

    static double value(RecordView fit, String estimate) {
        int at = fit.result().array("estimates").texts().indexOf(estimate);
        return fit.result().array("values").numbers()[at];
    }

    static double member(RecordView fit, String object, String number) {
        return fit.result().object(object).orElseThrow().number(number).orElseThrow();
    }
}
