package fringekeep.property.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.entry.EntryDocument;
import fringekeep.archive.entry.EntrySurroundings;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.judgement.JudgementKind;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.making.ScriptedCircumstances;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.FitKind;
import fringekeep.instrument.CalibrationKind;
import fringekeep.instrument.SetupKind;
import fringekeep.property.GatherProperty;
import fringekeep.property.PropertyKind;
import fringekeep.property.QuotedKind;
import fringekeep.property.SelectionKind;
import fringekeep.sample.BatchKind;
import fringekeep.sample.CompoundKind;
import fringekeep.scan.PlacementKind;
import fringekeep.scan.ReadingProfileKind;
import fringekeep.scan.ScanKind;
import fringekeep.scan.SeriesKind;
import fringekeep.sourcerun.SourceRunKind;
import fringekeep.sourcerun.VelocityKind;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * An archive of the real kinds in which a published power series stands as if it had been measured: one scan, placement and fit
 * for each point. The fits' results are given, for the files state visibilities and not counts.
 */
final class PowerLab implements AutoCloseable {
    static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    static final Path FOLDER = Path.of("src/test/reference/power-curves");

    final Archive archive;
    private final Map<String, Hash> named = new HashMap<>();
    private int files;

    private PowerLab(Archive archive) {
        this.archive = archive;
    }

    static PowerLab found(Path folder) throws ProblemException {
        Kinds kinds = new Kinds(List.of(
                new CompoundKind(),
                new BatchKind(),
                new SetupKind(),
                new CalibrationKind(),
                new SourceRunKind(),
                new VelocityKind(),
                new ReadingProfileKind(),
                new ScanKind(),
                new SeriesKind(),
                new PlacementKind(),
                new FitKind(),
                new JudgementKind(),
                new SelectionKind(),
                new PropertyKind(),
                new QuotedKind()));
        Person person = new Person(PERSON, Optional.of("Ottla Vireen"), Optional.empty(), Optional.empty());
        return new PowerLab(Archives.found(
                folder,
                new Archives.Founding("demo lab", "06:00", "Etc/UTC", true, List.of(person), Optional.empty()),
                kinds,
                ScriptedCircumstances.stepping(
                        "property lab", Instant.parse("2031-05-14T09:00:00Z"), ZoneOffset.UTC, "1.0.0")));
    }

    @Override
    public void close() {
        archive.close();
    }

    /** Records an entry document in single quotes and remembers it by a name. */
    Hash enter(String name, String document) throws ProblemException, StoppedException {
        EntrySurroundings around = new EntrySurroundings(
                archive.kinds(),
                reference -> named.containsKey(reference) ? named.get(reference) : archive.find(reference),
                any -> PERSON,
                path -> {
                    throw new IllegalStateException("no raw file is entered here: " + path);
                });
        NewRecord entered = EntryDocument.read(document.replace('\'', '"').getBytes(StandardCharsets.UTF_8), around)
                .record();
        NewRecord whole = entered.parts().containsKey(PartName.CHOICES)
                ? archive.compute(entered, List.of(), Work.QUIET)
                : by(entered);
        Hash hash = archive.record(whole).fingerprint();
        named.put(name, hash);
        return hash;
    }

    private static NewRecord by(NewRecord record) {
        return new NewRecord(
                record.kind(),
                record.inputs(),
                record.about(),
                record.parts(),
                record.payloads(),
                record.corrects(),
                record.after(),
                Optional.of(PERSON));
    }

    /** What a power series stands on. */
    record Series(Hash setup, Hash run, Hash batch, Hash compound, Hash velocity, Hash profile, List<Point> points) {}

    /** One row of a file. */
    record Point(double power, double visibility, double deviation) {}

