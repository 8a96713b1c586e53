package fringekeep.archive.judgement;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Rules of judgements beyond their schema (record format 1, section 6). */
final class JudgementRules {
    private static final String TARGET = "target";
    private static final String UNDOES = "undoes";
    private static final String CHOSEN = "chosen";
    private static final String OVER = "over";

    private final JsonObject content;
    private final Inputs inputs;
    private final Verdict verdict;
    private final List<Problem> problems = new ArrayList<>();

    private JudgementRules(JsonObject content, Inputs inputs, Verdict verdict) {
        this.content = content;
        this.inputs = inputs;
        this.verdict = verdict;
    }

    static List<Problem> examine(Parts parts, Inputs inputs) {
        JsonObject content = parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY);
        Optional<Verdict> verdict = content.text("verdict").flatMap(Verdict::of);
        if (verdict.isEmpty()) {
            return List.of(new Problem("judgement.verdict", "There is no such verdict.", "/content/verdict", ""));
        }
        JudgementRules rules = new JudgementRules(content, inputs, verdict.get());
        rules.reason(parts.get(PartName.REMARK).isPresent());
        rules.roles();
        rules.mask();
        rules.preference();
        return List.copyOf(rules.problems);
    }

    private void reason(boolean remark) {
        String reason = content.text("reason").orElse("");
        if (!verdict.reasons().contains(reason)) {
            add(
                    "judgement.reason",
                    "\"" + reason + "\" is no reason for \"" + verdict.code() + "\".",
                    "/content/reason",
                    "Use one of: " + String.join(", ", verdict.reasons()) + ".");
        } else if (reason.equals("other") && !remark) {
            add("judgement.other", "The reason \"other\" needs words.", "/remark", "Say in the remark what it is.");
        }
    }

    private void roles() {
        Set<String> allowed =
                switch (verdict) {
                    case WITHDRAWN, MASKED, DOUBTED -> Set.of(TARGET);
                    case RESTORED -> Set.of(UNDOES);
                    case PREFERRED -> Set.of(CHOSEN, OVER);
                };
        for (int i = 0; i < inputs.about().size(); i++) {
            Subject subject = inputs.about().get(i);
            String pointer = JsonPointer.child("/about", i);
            if (!allowed.contains(subject.role())) {
                add(
                        "judgement.role",
                        "\"" + verdict.code() + "\" has no role \"" + subject.role() + "\".",
                        JsonPointer.child(pointer, "role"),
                        "Use: " + String.join(", ", allowed.stream().sorted().toList()) + ".");
            }
            reach(subject, pointer);
        }
        for (String role : allowed) {
            if (inputs.about(role).isEmpty()) {
                add(
                        "judgement.nothing",
                        "\"" + verdict.code() + "\" needs a record in the role \"" + role + "\".",
                        "/about",
                        "Say what is judged.");
            }
        }
    }

    private void reach(Subject subject, String pointer) {
        boolean recordOnly = verdict == Verdict.MASKED || verdict == Verdict.RESTORED;
        if (recordOnly && subject.reach() != Reach.RECORD) {
            add(
                    "judgement.reach",
                    "\"" + verdict.code() + "\" speaks of the very record, not of its thing.",
                    JsonPointer.child(pointer, "reach"),
                    "Give the reach \"record\".");
        }
    }

    private void mask() {
        boolean points = content.get("points").isPresent();
        boolean channel = content.get("channel").isPresent();
        if (verdict == Verdict.MASKED && !points && !channel) {
            add(
                    "judgement.mask",
                    "A mask says which points or which channel.",
                    "/content",
                    "Give \"points\", \"channel\" or both.");
        }
        if (verdict != Verdict.MASKED && (points || channel)) {
            add(
                    "judgement.no-mask",
                    "Points and channel belong to \"masked\" only.",
                    "/content",
                    "Leave them out, or mask.");
        }
        if (points) {
            ascending(content.array("points"));
        }
        if (verdict == Verdict.MASKED) {
            inputs.about(TARGET).forEach(this::fits);
        }
    }

    private void ascending(JsonArray points) {
        double before = -1;
        for (int i = 0; i < points.items().size(); i++) {
            double[] range = range(points.items().get(i));
            if (range.length != 2 || range[0] > range[1] || range[0] <= before) {
                add(
                        "judgement.points",
                        "Ranges of points are [first, last], ascending and apart from each other.",
                        JsonPointer.child("/content/points", i),
                        "Sort and join them.");
                return;
            }
            before = range[1];
        }
    }

    private static double[] range(Json item) {
        return item instanceof JsonArray array && array.items().stream().allMatch(JsonNumber.class::isInstance)
                ? array.numbers()
                : new double[0];
    }

    private void fits(Subject target) {
        Optional<CountTable> table = target.facet(CountTable.class);
        if (table.isEmpty()) {
            return;
        }
        content.text("channel")
                .filter(channel -> table.get().channel(channel).isEmpty())
                .ifPresent(channel -> add(
                        "judgement.channel",
                        target.target().shortForm() + " has no channel \"" + channel + "\".",
                        "/content/channel",
                        "Name one of its channels."));
        List<Json> points = content.array("points").items();
        double[] last = points.isEmpty() ? new double[0] : range(points.get(points.size() - 1));
        if (last.length == 2 && last[1] >= table.get().rows()) {
            add(
                    "judgement.beyond",
                    target.target().shortForm() + " has " + table.get().rows() + " rows, counted from 0.",
                    "/content/points",
                    "Name rows it has.");
        }
    }

    private void preference() {
        if (verdict != Verdict.PREFERRED) {
            return;
        }
        List<Subject> chosen = inputs.about(CHOSEN);
        if (chosen.size() > 1) {
            add("judgement.several", "Only one record can be preferred.", "/about", "Choose one.");
        }
        Set<Hash> over = new HashSet<>();
        inputs.about(OVER).forEach(subject -> over.add(subject.target()));
        if (chosen.stream().anyMatch(subject -> over.contains(subject.target()))) {
            add("judgement.itself", "A record cannot be preferred to itself.", "/about", "Leave it out of \"over\".");
        }
        Set<KindName> kinds = new HashSet<>();
        inputs.about()
                .forEach(subject -> subject.record().map(RecordView::head).ifPresent(head -> kinds.add(head.kind())));
        if (kinds.size() > 1) {
            add("judgement.kinds", "Only records of one kind can be preferred to each other.", "/about", "");
        }
    }

    private void add(String code, String what, String pointer, String mend) {
        problems.add(new Problem(code, what, pointer, (mend + " Nothing has been stored.").strip()));
    }
}
