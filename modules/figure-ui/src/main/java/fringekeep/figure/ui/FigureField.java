package fringekeep.figure.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.desk.look.Texts;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A line of the outline of a figure: a head, or one choice that can be changed.
 *
 * @param words what it is
 * @param pointer where it stands in the choices; for a head the panel or series it heads
 * @param sort how it is typed
 * @param options words that may be chosen, where only some may; for a series the record it is taken from
 */
record FigureField(String words, String pointer, Sort sort, List<String> options) {
    private static final Texts TEXTS = new Texts("fringekeep.figure.ui.Texts", FigureField.class);
    private static final List<String> TONES = List.of(
            "ink",
            "ink-second",
            "quiet",
            "quantum",
            "classical",
            "masked",
            "mark",
            "series-three",
            "series-four",
            "series-five",
            "series-six");
    private static final List<String> SHAPES =
            List.of("", "dot", "circle", "square", "triangle", "cross", "lozenge", "bar", "struck");
    private static final List<String> STROKES = List.of("", "solid", "dashed", "dotted");

    FigureField {
        options = List.copyOf(options);
    }

    /** How a line is typed. */
    enum Sort {
        /** Head of the figure's own lines, or of a panel. */
        HEAD,
        /** Head of a series. */
        SERIES,
        /** Words. */
        TEXT,
        /** Words that may be left out. */
        OPTIONAL_TEXT,
        /** A number. */
        NUMBER,
        /** A number that may be left out. */
        OPTIONAL_NUMBER,
        /** Yes or no. */
        FLAG,
        /** One of some words. */
        CHOICE
    }

    boolean head() {
        return sort == Sort.HEAD || sort == Sort.SERIES;
    }

    /** All lines of a draft. */
    static List<FigureField> of(FigureDraft draft) {
        List<FigureField> lines = new ArrayList<>();
        lines.add(new FigureField(TEXTS.of("figure"), "", Sort.HEAD, List.of()));
        add(lines, "title", "/title", Sort.OPTIONAL_TEXT);
        add(lines, "caption", "/caption", Sort.TEXT);
        add(lines, "width", "/widthMillimetres", Sort.NUMBER);
        add(lines, "height", "/heightMillimetres", Sort.NUMBER);
        add(lines, "row", "/panelsInRow", Sort.NUMBER);
        List<JsonObject> panels = draft.choices().array("panels").objects();
        for (int i = 0; i < panels.size(); i++) {
            panel(lines, draft, panels.get(i), "/panels/" + i);
        }
        return lines;
    }

    private static void panel(List<FigureField> lines, FigureDraft draft, JsonObject panel, String at) {
        lines.add(new FigureField(TEXTS.of("panel", panel.text("name").orElse("")), at, Sort.HEAD, List.of()));
        add(lines, "heading", at + "/heading", Sort.OPTIONAL_TEXT);
        for (String axis : List.of("x", "y")) {
            add(lines, axis + ".label", at + "/" + axis + "/label", Sort.TEXT);
            add(lines, axis + ".unit", at + "/" + axis + "/unit", Sort.TEXT);
            add(lines, axis + ".from", at + "/" + axis + "/from", Sort.OPTIONAL_NUMBER);
            add(lines, axis + ".to", at + "/" + axis + "/to", Sort.OPTIONAL_NUMBER);
            add(lines, axis + ".logarithmic", at + "/" + axis + "/logarithmic", Sort.FLAG);
        }
        add(lines, "legend", at + "/legend", Sort.FLAG);
        List<JsonObject> series = panel.array("series").objects();
        for (int i = 0; i < series.size(); i++) {
            series(lines, draft, series.get(i), at + "/series/" + i);
        }
    }

    private static void series(List<FigureField> lines, FigureDraft draft, JsonObject series, String at) {
        int input = (int) series.integer("input").orElse(0);
        String of = input < draft.sources().size() ? draft.sources().get(input).label() : "";
        String what = series.text("series").orElse("")
                + series.text("estimate").map(name -> " " + name).orElse("");
        lines.add(new FigureField(what, at, Sort.SERIES, List.of(of)));
        add(lines, "label", at + "/label", Sort.OPTIONAL_TEXT);
        lines.add(new FigureField(TEXTS.of("tone"), at + "/tone", Sort.CHOICE, TONES));
        lines.add(new FigureField(TEXTS.of("shape"), at + "/shape", Sort.CHOICE, SHAPES));
        lines.add(new FigureField(TEXTS.of("stroke"), at + "/stroke", Sort.CHOICE, STROKES));
        if (series.text("series").filter("value"::equals).isPresent()) {
            add(lines, "at", at + "/at", Sort.OPTIONAL_NUMBER);
        }
    }

    private static void add(List<FigureField> lines, String key, String pointer, Sort sort) {
        lines.add(new FigureField(TEXTS.of(key), pointer, sort, sort == Sort.FLAG ? List.of("no", "yes") : List.of()));
    }

    /** What stands in the line now. */
    String value(FigureDraft draft) {
        if (head()) {
            return String.join(", ", options);
        }
        Optional<Json> json = draft.get(pointer);
        if (sort == Sort.FLAG) {
            return json.filter(JsonBoolean.class::isInstance)
                            .map(JsonBoolean.class::cast)
                            .filter(JsonBoolean::value)
                            .isPresent()
                    ? "yes"
                    : "no";
        }
        return json.map(FigureField::written).orElse("");
    }

    private static String written(Json json) {
        if (json instanceof JsonText text) {
            return text.value();
        }
        if (json instanceof JsonNumber number) {
            double value = number.value();
            return value == Math.rint(value) && Math.abs(value) < 1e9
                    ? Long.toString((long) value)
                    : Double.toString(value);
        }
        return json.toString();
    }

    /**
     * What typed words mean; a decimal comma is taken.
     *
     * @return the value; empty where the line may be left out and is
     * @throws IllegalArgumentException with words if they mean nothing here
     */
    Optional<Json> typed(String text) {
        String words = text.strip();
        return switch (sort) {
            case TEXT -> Optional.of(Json.of(words));
            case OPTIONAL_TEXT, CHOICE -> words.isEmpty() ? Optional.empty() : Optional.of(Json.of(words));
            case FLAG -> Optional.of(Json.of(words.equals("yes")));
            case NUMBER -> Optional.of(Json.of(number(words)));
            case OPTIONAL_NUMBER -> words.isEmpty() ? Optional.empty() : Optional.of(Json.of(number(words)));
            case HEAD, SERIES -> Optional.empty();
        };
    }

    private static double number(String words) {
        try {
            double value = Double.parseDouble(words.replace(',', '.').replace('\u2212', '-'));
            if (Double.isFinite(value)) {
                return value;
            }
        } catch (NumberFormatException e) {
            throw new IllegalArgumentException(TEXTS.of("no.number", words), e);
        }
        throw new IllegalArgumentException(TEXTS.of("no.number", words));
    }
}
