package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Polarizability and permanent moment from the temperature dependence of the electric susceptibility:
 * &chi;(T) = &alpha; + &lt;d&sup2;&gt;/(3kT) (Langevin-Debye), a straight line in 1/T.
 */
public final class MomentFit {
    private MomentFit() {}

    /**
     * Fits.
     *
     * @param data susceptibility (C m^2/V) against temperature (K, &gt; 0)
     * @return {@link Parameter#SQUARED_DIPOLE_MOMENT} and {@link Parameter#POLARIZABILITY} with covariance; a negative
     *     squared moment is given as it is, with a warning
     */
    public static FitOutcome fit(MeasuredCurve data) {
        for (int k = 0; k < data.size(); k++) {
            if (!(data.place(k) > 0.0)) {
                throw new IllegalArgumentException("a temperature is positive, not " + data.place(k) + " K");
            }
        }
        Optional<PropertyFit> fit = data.size() < 2
                ? Optional.empty()
                : LineFit.fit(
                        data,
                        temperature -> 1.0 / (3.0 * Codata2018.BOLTZMANN_CONSTANT * temperature),
                        List.of(Parameter.SQUARED_DIPOLE_MOMENT, Parameter.POLARIZABILITY));
        if (fit.isEmpty()) {
            return new FitRefused(FitRefused.Reason.NOT_DETERMINED, "moment and polarizability need two temperatures");
        }
        List<FitWarning> warnings = new ArrayList<>();
        if (fit.get().values()[0] < 0.0) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.NEGATIVE_VALUE,
                    "the squared dipole moment came out negative; quote an upper limit"));
        }
        return fit.get().withWarnings(warnings);
    }
}
