package fringekeep.scan;

import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * What a placement says of its scan beside the records it names.
 *
 * @param purpose what the scan was taken for
 * @param step step of the series, from 0
 * @param stepSetting the value of what the series varies, where the step has one
 */
public record PlacementFacet(Purpose purpose, OptionalInt step, Optional<SettingsFacet.Setting> stepSetting) {
    /** What a scan is taken for. */
    public enum Purpose {
        /** The measurement itself. */
        SIGNAL,
        /** The same without what is studied, to compare with. */
        REFERENCE,
        /** Counts without particles. */
        BACKGROUND,
        /** Without the grating laser or the laser that is studied. */
        LASER_OFF,
        /** Without particles from the source. */
        EMPTY_BEAM,
        /** Not for results. */
        TEST;

        /** The word in records. */
        public String text() {
            return name().toLowerCase(Locale.ROOT).replace('_', '-');
        }

        /** The purpose of a word in records. */
        public static Optional<Purpose> of(String text) {
            for (Purpose purpose : values()) {
                if (purpose.text().equals(text)) {
                    return Optional.of(purpose);
                }
            }
            return Optional.empty();
        }
    }
}
