package fringekeep.desk.form;

import fringekeep.archive.kind.Role;
import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Texts;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Finds the field a problem belongs to, and says it in the words of the form. */
final class FieldOfProblem {
    /** Code of what must be said and is not. */
    static final String MISSING = "schema.required";

    /** Code of a role that too few or too many play. */
    static final String ROLES = "record.role-count";

    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FieldOfProblem.class);
    private static final Pattern PLACE = Pattern.compile(", line [0-9]+, column [0-9]+$");
    private static final Pattern NAMED = Pattern.compile("['\"]([A-Za-z][A-Za-z0-9-]*)['\"]");

    private final FormKind kind;

    FieldOfProblem(FormKind kind) {
        this.kind = kind;
    }

    /** The problem at its field; without a place where no field is concerned. */
    Problem placed(Problem problem) {
        String pointer = PLACE.matcher(problem.where()).replaceAll("");
        if (!pointer.startsWith("/")) {
            return problem.at("");
        }
        if (problem.code().equals(MISSING)) {
            return missing(problem, pointer);
        }
        if (problem.code().equals(ROLES)) {
            return role(problem, pointer);
        }
        return problem.at(leaf(pointer));
    }

    private Problem missing(Problem problem, String pointer) {
        String name = named(problem).orElse("");
        String below = pointer + "/" + name;
        if (name.isEmpty() || kind.at(below).isEmpty()) {
            return problem.at(pointer);
        }
        String what = TEXTS.of("missing", kind.words().label(FormKind.path(below)));
        return new Problem(problem.code(), what, leaf(below), TEXTS.of("missing.mend"));
    }

    private Problem role(Problem problem, String pointer) {
        Optional<FormKind.Part> part = named(problem)
                .flatMap(name -> kind.roles().stream()
                        .filter(one -> ("/" + one.member()).equals(pointer)
                                && one.role().name().equals(name))
                        .findFirst());
        if (part.isEmpty()) {
            return problem.at("");
        }
        Role role = part.get().role();
        String label = kind.words().label(part.get().path());
        boolean one = role.least() == 1;
        String what = one ? TEXTS.of("missing", label) : problem.what();
        String mend = one ? TEXTS.of("missing.mend") : problem.mend();
        return new Problem(problem.code(), what, pointer + "/+" + role.name(), mend);
    }

    private static Optional<String> named(Problem problem) {
        Matcher matcher = NAMED.matcher(problem.what());
        return matcher.find() ? Optional.of(matcher.group(1)) : Optional.empty();
    }

    /** The field a pointer leads into: {@code /content/purity/unit} is the field {@code /content/purity}. */
    private String leaf(String pointer) {
        String here = pointer;
        while (here.lastIndexOf('/') > 0 && kind.at(here).isEmpty() && !reference(here)) {
            here = here.substring(0, here.lastIndexOf('/'));
        }
        return here.equals("/remark") ? "/remark/text" : here;
    }

    private static boolean reference(String pointer) {
        return List.of("/from", "/remark").contains(pointer)
                || pointer.matches("/(about|inputs)/[0-9]+(/(record|raw))?");
    }
}
