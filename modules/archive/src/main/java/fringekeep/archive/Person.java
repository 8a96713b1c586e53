package fringekeep.archive;

import fringekeep.archive.record.PersonId;
import java.util.Optional;

/** What is known of a person; erasable. */
public record Person(PersonId id, Optional<String> name, Optional<String> orcid, Optional<String> mail) {}
