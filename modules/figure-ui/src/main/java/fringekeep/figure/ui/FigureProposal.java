package fringekeep.figure.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.Estimates;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Texts;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A figure of selected records as a first proposal: one panel for each that offers series, and one panel that sets values side
 * by side where several records, or quoted ones, give a value of the same dimension. Not to be used on the window thread.
 */
final class FigureProposal {
    private static final Texts TEXTS = new Texts("fringekeep.figure.ui.Texts", FigureProposal.class);
    private static final List<String> SHAPES = List.of("dot", "circle", "square", "triangle", "lozenge", "cross");

    private final Archive archive;
    private final List<Json> inputs = new ArrayList<>();
    private final List<Json> panels = new ArrayList<>();
    private final Map<String, List<Value>> values = new LinkedHashMap<>();

    private FigureProposal(Archive archive) {
        this.archive = archive;
    }

    /** A value to be set beside others: which input, which estimate, whether it was computed here. */
    private record Value(int input, String estimate, String label, boolean ours, String unit) {}

    /** An entry document of a new figure, without caption. */
    static JsonObject of(Archive archive, List<Hash> records) {
        FigureProposal proposal = new FigureProposal(archive);
        for (Hash record : records) {
            archive.record(record).ifPresent(view -> proposal.add(record, view));
        }
        proposal.compare();
        int panels = proposal.panels.size();
        int inRow = panels < 2 ? 1 : 2;
        JsonObject choices = JsonObject.EMPTY
                .with("method", "figure.table/1")
                .with("caption", "")
                .with("constants", "CODATA 2018")
                .with("widthMillimetres", panels < 2 ? 86 : 170)
                .with("heightMillimetres", 65.0 * ((panels + inRow - 1) / Math.max(1, inRow)))
                .with("panelsInRow", inRow)
                .with("panels", new JsonArray(proposal.panels));
        return JsonObject.EMPTY
                .with("kind", "figure")
                .with("inputs", new JsonArray(proposal.inputs))
                .with("choices", choices);
    }

    private void add(Hash record, RecordView view) {
        Optional<RecordKind> kind = archive.kinds().get(view.head().kind());
        Optional<Plottable> plottable = kind.flatMap(one -> one.facet(Plottable.class, view, archive.inputs(record)));
        Optional<Estimates> estimates = kind.flatMap(one -> one.facet(Estimates.class, view, archive.inputs(record)));
        boolean series = plottable.filter(one -> !one.series().isEmpty()).isPresent();
        if (!series && estimates.isEmpty()) {
            return;
        }
        int input = inputs.size();
        inputs.add(JsonObject.EMPTY.with("role", series ? "series" : "value").with("record", record.hex()));
        String words = kind.map(one -> one.title(view, archive.inputs(record)).text())
                .filter(text -> !text.isEmpty())
                .orElse(archive.label(record));
        plottable.filter(one -> series).ifPresent(one -> panels.add(panel(input, words, one)));
        estimates.ifPresent(one -> {
            for (int i = 0; i < one.names().size(); i++) {
                values.computeIfAbsent(dimension(one.units().get(i)), unit -> new ArrayList<>())
                        .add(new Value(
                                input,
                                one.names().get(i),
                                words,
                                series,
                                one.units().get(i)));
            }
        });
    }

    private JsonObject panel(int input, String words, Plottable plottable) {
        Plottable.Series first = plottable.series().get(0);
        List<Json> series = new ArrayList<>();
        for (Plottable.Sort sort : List.of(Plottable.Sort.BAND, Plottable.Sort.CURVE, Plottable.Sort.POINTS)) {
            for (Plottable.Series one : plottable.series()) {
                if (one.sort() == sort
                        && one.xUnit().equals(first.xUnit())
                        && one.yUnit().equals(first.yUnit())) {
                    series.add(series(input, one));
                }
            }
        }
        return JsonObject.EMPTY
                .with("name", name())
                .with("heading", words)
                .with("legend", Json.of(panels.isEmpty()))
                .with("x", axis(first.xName(), first.xUnit()))
                .with("y", axis(first.yName(), first.yUnit()))
                .with("series", new JsonArray(series));
    }

    private String name() {
        return String.valueOf((char) ('a' + Math.min(25, panels.size())));
    }

    private static JsonObject axis(String label, String unit) {
        return JsonObject.EMPTY.with("label", label).with("unit", unit);
    }

    private static JsonObject series(int input, Plottable.Series one) {
        boolean classical = one.name().startsWith("classical");
        boolean quantum = one.name().startsWith("quantum");
        JsonObject object = JsonObject.EMPTY
                .with("input", input)
                .with("series", one.name())
                .with("label", one.sort() == Plottable.Sort.BAND ? "" : one.label())
                .with("tone", classical ? "classical" : quantum ? "quantum" : "ink");
        return switch (one.sort()) {
            case POINTS -> object.with("shape", "dot");
            case CURVE -> classical ? object.with("stroke", "dashed") : object;
            case BAND -> object;
        };
    }

    /** Sets values of one dimension side by side where two records or more give one. */
    private void compare() {
        for (List<Value> all : values.values()) {
            long records = all.stream().map(Value::input).distinct().count();
            boolean scaled = dimensionless(all.get(0).unit());
            if (records < 2 || scaled || panels.size() >= 24) {
                continue;
            }
            String unit = shown(all.get(0).unit());
            List<Json> series = new ArrayList<>();
            int place = 1;
            for (Value value : all) {
                JsonObject object = JsonObject.EMPTY
                        .with("input", value.input())
                        .with("series", "value")
                        .with("estimate", value.estimate())
                        .with("label", value.label());
                series.add(
                        value.ours()
                                ? object.with("at", place)
                                        .with("tone", "ink")
                                        .with("shape", SHAPES.get((place - 1) % SHAPES.size()))
                                : object.with("tone", "quiet").with("stroke", "dotted"));
                place += value.ours() ? 1 : 0;
            }
            panels.add(JsonObject.EMPTY
                    .with("name", name())
                    .with("legend", Json.of(true))
                    .with(
                            "x",
                            axis(TEXTS.of("axis.record"), "1").with("from", 0).with("to", place))
                    .with("y", axis(spaced(all.get(0).estimate()), unit))
                    .with("series", new JsonArray(series)));
        }
    }

    private static String spaced(String name) {
        return name.replaceAll("([a-z0-9])([A-Z])", "$1 $2").toLowerCase(java.util.Locale.ROOT);
    }

    /** Units of one dimension answer the same, so that a value in m3 stands beside one in L. */
    private static String dimension(String unit) {
        return parsed(unit).map(Unit::siCode).orElse(unit);
    }

    private static boolean dimensionless(String unit) {
        return dimension(unit).equals(dimension("1"));
    }

    /** Volumes of molecules are read in cubic \u00e5ngstr\u00f6m; everything else in the unit it is given in. */
    private static String shown(String unit) {
        return dimension(unit).equals(dimension("m3")) ? "Ao3" : unit;
    }

    private static Optional<Unit> parsed(String unit) {
        try {
            return Optional.of(Units.parse(unit));
        } catch (ProblemException e) {
            return Optional.empty(); // a unit of a newer program: compared by its letters
        }
    }
}
