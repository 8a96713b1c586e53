package fringekeep.fit.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.fit.internal.FitChoices.Combine;
import fringekeep.fit.internal.KnownFromInputs.Told;
import fringekeep.interferometry.fringe.DeadTime;
import fringekeep.interferometry.fringe.Estimator;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Writes out every default of a fit's choices and refuses what does not fit together or does not fit the inputs. */
public final class ChoicesCompletion {
    private static final Set<String> METHODS =
            Set.of("fringe.poisson-likelihood/1", "fringe.weighted/1", "fringe.unweighted/1");
    private static final double INTERVAL = 0.6827;
    private static final double LIMIT = 0.95;
    private static final double OUTLIER = 4;

    private final JsonObject given;
    private final Inputs inputs;
    private final KnownFromInputs known;
    private final List<Problem> problems = new ArrayList<>();

    /** Of incomplete choices. */
    public ChoicesCompletion(JsonObject given, Inputs inputs) {
        this.given = given;
        this.inputs = inputs;
        this.known = new KnownFromInputs(inputs);
    }

    /** The complete choices. */
    public JsonObject complete() throws ProblemException {
        int scans = inputs.role("scan").size();
        JsonObject choices = given.with("method", given.text("method").orElse("fringe.poisson-likelihood/1"));
        if (!METHODS.contains(choices.text("method").orElseThrow())) {
            throw new ProblemException(FitProblems.of(
                    "fit.method-unknown",
                    "/choices/method",
                    choices.text("method").orElseThrow()));
        }
        choices = usual(choices, "constants", Json.of("CODATA 2018"));
        choices = usual(choices, "combine", Json.of(scans == 1 ? "single" : "sum"));
        choices = usual(choices, "driftOrder", Json.of(0));
        choices = usual(choices, "background", JsonObject.EMPTY.with("sort", "none"));
        choices = usual(choices, "references", Json.of("none"));
        choices = usual(choices, "covariance", Json.of("expected"));
        choices = usual(choices, "dispersion", Json.of("poisson"));
        choices = usual(choices, "secondHarmonic", Json.of(false));
        choices = usual(choices, "phaseDrift", Json.of(false));
        choices = usual(choices, "positions", Json.of(known.corrections().isEmpty() ? "as-read" : "calibrated"));
        choices = usual(choices, "interval", Json.of(INTERVAL));
        choices = usual(choices, "limit", Json.of(LIMIT));
        choices = usual(choices, "outlier", Json.of(OUTLIER));
        choices = choices.with("period", period()).with("deadTime", deadTime());
        examine(new FitChoices(choices), scans);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return choices;
    }

    private static JsonObject usual(JsonObject choices, String name, Json value) {
        return choices.get(name).isPresent() ? choices : choices.with(name, value);
    }

    private JsonObject period() throws ProblemException {
        JsonObject period = given.object("period").orElse(JsonObject.EMPTY);
        period = usual(period, "sort", Json.of("fixed"));
        boolean own = period.number("si").isPresent() && !period.text("from").equals(Optional.of("setup"));
        if (own) {
            return usual(period, "from", Json.of("given"));
        }
        Optional<Told> told = known.period();
        if (told.isEmpty()) {
            throw new ProblemException(FitProblems.of("fit.no-period", "/choices/period"));
        }
        JsonObject from =
                period.with("from", "setup").with("si", told.get().si()).without("u");
        return told.get().deviation() > 0 ? from.with("u", told.get().deviation()) : from;
    }

    private JsonObject deadTime() throws ProblemException {
        JsonObject deadTime = given.object("deadTime").orElse(JsonObject.EMPTY.with("sort", "none"));
        return switch (deadTime.text("sort").orElse("none")) {
            case "none" -> JsonObject.EMPTY.with("sort", "none");
            case "setup" -> told(deadTime, known.setupDeadTime(), "setup", known.setupDeadTimeSort());
            case "calibration" -> told(deadTime, known.calibratedDeadTime(), "calibration", known.setupDeadTimeSort());
            default -> {
                if (deadTime.number("si").isEmpty()) {
                    throw new ProblemException(FitProblems.of("fit.dead-time-missing", "/choices/deadTime/si"));
                }
                yield usual(deadTime, "model", Json.of("non-extending"));
            }
        };
    }

    private static JsonObject told(JsonObject deadTime, Optional<Told> told, String source, DeadTime.Sort sort)
            throws ProblemException {
        if (told.isEmpty()) {
            throw new ProblemException(FitProblems.of("fit.no-dead-time", "/choices/deadTime", source));
        }
        String model = sort == DeadTime.Sort.PARALYSABLE ? "extending" : "non-extending";
        JsonObject with = usual(deadTime, "model", Json.of(model))
                .with("si", told.get().si())
                .without("u");
        return told.get().deviation() > 0 ? with.with("u", told.get().deviation()) : with;
    }

    private void examine(FitChoices choices, int scans) {
        boolean likelihood = choices.estimator() == Estimator.POISSON_LIKELIHOOD;
        Combine combine = choices.combine();
        refuse(combine == Combine.SINGLE && scans != 1, "fit.single-many", "/choices/combine", scans);
        refuse(
                combine == Combine.JOINT && (!likelihood || choices.periodFree()),
                "fit.joint-method",
                "/choices/combine");
        refuse(combine == Combine.SUM_AFTER_PHASE && choices.periodFree(), "fit.phase-period", "/choices/period/sort");
        refuse(
                likelihood && choices.json().text("covariance").equals(Optional.of("scatter")),
                "fit.scatter-method",
                "/choices/covariance");
        refuse(
                !likelihood && choices.background().flag("joint").orElse(false),
                "fit.joint-background",
                "/choices/background/joint");
        refuse(
                choices.backgroundSort().equals("known")
                        && choices.background().number("si").isEmpty(),
                "fit.known-background",
                "/choices/background/si");
        refuse(
                choices.backgroundSort().equals("scan")
                        && inputs.role("background").isEmpty(),
                "fit.no-background-scan",
                "/inputs");
        refuse(choices.normalised() && inputs.role("reference").isEmpty(), "fit.no-reference", "/inputs");
        refuse(
                choices.calibratedPositions() && known.corrections().isEmpty(),
                "fit.no-calibration",
                "/choices/positions");
    }

    private void refuse(boolean wrong, String code, String pointer, Object... values) {
        if (wrong) {
            problems.add(FitProblems.of(code, pointer, values));
        }
    }
}
