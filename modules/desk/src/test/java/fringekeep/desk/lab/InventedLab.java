package fringekeep.desk.lab;

import fringekeep.archive.Archive;
import fringekeep.archive.ArchiveFacts;
import fringekeep.archive.JournalLine;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.Moment;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.ThingId;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import java.lang.reflect.Proxy;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;

/**
 * An invented laboratory in memory, for tests of what windows show: two measurement days with placed scans and fits, a
 * property, a figure, a corrected calibration. Answers only what windows ask of an archive; anything else is a mistake in
 * code.
 */
public final class InventedLab {
    private final InventedGraph graph = new InventedGraph();
    private final Map<String, InventedKind> kinds = new LinkedHashMap<>();
    private final Map<String, List<Hash>> byKind = new LinkedHashMap<>();
    private final Map<Hash, RecordView> views = new HashMap<>();
    private final Map<Hash, String> labels = new HashMap<>();
    private final Map<Hash, Archive.Recorded> recorded = new HashMap<>();
    private long n = 1;

    /** The scan in the middle of the second day. */
    public final Hash scan;

    /** Its fit. */
    public final Hash fit;

    /** The property from all fits. */
    public final Hash property;

    /** The figure. */
    public final Hash figure;

    /** The calibration that was corrected. */
    public final Hash calibration;

    /** The withdrawn scan. */
    public final Hash withdrawn;

    /** Makes the laboratory. */
    public InventedLab() {
        for (String kind : List.of("compound", "batch", "setup", "calibration", "source-run", "velocity")) {
            kind(kind, Column.text("title", "Title"), Column.instant("since", "Since"));
        }
        Column watts = Column.real("laser_power_w", "Laser power", "W", "W");
        kind("scan", Column.instant("ended", "Ended"), watts);
        kind("placement", Column.text("purpose", "Purpose"));
        Column visibility = Column.real("visibility", "Visibility", "1", "1");
        kind("fit", visibility, Column.deviation("visibility_u", visibility));
        Column value = Column.real("value", "Value", "1", "1");
        kind("property", Column.text("what", "Property"), value, Column.deviation("value_u", value));
        kind("figure", Column.text("title", "Title"));
        kind("judgement", Column.text("verdict", "Verdict"));
        Hash compound = add("compound", "velorphyrin", "2025-01-04T09:00:00Z");
        Hash batch = add("batch", "batch 4 of velorphyrin", "2025-01-20T09:00:00Z");
        link(batch, compound, LinkSort.ABOUT, "compound");
        Hash setup = add("setup", "short bench", "2025-03-01T09:00:00Z");
        calibration = add("calibration", "power meter scale", "2025-03-10T08:00:00Z");
        Hash speed = add("calibration", "velocity scale", "2025-02-10T08:00:00Z");
        Hash run = add("source-run", "oven at 842 K", "2025-03-13T21:35:00Z");
        link(run, batch, LinkSort.ABOUT, "batch");
        Hash velocity = add("velocity", "mean 184.6(11) m/s", "2025-03-13T21:40:00Z");
        link(velocity, run, LinkSort.ABOUT, "run");
        property = hash("property");
        Hash middle = property;
        Hash middleFit = property;
        Hash struck = property;
        for (int i = 0; i < 36; i++) {
            Instant at = Instant.parse(i < 18 ? "2025-03-12T16:00:00Z" : "2025-03-13T22:00:00Z")
                    .plusSeconds(760L * (i % 18));
            boolean reference = i % 3 == 1;
            double power = reference ? 5 : 1 + (i * 0.37) % 9;
            Hash one = scan(i, at, power);
            Hash placement = add("placement", reference ? "reference" : "signal", at.toString());
            known("placement").rows.put(placement, new Row(Map.of("purpose", reference ? "reference" : "signal")));
            link(placement, one, LinkSort.ABOUT, "scan");
            link(placement, run, LinkSort.ABOUT, "run");
            link(placement, setup, LinkSort.ABOUT, "setup");
            double v = reference ? 0.295 : 0.3 * Math.abs(StrictMath.sin(power / 3.4));
            Hash fitted = fit(one, v, at);
            for (Hash input : List.of(placement, setup, run, compound, calibration)) {
                link(fitted, input, LinkSort.INPUT, "input");
            }
            link(property, fitted, LinkSort.INPUT, "fit");
            if (i == 30) {
                middle = one;
                middleFit = fitted;
            }
            struck = i == 5 ? one : struck;
        }
        scan = middle;
        fit = middleFit;
        withdrawn = struck;
        link(property, velocity, LinkSort.INPUT, "velocity");
        link(property, speed, LinkSort.INPUT, "calibration");
        put(property, "property", "polarizability of velorphyrin", "2025-03-17T10:12:00Z", propertyResult());
        known("property")
                .rows
                .put(property, new Row(Map.of("what", "polarizability", "value", 101.33, "value_u", 0.91)));
        known("property").pictures.put(property, List.of(power()));
        figure = add("figure", "polarizabilities", "2025-03-17T10:40:00Z");
        link(figure, property, LinkSort.INPUT, "property");
        known("figure").pictures.put(figure, List.of(power()));
        Hash newer = add("calibration", "power meter scale", "2025-03-18T09:05:00Z");
        link(newer, calibration, LinkSort.CORRECTS, "");
        graph.states.put(calibration, Set.of(StateName.CORRECTED));
        for (Hash later : List.of(property, figure)) {
            graph.states.put(later, Set.of(StateName.OUTDATED));
            graph.causes.put(later, List.of(new Cause(Cause.Sort.CORRECTED, calibration, newer)));
        }
        graph.states.put(withdrawn, Set.of(StateName.WITHDRAWN));
        Hash judgement = hash("judgement 1");
        put(
                judgement,
                "judgement",
                "withdrawn",
                "2025-03-13T00:04:00Z",
                Map.of(
                        PartName.CONTENT,
                        JsonObject.EMPTY.with("verdict", "withdrawn").with("reason", "mode-hop"),
                        PartName.REMARK,
                        JsonObject.EMPTY.with("text", "laser jumped half-way")));
        link(judgement, withdrawn, LinkSort.ABOUT, "target");
    }

