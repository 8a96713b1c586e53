package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeSet;

/**
 * A reading profile with its defaults written out.
 *
 * @param encoding name of the encoding
 * @param delimiter one character, or {@link #WHITE_SPACE}
 * @param decimal decimal sign
 * @param skip header lines before the first row
 * @param comment what begins a comment line, or empty
 * @param dataMarker line after which the header ends, or empty
 * @param sectionMarker what begins a section, or empty
 * @param columns columns of a row
 * @param exposure exposure (s) where neither column nor header holds one
 * @param total whether an exposure is that of the whole section
 * @param shots shots of each row
 * @param absent fields that say there is no value
 * @param dropFirst dead rows at the begin
 * @param dropLast dead rows at the end
 * @param rows rows of a complete section
 * @param dropUnfinished whether an unfinished last line is left out instead of refused
 * @param direction how the first axis runs
 * @param driftLimit relative change that is a finding
 * @param keySeparator what parts key and value, or empty
 * @param header header values
 * @param fileTimeIsEnd whether the time of the file may stand for the end
 */
public record Profile(
        String encoding,
        String delimiter,
        char decimal,
        int skip,
        String comment,
        String dataMarker,
        String sectionMarker,
        List<ProfileColumn> columns,
        OptionalDouble exposure,
        boolean total,
        OptionalLong shots,
        Set<String> absent,
        int dropFirst,
        int dropLast,
        OptionalLong rows,
        boolean dropUnfinished,
        String direction,
        double driftLimit,
        String keySeparator,
        List<HeaderKey> header,
        boolean fileTimeIsEnd) {
    /** Delimiter of one or more blanks or tabs. */
    static final String WHITE_SPACE = "white-space";

    private static final double USUAL_DRIFT_LIMIT = 0.25;

    /** From the content of a reading profile that was examined before. */
    public static Profile of(JsonObject content) {
        return new Profile(
                content.text("encoding").orElseThrow(),
                content.text("delimiter").orElseThrow(),
                content.text("decimal").orElseThrow().charAt(0),
                integer(content, "skip"),
                content.text("comment").orElse(""),
                content.text("dataMarker").orElse(""),
                content.text("sectionMarker").orElse(""),
                content.array("columns").objects().stream()
                        .map(ProfileColumn::of)
                        .toList(),
                content.object("exposure")
                        .map(quantity -> quantity.number("si"))
                        .orElse(OptionalDouble.empty()),
                content.text("exposureSort").orElse("per-point").equals("total"),
                content.integer("shots"),
                new TreeSet<>(content.array("absent").texts()),
                integer(content, "dropFirst"),
                integer(content, "dropLast"),
                content.integer("rows"),
                content.text("unfinishedRow").orElse("refuse").equals("drop"),
                content.text("direction").orElse("either"),
                content.number("driftLimit").orElse(USUAL_DRIFT_LIMIT),
                content.text("keySeparator").orElse(""),
                content.array("header").objects().stream().map(HeaderKey::of).toList(),
                content.text("fileTime").orElse("none").equals("end"));
    }

    private static int integer(JsonObject content, String name) {
        return (int) content.integer(name).orElse(0);
    }

    /** Columns of one role in order. */
    List<ProfileColumn> columns(ProfileColumn.Role role) {
        return columns.stream().filter(column -> column.role() == role).toList();
    }

    /** Whether columns are chosen by place alone, so that every row has exactly so many fields. */
    boolean byPlace() {
        return columns.stream()
                .allMatch(column -> column.header().isEmpty() && column.number().isEmpty());
    }
}
