package fringekeep.property.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationTarget;
import fringekeep.instrument.Grating;
import fringekeep.instrument.GratingSort;
import fringekeep.instrument.Laser;
import fringekeep.instrument.SetupFacet;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.MaterialGrating;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.RecoilKernel;
import fringekeep.interferometry.nearfield.TrainGeometry;
import fringekeep.interferometry.nearfield.WallPotential;
import fringekeep.interferometry.nearfield.WeightedNodes;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The set-up of a power series as the fits' setup record and its calibrations state it: slits, standing light wave, slits.
 *
 * @param record the setup record
 * @param setup what it says
 * @param waist calibration of the laser waist, if one is pinned
 */
record Bench(Hash record, SetupFacet setup, Optional<PowerPoint.Pinned> waist) {
    static final String PERIOD = "period";
    static final String OPEN_FRACTION = "openFraction";
    static final String SEPARATION = "separation";
    static final String WAIST = "waist";
    static final String HEIGHT = "beamHeight";

    /** Reads and checks; problems say what does not fit the model. */
    static Optional<Bench> read(Inputs inputs, List<Problem> problems) {
        List<Input> setups = new ArrayList<>();
        List<Input> calibrations = new ArrayList<>(inputs.role("calibration"));
        for (Input fit : PowerPoints.fits(inputs)) {
            setups.addAll(fit.inputs().role("setup"));
            calibrations.addAll(fit.inputs().role("calibration"));
        }
        if (setups.isEmpty() || setups.get(0).facet(SetupFacet.class).isEmpty()) {
            problems.add(problem(
                    "property.no-setup", "The fits pin no setup.", "Place the scans with their setup, fit anew."));
            return Optional.empty();
        }
        Bench bench = new Bench(
                setups.get(0).target(), setups.get(0).facet(SetupFacet.class).get(), waist(calibrations));
        for (Input other : setups) {
            boolean same = other.facet(SetupFacet.class).map(bench::likeOptics).orElse(false);
            if (!same) {
                problems.add(problem(
                        "property.setups-differ",
                        "The fits rest on setups that differ: " + bench.record.shortForm() + " and "
                                + other.target().shortForm() + ".",
                        "Take fits of one set-up only; derive one property for each."));
                return Optional.empty();
            }
        }
        bench.examine(problems);
        return problems.isEmpty() ? Optional.of(bench) : Optional.empty();
    }

    private boolean likeOptics(SetupFacet other) {
        return other.gratings().equals(setup.gratings())
                && other.separations().equals(setup.separations())
                && other.beam().equals(setup.beam());
    }

    private static Optional<PowerPoint.Pinned> waist(List<Input> calibrations) {
        for (Input calibration : calibrations) {
            Optional<CalibrationFacet> facet = calibration.facet(CalibrationFacet.class);
            if (facet.isPresent() && facet.get().target() == CalibrationTarget.WAIST_ACROSS) {
                return Optional.of(new PowerPoint.Pinned(calibration.target(), facet.get()));
            }
        }
        return Optional.empty();
    }

    private static Problem problem(String code, String what, String mend) {
        return new Problem(code, what, "/inputs", mend);
    }

    private void examine(List<Problem> problems) {
        boolean sorts = setup.gratings().size() == 3
                && setup.gratings().get(0).sort() == GratingSort.MATERIAL
                && setup.gratings().get(1).sort() == GratingSort.STANDING_WAVE
                && setup.gratings().get(2).sort() == GratingSort.MATERIAL;
        if (!sorts) {
            problems.add(problem(
                    "property.gratings",
                    "The method needs a material grating, a standing light wave and a material grating.",
                    "Choose fits of such a set-up."));
            return;
        }
        need(setup.gratings().get(0).period(), "period of grating 1", problems);
        need(setup.gratings().get(0).openFraction(), "open fraction of grating 1", problems);
        need(setup.gratings().get(2).openFraction(), "open fraction of grating 3", problems);
        need(setup.separation(0), "separation of gratings 1 and 2", problems);
        need(setup.separation(1), "separation of gratings 2 and 3", problems);
        Optional<Laser> laser = setup.gratings().get(1).laser();
        if (laser.isEmpty()) {
            problems.add(problem("property.no-laser", "The standing light wave has no laser.", "Correct the setup."));
        } else if (waist.isEmpty()) {
            need(laser.get().waistAcross(), "laser waist across the beam", problems);
        }
    }

