package fringekeep.archive.record;

/**
 * A payload a record carries.
 *
 * @param name name that the parts refer to
 * @param sha256 hash of its bytes
 * @param bytes length (bytes)
 * @param form {@code csv/1} or {@code npy/1.0}
 */
public record PayloadReference(String name, Hash sha256, long bytes, String form) {}