    private void kind(String name, Column... columns) {
        String table = name.replace('-', '_');
        kinds.put(name, new InventedKind(name, new Projection(table, new KindName(name), List.of(columns), List.of())));
    }

    private Hash scan(int i, Instant at, double power) {
        Hash one = hash("scan " + i);
        JsonObject watts = JsonObject.EMPTY
                .with("text", "7,30")
                .with("unit", "W")
                .with("si", power)
                .with(
                        "uncertainty",
                        JsonObject.EMPTY
                                .with("sort", "stated")
                                .with("text", "0.015")
                                .with("si", 0.015));
        JsonObject wave = JsonObject.EMPTY
                .with("text", "532.0")
                .with("unit", "nm")
                .with("si", 5.32e-7)
                .with("uncertainty", JsonObject.EMPTY.with("sort", "exact"));
        JsonObject oven = JsonObject.EMPTY
                .with("text", "568.9")
                .with("unit", "Cel")
                .with("si", 842.05)
                .with("uncertainty", JsonObject.EMPTY.with("sort", "unstated"));
        JsonArray settings = JsonArray.of(
                JsonObject.EMPTY.with("name", "laser power").with("quantity", watts),
                JsonObject.EMPTY.with("name", "laser wavelength").with("quantity", wave),
                JsonObject.EMPTY.with("name", "oven").with("quantity", oven));
        put(
                one,
                "scan",
                "signal at " + Math.rint(power * 100) / 100 + " W",
                at.toString(),
                Map.of(
                        PartName.RESULT,
                        JsonObject.EMPTY.with("settings", settings).with("rows", 31)));
        known("scan").rows.put(one, new Row(Map.of("ended", at, "laser_power_w", power)));
        double[] x = new double[31];
        double[] counts = new double[31];
        for (int k = 0; k < 31; k++) {
            x[k] = 26.6e-9 * k;
            counts[k] = Math.rint(
                    770 + 160 * StrictMath.cos(2 * Math.PI * (k - 6) / 10) + 20 * StrictMath.sin(7.0 * k * (i + 1)));
        }
        known("scan")
                .counts
                .put(
                        one,
                        new CountTable(
                                List.of(new CountTable.Column("position", "m", x)),
                                List.of(new CountTable.Column("counts", "1", counts)),
                                new double[31],
                                new double[0],
                                Optional.empty(),
                                Optional.empty()));
        known("scan").spans.put(one, new TimeSpan(new Moment(at, "+01:00", Optional.empty()), Optional.empty()));
        return one;
    }

    private Hash fit(Hash of, double visibility, Instant at) {
        Hash fitted = hash("fit " + n);
        JsonObject result = JsonObject.EMPTY
                .with("estimates", JsonArray.ofTexts(List.of("mean", "cosine", "sine")))
                .with("values", JsonArray.ofNumbers(769.4, -95.6, -131.6))
                .with("covariance", JsonArray.ofNumbers(26, 0, 50, 0, 0, 52))
                .with("visibility", JsonObject.EMPTY.with("value", visibility).with("u", 0.0092))
                .with("degreesOfFreedom", Json.of(28));
        put(fitted, "fit", "visibility", at.plusSeconds(60).toString(), Map.of(PartName.RESULT, result));
        known("fit").rows.put(fitted, new Row(Map.of("visibility", visibility, "visibility_u", 0.0092)));
        known("fit").pictures.put(fitted, List.of(fringe()));
        link(fitted, of, LinkSort.INPUT, "scan");
        return fitted;
    }

