package fringekeep.archive.json;

/** A JSON true or false. */
public record JsonBoolean(boolean value) implements Json {}
