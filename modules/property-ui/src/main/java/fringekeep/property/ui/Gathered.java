package fringekeep.property.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.facet.Estimates;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.ThingId;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Tone;
import fringekeep.fit.FringeFacet;
import fringekeep.property.ChooseFits;
import fringekeep.property.RerunSelection;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * The fits a plan names, and what is known around them.
 *
 * @param lines fits taken and left out, in one list
 * @param taken how many are taken
 * @param quoted quoted values of the same compound
 * @param difference what the rule of the recorded selection would give now; empty words for no difference
 */
record Gathered(List<Line> lines, int taken, List<Quoted> quoted, String difference) {
    private static final Set<Column.Sort> RULED = Set.of(Column.Sort.TEXT, Column.Sort.REAL, Column.Sort.INTEGER);

    Gathered {
        lines = List.copyOf(lines);
        quoted = List.copyOf(quoted);
    }

    /**
     * A fit.
     *
     * @param fit its record
     * @param label what people call it
     * @param power laser power / W
     * @param visibility with its uncertainty
     * @param numbers power (W), visibility, its standard uncertainty; NaN where not known
     * @param reason code why it is left out; empty where it is taken
     * @param byHand whether a person left it out
     */
    record Line(
            Hash fit, String label, String power, String visibility, double[] numbers, String reason, boolean byHand) {}

    /**
     * A quoted value.
     *
     * @param record its record
     * @param label what people call it
     * @param how computed or measured, and by whom
     * @param value as quoted
     * @param volume polarizability volume and its uncertainty (m3), NaN where it is another sort of value
     */
    record Quoted(Hash record, String label, String how, String value, double[] volume) {}

    /** Columns of the list of fits that a rule may speak of: texts and numbers. */
    static List<Column> columns(Archive archive) {
        return archive.kinds().get(new KindName("fit")).map(RecordKind::projections).orElse(List.of()).stream()
                .findFirst()
                .map(projection -> projection.columns().stream()
                        .filter(column -> column.deviationOf().isEmpty() && RULED.contains(column.sort()))
                        .toList())
                .orElse(List.of());
    }

    /** Reads; asks the archive. */
    static Gathered read(Archive archive, PropertyPlan plan) throws ProblemException {
        ChooseFits.Choice choice = plan.choice();
        ChooseFits.Chosen chosen = new ChooseFits(archive).resolve(choice);
        List<Line> lines = new ArrayList<>();
        Set<ThingId> compounds = new LinkedHashSet<>();
        for (Hash fit : chosen.taken()) {
            lines.add(line(archive, fit, "", choice));
            compounds(archive, fit, compounds);
        }
        for (Hash fit : chosen.left().keySet()) {
            lines.add(line(archive, fit, chosen.left().get(fit), choice));
        }
        return new Gathered(
                lines, chosen.taken().size(), quoted(archive, compounds), difference(archive, plan.selection()));
    }

    private static Line line(Archive archive, Hash fit, String reason, ChooseFits.Choice choice) {
        Optional<FringeFacet> fringe = archive.record(fit)
                .flatMap(view -> archive.kinds()
                        .get(view.head().kind())
                        .flatMap(kind -> kind.facet(FringeFacet.class, view, archive.inputs(fit))));
        String power = fringe.flatMap(FringeFacet::power)
                .map(value -> ValueText.number(value.value()))
                .orElse("\u2013");
        String visibility = fringe.map(each -> ValueText.estimate(
                        each.visibility().value(), each.visibility().deviation()))
                .orElse("\u2013");
        double[] numbers = {
            fringe.flatMap(FringeFacet::power).map(FringeFacet.Value::value).orElse(Double.NaN),
            fringe.map(each -> each.visibility().value()).orElse(Double.NaN),
            fringe.map(each -> each.visibility().deviation()).orElse(Double.NaN)
        };
        return new Line(
                fit,
                archive.label(fit),
                power,
                visibility,
                numbers,
                reason,
                choice.byHand().containsKey(fit));
    }

    private static void compounds(Archive archive, Hash fit, Set<ThingId> things) {
        for (InputReference input : archive.record(fit).orElseThrow().head().inputs()) {
            if (input instanceof InputReference.OfRecord of && of.role().equals("compound")) {
                archive.record(of.record()).map(view -> view.head().thing()).ifPresent(things::add);
            }
        }
    }