    /** Bench, compound, run and velocity of a file. */
    Series series(String file) throws Exception {
        List<String> lines = Files.readAllLines(FOLDER.resolve(file + ".csv"));
        Map<String, String> head = new HashMap<>();
        List<Point> points = new ArrayList<>();
        for (String line : lines) {
            if (line.startsWith("#")) {
                String[] pair = line.substring(1).split(":", 2);
                head.put(pair[0].strip(), pair[1].strip());
            } else if (Character.isDigit(line.charAt(0))) {
                String[] cells = line.split(",");
                points.add(new Point(
                        Double.parseDouble(cells[0]), Double.parseDouble(cells[1]), Double.parseDouble(cells[2])));
            }
        }
        Hash compound = enter(
                "compound",
                "{'kind':'compound','choices':{'method':'compound.mass/1','constants':'CODATA 2018','charge':0,"
                        + "'composition':{'sort':'masses','masses':[{'mass':'" + head.get("mass_u")
                        + " u exact','share':1}]}}}");
        Hash batch = enter(
                "batch",
                "{'kind':'batch','about':[{'role':'compound','record':'compound'}],"
                        + "'content':{'label':'B','cautions':[],'acknowledged':true}}");
        Hash run = enter(
                "run",
                "{'kind':'source-run','about':[{'role':'batch','record':'batch'}],'content':{'label':'R',"
                        + "'source':'effusive','cautions':[],'acknowledged':true,'settings':[]}}");
        Hash setup = enter("setup", setup(head));
        boolean single = Double.parseDouble(head.get("v_sigma_m_s")) == 0;
        Hash velocity = enter(
                "velocity",
                "{'kind':'velocity','about':[{'role':'run','record':'run'}],'content':{'origin':'head of the file','mean':'"
                        + head.get("v_mean_m_s") + " m/s exact',"
                        + (single
                                ? "'shape':'single'}}"
                                : "'spread':'" + head.get("v_sigma_m_s") + " m/s exact','shape':'normal'}}"));
        Hash profile = profile("");
        return new Series(setup, run, batch, compound, velocity, profile, points);
    }

    /** A reading profile that states a standard uncertainty of the power (W); none where the text is empty. */
    private Hash profile(String deviation) throws ProblemException, StoppedException {
        return enter(
                "profile",
                "{'kind':'reading-profile','content':{'form':'delimited/1','encoding':'UTF-8','delimiter':',',"
                        + "'decimal':'.','skip':0,'comment':'#','keySeparator':':','direction':'any',"
                        + "'exposure':'1 s exact','columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}],"
                        + "'header':[{'key':'start','moment':'start'},"
                        + "{'key':'laser power','setting':'laser power','unit':'W'"
                        + (deviation.isEmpty() ? "" : ",'deviation':'" + deviation + "'")
                        + "}]}}");
    }

    private static String setup(Map<String, String> head) {
        String grating =
                "{'sort':'material','period':'266 nm exact','openFraction':'" + head.get("open_fraction") + " exact'}";
        return "{'kind':'setup','content':{'label':'bench','gratings':[" + grating
                + ",{'sort':'standing-wave','laser':{'wavelength':'" + head.get("laser_nm")
                + " nm exact','waistAcross':'" + head.get("w_y_m") + " m exact','reflectivity':'1 exact'}}," + grating
                + "],'separations':['" + head.get("L_m") + " m exact','" + head.get("L_m") + " m exact'],"
                + "'cautions':[],'acknowledged':true}}";
    }

