package fringekeep.instrument;

import fringekeep.archive.kind.FlatTable;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Tables of a setup: its gratings, and the distances between them. */
final class SetupTables {
    private SetupTables() {}

    static List<FlatTable> of(SetupFacet setup) {
        List<FlatTable> tables = new ArrayList<>();
        if (!setup.gratings().isEmpty()) {
            tables.add(gratings(setup));
        }
        if (!setup.separations().isEmpty()) {
            tables.add(separations(setup));
        }
        return tables;
    }

    private static FlatTable gratings(SetupFacet setup) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("sort", "Sort", "", "What the grating is made of."),
                new FlatTable.FlatColumn("name", "Name", "", "What people call it."),
                new FlatTable.FlatColumn("period_m", "Period", "m", "Period; of light half the wavelength."),
                new FlatTable.FlatColumn("period_u_m", "u", "m", "Standard uncertainty of the period."),
                new FlatTable.FlatColumn("open_fraction", "Open fraction", "1", "Slit opening over period."),
                new FlatTable.FlatColumn("wavelength_m", "Wavelength", "m", "Vacuum wavelength of the laser."),
                new FlatTable.FlatColumn("power_w", "Power", "W", "Incident power of the laser, single pass."),
                new FlatTable.FlatColumn("waist_across_m", "Waist across", "m", "1/e² intensity radius w_y."),
                new FlatTable.FlatColumn("waist_along_m", "Waist along", "m", "1/e² intensity radius w_z."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (Grating grating : setup.gratings()) {
            rows.add(List.of(
                    Optional.of(grating.sort().words()),
                    grating.name().isEmpty() ? Optional.empty() : Optional.of(grating.name()),
                    value(grating.period()),
                    deviation(grating.period()),
                    value(grating.openFraction()),
                    value(grating.laser().map(Laser::wavelength)),
                    value(grating.laser().flatMap(Laser::power)),
                    value(grating.laser().flatMap(Laser::waistAcross)),
                    value(grating.laser().flatMap(Laser::waistAlong))));
        }
        return new FlatTable("gratings", columns, rows);
    }

    private static FlatTable separations(SetupFacet setup) {
        List<FlatTable.FlatColumn> columns = List.of(
                new FlatTable.FlatColumn("separation_m", "Separation", "m", "Distance to the next grating."),
                new FlatTable.FlatColumn("separation_u_m", "u", "m", "Standard uncertainty of the distance."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        for (Entered separation : setup.separations()) {
            rows.add(List.of(value(Optional.of(separation)), deviation(Optional.of(separation))));
        }
        return new FlatTable("separations", columns, rows);
    }

    private static Optional<Object> value(Optional<Entered> entered) {
        return entered.map(Entered::si);
    }

    private static Optional<Object> deviation(Optional<Entered> entered) {
        return entered.filter(value -> value.deviation().isPresent())
                .map(value -> value.deviation().getAsDouble());
    }
}
