package fringekeep.desk.run;

/**
 * How far a job is.
 *
 * @param what a few words
 * @param done how many of {@code total}
 * @param total 0 when unknown
 * @param place whose job it is
 */
public record Progress(String what, long done, long total, String place) {}
