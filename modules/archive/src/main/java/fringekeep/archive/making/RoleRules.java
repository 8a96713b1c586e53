package fringekeep.archive.making;

import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;

/** Checks that inputs and subjects are at hand and play the roles their record's kind has. */
final class RoleRules {
    private final RecordKind kind;
    private final List<Problem> problems = new ArrayList<>();

    private RoleRules(RecordKind kind) {
        this.kind = kind;
    }

    static List<Problem> examine(RecordKind kind, Inputs inputs) {
        RoleRules rules = new RoleRules(kind);
        inputs.all().forEach(rules::input);
        for (int i = 0; i < inputs.about().size(); i++) {
            rules.subject(inputs.about().get(i), JsonPointer.child("/about", i));
        }
        rules.counts(
                kind.inputRoles(),
                "/inputs",
                role -> inputs.role(role.name()).stream()
                        .filter(input -> input.raw() == role.raw())
                        .count());
        rules.counts(
                kind.aboutRoles(), "/about", role -> inputs.about(role.name()).size());
        return List.copyOf(rules.problems);
    }

    private void input(Input input) {
        String pointer = JsonPointer.child("/inputs", input.position());
        Optional<Role> role = kind.inputRoles().stream()
                .filter(one -> one.name().equals(input.role()) && one.raw() == input.raw())
                .findFirst();
        if (role.isEmpty()) {
            unknown(kind.inputRoles(), input.role(), input.raw(), pointer);
        } else if (!input.raw()) {
            played(
                    role.get(),
                    input.record(),
                    input.target(),
                    facet -> input.facet(facet).isPresent(),
                    pointer);
        }
    }

    private void subject(Subject subject, String pointer) {
        Optional<Role> role = kind.aboutRoles().stream()
                .filter(one -> one.name().equals(subject.role()) && !one.raw())
                .findFirst();
        if (role.isEmpty()) {
            unknown(kind.aboutRoles(), subject.role(), false, pointer);
        } else {
            played(
                    role.get(),
                    subject.record(),
                    subject.target(),
                    facet -> subject.facet(facet).isPresent(),
                    pointer);
        }
    }

    private void unknown(List<Role> roles, String name, boolean raw, String pointer) {
        String offered =
                String.join(", ", roles.stream().map(Role::name).distinct().toList());
        add(
                "record.role-unknown",
                "A " + kind.kind() + " has no role \"" + name + "\" for a " + (raw ? "raw file" : "record") + ".",
                JsonPointer.child(pointer, "role"),
                offered.isEmpty() ? "Leave it out." : "Use one of: " + offered + ".");
    }

    private void played(
            Role role, Optional<RecordView> record, Hash target, Predicate<Class<?>> offers, String pointer) {
        if (record.isEmpty()) {
            add(
                    "record.not-at-hand",
                    "The record " + target.shortForm() + " is not in this archive.",
                    JsonPointer.child(pointer, "record"),
                    "Record or receive it first.");
            return;
        }
        if (!role.kinds().isEmpty()
                && !role.kinds().contains(record.get().head().kind())) {
            add(
                    "record.role-kind",
                    "The role \"" + role.name() + "\" is not for a "
                            + record.get().head().kind() + ".",
                    JsonPointer.child(pointer, "record"),
                    "Name a record of: "
                            + String.join(
                                    ", ",
                                    role.kinds().stream()
                                            .map(Object::toString)
                                            .sorted()
                                            .toList()) + ".");
            return;
        }
        for (Class<?> facet : role.facets()) {
            if (!offers.test(facet)) {
                add(
                        "record.role-facet",
                        "The " + record.get().head().kind() + " " + target.shortForm() + " offers no "
                                + facet.getSimpleName() + ", which the role \"" + role.name() + "\" asks for.",
                        JsonPointer.child(pointer, "record"),
                        "Name another record.");
            }
        }
    }

    private void counts(List<Role> roles, String pointer, java.util.function.ToLongFunction<Role> count) {
        for (Role role : roles) {
            long found = count.applyAsLong(role);
            if (found < role.least() || found > role.most()) {
                add(
                        "record.role-count",
                        "The role \"" + role.name() + "\" is played " + found + " times; " + allowed(role)
                                + " are allowed.",
                        pointer,
                        found < role.least() ? "Add what is missing." : "Leave the others out.");
            }
        }
    }

    private static String allowed(Role role) {
        if (role.most() == Integer.MAX_VALUE) {
            return role.least() + " or more";
        }
        return role.least() == role.most() ? Integer.toString(role.least()) : role.least() + " to " + role.most();
    }

    private void add(String code, String what, String pointer, String mend) {
        problems.add(new Problem(code, what, pointer, mend + " Nothing has been stored."));
    }
}
