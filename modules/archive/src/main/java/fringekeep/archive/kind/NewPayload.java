package fringekeep.archive.kind;

/**
 * Bytes of a payload to be recorded.
 *
 * @param name name that the parts refer to
 * @param form {@code csv/1} or {@code npy/1.0}
 * @param bytes the bytes
 */
public record NewPayload(String name, String form, byte[] bytes) {
    /** Copies. */
    public NewPayload {
        bytes = bytes.clone();
    }
}
