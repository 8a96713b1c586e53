package fringekeep.sourcerun;

import fringekeep.archive.facet.TimeSpan;
import fringekeep.sample.Entered;
import java.util.List;
import java.util.Optional;

/**
 * What later stages ask a source run for.
 *
 * @param label what people call it, may be empty
 * @param source code of the sort of source, where stated
 * @param settings settings in the order of entry
 * @param time when it ran, where stated
 */
public record SourceRunFacet(String label, Optional<String> source, List<Setting> settings, Optional<TimeSpan> time) {
    /** Copies. */
    public SourceRunFacet {
        settings = List.copyOf(settings);
    }

    /** The setting of that name. */
    public Optional<Setting> setting(String name) {
        return settings.stream().filter(setting -> setting.name().equals(name)).findFirst();
    }

    /**
     * A setting.
     *
     * @param name such as {@code oven temperature}
     * @param value SI value and uncertainty
     * @param unit UCUM code of the SI unit, in base units
     */
    public record Setting(String name, Entered value, String unit) {}
}
