package fringekeep.archive.record;

import java.util.Optional;

/** What a record was made from: a record, or a raw file. */
public sealed interface InputReference {
    /** The role the input plays. */
    String role();

    /** A pinned record, and which of its channels if one is meant. */
    record OfRecord(String role, Hash record, Optional<String> channel) implements InputReference {
        /** A pinned record as a whole. */
        public OfRecord(String role, Hash record) {
            this(role, record, Optional.empty());
        }
    }

    /** A raw file of so many bytes. */
    record OfRaw(String role, Hash raw, long bytes) implements InputReference {}
}