    private static Map<PartName, JsonObject> propertyResult() {
        return Map.of(
                PartName.RESULT,
                JsonObject.EMPTY
                        .with(
                                "polarizabilityVolume",
                                JsonObject.EMPTY.with("value", 1.0133e-28).with("u", 9.1e-31))
                        .with("model", "quantum"));
    }

    private Hash add(String kind, String title, String at) {
        Hash one = hash(kind + n);
        put(one, kind, title, at, Map.of(PartName.CONTENT, JsonObject.EMPTY.with("label", title)));
        known(kind).rows.put(one, new Row(Map.of("title", title, "since", Instant.parse(at))));
        return one;
    }

    private void put(Hash one, String kind, String title, String at, Map<PartName, JsonObject> parts) {
        List<Hash> same = byKind.computeIfAbsent(kind, key -> new ArrayList<>());
        same.add(one);
        Map<PartName, JsonObject> all = new HashMap<>(parts);
        all.put(
                PartName.MADE,
                JsonObject.EMPTY.with("at", at).with("offset", "Z").with("build", "1.0.0"));
        views.put(one, new View(one, kind, all));
        known(kind).titles.put(one, new Title(title, ""));
        String number = Integer.toString(same.size());
        String padded = kind.equals("scan") || kind.equals("fit") ? "0".repeat(4 - number.length()) + number : number;
        labels.put(one, kind.replace('-', ' ') + " " + padded);
        recorded.put(one, new Archive.Recorded(one, ++n, labels.get(one), Instant.parse(at)));
    }

    private void link(Hash from, Hash to, LinkSort sort, String role) {
        graph.all.add(new Link(from, to, sort, role));
    }

    private InventedKind known(String kind) {
        return Objects.requireNonNull(kinds.get(kind), kind);
    }

    private static Hash hash(String text) {
        return Hash.of(text.getBytes(StandardCharsets.UTF_8));
    }

    record View(Hash fingerprint, String kind, Map<PartName, JsonObject> parts) implements RecordView {
        @Override
        public Head head() {
            return new Head(
                    new KindName(kind),
                    1,
                    new ThingId(fingerprint.hex().substring(0, 32)),
                    List.of(),
                    List.of(),
                    List.of(),
                    new TreeMap<>(),
                    new TreeMap<>(),
                    Optional.empty(),
                    Optional.empty());
        }

        @Override
        public Optional<JsonObject> part(PartName name) {
            return Optional.ofNullable(parts.get(name));
        }

        @Override
        public boolean withheld(PartName name) {
            return false;
        }

        @Override
        public byte[] payload(String name) throws ProblemException {
            throw new ProblemException(new Problem("lab.payload", "There is no payload.", name, "Ask for none."));
        }
    }

    static final Inputs NONE = new Inputs() {
        @Override
        public List<Input> all() {
            return List.of();
        }

        @Override
        public List<Subject> about() {
            return List.of();
        }
    };

    /** The setup. */
    public Hash setup() {
        return Objects.requireNonNull(byKind.get("setup")).get(0);
    }

    /** A scan by its place. */
    public Hash scan(int place) {
        return Objects.requireNonNull(byKind.get("scan")).get(place);
    }

    /** The laboratory as an archive. */
    public Archive archive() {
        return (Archive) Proxy.newProxyInstance(
                InventedLab.class.getClassLoader(),
                new Class<?>[] {Archive.class},
                (proxy, method, arguments) -> switch (method.getName()) {
                    case "facts" ->
                        new ArchiveFacts(
                                new ArchiveId("0".repeat(32)),
                                "Halvorn Bench",
                                "06:00",
                                "Etc/GMT-1",
                                true,
                                n,
                                Path.of("lab"));
                    case "kinds" -> new Kinds(kinds.values());
                    case "record" -> Optional.ofNullable(views.get((Hash) arguments[0]));
                    case "inputs" -> NONE;
                    case "label" -> labels.get((Hash) arguments[0]);
                    case "recorded" -> Optional.ofNullable(recorded.get((Hash) arguments[0]));
                    case "records" ->
                        (long) arguments[1] > 1 ? List.of() : byKind.getOrDefault((String) arguments[0], List.of());
                    case "counts" -> counts();
                    case "list" -> page((Listing) arguments[0]);
                    case "journalLines" ->
                        arguments[0] instanceof Instant from
                                ? journal(from, (Instant) arguments[1])
                                : journal(Instant.MIN, Instant.MAX);
                    case "graph" -> graph.asGraph();
                    case "graphReady" -> true;
                    case "find" -> find((String) arguments[0]);
                    case "onCommit" -> (AutoCloseable) () -> {};
                    case "persons" -> List.of();
                    case "close" -> Optional.empty();
                    default -> throw new IllegalStateException("windows do not ask " + method);
                });
    }

