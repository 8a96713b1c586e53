package fringekeep.sourcerun;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.beam.GravitySelector;
import fringekeep.interferometry.beam.VelocityDistribution;
import fringekeep.interferometry.beam.VelocityLaw;
import fringekeep.sample.Entered;
import java.util.List;
import java.util.Optional;

/**
 * Method {@code velocity.three-slit/1}: particles that pass three slits fly a parabola through them, which fixes their speed
 * ({@link GravitySelector}). Uncertainties of positions, heights and gravity are carried on by central differences over one
 * standard uncertainty each (JCGM 100:2008, 5.1.3, note 2).
 */
final class ThreeSlitMethod {
    private static final double FLAT = 100;

    private final JsonObject choices;
    private final Inputs inputs;
    private final List<JsonObject> slits;
    private final VelocityFindings findings = new VelocityFindings();

    ThreeSlitMethod(JsonObject choices, Inputs inputs) {
        this.choices = choices;
        this.inputs = inputs;
        this.slits = SourceRunReader.objects(choices.array("slits")).toList();
    }

    JsonObject result() throws ProblemException {
        double[] given = new double[7];
        double[] deviations = new double[7];
        boolean unstated = false;
        for (int i = 0; i < 7; i++) {
            Entered entered = entered(i).orElseThrow(() -> new ProblemException(Trouble.at("slits", "/choices/slits")));
            given[i] = entered.si();
            deviations[i] = entered.deviationOrZero();
            unstated |= entered.deviation().isEmpty();
        }
        if (unstated) {
            findings.add("uncertainty-unstated");
        }
        VelocityDistribution passed = passed(selector(given));
        VelocityOutcome found = new VelocityOutcome(passed, 0);
        for (int i = 0; i < 7; i++) {
            if (deviations[i] > 0) {
                found.influence(name(i), deviations[i], slope(given, i, deviations[i]));
            }
        }
        found.calibrate(inputs);
        if (!found.usable()) {
            throw new ProblemException(Trouble.at("not-finite", "/choices"));
        }
        return found.json(findings);
    }

    /** Positions of the three slits, their heights, gravity. */
    private Optional<Entered> entered(int place) {
        if (place == 6) {
            return Entered.of(choices, "gravity");
        }
        return slits.size() == 3
                ? Entered.of(slits.get(place % 3), place < 3 ? "position" : "height")
                : Optional.empty();
    }

    private static String name(int place) {
        return place == 6 ? "gravity" : (place < 3 ? "position " : "height ") + (place % 3 + 1);
    }

    private static GravitySelector selector(double[] values) throws ProblemException {
        boolean rising = values[0] < values[1] && values[1] < values[2];
        double part = (values[1] - values[0]) / (values[2] - values[0]);
        double sag = values[4] - (values[3] + (values[5] - values[3]) * part);
        if (!rising || !(sag > 0) || !(values[6] > 0)) {
            throw new ProblemException(Trouble.at("slits-line", "/choices/slits"));
        }
        return new GravitySelector(
                new double[] {values[0], values[1], values[2]},
                new double[] {values[3], values[4], values[5]},
                values[6]);
    }

    private static double slope(double[] given, int place, double deviation) throws ProblemException {
        double[] up = given.clone();
        double[] down = given.clone();
        up[place] += deviation;
        down[place] -= deviation;
        return (selector(up).velocity() - selector(down).velocity()) / (2 * deviation);
    }

    private VelocityDistribution passed(GravitySelector selector) {
        double[] openings = new double[3];
        double widest = 0;
        for (int i = 0; i < 3; i++) {
            openings[i] = Entered.of(slits.get(i), "opening").map(Entered::si).orElse(0.0);
            widest = Math.max(widest, openings[i]);
        }
        double velocity = selector.velocity();
        if (widest == 0) {
            return new VelocityDistribution(new double[] {velocity}, new double[] {1}, velocity, 0, 0);
        }
        return selector.passed(openings, source(velocity), 0);
    }

    /** Velocities of the source; where none are given, a law so wide that it weighs all that pass alike. */
    private VelocityLaw source(double velocity) {
        Optional<JsonObject> source = choices.object("source");
        Optional<Entered> centre = source.flatMap(one -> Entered.of(one, "centre"));
        Optional<Entered> width = source.flatMap(one -> Entered.of(one, "width"));
        return centre.isPresent() && width.isPresent()
                ? new VelocityLaw(3, centre.get().si(), width.get().si())
                : new VelocityLaw(0, velocity, FLAT * velocity);
    }
}
