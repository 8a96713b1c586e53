package fringekeep.instrument;

import static fringekeep.instrument.CalibrationModel.OFFSET;
import static fringekeep.instrument.CalibrationModel.OFFSET_SCALE;
import static fringekeep.instrument.CalibrationModel.QUADRATIC;
import static fringekeep.instrument.CalibrationModel.SCALE;
import static fringekeep.instrument.CalibrationModel.VALUE;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/** What can be calibrated, in which SI unit it is read, and with which models. */
public enum CalibrationTarget {
    /** Power of a laser. */
    POWER_SCALE("W", SCALE, OFFSET_SCALE, QUADRATIC),
    /** Waist w_y across the particle beam. */
    WAIST_ACROSS("m", VALUE, SCALE),
    /** Waist w_z along the particle beam. */
    WAIST_ALONG("m", VALUE, SCALE),
    /** Power over waist w_y, which alone enters a standing-wave grating. */
    POWER_WAIST("W/m", SCALE),
    /** Position of the scanned grating. */
    POSITION_SCALE("m", SCALE, OFFSET_SCALE),
    /** Zero of the position of the scanned grating. */
    POSITION_OFFSET("m", OFFSET),
    /** Dead time of the detector. */
    DEAD_TIME("s", VALUE),
    /** Time zero of flight traces: reading at which the slot lets particles through. */
    TIME_ZERO("s", VALUE, OFFSET),
    /** Distance of flight from chopper to detector. */
    FLIGHT_DISTANCE("m", VALUE, OFFSET),
    /** Velocity. */
    VELOCITY_OFFSET("m/s", OFFSET),
    /** Velocity. */
    VELOCITY_SCALE("m/s", SCALE, OFFSET_SCALE),
    /** Dark counts a second. */
    DARK_RATE("Hz", VALUE),
    /** (E&middot;&nabla;)E over the square of the voltage. */
    FIELD_STRENGTH("m-3", VALUE, SCALE),
    /** Voltage at field plates. */
    VOLTAGE_SCALE("V", SCALE, OFFSET_SCALE),
    /** Mass that a filter lets through. */
    MASS_SCALE("kg", SCALE, OFFSET_SCALE, QUADRATIC),
    /** Pressure. */
    PRESSURE_SCALE("Pa", SCALE, OFFSET_SCALE),
    /** Temperature. */
    TEMPERATURE_SCALE("K", OFFSET, SCALE, OFFSET_SCALE),
    /** A device's clock less true time. */
    CLOCK_OFFSET("s", VALUE),
    /** Share of the particles that are counted. */
    DETECTION_EFFICIENCY("1", VALUE),
    /** Period of a grating. */
    PERIOD_SCALE("m", SCALE, VALUE);

    private final String unit;
    private final List<CalibrationModel> models;

    CalibrationTarget(String unit, CalibrationModel... models) {
        this.unit = unit;
        this.models = List.of(models);
    }

    /** The code that stands in member {@code what}, such as {@code power-scale}. */
    public String code() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /** UCUM code of the SI unit of readings and of true values. */
    public String unit() {
        return unit;
    }

    /** Models that make sense for it. */
    public Set<CalibrationModel> models() {
        return Set.copyOf(models);
    }

    /** Codes of the models, for a sentence. */
    String modelCodes() {
        return String.join(", ", models.stream().map(CalibrationModel::method).toList());
    }

    /** The target of that code. */
    public static Optional<CalibrationTarget> of(String code) {
        for (CalibrationTarget target : values()) {
            if (target.code().equals(code)) {
                return Optional.of(target);
            }
        }
        return Optional.empty();
    }
}
