package fringekeep.scan;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.scan.internal.Rows;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Stream;

/** Placement: where one scan belongs and what it was taken for. Entered by people, one for each scan. */
public final class PlacementKind implements RecordKind {
    /** Name of the kind. */
    public static final KindName NAME = new KindName("placement");

    private static final int MOST_VELOCITIES = 1_000;

    private static final Projection TABLE = new Projection(
            "placement",
            NAME,
            List.of(
                    Column.hash("scan", "scan"),
                    Column.text("purpose", "role"),
                    Column.integer("step", "step"),
                    Column.real("step_value_si", "step value", "", ""),
                    Column.text("step_shown", "step value"),
                    Column.hash("setup", "setup"),
                    Column.hash("run", "run"),
                    Column.hash("series", "series"),
                    Column.hash("batch", "batch")),
            List.of(List.of("scan"), List.of("purpose")));

    @Override
    public KindName kind() {
        return NAME;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return SchemaResource.read(PlacementKind.class, "placement-" + number + ".schema.json");
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(
                Role.of("scan", "scan", 1, 1),
                Role.of("setup", "setup", 1, 1),
                Role.of("run", "source-run", 0, 1),
                Role.of("velocity", "velocity", 0, MOST_VELOCITIES),
                Role.of("series", "series", 0, 1),
                Role.of("batch", "batch", 0, 1));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        JsonObject content = parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY);
        List<Problem> problems = new ArrayList<>();
        for (int i = 0; i < inputs.about().size(); i++) {
            Subject subject = inputs.about().get(i);
            if (subject.reach() != AboutReference.Reach.THING) {
                problems.add(ScanProblems.of("placement.reach", "/about/" + i, subject.role()));
            }
        }
        step(content, inputs).ifPresent(problems::add);
        batch(inputs).ifPresent(problems::add);
        return problems;
    }

    private static Optional<Problem> step(JsonObject content, Inputs inputs) {
        OptionalLong step = content.integer("step");
        List<Subject> series = inputs.about("series");
        if (step.isEmpty()) {
            return Optional.empty();
        }
        if (series.isEmpty()) {
            return Optional.of(ScanProblems.of("placement.step-alone", "/content/step"));
        }
        Optional<RecordView> record = series.get(0).record();
        int steps =
                record.map(view -> view.content().array("steps").items().size()).orElse(Integer.MAX_VALUE);
        return step.getAsLong() < steps
                ? Optional.empty()
                : Optional.of(ScanProblems.of("placement.step-missing", "/content/step", step.getAsLong(), steps - 1));
    }

    /** The batch stands here only where the run names none or several. */
    private static Optional<Problem> batch(Inputs inputs) {
        List<Subject> run = inputs.about("run");
        boolean told = !run.isEmpty() && run.get(0).inputs().about("batch").size() == 1;
        return told && !inputs.about("batch").isEmpty()
                ? Optional.of(ScanProblems.of("placement.batch-twice", "/about"))
                : Optional.empty();
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet != PlacementFacet.class) {
            return Optional.empty();
        }
        JsonObject content = record.content();
        Optional<PlacementFacet.Purpose> purpose = content.text("purpose").flatMap(PlacementFacet.Purpose::of);
        OptionalInt step = content.integer("step").isPresent()
                ? OptionalInt.of((int) content.integer("step").getAsLong())
                : OptionalInt.empty();
        return purpose.map(known -> facet.cast(new PlacementFacet(known, step, stepSetting(content, inputs))));
    }

    private static Optional<SettingsFacet.Setting> stepSetting(JsonObject content, Inputs inputs) {
        Optional<JsonObject> series = inputs.about("series").stream()
                .findFirst()
                .flatMap(Subject::record)
                .map(RecordView::content);
        OptionalLong step = content.integer("step");
        if (series.isEmpty() || step.isEmpty()) {
            return Optional.empty();
        }
        List<JsonObject> steps = series.get().array("steps").objects();
        return step.getAsLong() < steps.size()
                ? steps.get((int) step.getAsLong())
                        .object("quantity")
                        .map(quantity -> Settings.of(series.get().text("varied").orElse(""), quantity))
                : Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        Optional<SettingsFacet.Setting> step = stepSetting(content, inputs);
        return Stream.of(new Rows()
                .hash("scan", target(record, "scan"))
                .text("purpose", content.text("purpose"))
                .integer("step", content.integer("step"))
                .real("step_value_si", step.map(SettingsFacet.Setting::value).orElse(Double.NaN))
                .text("step_shown", step.map(SettingsFacet.Setting::shown))
                .hash("setup", target(record, "setup"))
                .hash("run", target(record, "run"))
                .hash("series", target(record, "series"))
                .hash("batch", target(record, "batch"))
                .row());
    }

    private static Optional<Hash> target(RecordView record, String role) {
        return record.head().about().stream()
                .filter(reference -> reference.role().equals(role))
                .map(AboutReference::record)
                .findFirst();
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        String purpose = record.content().text("purpose").orElse("").replace('-', ' ');
        Optional<SettingsFacet.Setting> step = stepSetting(record.content(), inputs);
        String text = step.map(setting -> purpose + " at " + setting.shown()).orElse(purpose);
        return new Title(text, step.map(SettingsFacet.Setting::name).orElse(""));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return record.content().text("purpose").stream();
    }
}