    /** The graph. */
    public Graph graph() {
        return graph.asGraph();
    }

    private List<JournalLine> journal(Instant from, Instant to) {
        return recorded.values().stream()
                .filter(one -> !one.at().isBefore(from) && one.at().isBefore(to))
                .map(one -> new JournalLine(one.n(), one.at(), "recorded", Optional.of(one.fingerprint())))
                .toList();
    }

    private Map<String, Long> counts() {
        Map<String, Long> counts = new HashMap<>();
        byKind.forEach((kind, records) -> counts.put(kind, (long) records.size()));
        return counts;
    }

    private Page page(Listing listing) {
        InventedKind kind = known(listing.projection().replace('_', '-'));
        List<Page.Line> lines = byKind.getOrDefault(kind.kind().text(), List.of()).stream()
                .filter(one -> !graph.states(one).contains(StateName.CORRECTED))
                .filter(one -> listing.words().stream()
                        .allMatch(word -> title(kind, one).contains(word)))
                .map(one -> line(kind, one))
                .toList();
        return new Page(lines, Optional.empty(), n);
    }

    private static String title(InventedKind kind, Hash one) {
        return Objects.requireNonNull(kind.titles.get(one)).text();
    }

    private Page.Line line(InventedKind kind, Hash one) {
        return new Page.Line(
                one,
                Objects.requireNonNull(recorded.get(one)).n(),
                Objects.requireNonNull(labels.get(one)),
                kind.rows.getOrDefault(one, new Row(Map.of())));
    }

    private Hash find(String words) throws ProblemException {
        return labels.entrySet().stream()
                .filter(entry -> entry.getValue().equals(words))
                .map(Map.Entry::getKey)
                .findFirst()
                .orElseThrow(() -> new ProblemException(
                        new Problem("lab.find", "Nothing answers " + words + ".", "", "Write a number.")));
    }

    private static Picture fringe() {
        double[] x = new double[31];
        double[] y = new double[31];
        double[] u = new double[31];
        double[] r = new double[31];
        double[] fine = new double[161];
        double[] curve = new double[161];
        double[] low = new double[161];
        double[] high = new double[161];
        for (int i = 0; i <= 160; i++) {
            fine[i] = 5.0 * i;
            curve[i] = 770 + 160 * StrictMath.cos(2 * Math.PI * (fine[i] - 175) / 266);
            low[i] = curve[i] - 8;
            high[i] = curve[i] + 8;
        }
        for (int i = 0; i < 31; i++) {
            x[i] = 26.6 * i;
            r[i] = 2 * StrictMath.sin(7.0 * i * i);
            y[i] = 770 + 160 * StrictMath.cos(2 * Math.PI * (x[i] - 175) / 266) + 27 * r[i];
            u[i] = 27;
        }
        Axis position = Axis.linear("position of grating 3", "nm");
        return new Picture(
                "",
                130,
                80,
                1,
                List.of(
                        new Panel(
                                "",
                                "",
                                position,
                                Axis.linear("counts in 10 s", ""),
                                List.of(
                                        new Layer.Band("", Tone.QUANTUM, fine, low, high),
                                        new Layer.Curve("", Tone.QUANTUM, Stroke.SOLID, fine, curve),
                                        new Layer.Points("", Tone.INK, Shape.DOT, x, y, u)),
                                1,
                                false),
                        new Panel(
                                "",
                                "",
                                position,
                                Axis.linear("residuals", "\u03C3"),
                                List.of(new Layer.Sticks("", Tone.INK, x, r)),
                                0.3,
                                false)));
    }

    private static Picture power() {
        double[] p = new double[121];
        double[] q = new double[121];
        double[] c = new double[121];
        for (int i = 0; i < 121; i++) {
            p[i] = 0.1 * i;
            q[i] = 0.3 * Math.abs(StrictMath.sin(p[i] / 3.4));
            c[i] = 0.3 * Math.abs(StrictMath.sin(p[i] / 1.7));
        }
        return new Picture(
                "",
                130,
                80,
                1,
                List.of(new Panel(
                        "",
                        "",
                        Axis.linear("laser power", "W"),
                        Axis.linear("visibility", ""),
                        List.of(
                                new Layer.Curve("classical", Tone.CLASSICAL, Stroke.DASHED, p, c),
                                new Layer.Curve("quantum", Tone.QUANTUM, Stroke.SOLID, p, q),
                                new Layer.Points(
                                        "signal",
                                        Tone.INK,
                                        Shape.DOT,
                                        new double[] {1, 3.2, 5.4, 7.3, 9.8},
                                        new double[] {0.09, 0.24, 0.3, 0.25, 0.08},
                                        new double[] {0.01, 0.01, 0.01, 0.01, 0.01})),
                        1,
                        true)));
    }
}
