package fringekeep.commandline.compute;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.List;
import java.util.stream.Stream;

/** All methods, in the order of the measurement chain. */
public final class Methods {
    private static final List<Group> GROUPS = List.of(
            new Group("beams", Stream.of(BeamMethods.all(), FlightMethods.all())),
            new Group("fringes", Stream.of(FringeMethods.all(), PlanningMethods.all())),
            new Group("near field", Stream.of(NearFieldMethods.all(), ReductionMethods.all())),
            new Group(
                    "molecular properties",
                    Stream.of(PowerCurveMethods.all(), DeflectionMethods.all(), CrossSectionMethods.all())),
            new Group("far field", Stream.of(FarFieldMethods.all())),
            new Group("particle traces", Stream.of(TraceMethods.all())),
            new Group("statistics", Stream.of(StatisticsMethods.all())));

    private Methods() {}

    /**
     * Methods that belong together.
     *
     * @param words what they are about
     * @param methods the methods
     */
    public record Group(String words, List<Method> methods) {
        /** Copies. */
        public Group {
            methods = List.copyOf(methods);
        }

        Group(String words, Stream<List<Method>> parts) {
            this(words, parts.flatMap(List::stream).toList());
        }
    }

    /** All groups. */
    public static List<Group> groups() {
        return GROUPS;
    }

    /** All methods. */
    public static List<Method> all() {
        return GROUPS.stream().flatMap(group -> group.methods().stream()).toList();
    }

    /**
     * The method of a name.
     *
     * @throws ProblemException with the names that may have been meant
     */
    public static Method named(String name) throws ProblemException {
        return all().stream()
                .filter(method -> method.name().equals(name))
                .findFirst()
                .orElseThrow(() -> unknown(name));
    }

    private static ProblemException unknown(String name) {
        List<String> nearest = Nearest.to(name, all().stream().map(Method::name).toList());
        return new ProblemException(new Problem(
                "compute.unknown-method",
                "There is no method \"" + name + "\".",
                "",
                nearest.isEmpty()
                        ? "See \"compute --list\"."
                        : "Perhaps " + String.join(" or ", nearest) + "? See \"compute --list\"."));
    }
}
