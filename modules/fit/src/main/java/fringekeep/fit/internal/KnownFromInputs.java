package fringekeep.fit.internal;

import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.ProblemException;
import fringekeep.fit.internal.FitParameters.PositionCorrection;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationModel;
import fringekeep.instrument.CalibrationTarget;
import fringekeep.instrument.Grating;
import fringekeep.instrument.SetupFacet;
import fringekeep.interferometry.fringe.DeadTime;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** What the setups and calibrations among the inputs tell a fit. */
public final class KnownFromInputs {
    private final Inputs inputs;

    /** Of the inputs of a fit. */
    public KnownFromInputs(Inputs inputs) {
        this.inputs = inputs;
    }

    /**
     * A value and the input that states it.
     *
     * @param input position
     * @param si value (SI)
     * @param deviation standard uncertainty (SI), 0 when exact or not stated
     */
    public record Told(int input, double si, double deviation) {}

    /**
     * Period of the fringes as the setups state it; empty if they do not.
     *
     * @throws ProblemException if setups state different ones
     */
    public Optional<Told> period() throws ProblemException {
        return agreed("the period", KnownFromInputs::fringePeriod);
    }

    /** Dead time as the setups state it; empty if they do not. */
    public Optional<Told> setupDeadTime() throws ProblemException {
        return agreed("the dead time", setup -> setup.detector().flatMap(SetupFacet.Detector::deadTime));
    }

    /** How the dead time of the setup's detector acts. */
    public DeadTime.Sort setupDeadTimeSort() {
        return setups().stream()
                .map(input -> input.facet(SetupFacet.class))
                .flatMap(Optional::stream)
                .flatMap(setup -> setup.detector().stream())
                .map(SetupFacet.Detector::deadTimeSort)
                .filter(sort -> sort == SetupFacet.DeadTimeSort.PROLONGED)
                .findFirst()
                .map(sort -> DeadTime.Sort.PARALYSABLE)
                .orElse(DeadTime.Sort.NON_PARALYSABLE);
    }

    /** Dead time of the first pinned calibration of it. */
    public Optional<Told> calibratedDeadTime() {
        for (Input input : inputs.role("calibration")) {
            Optional<CalibrationFacet> facet =
                    input.facet(CalibrationFacet.class).filter(each -> each.target() == CalibrationTarget.DEAD_TIME);
            if (facet.isPresent()) {
                return Optional.of(new Told(
                        input.position(),
                        facet.get().parameters()[0],
                        facet.get().deviation(0)));
            }
        }
        return Optional.empty();
    }

    /** Corrections of positions by pinned calibrations, in the order of the inputs. */
    public List<PositionCorrection> corrections() {
        List<PositionCorrection> corrections = new ArrayList<>();
        for (Input input : inputs.role("calibration")) {
            input.facet(CalibrationFacet.class)
                    .filter(facet -> facet.target() == CalibrationTarget.POSITION_SCALE
                            || facet.target() == CalibrationTarget.POSITION_OFFSET)
                    .ifPresent(facet -> corrections.add(correction(input.position(), facet)));
        }
        return corrections;
    }

    private static PositionCorrection correction(int input, CalibrationFacet facet) {
        double[] p = facet.parameters();
        CalibrationModel model = facet.model();
        return switch (model) {
            case SCALE -> new PositionCorrection(input, 0, 0, p[0], facet.deviation(0));
            case OFFSET -> new PositionCorrection(input, p[0], facet.deviation(0), 1, 0);
            case OFFSET_SCALE -> new PositionCorrection(input, p[0], facet.deviation(0), p[1], facet.deviation(1));
            case VALUE, QUADRATIC ->
                throw new IllegalArgumentException("positions are not calibrated by " + model.method());
        };
    }

    private List<Input> setups() {
        return inputs.role("setup");
    }

    private Optional<Told> agreed(String what, Function<SetupFacet, Optional<Entered>> value) throws ProblemException {
        Optional<Told> told = Optional.empty();
        for (Input input : setups()) {
            Optional<Entered> entered = input.facet(SetupFacet.class).flatMap(value);
            if (entered.isPresent()
                    && told.isPresent()
                    && told.get().si() != entered.get().si()) {
                throw new ProblemException(FitProblems.of("fit.several-setups", "/inputs", what));
            }
            if (entered.isPresent() && told.isEmpty()) {
                told = Optional.of(new Told(
                        input.position(), entered.get().si(), entered.get().deviationOrZero()));
            }
        }
        return told;
    }

    /** The period the setup names as that of the fringes, with the uncertainty of its grating. */
    private static Optional<Entered> fringePeriod(SetupFacet setup) {
        double si = setup.fringePeriod().orElse(Double.NaN);
        return setup.gratings().stream()
                .map(Grating::period)
                .flatMap(Optional::stream)
                .filter(period -> period.si() == si)
                .findFirst();
    }
}