    private void need(Optional<Entered> quantity, String words, List<Problem> problems) {
        if (quantity.isEmpty()) {
            problems.add(problem(
                    "property.setup-incomplete",
                    "Setup " + record.shortForm() + " does not state the " + words + ".",
                    "Correct the setup, then gather the fits again."));
        }
    }

    private static double si(Optional<Entered> quantity) {
        return quantity.orElseThrow().si();
    }

    /** The set-up for the model, with one shared parameter moved. */
    PowerSeriesSetup optics(JsonObject choices, Shift shift) {
        double period = si(setup.gratings().get(0).period()) + shift.of(record, PERIOD);
        double stretch = shift.of(record, SEPARATION);
        return new PowerSeriesSetup(
                TrainGeometry.equal(period),
                outer(setup.gratings().get(0), period, shift),
                outer(setup.gratings().get(2), period, shift),
                si(setup.separation(0)) + stretch,
                si(setup.separation(1)) + stretch,
                Double.POSITIVE_INFINITY,
                laser(choices, shift));
    }

    private MaterialGrating outer(Grating grating, double period, Shift shift) {
        Optional<WallPotential> wall = grating.wall()
                .filter(potential ->
                        potential.cutoff().isPresent() && grating.thickness().isPresent())
                .map(potential -> new WallPotential(
                        potential.coefficient().si(),
                        potential.exponent(),
                        si(grating.thickness()),
                        si(potential.cutoff())));
        return new MaterialGrating(period, si(grating.openFraction()) + shift.of(record, OPEN_FRACTION), wall);
    }

    private LaserBeam laser(JsonObject choices, Shift shift) {
        Laser laser = setup.gratings().get(1).laser().orElseThrow();
        double entered = laser.waistAcross().map(Entered::si).orElse(Double.NaN) + shift.of(record, WAIST);
        double calibrated = waist.isPresent()
                ? waist.get()
                        .moved(shift)
                        .apply(Double.isNaN(entered) ? 0 : entered)
                        .value()
                : entered;
        RecoilKernel recoil = choices.text("recoil").orElse("").equals("random-walk")
                ? RecoilKernel.RANDOM_WALK
                : RecoilKernel.STANDING_MODE_COHERENT;
        return new LaserBeam(
                laser.wavelength().si(),
                calibrated,
                laser.reflectivity().map(Entered::si).orElse(1.0),
                recoil);
    }

    /** Heights of the beam against the laser's axis, uniform over the stated height; one node where none is stated. */
    WeightedNodes heights(JsonObject choices, Shift shift) {
        Optional<Entered> height = setup.beam().flatMap(SetupFacet.Beam::height);
        int nodes = (int) choices.integer("heightNodes").orElse(1);
        if (height.isEmpty() || nodes == 1) {
            return WeightedNodes.single(0);
        }
        double half = 0.5 * (height.get().si() + shift.of(record, HEIGHT));
        return WeightedNodes.uniform(-half, half, nodes);
    }

    /** Everything of the set-up that all points share. */
    List<Shared> shared(JsonObject choices) {
        List<Shared> shared = new ArrayList<>();
        add(shared, PERIOD, setup.gratings().get(0).period());
        add(shared, OPEN_FRACTION, setup.gratings().get(0).openFraction());
        add(shared, SEPARATION, setup.separation(0));
        Laser laser = setup.gratings().get(1).laser().orElseThrow();
        if (waist.isEmpty()) {
            add(shared, WAIST, laser.waistAcross());
        } else {
            shared.addAll(ofCalibration(waist.get()));
        }
        if (choices.integer("heightNodes").orElse(1) > 1) {
            setup.beam().flatMap(SetupFacet.Beam::height).ifPresent(height -> add(shared, HEIGHT, Optional.of(height)));
        }
        return shared;
    }

    private void add(List<Shared> shared, String parameter, Optional<Entered> quantity) {
        quantity.ifPresent(entered -> shared.add(new Shared(record, parameter, entered.si(), entered.deviation())));
    }

    /** Parameters of a calibration, each with its own uncertainty. */
    static List<Shared> ofCalibration(PowerPoint.Pinned pinned) {
        List<Shared> shared = new ArrayList<>();
        double[] parameters = pinned.calibration().parameters();
        for (int i = 0; i < parameters.length; i++) {
            shared.add(new Shared(
                    pinned.record(),
                    pinned.calibration().model().parameters().get(i),
                    parameters[i],
                    java.util.OptionalDouble.of(pinned.calibration().deviation(i))));
        }
        return shared;
    }
}
