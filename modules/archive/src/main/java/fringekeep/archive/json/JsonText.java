package fringekeep.archive.json;

/** A JSON text, kept exactly as given. */
public record JsonText(String value) implements Json {}
