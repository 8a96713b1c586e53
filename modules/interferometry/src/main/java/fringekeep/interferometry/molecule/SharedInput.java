package fringekeep.interferometry.molecule;

import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.MaterialGrating;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.WeightedNodes;

/** Inputs whose error is common to all points of a curve. Each is changed by a relative factor. */
public enum SharedInput {
    /** Calibration of the laser power. */
    POWER {
        @Override
        MeasuredCurve changed(MeasuredCurve data, double factor) {
            double[] places = new double[data.size()];
            double[] values = new double[data.size()];
            double[] uncertainties = new double[data.size()];
            for (int k = 0; k < places.length; k++) {
                places[k] = factor * data.place(k);
                values[k] = data.value(k);
                uncertainties[k] = data.uncertainty(k);
            }
            return new MeasuredCurve(places, values, uncertainties);
        }
    },
    /** Waist of the laser across the molecular beam. */
    WAIST {
        @Override
        PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
            LaserBeam laser = fitter.setup().laser();
            LaserBeam other =
                    new LaserBeam(laser.wavelength(), laser.waist() * factor, laser.reflectivity(), laser.recoil());
            return new PowerCurveFitter(fitter.setup().withLaser(other), fitter.ensemble(), fitter.choices());
        }
    },
    /** Scale of the velocity axis. */
    VELOCITY {
        @Override
        PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
            BeamEnsemble beam = fitter.ensemble();
            WeightedNodes speeds = beam.velocities().stretched(factor);
            return with(fitter, new BeamEnsemble(speeds, beam.masses(), beam.heights()));
        }
    },
    /** Both separations of the gratings. */
    SEPARATION {
        @Override
        PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
            PowerSeriesSetup setup = fitter.setup().withSeparations(factor);
            return new PowerCurveFitter(setup, fitter.ensemble(), fitter.choices());
        }
    },
    /** Mass of the molecule. */
    MASS {
        @Override
        PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
            BeamEnsemble beam = fitter.ensemble();
            WeightedNodes masses = beam.masses().stretched(factor);
            return with(fitter, new BeamEnsemble(beam.velocities(), masses, beam.heights()));
        }
    },
    /** Height of the molecular beam at the laser. */
    BEAM_HEIGHT {
        @Override
        PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
            BeamEnsemble beam = fitter.ensemble();
            WeightedNodes heights = beam.heights().stretched(factor);
            return with(fitter, new BeamEnsemble(beam.velocities(), beam.masses(), heights));
        }
    },
    /** Open fraction of both outer gratings. */
    OPEN_FRACTION {
        @Override
        PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
            PowerSeriesSetup s = fitter.setup();
            PowerSeriesSetup other = new PowerSeriesSetup(
                    s.geometry(),
                    opened(s.first(), factor),
                    opened(s.third(), factor),
                    s.separation1(),
                    s.separation2(),
                    s.divergence(),
                    s.laser());
            return new PowerCurveFitter(other, fitter.ensemble(), fitter.choices());
        }
    };

    private static MaterialGrating opened(MaterialGrating grating, double factor) {
        return new MaterialGrating(grating.period(), grating.openFraction() * factor, grating.wall());
    }

    private static PowerCurveFitter with(PowerCurveFitter fitter, BeamEnsemble beam) {
        return new PowerCurveFitter(fitter.setup(), beam, fitter.choices());
    }

    /** The data with this input changed; most inputs are not part of the data. */
    MeasuredCurve changed(MeasuredCurve data, double factor) {
        return data;
    }

    /** The question with this input changed; most of them are part of it. */
    PowerCurveFitter changed(PowerCurveFitter fitter, double factor) {
        return fitter;
    }
}
