package fringekeep.archive.record;

/**
 * What a record speaks of without being made from it.
 *
 * @param role the part it plays
 * @param record a record
 * @param reach that record alone, or all records of its thing
 */
public record AboutReference(String role, Hash record, Reach reach) {
    /** How far a reference reaches. */
    public enum Reach {
        /** That record alone. */
        RECORD,
        /** All records of its thing. */
        THING
    }
}
