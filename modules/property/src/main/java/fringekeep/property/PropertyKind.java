package fringekeep.property;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.facet.Estimates;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import fringekeep.property.internal.PolarizabilityComputation;
import fringekeep.property.internal.PropertyFacets;
import fringekeep.property.internal.PropertyPicture;
import fringekeep.property.internal.PropertyRows;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;

/** A molecular property derived from fits. */
public final class PropertyKind implements RecordKind {
    private static final KindName NAME = new KindName("property");

    private final JsonObject schema = SchemaResource.read(PropertyKind.class, "property-1.schema.json");
    private final Computation computation = new PolarizabilityComputation();

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
        return schema;
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of(
                Role.of("selection", "selection", 0, 20),
                Role.of("fit", "fit", 0, 10_000),
                Role.offering("velocity", Distribution.class, 1, 20),
                Role.of("compound", "compound", 1, 1),
                Role.of("calibration", "calibration", 0, 20),
                Role.of("quoted", "quoted", 0, 20),
                Role.of("notwithstanding", "judgement", 0, 1000));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(computation);
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        List<Problem> problems = new ArrayList<>();
        if (inputs.role("selection").isEmpty() && inputs.role("fit").isEmpty()) {
            problems.add(new Problem(
                    "property.no-fits", "No fit is pinned.", "/inputs", "Pin a selection of fits, or fits."));
        }
        Optional<JsonObject> search = parts.get(PartName.CHOICES).flatMap(choices -> choices.object("search"));
        if (search.isPresent()
                && search.get().number("from").orElse(0)
                        >= search.get().number("to").orElse(0)) {
            problems.add(new Problem(
                    "property.empty-search",
                    "The search range ends before it begins.",
                    "/choices/search",
                    "Let from be less than to."));
        }
        boolean held = parts.get(PartName.CHOICES)
                .filter(choices -> choices.text("visibility").orElse("").equals("relative"))
                .flatMap(choices -> choices.object("factor"))
                .map(factor -> factor.text("sort").orElse("").equals("given"))
                .orElse(false);
        if (held) {
            problems.add(new Problem(
                    "property.relative-factor",
                    "Visibilities are taken relative to references, whose own visibility is part of the factor.",
                    "/choices/factor",
                    "Let the factor be free, or take visibilities as fitted."));
        }
        return problems;
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (record.part(PartName.RESULT).isEmpty()) {
            return Optional.empty();
        }
        if (facet == Estimates.class) {
            return Optional.of(facet.cast(PropertyFacets.estimates(record)));
        }
        if (facet == StatedUnits.class) {
            return Optional.of(facet.cast(new StatedUnits(PropertyFacets.units())));
        }
        if (facet == Plottable.class) {
            try {
                return Optional.of(facet.cast(PropertyFacets.plottable(record)));
            } catch (ProblemException e) {
                // its payloads are not at hand: check names them, and who asks for a series hears that there is none
                return Optional.empty();
            }
        }
        return Optional.empty();
    }

    /** Method family and what it rests on: two properties that answer the same are rivals. */
    @Override
    public Optional<String> question(RecordView record, Inputs inputs) {
        String method = record.choices().text("method").orElse("");
        String family = method.contains("/") ? method.substring(0, method.indexOf('/')) : method;
        TreeSet<String> things = new TreeSet<>();
        for (Input input : inputs.all()) {
            if (input.role().equals("selection") || input.role().equals("fit")) {
                input.record().ifPresent(view -> things.add(view.head().thing().hex()));
            }
        }
        return Optional.of(family + " " + String.join(" ", things));
    }

    @Override
    public List<Projection> projections() {
        return List.of(PropertyRows.PROPERTIES);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return Stream.of(PropertyRows.row(record, inputs));
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        return PropertyRows.title(record, inputs);
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        try {
            return record.part(PartName.RESULT).isEmpty()
                    ? List.of()
                    : List.of(PropertyPicture.of(PropertyFacets.plottable(record)));
        } catch (ProblemException e) {
            // payloads are not at hand; check names them
            return List.of();
        }
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        return PropertyRows.tables(record);
    }
}
