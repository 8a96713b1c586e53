package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import java.util.Optional;

/**
 * A header value as a profile describes it.
 *
 * @param key key in the file
 * @param use what the value is
 * @param name name of the setting, or {@code start} or {@code end}; empty for others
 * @param required whether a file without it is refused
 * @param unit UCUM unit where the file gives none
 * @param deviation standard uncertainty in that unit
 * @param format pattern of a moment
 * @param offset offset of a moment
 * @param zone zone of a moment
 */
record HeaderKey(
        String key,
        Use use,
        String name,
        boolean required,
        Optional<String> unit,
        Optional<String> deviation,
        Optional<String> format,
        Optional<String> offset,
        Optional<String> zone) {
    /** What a header value is. */
    enum Use {
        SETTING("setting"),
        MOMENT("moment"),
        EXPOSURE("exposure"),
        SHOTS("shots"),
        ROWS("rows"),
        PERSONAL("personal");

        private final String member;

        Use(String member) {
            this.member = member;
        }

        /** Member of the profile's header item that says so. */
        String member() {
            return member;
        }
    }

    /** From a member of the profile's header that was examined before. */
    static HeaderKey of(JsonObject item) {
        for (Use use : Use.values()) {
            if (item.get(use.member()).isPresent()) {
                return new HeaderKey(
                        item.text("key").orElseThrow(),
                        use,
                        item.text(use.member()).orElse(""),
                        item.flag("required").orElse(false),
                        item.text("unit"),
                        item.text("deviation"),
                        item.text("format"),
                        item.text("offset"),
                        item.text("zone"));
            }
        }
        throw new IllegalArgumentException("a header value without a use: " + item);
    }
}
