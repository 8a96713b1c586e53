package fringekeep.property.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.Hash;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.WordChoice;
import fringekeep.drawing.NumberText;
import fringekeep.property.ui.RulePanel.Ear;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BooleanSupplier;
import java.util.function.Supplier;

/** All choices of method property.polarizability-power/1, each with what is usual. */
@SuppressWarnings("serial")
final class PropertyChoices extends RowsPanel {
    private static final int INDENT = RulePanel.INDENT;

    private final transient Supplier<PropertyPlan> plan;
    private final transient Ear ear;

    PropertyChoices(Supplier<PropertyPlan> plan, Ear ear, Supplier<List<Hash>> offered) {
        this.plan = plan;
        this.ear = ear;
        setName("property.choices");
        words("model", "description", "quantum", "quantum", "classical");
        words("model", "recoil", "standing-mode-coherent", "standing-mode-coherent", "random-walk");
        words("model", "crossSection.sort", "none", "none", "free", "given");
        number("model", "crossSection.si", "m2", () -> is("crossSection.sort", "given"));
        words("model", "factor.sort", "free", "free", "given");
        number("model", "factor.value", "1", () -> is("factor.sort", "given"));
        words("data", "bias", "noise-subtracted", "noise-subtracted", "none");
        words("data", "visibility", "as-fitted", "as-fitted", "relative");
        words("data", "powers", "independent", "independent", "together", "as-read");
        text("data", "powerSetting");
        number("answer", "search.from", "Ao3", () -> true);
        number("answer", "search.to", "Ao3", () -> true);
        number("answer", "threshold", "1", () -> true);
        number("answer", "level", "1", () -> true);
        whole("answer", "heightNodes");
        whole("answer", "bootstrap.resamples");
        whole("answer", "seed");
        WordChoice quoted = new WordChoice(
                "property.quoted",
                label("quoted"),
                PropertyWords.words("quoted", List.of("no", "yes")),
                "no",
                INDENT,
                code -> ear.change(now -> now.quoted(code.equals("yes") ? offered.get() : List.of())));
        add(
                "answer",
                quoted,
                () -> !offered.get().isEmpty(),
                () -> quoted.show(plan.get().quoted().isEmpty() ? "no" : "yes"));
        refresh();
    }

    private static String label(String path) {
        return PropertyWords.TEXTS.of("choice." + path);
    }

    private static String hint(String path) {
        return PropertyWords.TEXTS.orElse("choice." + path + ".hint", "");
    }

    private boolean is(String path, String code) {
        return plan.get().text(path).equals(Optional.of(code));
    }

    private void words(String head, String path, String usual, String... codes) {
        WordChoice choice = new WordChoice(
                "property." + path,
                label(path),
                PropertyWords.words(path, List.of(codes)),
                usual,
                INDENT,
                code -> ear.change(now -> chosen(now, path, code, usual)));
        add(head, choice, () -> true, () -> choice.show(plan.get().text(path).orElse(usual)));
    }

    private static PropertyPlan chosen(PropertyPlan now, String path, String code, String usual) {
        PropertyPlan cleared =
                path.endsWith(".sort") ? now.choices(now.choices().without(path.substring(0, path.indexOf('.')))) : now;
        return cleared.with(path, code.equals(usual) ? Optional.empty() : Optional.of(Json.of(code)));
    }

    private void text(String head, String path) {
        FieldRow row = FieldRow.any(
                "property." + path,
                label(path),
                hint(path),
                INDENT,
                written -> ear.change(
                        now -> now.with(path, written.isEmpty() ? Optional.empty() : Optional.of(Json.of(written)))));
        add(head, row, () -> true, () -> row.show(plan.get().text(path).orElse("")));
    }

    private void number(String head, String path, String unit, BooleanSupplier seen) {
        Unit shown = Units.of(unit);
        FieldRow row = new FieldRow("property." + path, label(path), hint(path), INDENT, written -> {
            Optional<BigDecimal> number = read(written);
            if (number.isEmpty() && !written.isEmpty()) {
                return PropertyWords.TEXTS.of("not-a-number", written);
            }
            ear.change(now -> now.with(path, number.map(value -> Json.of(shown.toSi(value)))));
            return "";
        });
        add(head, row, seen, () -> row.show(shown(plan.get().number(path), shown)));
    }

    private void whole(String head, String path) {
        FieldRow row = new FieldRow("property." + path, label(path), hint(path), INDENT, written -> {
            Optional<BigDecimal> number = read(written);
            boolean whole =
                    number.isPresent() && number.get().stripTrailingZeros().scale() <= 0;
            if (!whole && !written.isEmpty()) {
                return PropertyWords.TEXTS.of("not-whole", written);
            }
            ear.change(now -> now.with(path, number.map(value -> Json.of(value.doubleValue()))));
            return "";
        });
        add(head, row, () -> true, () -> row.show(shown(plan.get().number(path), Units.of("1"))));
    }

    private static Optional<BigDecimal> read(String written) {
        try {
            return Optional.of(new BigDecimal(written.replace('\u2212', '-').replace(',', '.')));
        } catch (NumberFormatException e) {
            return Optional.empty(); // the row says so
        }
    }

    private static String shown(OptionalDouble si, Unit unit) {
        return si.isEmpty()
                ? ""
                : NumberText.significant(unit.fromSi(si.getAsDouble()), 9).replace("\u2009", "");
    }
}
