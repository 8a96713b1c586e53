package fringekeep.archive.internal.store.journal;

import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import java.util.Optional;
import java.util.OptionalLong;

/** What a journal entry says was done. */
public sealed interface Act {
    /** The act's name as written. */
    String name();

    /**
     * What the lab calls the archive and how it counts days.
     *
     * @param title 1 to 200 characters
     * @param dayBoundary {@code HH:MM}
     * @param zone time-zone id
     */
    record Naming(String title, String dayBoundary, String zone) {}

    /** Journal state of another archive. */
    record Continues(ArchiveId archive, long n, Hash sha256) {}

    /** Entry 1. */
    record Founded(Naming naming, boolean invented, Optional<Continues> continues) implements Act {
        @Override
        public String name() {
            return "founded";
        }
    }

    /** From here on title, boundary and zone are these, whole. */
    record Settings(Naming naming) implements Act {
        @Override
        public String name() {
            return "settings";
        }
    }

    /** A record made here; with a number when it brings its thing. */
    record Recorded(Hash record, OptionalLong number) implements Act {
        @Override
        public String name() {
            return "recorded";
        }
    }

    /** A record that came from elsewhere. */
    record Received(Hash record, Origin origin) implements Act {
        @Override
        public String name() {
            return "received";
        }
    }

    /** Where a received record was recorded first, as far as known. */
    record Origin(ArchiveId archive, OptionalLong n, OptionalLong number) {}

    /** A part of a record that was withheld when the record came. */
    record Supplied(Hash record, String part, Hash sha256) implements Act {
        @Override
        public String name() {
            return "supplied";
        }
    }

    /** Bytes taken away for cause. */
    record Purged(String what, Hash sha256, String reason, String text) implements Act {
        @Override
        public String name() {
            return "purged";
        }
    }

    /** What a person's id stood for is gone. */
    record PersonErased(PersonId person) implements Act {
        @Override
        public String name() {
            return "person-erased";
        }
    }
}
