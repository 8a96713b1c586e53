package fringekeep.archive.internal.records;

import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PayloadReference;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Rules that every head keeps whatever its kind: no repetitions, closed part names, numbers of links. */
final class HeadRules {
    private static final int MOST_LINKS = 20_000;
    private final List<Problem> problems = new ArrayList<>();

    private HeadRules() {}

    static List<Problem> examine(Head head) {
        HeadRules rules = new HeadRules();
        rules.inputs(head.inputs());
        rules.about(head.about());
        rules.payloads(head.payloads());
        rules.links(head.inputs().size() + head.about().size());
        rules.parts(head.parts(), "/parts", false);
        rules.parts(head.sealed(), "/sealed", true);
        rules.together(head);
        return List.copyOf(rules.problems);
    }

    private void inputs(List<InputReference> inputs) {
        Set<List<Object>> seen = new HashSet<>();
        for (int i = 0; i < inputs.size(); i++) {
            if (!seen.add(identity(inputs.get(i)))) {
                add(
                        "head.repeated-input",
                        "An input stands twice under the same role.",
                        JsonPointer.child("/inputs", i));
            }
        }
    }

    private static List<Object> identity(InputReference input) {
        if (input instanceof InputReference.OfRecord record) {
            return List.of(record.role(), record.record(), record.channel());
        }
        if (input instanceof InputReference.OfRaw raw) {
            return List.of(raw.role(), raw.raw(), Optional.empty());
        }
        throw new AssertionError(input);
    }

    private void about(List<AboutReference> about) {
        Set<List<Object>> seen = new HashSet<>();
        for (int i = 0; i < about.size(); i++) {
            if (!seen.add(List.of(about.get(i).role(), about.get(i).record()))) {
                add(
                        "head.repeated-about",
                        "A record is spoken of twice under the same role.",
                        JsonPointer.child("/about", i));
            }
        }
    }

    private void payloads(List<PayloadReference> payloads) {
        Set<String> seen = new HashSet<>();
        for (int i = 0; i < payloads.size(); i++) {
            if (!seen.add(payloads.get(i).name())) {
                add(
                        "head.repeated-payload",
                        "Two payloads are named \"" + payloads.get(i).name() + "\".",
                        JsonPointer.child("/payloads", i));
            }
        }
    }

    private void links(int count) {
        if (count > MOST_LINKS) {
            add(
                    "head.too-many-links",
                    "The record would refer to " + count + " others; at most " + MOST_LINKS + " are allowed.",
                    "/inputs");
        }
    }

    private void parts(Map<String, Hash> parts, String pointer, boolean salted) {
        for (String name : parts.keySet()) {
            Optional<PartName> known = PartName.of(name);
            if (known.isEmpty() || known.get().salted() != salted) {
                add(
                        "head.part-name",
                        "There is no " + (salted ? "salted" : "open") + " part \"" + name + "\" in this form.",
                        JsonPointer.child(pointer, name));
            }
        }
    }

    private void together(Head head) {
        Set<String> names = head.parts().keySet();
        if (!names.contains(PartName.MADE.text())) {
            add("head.made-missing", "The part \"made\" is missing.", "/parts");
        }
        if (names.contains(PartName.CONTENT.text())
                && (names.contains(PartName.CHOICES.text()) || names.contains(PartName.RESULT.text()))) {
            add("head.content-and-result", "Entered content and computed parts never stand together.", "/parts");
        }
    }

    private void add(String code, String what, String pointer) {
        problems.add(new Problem(code, what, pointer, "Nothing has been stored."));
    }
}
