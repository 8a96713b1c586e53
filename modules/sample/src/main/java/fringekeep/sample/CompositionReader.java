package fringekeep.sample;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** Reads the composition of a compound and collects all that is wrong with it. */
final class CompositionReader {
    private static final String AT = "/choices/composition";

    private final JsonObject composition;
    private final List<Problem> problems;

    CompositionReader(JsonObject composition, List<Problem> problems) {
        this.composition = composition;
        this.problems = problems;
    }

    Optional<Composition> read() {
        return switch (composition.text("sort").orElse("")) {
            case "formula" -> molecule();
            case "cluster" -> cluster();
            case "particle" -> particle();
            case "masses" -> masses();
            default -> {
                problems.add(Trouble.at("composition-sort", AT + "/sort"));
                yield Optional.empty();
            }
        };
    }

    private Optional<Composition> molecule() {
        allow("formula", Set.of("formula"));
        Optional<Formula> formula = formula("formula");
        Optional<FormulaMass> mass = formula.flatMap(this::mass);
        return mass.map(known -> new Composition.Molecule(formula.orElseThrow(), known));
    }

    private Optional<Composition> cluster() {
        allow("cluster", Set.of("unit", "sizes", "window"));
        Optional<Formula> unit = formula("unit");
        Optional<FormulaMass> mass = unit.flatMap(this::mass);
        Optional<ClusterSizes> sizes = Optional.empty();
        if (composition.object("sizes").isEmpty()) {
            missing("sizes");
        } else {
            sizes = ClusterSizes.read(composition.object("sizes").get(), AT + "/sizes", problems);
        }
        Optional<double[]> window = window();
        if (mass.isEmpty() || sizes.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(new Composition.Cluster(
                unit.orElseThrow(), mass.get(), sizes.get().sizes(), sizes.get().shares(), window));
    }

    private Optional<double[]> window() {
        Optional<JsonObject> window = composition.object("window");
        if (window.isEmpty()) {
            return Optional.empty();
        }
        Optional<Entered> from = Entered.of(window.get(), "from");
        Optional<Entered> to = Entered.of(window.get(), "to");
        if (from.isEmpty()
                || to.isEmpty()
                || from.get().si() < 0
                || !(from.get().si() < to.get().si())) {
            problems.add(Trouble.at("window-order", AT + "/window"));
            return Optional.empty();
        }
        return Optional.of(new double[] {from.get().si(), to.get().si()});
    }

    private Optional<Composition> particle() {
        allow("particle", Set.of("material", "radius", "radiusSpread", "density"));
        Optional<String> material = composition.text("material");
        if (material.isEmpty()) {
            missing("material");
        }
        Optional<Entered> radius = positive(composition, "radius", AT, true);
        Optional<Entered> density = positive(composition, "density", AT, true);
        Optional<Entered> spread = positive(composition, "radiusSpread", AT, false);
        if (radius.isPresent()
                && spread.isPresent()
                && spread.get().si() > radius.get().si() / 3) {
            problems.add(Trouble.at("radius-spread", AT + "/radiusSpread"));
            return Optional.empty();
        }
        if (material.isEmpty() || radius.isEmpty() || density.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(new Composition.Particle(material.get(), radius.get(), spread, density.get()));
    }

    private Optional<Composition> masses() {
        allow("masses", Set.of("masses"));
        JsonArray given = composition.array("masses");
        if (given.items().isEmpty()) {
            missing("masses");
            return Optional.empty();
        }
        List<Entered> masses = new ArrayList<>();
        List<Double> shares = new ArrayList<>();
        for (int i = 0; i < given.items().size(); i++) {
            mass(given.items().get(i), AT + "/masses/" + i, masses, shares);
        }
        if (masses.size() < given.items().size()) {
            return Optional.empty();
        }
        return Optional.of(new Composition.Masses(
                masses, shares.stream().mapToDouble(Double::doubleValue).toArray()));
    }

    private void mass(Json item, String at, List<Entered> masses, List<Double> shares) {
        JsonObject one = item instanceof JsonObject object ? object : JsonObject.EMPTY;
        Optional<Entered> mass = positive(one, "mass", at, true);
        OptionalDouble share = one.number("share");
        if (share.isEmpty() || !(share.getAsDouble() > 0)) {
            problems.add(Trouble.at("share", at + "/share"));
        } else if (mass.isPresent()) {
            if (!masses.isEmpty()
                    && mass.get().si() <= masses.get(masses.size() - 1).si()) {
                problems.add(Trouble.at("not-ascending", at + "/mass"));
            }
            masses.add(mass.get());
            shares.add(share.getAsDouble());
        }
    }

    private Optional<Formula> formula(String member) {
        Optional<String> text = composition.text(member);
        if (text.isEmpty()) {
            missing(member);
            return Optional.empty();
        }
        try {
            Formula formula = Formula.parse(text.get());
            if (member.equals("unit") && formula.charge() != 0) {
                problems.add(Trouble.at("unit-charged", AT + "/unit", text.get()));
            }
            return Optional.of(formula);
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at(AT + "/" + member)));
            return Optional.empty();
        }
    }

    private Optional<FormulaMass> mass(Formula formula) {
        Optional<FormulaMass> mass = FormulaMass.of(formula);
        if (mass.isEmpty()) {
            for (Formula.Term term : formula.terms()) {
                if (FormulaMass.weight(term).isEmpty()) {
                    String member = composition.text("sort").orElse("").equals("cluster") ? "unit" : "formula";
                    problems.add(Trouble.at("no-weight", AT + "/" + member, term.symbol()));
                }
            }
        }
        return mass;
    }

    private Optional<Entered> positive(JsonObject holder, String member, String at, boolean required) {
        Optional<Entered> value = Entered.of(holder, member);
        if (value.isEmpty()) {
            if (required || holder.get(member).isPresent()) {
                problems.add(Trouble.at("missing", at + "/" + member, member));
            }
            return Optional.empty();
        }
        if (!(value.get().si() > 0)) {
            problems.add(Trouble.at("not-positive", at + "/" + member, member));
            return Optional.empty();
        }
        return value;
    }

    private void missing(String member) {
        problems.add(Trouble.at("missing", AT + "/" + member, member));
    }

    private void allow(String sort, Set<String> members) {
        for (String member : Composition.MEMBERS) {
            if (composition.get(member).isPresent() && !members.contains(member)) {
                problems.add(Trouble.at("not-of-sort", AT + "/" + member, member, sort));
            }
        }
    }
}
