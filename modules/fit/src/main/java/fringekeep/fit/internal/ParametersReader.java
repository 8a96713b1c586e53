package fringekeep.fit.internal;

import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.ProblemException;
import fringekeep.fit.internal.KnownFromInputs.Told;
import fringekeep.fit.internal.Sensitivities.Source;
import fringekeep.interferometry.fringe.DeadTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Reads the parameters of a fit. What a choice says to come from an input is read from that input, so that a supposed other
 * setup or calibration takes effect; in a record both are equal.
 */
public final class ParametersReader {
    private final FitChoices choices;
    private final KnownFromInputs known;

    /** Of choices and inputs. */
    public ParametersReader(FitChoices choices, Inputs inputs) {
        this.choices = choices;
        this.known = new KnownFromInputs(inputs);
    }

    /** The parameters. */
    public FitParameters parameters() throws ProblemException {
        double period = toldPeriod().map(Told::si).orElse(choices.periodSi());
        DeadTime recorded = choices.deadTime();
        DeadTime deadTime = toldDeadTime()
                .map(told -> new DeadTime(recorded.sort(), told.si()))
                .orElse(recorded);
        return new FitParameters(period, deadTime, choices.calibratedPositions() ? known.corrections() : List.of());
    }

    /** What inputs state with an uncertainty. */
    public List<Source> sources(FitParameters parameters) throws ProblemException {
        List<Source> sources = new ArrayList<>();
        toldPeriod()
                .filter(told -> told.deviation() > 0 && !choices.periodFree())
                .ifPresent(told -> sources.add(Sensitivities.period(told.input(), told.deviation(), parameters)));
        toldDeadTime()
                .filter(told -> told.deviation() > 0)
                .ifPresent(told -> sources.add(Sensitivities.deadTime(told.input(), told.deviation(), parameters)));
        sources.addAll(Sensitivities.corrections(parameters));
        return sources;
    }

    private Optional<Told> toldPeriod() throws ProblemException {
        boolean setup = choices.period().text("from").orElse("given").equals("setup");
        return setup ? known.period() : Optional.empty();
    }

    private Optional<Told> toldDeadTime() throws ProblemException {
        return switch (choices.deadTimeSort()) {
            case "setup" -> known.setupDeadTime();
            case "calibration" -> known.calibratedDeadTime();
            default -> Optional.empty();
        };
    }
}
