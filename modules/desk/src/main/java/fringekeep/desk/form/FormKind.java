package fringekeep.desk.form;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.Role;
import fringekeep.archive.record.PartName;
import fringekeep.desk.form.Asked.Leaf;
import fringekeep.desk.form.Asked.Member;
import fringekeep.desk.form.Asked.Sort;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** A kind as its form sees it: what is asked for in each part, which roles others play, and how it is laid out. */
final class FormKind {
    /** A role, and where its entries stand: {@code about} or {@code inputs}. */
    record Part(String member, Role role, boolean file) {
        /** Path for the table of words, such as {@code about.compound}. */
        String path() {
            return member + "." + role.name() + (file ? ".raw" : "");
        }

        /** Member of an entry that holds what was typed. */
        String key() {
            return file ? "raw" : "record";
        }

        /** How it is typed. */
        Leaf leaf() {
            return Leaf.of(file ? Sort.FILE : Sort.RECORD, "");
        }
    }

    private static final List<PartName> ENTERED =
            List.of(PartName.CONTENT, PartName.CHOICES, PartName.IDENTITY, PartName.REMARK);

    private final RecordKind kind;
    private final FormWords words;
    private final Map<PartName, Asked> parts = new LinkedHashMap<>();
    private final List<Part> roles = new ArrayList<>();

    FormKind(RecordKind kind) {
        this.kind = kind;
        this.words = FormWords.of(kind.kind().text());
        AskedReading reading = new AskedReading(kind.jsonSchema(kind.schema()));
        for (PartName name : ENTERED) {
            reading.part(name.text()).ifPresent(asked -> parts.put(name, asked));
        }
        kind.aboutRoles().forEach(role -> roles.add(new Part("about", role, false)));
        kind.inputRoles().forEach(role -> roles.add(new Part("inputs", role, role.raw())));
    }

    RecordKind kind() {
        return kind;
    }

    String name() {
        return kind.kind().text();
    }

    FormWords words() {
        return words;
    }

    /** What is asked for in a part. */
    Optional<Asked> part(PartName name) {
        return Optional.ofNullable(parts.get(name));
    }

    List<Part> roles() {
        return roles;
    }

    /** Whether a person says first which of content and choices is meant. */
    boolean twoWays() {
        return parts.containsKey(PartName.CONTENT) && parts.containsKey(PartName.CHOICES);
    }

    /** The part that holds the facts, in a document or where a form begins. */
    PartName main(JsonObject document) {
        boolean choices = document.get(PartName.CHOICES.text()).isPresent() || !parts.containsKey(PartName.CONTENT);
        return choices && parts.containsKey(PartName.CHOICES) ? PartName.CHOICES : PartName.CONTENT;
    }

    /** Members of a group in the order of the table; those it does not name follow, those asked for first. */
    List<Member> ordered(Asked.Group group, String path) {
        List<String> order = words.list(path + ".order");
        List<Member> members = new ArrayList<>(group.members());
        members.sort(Comparator.<Member>comparingInt(
                        member -> order.contains(member.name()) ? order.indexOf(member.name()) : order.size())
                .thenComparing(member -> !member.required())
                .thenComparing(member -> !(member.asked() instanceof Leaf)));
        return members;
    }

    /** What is asked for at a pointer into a document, positions in lists left out or not; empty for unknown places. */
    Optional<Asked> at(String pointer) {
        List<String> steps = JsonPointer.steps(pointer);
        Optional<Asked> here =
                steps.isEmpty() ? Optional.empty() : PartName.of(steps.get(0)).flatMap(this::part);
        for (String step : steps.subList(Math.min(1, steps.size()), steps.size())) {
            here = here.flatMap(asked -> below(asked, step));
        }
        return here;
    }

    private static Optional<Asked> below(Asked asked, String step) {
        if (asked instanceof Asked.Group group) {
            return group.member(step).map(Member::asked);
        }
        if (asked instanceof Asked.Rows rows) {
            return step.matches("[0-9]+") ? Optional.of(rows.item()) : below(rows.item(), step);
        }
        return Optional.empty();
    }

    /** A pointer without positions, for the table of words: {@code content.gratings.period}. */
    static String path(String pointer) {
        List<String> names = JsonPointer.steps(pointer).stream()
                .filter(step -> !step.matches("[0-9]+"))
                .toList();
        return String.join(".", names);
    }
}
