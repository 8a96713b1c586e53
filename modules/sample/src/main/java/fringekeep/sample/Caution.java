package fringekeep.sample;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.ResourceBundle;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Hazards that batches, setups and source runs can state, with the usual caution in words. Every caution ends by deferring to
 * the local rules, which come first.
 *
 * <p>Source of the words: common practice, no source; the names of substance hazards follow the classes of the Globally
 * Harmonized System, the laser classes IEC 60825-1.
 */
public enum Caution {
    DUST,
    TOXIC,
    CARCINOGENIC,
    CORROSIVE,
    FLAMMABLE,
    OXIDISING,
    EXPLOSIVE,
    IRRITANT,
    GAS_UNDER_PRESSURE,
    HARMFUL_TO_ENVIRONMENT,
    RADIOACTIVE,
    BIOLOGICAL,
    LIGHT_SENSITIVE,
    AIR_SENSITIVE,
    MOISTURE_SENSITIVE,
    HEAT_SENSITIVE,
    STATIC_SENSITIVE,
    CLASS_4_LASER,
    CLASS_3B_LASER,
    ULTRAVIOLET_LASER,
    INFRARED_LASER,
    HIGH_VOLTAGE,
    OVEN,
    VACUUM,
    CRYOGEN,
    NOISE,
    MAGNETIC_FIELD;

    /** The code that stands in records, such as {@code class-4-laser}. */
    public String code() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /** What the hazard is called. */
    public String title() {
        return words().getString(code() + ".title");
    }

    /** The usual caution, one or two sentences, followed by {@link #localRules()} where it is shown. */
    public String advice() {
        return words().getString(code() + ".words");
    }

    /** The sentence that defers to the local rules. */
    public static String localRules() {
        return words().getString("local-rules");
    }

    /** The caution with that code. */
    public static Optional<Caution> of(String code) {
        return List.of(values()).stream()
                .filter(caution -> caution.code().equals(code))
                .findFirst();
    }

    /** Codes of some cautions, joined for a sentence. */
    public static String codes(Set<Caution> cautions) {
        return cautions.stream().map(Caution::code).collect(Collectors.joining(", "));
    }

    private static ResourceBundle words() {
        return ResourceBundle.getBundle("fringekeep.sample.Cautions", Locale.ROOT);
    }
}
