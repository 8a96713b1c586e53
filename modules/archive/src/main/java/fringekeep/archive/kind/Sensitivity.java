package fringekeep.archive.kind;

import fringekeep.archive.record.Hash;

/**
 * How estimates answer to a source they share with others.
 *
 * @param source the record that states the source (a calibration, a setup, a velocity)
 * @param parameter its parameter
 * @param deviation standard uncertainty of the parameter (its SI unit)
 * @param derivatives derivative of each estimate with respect to the parameter (SI)
 */
public record Sensitivity(Hash source, String parameter, double deviation, double[] derivatives) {
    /** Copies. */
    public Sensitivity {
        derivatives = derivatives.clone();
    }
}
