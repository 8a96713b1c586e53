package fringekeep.desk.pane;

import fringekeep.archive.kind.FlatTable;
import fringekeep.drawing.NumberText;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.UnaryOperator;

/** A kind's table as cells: units in heads, with one prefix a column; rows of mixed units keep what the kind says. */
final class TableReading {
    private final FlatTable table;
    private final UnaryOperator<String> called;
    private final List<FactUnits.Sized> units = new ArrayList<>();

    /**
     * Reads a table.
     *
     * @param called what texts are called: fingerprints by label
     */
    TableReading(FlatTable table, UnaryOperator<String> called) {
        this.table = table;
        this.called = called;
        for (int column = 0; column < table.columns().size(); column++) {
            String unit = table.columns().get(column).unit();
            String shown = unit.isEmpty() ? "" : FactUnits.shown(unit);
            units.add(FactUnits.sized(shown, largest(column)));
        }
    }

    private double largest(int column) {
        return table.rows().stream()
                .map(row -> row.get(column))
                .flatMap(Optional::stream)
                .filter(Double.class::isInstance)
                .mapToDouble(value -> Math.abs((Double) value))
                .filter(Double::isFinite)
                .max()
                .orElse(0);
    }

    PageTable page(String heading, boolean late) {
        List<String> heads = new ArrayList<>();
        List<Boolean> right = new ArrayList<>();
        for (int column = 0; column < table.columns().size(); column++) {
            String label = table.columns().get(column).label();
            String unit = units.get(column).shown();
            String small = label.length() > 1 && Character.isLowerCase(label.charAt(1))
                    ? label.substring(0, 1).toLowerCase(Locale.ROOT) + label.substring(1)
                    : label;
            heads.add(unit.isEmpty() ? small : small + " / " + unit);
            int here = column;
            right.add(table.rows().stream()
                    .map(row -> row.get(here))
                    .flatMap(Optional::stream)
                    .anyMatch(Number.class::isInstance));
        }
        List<List<String>> rows = new ArrayList<>();
        for (List<Optional<Object>> row : table.rows()) {
            List<String> cells = new ArrayList<>();
            for (int column = 0; column < row.size(); column++) {
                cells.add(cell(row, column));
            }
            rows.add(cells);
        }
        return new PageTable(heading, heads, right, rows, late);
    }

    /** Uncertainties have two digits, values as many as the uncertainty of their row says. */
    private String cell(List<Optional<Object>> row, int column) {
        Optional<Object> cell = row.get(column);
        if (cell.isEmpty()) {
            return "\u2013";
        }
        Object value = cell.get();
        if (value instanceof Double number) {
            double shown = units.get(column).of(number);
            if (uncertain(column)) {
                return NumberText.significant(shown, 2);
            }
            double u = named(column, "value") ? combined(row) : Double.NaN;
            return u > 0
                    ? NumberText.measured(shown, u).replaceFirst("\\([0-9.]+\\)", "")
                    : NumberText.significant(shown, 5);
        }
        return value instanceof Number whole ? NumberText.count(whole.longValue()) : called.apply(value.toString());
    }

    private boolean named(int column, String name) {
        return table.columns().get(column).name().equals(name);
    }

    private boolean uncertain(int column) {
        String label = table.columns().get(column).label();
        return label.equals("u") || label.endsWith(" u") || label.startsWith("part of u");
    }

    private double combined(List<Optional<Object>> row) {
        for (int column = 0; column < row.size(); column++) {
            if (named(column, "combined_u") && row.get(column).orElse(0.0) instanceof Double u) {
                return u;
            }
        }
        return Double.NaN;
    }
}
