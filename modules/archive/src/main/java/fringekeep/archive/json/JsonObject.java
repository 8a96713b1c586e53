package fringekeep.archive.json;

import java.util.Collections;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;

/** A JSON object. Members are held in the canonical order (UTF-16 code units, RFC 8785). Immutable. */
public record JsonObject(SortedMap<String, Json> members) implements Json {
    /** The object without members. */
    public static final JsonObject EMPTY = new JsonObject(new TreeMap<>());

    /** Copies the members into canonical order. */
    public JsonObject {
        SortedMap<String, Json> copy = new TreeMap<>();
        copy.putAll(members);
        members = Collections.unmodifiableSortedMap(copy);
    }

    /** An object with the given members. */
    public static JsonObject of(Map<String, ? extends Json> members) {
        return new JsonObject(new TreeMap<>(members));
    }

    /** The same object with one member set. */
    public JsonObject with(String name, Json value) {
        SortedMap<String, Json> copy = new TreeMap<>(members);
        copy.put(name, value);
        return new JsonObject(copy);
    }

    /** The same object with a text member set. */
    public JsonObject with(String name, String value) {
        return with(name, new JsonText(value));
    }

    /** The same object with a number member set. */
    public JsonObject with(String name, double value) {
        return with(name, new JsonNumber(value));
    }

    /** The same object with a member set when there is a value. */
    public JsonObject with(String name, Optional<? extends Json> value) {
        return value.isPresent() ? with(name, (Json) value.get()) : this;
    }

    /** The same object without one member. */
    public JsonObject without(String name) {
        SortedMap<String, Json> copy = new TreeMap<>(members);
        copy.remove(name);
        return new JsonObject(copy);
    }

    /** A member of any sort. */
    public Optional<Json> get(String name) {
        return Optional.ofNullable(members.get(name));
    }

    /** A text member; empty when absent or of another sort. */
    public Optional<String> text(String name) {
        return members.get(name) instanceof JsonText text ? Optional.of(text.value()) : Optional.empty();
    }

    /** A number member; empty when absent or of another sort. */
    public OptionalDouble number(String name) {
        return members.get(name) instanceof JsonNumber number
                ? OptionalDouble.of(number.value())
                : OptionalDouble.empty();
    }

    /** An integer member; empty when absent or of another sort. */
    public OptionalLong integer(String name) {
        return members.get(name) instanceof JsonNumber number ? number.asInteger() : OptionalLong.empty();
    }

    /** A true-or-false member; empty when absent or of another sort. */
    public Optional<Boolean> flag(String name) {
        return members.get(name) instanceof JsonBoolean flag ? Optional.of(flag.value()) : Optional.empty();
    }

    /** An object member; empty when absent or of another sort. */
    public Optional<JsonObject> object(String name) {
        return members.get(name) instanceof JsonObject object ? Optional.of(object) : Optional.empty();
    }

    /** An array member; the empty array when absent or of another sort. */
    public JsonArray array(String name) {
        return members.get(name) instanceof JsonArray array ? array : new JsonArray(java.util.List.of());
    }
}
