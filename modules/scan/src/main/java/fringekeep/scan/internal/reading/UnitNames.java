package fringekeep.scan.internal.reading;

import fringekeep.scan.internal.reading.ProfileColumn.Role;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Compares units that a file writes behind its column names, as in {@code pos/nm} or {@code pos (nm)}, with the profile's. */
final class UnitNames {
    private static final Pattern WRITTEN =
            Pattern.compile("[^/(\\[]{1,100}(?:/\\s*(\\S{1,20})|[(\\[]\\s*([^)\\]]{1,20})\\s*[)\\]])");

    private final Profile profile;
    private final List<Field> names;

    UnitNames(Profile profile, Section section) {
        this.profile = profile;
        this.names = section.names().isEmpty()
                ? List.of()
                : new FieldSplitter(profile.delimiter())
                        .split(section.names().get(0).text());
    }

    /** Findings for columns whose written unit is a known one and not the profile's. */
    List<Finding> differing() {
        List<Finding> findings = new ArrayList<>();
        for (int i = 0; i < profile.columns().size(); i++) {
            ProfileColumn column = profile.columns().get(i);
            Optional<String> written = name(column, i).flatMap(UnitNames::unit);
            boolean differs = written.flatMap(ColumnUnit::written)
                    .filter(unit -> !unit.equals(column.unit()))
                    .isPresent();
            if (differs && column.role() != Role.UNUSED) {
                findings.add(Finding.of("wrong-unit-suspected")
                        .column(column.tableName())
                        .text(written.orElseThrow()));
            }
        }
        return findings;
    }

    private Optional<String> name(ProfileColumn column, int index) {
        if (column.header().isPresent()) {
            String wanted = column.header().get();
            return names.stream()
                    .map(Field::text)
                    .filter(wanted::equalsIgnoreCase)
                    .findFirst();
        }
        int place = column.number().orElse(index + 1) - 1;
        return place < names.size() ? Optional.of(names.get(place).text()) : Optional.empty();
    }

    private static Optional<String> unit(String name) {
        Matcher matcher = WRITTEN.matcher(name);
        if (!matcher.matches()) {
            return Optional.empty();
        }
        return Optional.of(matcher.group(1) != null ? matcher.group(1) : matcher.group(2));
    }
}
