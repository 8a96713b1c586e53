package fringekeep.sample;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Tables of a compound: the atoms it is made of, and its masses in flight. */
final class CompoundTables {
    private CompoundTables() {}

    static List<FlatTable> of(RecordView record) {
        List<FlatTable> tables = new ArrayList<>();
        formula(record).ifPresent(formula -> tables.add(atoms(formula)));
        CompoundFacts.mass(record).ifPresent(mass -> tables.add(masses(mass)));
        return tables;
    }

    private static Optional<Formula> formula(RecordView record) {
        JsonObject composition = record.choices().object("composition").orElse(JsonObject.EMPTY);
        Optional<String> text = composition.text("formula").or(() -> composition.text("unit"));
        if (text.isEmpty()) {
            return Optional.empty();
        }
        try {
            return Optional.of(Formula.parse(text.get()));
        } catch (ProblemException e) {
            return Optional.empty(); // a formula this program cannot read has no atoms to list
        }
    }

    private static FlatTable atoms(Formula formula) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("atom", "Atom", "", "Element, or isotope with its nucleon number."),
                new FlatTable.FlatColumn("count", "Count", "1", "How many of them."),
                new FlatTable.FlatColumn("mass_u", "Mass", "u", "Standard atomic weight or isotope mass."),
                new FlatTable.FlatColumn("mass_deviation_u", "u", "u", "Standard uncertainty of the mass."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (Formula.Term term : formula.terms()) {
            Optional<Element.Weight> weight = FormulaMass.weight(term);
            rows.add(List.of(
                    Optional.of(term.atom()),
                    Optional.of(term.count()),
                    weight.map(known -> known.value().doubleValue()),
                    weight.map(Element.Weight::deviation)));
        }
        return new FlatTable("atoms", columns, rows);
    }

    private static FlatTable masses(MassFacet mass) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("mass_kg", "Mass in flight", "kg", "Mass of the particle as it flies."),
                new FlatTable.FlatColumn("share", "Share", "1", "Share of the particles with that mass."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        double[] nodes = mass.nodes();
        double[] weights = mass.weights();
        for (int i = 0; i < nodes.length; i++) {
            rows.add(List.of(Optional.of(nodes[i]), Optional.of(weights[i])));
        }
        return new FlatTable("masses", columns, rows);
    }
}