    private static List<Quoted> quoted(Archive archive, Set<ThingId> compounds) {
        List<Quoted> found = new ArrayList<>();
        for (Hash record : archive.records("quoted", 1, 10_000)) {
            boolean current = archive.graph().current(record).equals(Optional.of(record));
            archive.record(record)
                    .filter(view -> current && speaksOf(archive, view, compounds))
                    .ifPresent(view -> found.add(quoted(archive, view)));
        }
        return found;
    }

    private static boolean speaksOf(Archive archive, RecordView quoted, Set<ThingId> compounds) {
        return quoted.head().about().stream()
                .filter(about -> about.role().equals("compound"))
                .map(AboutReference::record)
                .flatMap(compound -> archive.record(compound).stream())
                .anyMatch(compound -> compounds.contains(compound.head().thing()));
    }

    private static Quoted quoted(Archive archive, RecordView view) {
        JsonObject content = view.content();
        Hash record = view.fingerprint();
        Optional<RecordKind> kind = archive.kinds().get(view.head().kind());
        String value = kind.map(each -> each.title(view, archive.inputs(record)).detail())
                .orElse("");
        double[] volume = kind.filter(each -> content.text("what").equals(Optional.of("polarizability-volume")))
                .flatMap(each -> each.facet(Estimates.class, view, archive.inputs(record)))
                .map(estimates -> new double[] {estimates.values()[0], Math.sqrt(estimates.covariance(0, 0))})
                .orElse(new double[] {Double.NaN, Double.NaN});
        String how =
                content.text("how").orElse("") + ", " + content.text("source").orElse("");
        return new Quoted(record, archive.label(record), how, value, volume);
    }

    private static String difference(Archive archive, Optional<Hash> selection) throws ProblemException {
        if (selection.isEmpty()) {
            return "";
        }
        RerunSelection.Difference difference = new RerunSelection(archive).difference(selection.get());
        return difference.none()
                ? ""
                : PropertyWords.TEXTS.of(
                        "rerun",
                        difference.nowChosen().size(),
                        difference.noLonger().size());
    }

    /** The points alone: visibility against power, those left out struck through. */
    Picture picture() {
        List<Layer> layers = new ArrayList<>();
        layers.add(points(lines.stream().filter(line -> line.reason().isEmpty()).toList(), true));
        List<Line> left =
                lines.stream().filter(line -> !line.reason().isEmpty()).toList();
        if (!left.isEmpty()) {
            layers.add(points(left, false));
        }
        Axis y = new Axis("visibility", "", false, OptionalDouble.of(0), OptionalDouble.empty());
        Axis x = new Axis("laser power", "W", false, OptionalDouble.of(0), OptionalDouble.empty());
        return new Picture("", 140, 90, 1, List.of(new Panel("", "", x, y, layers, 1, true)));
    }

    private static Layer points(List<Line> shown, boolean taken) {
        List<double[]> known = shown.stream()
                .map(Line::numbers)
                .filter(each -> Double.isFinite(each[0]) && Double.isFinite(each[1]))
                .toList();
        return new Layer.Points(
                PropertyWords.TEXTS.of(taken ? "points.taken" : "points.left"),
                taken ? Tone.INK : Tone.QUIET,
                taken ? Shape.DOT : Shape.STRUCK,
                known.stream().mapToDouble(each -> each[0]).toArray(),
                known.stream().mapToDouble(each -> each[1]).toArray(),
                known.stream().mapToDouble(each -> each[2]).toArray());
    }

    /** How far a quoted volume lies from ours, in our standard uncertainties joined with its own. */
    static String apart(double[] ours, Quoted quoted) {
        double theirs = Double.isNaN(quoted.volume()[1]) ? 0 : quoted.volume()[1];
        double u = Math.sqrt(ours[1] * ours[1] + theirs * theirs);
        double apart = (quoted.volume()[0] - ours[0]) / u;
        return Double.isFinite(apart)
                ? (apart > 0 ? "+" : "") + fringekeep.drawing.NumberText.fixed(apart, 1) + " \u03c3"
                : "";
    }

    /** Unit in which volumes are shown. */
    static String volume(double[] ours) {
        return ValueText.estimate(ours[0], ours[1], Units.of("Ao3"));
    }
}
