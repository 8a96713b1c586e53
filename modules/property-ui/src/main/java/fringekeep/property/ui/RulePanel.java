package fringekeep.property.ui;

import fringekeep.archive.listing.Column;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.desk.part.FieldRow;
import fringekeep.property.ui.PropertyPlan.Bounds;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.function.UnaryOperator;

/** The rule: one field a column of the list of fits, the short name of the list, the rule in words. */
@SuppressWarnings("serial")
final class RulePanel extends RowsPanel {
    static final int INDENT = 130;

    private final transient Supplier<PropertyPlan> plan;

    /** Tells changes of the plan. */
    interface Ear {
        void change(UnaryOperator<PropertyPlan> how);
    }

    RulePanel(Supplier<PropertyPlan> plan, Ear ear, List<Column> columns) {
        this.plan = plan;
        setName("property.rule");
        for (Column column : columns) {
            column(column, ear);
        }
        FieldRow label = FieldRow.any(
                "property.label",
                text("label"),
                text("label.hint"),
                INDENT,
                written -> ear.change(now -> now.label(written)));
        add("list", label, () -> true, () -> label.show(plan.get().label()));
        FieldRow words = FieldRow.any(
                "property.words",
                text("words"),
                text("words.hint"),
                INDENT,
                written -> ear.change(now -> now.words(written)));
        add("list", words, () -> true, () -> words.show(plan.get().words()));
        refresh();
    }

    private static String text(String key) {
        return PropertyWords.TEXTS.of(key);
    }

    private void column(Column column, Ear ear) {
        boolean number = column.sort() != Column.Sort.TEXT;
        Unit unit = Units.of(column.shownUnit().isEmpty() ? "1" : column.shownUnit());
        boolean pure = unit.code().equals("1");
        String hint = number ? (pure ? "" : unit.shown() + "; ") + text("rule.hint") : text("rule.is");
        FieldRow row = new FieldRow(
                "rule." + column.name(), column.label(), hint, INDENT, written -> entered(column, unit, ear, written));
        add("rule", row, () -> true, () -> row.show(written(column, unit)));
    }

    private String written(Column column, Unit unit) {
        Bounds bounds = plan.get().conditions().get(column.name());
        if (bounds == null) {
            return "";
        }
        String ending = " " + unit.shown();
        return bounds.written().endsWith(ending)
                ? bounds.written().substring(0, bounds.written().length() - ending.length())
                : bounds.written();
    }

    private static String entered(Column column, Unit unit, Ear ear, String written) {
        if (written.isEmpty()) {
            ear.change(now -> now.without(column.name()));
            return "";
        }
        Optional<Bounds> bounds = column.sort() == Column.Sort.TEXT
                ? Optional.of(BoundsText.text(written))
                : BoundsText.number(written, unit);
        bounds.ifPresent(bound -> ear.change(now -> now.condition(column.name(), bound)));
        return bounds.isPresent() ? "" : PropertyWords.TEXTS.of("rule.fault", written);
    }
}
