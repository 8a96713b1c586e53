package fringekeep.fit;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.facet.Estimates;
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
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** Fit: the fringe of one or many scans. Computed. */
public final class FitKind implements RecordKind {
    /** Name of the kind. */
    public static final KindName NAME = new KindName("fit");

    private static final int MOST = 20_000;

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
        return SchemaResource.read(FitKind.class, "fit-" + number + ".schema.json");
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of(
                Role.offering("scan", CountTable.class, 1, MOST),
                Role.offering("reference", CountTable.class, 0, MOST),
                Role.offering("background", CountTable.class, 0, MOST),
                Role.of("placement", "placement", 1, MOST),
                Role.of("setup", "setup", 1, MOST).timed("scan"),
                Role.of("run", "source-run", 0, MOST),
                Role.of("batch", "batch", 0, MOST),
                Role.of("compound", "compound", 0, MOST),
                Role.of("calibration", "calibration", 0, MOST).timed("scan"),
                Role.of("mask", "judgement", 0, MOST),
                Role.of("notwithstanding", "judgement", 0, MOST));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return List.of();
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(FitComputation.INSTANCE);
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet == Estimates.class) {
            return FitReading.estimates(record.result(), inputs).map(facet::cast);
        }
        if (facet == FringeFacet.class) {
            return FringeFacts.of(record, inputs).map(facet::cast);
        }
        return Optional.empty();
    }

    @Override
    public List<Projection> projections() {
        return List.of(FitRows.TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return FitRows.of(record, inputs);
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        Optional<FringeFacet> fringe = FringeFacts.of(record, inputs);
        String visibility = fringe.map(each -> ValueText.estimate(
                        each.visibility().value(), each.visibility().deviation()))
                .map(text -> "visibility " + text)
                .orElse("no visibility");
        int scans = inputs.role("scan").size();
        String purpose = fringe.flatMap(FringeFacet::purpose)
                .map(each -> each.text().replace('-', ' ') + ", ")
                .orElse("");
        String count = scans == 1 ? "1 scan" : scans + " scans";
        return new Title(visibility, purpose + count + ", " + FringeFacts.channel(inputs));
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        return FitPicture.of(record, inputs).map(List::of).orElse(List.of());
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        return FitTables.of(record, inputs);
    }

    @Override
    public Optional<String> question(RecordView record, Inputs inputs) {
        return Optional.of(question(inputs));
    }

    /** Kind and the set of scan things with channel under role scan, ascending. */
    static String question(Inputs inputs) {
        List<String> asked = new ArrayList<>();
        for (Input scan : inputs.role("scan")) {
            String thing = scan.record()
                    .map(record -> record.head().thing().hex())
                    .orElse(scan.target().hex());
            asked.add(thing + " " + scan.channel().orElse("counts"));
        }
        return question(asked);
    }

    /** The same from texts {@code thing channel}. */
    static String question(List<String> asked) {
        return "fit " + String.join("; ", asked.stream().sorted().distinct().toList());
    }
}
