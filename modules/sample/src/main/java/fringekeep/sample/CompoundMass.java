package fringekeep.sample;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Knob;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.interferometry.constants.Codata2018;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Method {@code compound.mass/1}: mass from the composition.
 *
 * <p>Molecules: sum of standard atomic weights and isotope masses ({@link Elements}, {@link FormulaMass}); 60 atoms of
 * carbon weigh 60 &middot; 12.011 with u = 60 &middot; 0.0014/&radic;3. Clusters: sizes times the mass of a unit. Particles:
 * 4/3 &pi; r&sup3; &rho; with relative variance 9 u&sup2;(r)/r&sup2; + u&sup2;(&rho;)/&rho;&sup2; (JCGM 100:2008, 5.1.6).
 * Standard uncertainties are given with two digits (JCGM 100:2008, 7.2.6). The mass in flight is less one electron mass for
 * every positive charge; binding energies are below the uncertainties and left out.
 */
final class CompoundMass implements Computation {
    static final String METHOD = "compound.mass/1";
    private static final MathContext TWO_DIGITS = new MathContext(2, RoundingMode.HALF_EVEN);

    @Override
    public List<MethodId> methods() {
        return List.of(new MethodId(METHOD));
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        JsonObject complete = choices;
        if (choices.text("method").isEmpty()) {
            complete = complete.with("method", METHOD);
        }
        if (choices.text("constants").isEmpty()) {
            complete = complete.with("constants", Codata2018.NAME);
        }
        if (choices.get("charge").isEmpty()) {
            complete = complete.with("charge", writtenCharge(choices));
        }
        List<Problem> problems = CompoundRules.choices(complete);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return complete;
    }

    /** The charge that the formula states; 0 where there is no formula that can be read. */
    private static double writtenCharge(JsonObject choices) {
        try {
            Optional<JsonObject> composition = choices.object("composition");
            if (composition.isPresent()
                    && Composition.read(composition.get()) instanceof Composition.Molecule molecule) {
                return molecule.formula().charge();
            }
            return 0;
        } catch (ProblemException e) {
            return 0; // the rules report what is wrong with the composition
        }
    }

    @Override
    public Outcome compute(JsonObject choices, Inputs inputs, Work work) {
        List<Problem> problems = CompoundRules.choices(choices);
        if (!problems.isEmpty()) {
            return new Outcome.NoResult(problems);
        }
        try {
            Composition composition =
                    Composition.read(choices.object("composition").orElse(JsonObject.EMPTY));
            int charge = (int) choices.integer("charge").orElse(0);
            return new Outcome.Computed(result(composition, charge), List.of());
        } catch (ProblemException e) {
            return new Outcome.NoResult(e.problems());
        }
    }

    private static JsonObject result(Composition composition, int charge) throws ProblemException {
        if (composition instanceof Composition.Molecule molecule) {
            return ofMolecule(molecule.mass(), charge);
        }
        MassDistribution neutral = neutral(composition);
        if (!Double.isFinite(neutral.mean()) || !Double.isFinite(neutral.spread()) || !(neutral.mean() > 0)) {
            throw new ProblemException(Trouble.at("not-finite", "/choices/composition"));
        }
        double molar = neutral.mean() / Codata2018.ATOMIC_MASS_CONSTANT / 1000;
        JsonObject result = JsonObject.EMPTY.with(
                "molarMass", estimate(molar, neutral.deviation() / Codata2018.ATOMIC_MASS_CONSTANT / 1000));
        if (charge != 0) {
            result = result.with("ionMass", estimate(inFlight(neutral.mean(), charge), neutral.deviation()));
        }
        List<String> unstated = unstated(composition);
        if (!unstated.isEmpty()) {
            result = result.with("unstated", JsonArray.ofTexts(unstated));
        }
        return neutral.nodes().length == 1 && neutral.passed().isEmpty()
                ? result
                : result.with("distribution", distribution(neutral, charge));
    }

    private static JsonObject ofMolecule(FormulaMass mass, int charge) {
        BigDecimal molar = mass.mean().movePointLeft(3);
        double u = BigDecimal.valueOf(mass.deviation())
                .round(TWO_DIGITS)
                .movePointLeft(3)
                .doubleValue();
        JsonObject result = JsonObject.EMPTY.with(
                "molarMass", JsonObject.EMPTY.with("value", molar.doubleValue()).with("u", u));
        double kilograms = mass.deviation() * Codata2018.ATOMIC_MASS_CONSTANT;
        return charge == 0 ? result : result.with("ionMass", estimate(inFlight(mass.kilograms(), charge), kilograms));
    }

    static MassDistribution neutral(Composition composition) throws ProblemException {
        if (composition instanceof Composition.Cluster cluster) {
            return ofCluster(cluster);
        }
        if (composition instanceof Composition.Particle particle) {
            return ofParticle(particle);
        }
        if (composition instanceof Composition.Masses masses) {
            return ofMasses(masses);
        }
        throw new AssertionError(composition);
    }

