package fringekeep.property.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Hash;
import fringekeep.property.ChooseFits;
import fringekeep.property.SelectFits.Condition;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a person has asked of a property so far; a value, so that changes can be undone.
 *
 * @param selection the recorded selection whose list this is; empty for a new list
 * @param revises the property that the new one corrects
 * @param label short name of the list
 * @param words the rule in words; empty for words made from the conditions
 * @param conditions conditions by column, as written
 * @param picked the list where there are no conditions
 * @param byHand fits left out by hand, each with the code of its reason
 * @param choices what was chosen; what is absent is as usual
 * @param quoted quoted values that stand beside
 */
record PropertyPlan(
        Optional<Hash> selection,
        Optional<Hash> revises,
        String label,
        String words,
        Map<String, Bounds> conditions,
        List<Hash> picked,
        Map<Hash, String> byHand,
        JsonObject choices,
        List<Hash> quoted) {
    PropertyPlan {
        conditions = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(conditions));
        picked = List.copyOf(picked);
        byHand = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(byHand));
        quoted = List.copyOf(quoted);
    }

    /**
     * A condition on a column.
     *
     * @param is text it must be
     * @param from least number (SI)
     * @param below bound it stays below (SI)
     * @param written as a person wrote it
     */
    record Bounds(Optional<String> is, OptionalDouble from, OptionalDouble below, String written) {}

    /** A new list of picked fits. */
    static PropertyPlan picked(List<Hash> fits) {
        return new PropertyPlan(
                Optional.empty(), Optional.empty(), "", "", Map.of(), fits, Map.of(), JsonObject.EMPTY, List.of());
    }

    /** A new list by rule: all signals, until more is said. */
    static PropertyPlan rule() {
        return picked(List.of())
                .condition(
                        "purpose",
                        new Bounds(Optional.of("signal"), OptionalDouble.empty(), OptionalDouble.empty(), "signal"));
    }

    /** Another list: from now on it is no more that of the recorded selection. */
    private PropertyPlan list(String name, String rule, Map<String, Bounds> bounds, Map<Hash, String> left) {
        return new PropertyPlan(Optional.empty(), revises, name, rule, bounds, picked, left, choices, quoted);
    }

    PropertyPlan label(String text) {
        return list(text, words, conditions, byHand);
    }

    PropertyPlan words(String text) {
        return list(label, text, conditions, byHand);
    }

    /** A condition set. */
    PropertyPlan condition(String column, Bounds bounds) {
        Map<String, Bounds> next = new LinkedHashMap<>(conditions);
        next.put(column, bounds);
        return list(label, words, next, byHand);
    }

    /** A condition taken away. */
    PropertyPlan without(String column) {
        Map<String, Bounds> next = new LinkedHashMap<>(conditions);
        next.remove(column);
        return list(label, words, next, byHand);
    }

    /** A fit left out by hand. */
    PropertyPlan leave(Hash fit, String reason) {
        Map<Hash, String> next = new LinkedHashMap<>(byHand);
        next.put(fit, reason);
        return list(label, words, conditions, next);
    }

    /** A fit no longer left out by hand. */
    PropertyPlan take(Hash fit) {
        Map<Hash, String> next = new LinkedHashMap<>(byHand);
        next.remove(fit);
        return list(label, words, conditions, next);
    }

    PropertyPlan choices(JsonObject next) {
        return new PropertyPlan(selection, revises, label, words, conditions, picked, byHand, next, quoted);
    }

    PropertyPlan quoted(List<Hash> next) {
        return new PropertyPlan(selection, revises, label, words, conditions, picked, byHand, choices, next);
    }

    /** The same as a new revision of a property. */
    PropertyPlan revising(Hash property) {
        return new PropertyPlan(
                selection, Optional.of(property), label, words, conditions, picked, byHand, choices, quoted);
    }

    /** A member such as {@code factor.sort} set; empty takes it out. */
    PropertyPlan with(String path, Optional<Json> value) {
        int dot = path.indexOf('.');
        if (dot < 0) {
            return choices(value.isPresent() ? choices.with(path, value.get()) : choices.without(path));
        }
        String owner = path.substring(0, dot);
        String member = path.substring(dot + 1);
        JsonObject inner = choices.object(owner).orElse(JsonObject.EMPTY);
        JsonObject next = value.isPresent() ? inner.with(member, value.get()) : inner.without(member);
        return choices(next.members().isEmpty() ? choices.without(owner) : choices.with(owner, next));
    }

    Optional<String> text(String path) {
        int dot = path.indexOf('.');
        return dot < 0
                ? choices.text(path)
                : choices.object(path.substring(0, dot)).flatMap(inner -> inner.text(path.substring(dot + 1)));
    }

    OptionalDouble number(String path) {
        int dot = path.indexOf('.');
        return dot < 0
                ? choices.number(path)
                : choices.object(path.substring(0, dot))
                        .map(inner -> inner.number(path.substring(dot + 1)))
                        .orElse(OptionalDouble.empty());
    }

    /** How the fits are chosen, in the terms of the archive. */
    ChooseFits.Choice choice() {
        List<Condition> all = new ArrayList<>();
        new java.util.TreeMap<>(conditions)
                .forEach(
                        (column, bounds) -> all.add(new Condition(column, bounds.is(), bounds.from(), bounds.below())));
        return new ChooseFits.Choice(label, rule(conditions), all, picked, byHand);
    }

    private String rule(Map<String, Bounds> bounds) {
        if (!words.isBlank()) {
            return words.strip();
        }
        List<String> parts = new ArrayList<>();
        bounds.forEach((column, bound) -> parts.add(column.replace('_', ' ') + " " + bound.written()));
        return parts.isEmpty() ? PropertyWords.TEXTS.of("rule.picked") : String.join(", ", parts);
    }
}