    /** A fit of one point. */
    Hash fit(Series series, Point point, String power) throws Exception {
        Hash scan = scan(series, power);
        Hash placement = archive.record(new NewRecord(
                        new KindName("placement"),
                        List.of(),
                        List.of(
                                thing("scan", scan),
                                thing("setup", series.setup()),
                                thing("run", series.run()),
                                thing("velocity", series.velocity())),
                        Map.of(PartName.CONTENT, JsonObject.EMPTY.with("purpose", "signal")),
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
        List<InputReference> inputs = List.of(
                new InputReference.OfRecord("scan", scan, Optional.of("counts")),
                new InputReference.OfRecord("placement", placement),
                new InputReference.OfRecord("setup", series.setup()),
                new InputReference.OfRecord("run", series.run()),
                new InputReference.OfRecord("batch", series.batch()),
                new InputReference.OfRecord("compound", series.compound()));
        return archive.record(new NewRecord(
                        new KindName("fit"),
                        inputs,
                        List.of(),
                        Map.of(PartName.CHOICES, FIT_CHOICES, PartName.RESULT, result(point)),
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty()))
                .fingerprint();
    }

    private static AboutReference thing(String role, Hash record) {
        return new AboutReference(role, record, AboutReference.Reach.THING);
    }

    /** The choices of record format 1's own example of a fit. */
    private static final JsonObject FIT_CHOICES = JsonObject.EMPTY
            .with("combine", "single")
            .with("constants", "CODATA 2018")
            .with("deadTime", JsonObject.EMPTY.with("sort", "none"))
            .with("driftOrder", 0)
            .with("method", "fringe.unweighted/1")
            .with("period", JsonObject.EMPTY.with("si", 2.66e-7).with("sort", "fixed"));

    /** Mean 1 without uncertainty, so that cosine is the visibility and its deviation that of the file. */
    private static JsonObject result(Point point) throws ProblemException {
        double variance = point.deviation() * point.deviation();
        String text = String.format(
                Locale.ROOT,
                "{'estimates':['mean','cosine','sine'],'values':[1,%1$s,0],'covariance':[0,0,%2$s,0,0,%2$s],"
                        + "'degreesOfFreedom':1,'sensitivities':[],'visibility':{'value':%1$s,'u':%3$s,'lower':0,'upper':1}}",
                point.visibility(),
                variance,
                point.deviation());
        return json(text);
    }

    static JsonObject json(String singleQuoted) throws ProblemException {
        return (JsonObject) fringekeep.archive.json.JsonDocument.read(
                        singleQuoted.replace('\'', '"').getBytes(StandardCharsets.UTF_8))
                .value();
    }

    private Hash scan(Series series, String power) throws Exception {
        String file = "# start: " + start() + "\n# laser power: " + power + "\n0,120\n66.5,100\n133,80\n199.5,100\n";
        files++;
        Archive.RawTaken raw = archive.takeIn(file.getBytes(StandardCharsets.UTF_8));
        NewRecord request = new NewRecord(
                new KindName("scan"),
                List.of(
                        new InputReference.OfRaw("raw", raw.hash(), raw.bytes()),
                        new InputReference.OfRecord("profile", series.profile())),
                List.of(),
                Map.of(
                        PartName.CHOICES,
                        JsonObject.EMPTY.with("file", JsonObject.EMPTY.with("name", "point-" + files + ".csv"))),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
        return archive.record(archive.compute(request, List.of(), Work.QUIET)).fingerprint();
    }

    /** A property of a selection as the verb gathers it. */
    Hash property(Hash selection, String choices) throws Exception {
        NewRecord request = new GatherProperty(archive).request(selection, json(choices), List.of(), Optional.empty());
        return archive.record(archive.compute(request, List.of(), Work.QUIET)).fingerprint();
    }

    private Instant start() {
        return Instant.parse("2031-01-13T20:00:00Z").plusSeconds(60L * files);
    }

    /** A selection of just these fits. */
    Hash listed(List<Hash> fits) throws ProblemException {
        return archive.record(new NewRecord(
                        new KindName("selection"),
                        fits.stream()
                                .<InputReference>map(fit -> new InputReference.OfRecord("taken", fit))
                                .toList(),
                        List.of(),
                        Map.of(PartName.CONTENT, json("{'rule':'as listed','conditions':[],'left':[]}")),
                        List.of(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.of(PERSON)))
                .fingerprint();
    }

    Hash judge(String verdict, String reason, Map<String, Hash> about) throws ProblemException {
        return archive.record(new NewRecord(
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

    JsonObject result(Hash record) {
        return archive.record(record).orElseThrow().result();
    }
}