    private static MassDistribution ofCluster(Composition.Cluster cluster) throws ProblemException {
        List<Double> masses = new ArrayList<>();
        List<Double> shares = new ArrayList<>();
        double all = 0;
        double kept = 0;
        for (int i = 0; i < cluster.sizes().length; i++) {
            double mass = cluster.sizes()[i] * cluster.mass().kilograms();
            all += cluster.shares()[i];
            if (cluster.window().isEmpty()
                    || (mass >= cluster.window().get()[0]
                            && mass <= cluster.window().get()[1])) {
                masses.add(mass);
                shares.add(cluster.shares()[i]);
                kept += cluster.shares()[i];
            }
        }
        if (!(kept > 0)) {
            throw new ProblemException(Trouble.at("window-empty", "/choices/composition/window"));
        }
        OptionalDouble passed = cluster.window().isPresent() ? OptionalDouble.of(kept / all) : OptionalDouble.empty();
        double relative = cluster.mass().deviation() / cluster.mass().mean().doubleValue();
        return MassDistribution.of(array(masses), array(shares), relative, passed);
    }

    private static MassDistribution ofParticle(Composition.Particle particle) {
        double radius = particle.radius().si();
        double relativeRadius = 3 * particle.radius().deviationOrZero() / radius;
        double relativeDensity =
                particle.density().deviationOrZero() / particle.density().si();
        double relative = Math.sqrt(relativeRadius * relativeRadius + relativeDensity * relativeDensity);
        double spread = particle.radiusSpread().map(Entered::si).orElse(0.0);
        int steps = spread == 0 ? 0 : 15;
        double[] masses = new double[2 * steps + 1];
        double[] shares = new double[masses.length];
        for (int i = -steps; i <= steps; i++) {
            double off = 0.2 * i;
            double r = radius + (steps == 0 ? 0 : off * spread);
            masses[i + steps] =
                    4.0 / 3.0 * Math.PI * r * r * r * particle.density().si();
            shares[i + steps] = StrictMath.exp(-off * off / 2);
        }
        if (steps > 0 && !(masses[0] > 0)) {
            masses[0] = Math.ulp(masses[1]); // a spread of exactly a third of the radius reaches 0
        }
        return MassDistribution.of(masses, shares, relative, OptionalDouble.empty());
    }

    private static MassDistribution ofMasses(Composition.Masses given) {
        double[] masses = given.masses().stream().mapToDouble(Entered::si).toArray();
        double mean = 0;
        double deviation = 0;
        for (int i = 0; i < masses.length; i++) {
            mean += given.shares()[i] * masses[i];
            deviation += given.shares()[i] * given.masses().get(i).deviationOrZero();
        }
        return MassDistribution.of(masses, given.shares(), deviation / mean, OptionalDouble.empty());
    }

    private static List<String> unstated(Composition composition) {
        List<String> unstated = new ArrayList<>();
        if (composition instanceof Composition.Particle particle) {
            if (particle.radius().deviation().isEmpty()) {
                unstated.add("radius");
            }
            if (particle.density().deviation().isEmpty()) {
                unstated.add("density");
            }
        }
        if (composition instanceof Composition.Masses masses
                && masses.masses().stream().anyMatch(mass -> mass.deviation().isEmpty())) {
            unstated.add("masses");
        }
        return unstated;
    }

    private static JsonObject distribution(MassDistribution neutral, int charge) {
        double[] nodes = neutral.nodes().clone();
        for (int i = 0; i < nodes.length; i++) {
            nodes[i] = inFlight(nodes[i], charge);
        }
        JsonObject distribution = JsonObject.EMPTY
                .with("nodes", JsonArray.ofNumbers(nodes))
                .with("weights", JsonArray.ofNumbers(neutral.weights()))
                .with("mean", inFlight(neutral.mean(), charge))
                .with("spread", neutral.spread());
        return neutral.passed().isPresent()
                ? distribution.with("passed", neutral.passed().getAsDouble())
                : distribution;
    }

    /** Mass (kg) less the electrons taken, or plus those added. */
    static double inFlight(double neutral, int charge) {
        return neutral - charge * Codata2018.ELECTRON_MASS;
    }

    private static Json estimate(double value, double u) {
        double rounded = BigDecimal.valueOf(u).round(TWO_DIGITS).doubleValue();
        return JsonObject.EMPTY.with("value", value).with("u", rounded);
    }

    private static double[] array(List<Double> numbers) {
        return numbers.stream().mapToDouble(Double::doubleValue).toArray();
    }

    @Override
    public List<Knob> knobs(JsonObject choices, Inputs inputs) {
        JsonObject composition = choices.object("composition").orElse(JsonObject.EMPTY);
        List<Knob> knobs = new ArrayList<>();
        knob("radius", "m", composition).ifPresent(knobs::add);
        knob("radiusSpread", "m", composition).ifPresent(knobs::add);
        knob("density", "kg/m3", composition).ifPresent(knobs::add);
        return knobs;
    }

    private static Optional<Knob> knob(String member, String unit, JsonObject composition) {
        return Entered.of(composition, member)
                .map(value -> new Knob(
                        member,
                        -1,
                        "/composition/" + member + "/si",
                        value.si(),
                        value.deviation().orElse(Double.NaN),
                        unit));
    }
}
