package fringekeep.fit.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.Hash;
import fringekeep.fit.FitScans;
import fringekeep.fit.MaskChange;
import fringekeep.fit.TrialFits;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * What a person has asked of a fit so far. A value: every change gives another, so that changes can be undone.
 *
 * @param scans scans that are fitted together
 * @param channel channel that is fitted
 * @param choices what was chosen; what is absent is as usual
 * @param references reference scans
 * @param backgrounds background scans
 * @param masks masked points and what is to be said of them
 * @param end what is to become of the fit among others
 */
record FitPlan(
        List<Hash> scans,
        String channel,
        JsonObject choices,
        List<Hash> references,
        List<Hash> backgrounds,
        Masks masks,
        End end) {
    FitPlan {
        scans = List.copyOf(scans);
        references = List.copyOf(references);
        backgrounds = List.copyOf(backgrounds);
    }

    /** A row of a scan. */
    record Place(Hash scan, int row) implements Comparable<Place> {
        private static final Comparator<Place> ORDER =
                Comparator.comparing((Place place) -> place.scan().hex()).thenComparingInt(Place::row);

        @Override
        public int compareTo(Place other) {
            return ORDER.compare(this, other);
        }
    }

    /**
     * Changes of masks.
     *
     * @param masked points masked now, each with its reason; empty for none yet
     * @param shown points that earlier masks hide and that are used
     * @param reason reason that points get which are masked next; empty for none yet
     * @param undoing why earlier masks do not hold; empty for none yet
     * @param words words beside the reasons
     */
    record Masks(
            SortedMap<Place, String> masked, NavigableSet<Place> shown, String reason, String undoing, String words) {
        static final Masks NONE = new Masks(new TreeMap<>(), new TreeSet<>(), "", "", "");

        Masks {
            masked = new TreeMap<>(masked);
            shown = new TreeSet<>(shown);
        }

        /** Whether a reason is still wanted. */
        boolean unsaid() {
            return masked.containsValue("") || !shown.isEmpty() && undoing.isEmpty();
        }

        /** Whether a reason says to look at the words and there are none. */
        boolean wordless() {
            boolean other = masked.containsValue("other") || !shown.isEmpty() && undoing.equals("other");
            return other && words.isBlank();
        }

        /** Masks a point that is used, or uses one that is masked. */
        Masks turned(Place place, boolean used) {
            SortedMap<Place, String> next = new TreeMap<>(masked);
            NavigableSet<Place> seen = new TreeSet<>(shown);
            if (used && !seen.remove(place)) {
                next.put(place, reason);
            } else if (!used && next.remove(place) == null) {
                seen.add(place);
            }
            return new Masks(next, seen, reason, undoing, words);
        }

        /** The reason of points that have none yet and of those that are masked next. */
        Masks because(String code) {
            SortedMap<Place, String> next = new TreeMap<>(masked);
            next.replaceAll((place, before) -> before.isEmpty() || before.equals(reason) ? code : before);
            return new Masks(next, shown, code, undoing, words);
        }

        Masks undoing(String code) {
            return new Masks(masked, shown, reason, code, words);
        }

        Masks words(String text) {
            return new Masks(masked, shown, reason, undoing, text);
        }
    }

    /**
     * What is to become of the fit among others of the same scans.
     *
     * @param again whether it corrects the one that stands
     * @param preferred reason why it is preferred; empty for nothing said
     */
    record End(boolean again, String preferred) {
        static final End USUAL = new End(false, "");
    }

    /** All as usual. */
    static FitPlan usual(List<Hash> scans, String channel) {
        return new FitPlan(scans, channel, JsonObject.EMPTY, List.of(), List.of(), Masks.NONE, End.USUAL);
    }

    FitPlan channel(String next) {
        return new FitPlan(scans, next, choices, references, backgrounds, Masks.NONE, end);
    }

    FitPlan choices(JsonObject next) {
        return new FitPlan(scans, channel, next, references, backgrounds, masks, end);
    }

    FitPlan references(List<Hash> next) {
        return new FitPlan(scans, channel, choices, next, backgrounds, masks, end);
    }

    FitPlan backgrounds(List<Hash> next) {
        return new FitPlan(scans, channel, choices, references, next, masks, end);
    }

    FitPlan masks(Masks next) {
        return new FitPlan(scans, channel, choices, references, backgrounds, next, end);
    }

    FitPlan end(End next) {
        return new FitPlan(scans, channel, choices, references, backgrounds, masks, next);
    }

    /** The same choices of other scans, without masks. */
    FitPlan of(List<Hash> others) {
        return new FitPlan(others, channel, choices, references, backgrounds, Masks.NONE, End.USUAL);
    }

    /** A member such as {@code period.sort} set; empty takes it out, and its owner when that has no more. */
    FitPlan with(String path, Optional<Json> value) {
        return choices(set(choices, path, value));
    }

    private static JsonObject set(JsonObject object, String path, Optional<Json> value) {
        int dot = path.indexOf('.');
        if (dot < 0) {
            return value.isPresent() ? object.with(path, value.get()) : object.without(path);
        }
        String owner = path.substring(0, dot);
        JsonObject inner = set(object.object(owner).orElse(JsonObject.EMPTY), path.substring(dot + 1), value);
        return inner.members().isEmpty() ? object.without(owner) : object.with(owner, inner);
    }

    /** A chosen member as text. */
    Optional<String> text(String path) {
        int dot = path.indexOf('.');
        return dot < 0
                ? choices.text(path)
                : choices.object(path.substring(0, dot)).flatMap(inner -> inner.text(path.substring(dot + 1)));
    }

    /** A chosen member as a number. */
    OptionalDouble number(String path) {
        int dot = path.indexOf('.');
        return dot < 0
                ? choices.number(path)
                : choices.object(path.substring(0, dot))
                        .map(inner -> inner.number(path.substring(dot + 1)))
                        .orElse(OptionalDouble.empty());
    }

    /** How the scans are combined. */
    String combine() {
        return text("combine").orElse(scans.size() == 1 ? "single" : "sum");
    }

    /** What the archive is asked. */
    TrialFits.Draft draft() {
        List<MaskChange> changes = new ArrayList<>();
        for (Hash scan : scans) {
            SortedMap<Integer, String> masked = new TreeMap<>();
            NavigableSet<Integer> shown = new TreeSet<>();
            masks.masked().forEach((place, reason) -> {
                if (place.scan().equals(scan)) {
                    masked.put(place.row(), reason);
                }
            });
            masks.shown().stream().filter(place -> place.scan().equals(scan)).forEach(place -> shown.add(place.row()));
            changes.add(new MaskChange(scan, channel, masked, shown, masks.undoing(), masks.words()));
        }
        return new TrialFits.Draft(request(), changes);
    }

    /** What is asked of the fit. */
    FitScans.Request request() {
        return new FitScans.Request(scans, channel, choices, references, backgrounds, List.of(), end.again());
    }
}
