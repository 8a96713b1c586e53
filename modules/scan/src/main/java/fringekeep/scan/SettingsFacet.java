package fringekeep.scan;

import java.util.List;
import java.util.Optional;

/**
 * Settings a record states, in SI: of a scan those its file holds, of a placement those of its series step.
 *
 * @param settings in the order of the record
 */
public record SettingsFacet(List<Setting> settings) {
    /** Copies. */
    public SettingsFacet {
        settings = List.copyOf(settings);
    }

    /** The first setting of that name. */
    public Optional<Setting> named(String name) {
        return settings.stream()
                .filter(setting -> setting.name().equalsIgnoreCase(name))
                .findFirst();
    }

    /**
     * One setting.
     *
     * @param name such as {@code laser power}
     * @param value SI
     * @param deviation standard uncertainty (SI), 0 when exact, NaN when not stated
     * @param unit UCUM code as entered; {@code value} is in the coherent SI unit of the same sort
     * @param shown the quantity as people read it
     */
    public record Setting(String name, double value, double deviation, String unit, String shown) {}
}
