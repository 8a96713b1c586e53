package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * A column as a profile describes it.
 *
 * @param role what it holds
 * @param name name of the axis or channel; empty for others
 * @param of the channel an exposure belongs to; empty = all
 * @param unit unit of the numbers in the file
 * @param counted whether values must be whole numbers &ge; 0
 * @param header name in the file by which it is found
 * @param number place in the row by which it is found, from 1
 * @param positions {@code set} or {@code read}, where said
 * @param means what a channel holds; {@code counts} unless said
 * @param saturation number in the file from which rows are saturated
 * @param highest highest usual rate (1/s, or per shot)
 * @param from least usual number in the file
 * @param to greatest usual number in the file
 */
record ProfileColumn(
        Role role,
        String name,
        String of,
        ColumnUnit unit,
        boolean counted,
        Optional<String> header,
        OptionalInt number,
        Optional<String> positions,
        String means,
        OptionalDouble saturation,
        OptionalDouble highest,
        OptionalDouble from,
        OptionalDouble to) {
    /** What a column holds. */
    enum Role {
        AXIS("axis"),
        CHANNEL("channel"),
        EXPOSURE("exposure"),
        SHOTS("shots"),
        UNUSED("unused");

        private final String member;

        Role(String member) {
            this.member = member;
        }

        /** Member of the profile's column that says so. */
        String member() {
            return member;
        }
    }

    /** From a member of the profile's columns that was examined before. */
    static ProfileColumn of(JsonObject column) {
        Role role = role(column);
        String unit = column.text("unit").orElse(role == Role.EXPOSURE ? "s" : "1");
        String means = column.text("means").orElse(column.text("unit").isPresent() ? "reading" : "counts");
        boolean counts = role == Role.CHANNEL && column.text("unit").isEmpty() && !means.equals("reading");
        return new ProfileColumn(
                role,
                column.text(role.member()).orElse(""),
                column.text("of").orElse(""),
                ColumnUnit.of(unit),
                counts || role == Role.SHOTS,
                column.text("header"),
                column.integer("number").isPresent()
                        ? OptionalInt.of((int) column.integer("number").getAsLong())
                        : OptionalInt.empty(),
                column.text("positions"),
                means,
                column.number("saturation"),
                column.number("highest"),
                column.number("from"),
                column.number("to"));
    }

    private static Role role(JsonObject column) {
        for (Role role : Role.values()) {
            if (column.get(role.member()).isPresent()) {
                return role;
            }
        }
        throw new IllegalArgumentException("a column without a role: " + column);
    }

    /** Name of the column of the table: lower-case words with underscores and the SI unit. */
    String tableName() {
        String base =
                switch (role) {
                    case AXIS, CHANNEL -> words(name);
                    case EXPOSURE -> of.isEmpty() ? "exposure" : words(of) + "_exposure";
                    case SHOTS -> "shots";
                    case UNUSED -> "unused";
                };
        String suffix = unit.suffix();
        return suffix.isEmpty() ? base : base + "_" + suffix;
    }

    private static String words(String name) {
        return name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "_").replaceAll("^_+|_+$", "");
    }
}
