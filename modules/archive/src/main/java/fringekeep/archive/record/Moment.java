package fringekeep.archive.record;

import java.time.Instant;
import java.util.Optional;

/**
 * A moment people mean: the instant, and the offset and zone that were in force, which are recorded facts.
 *
 * @param at the instant (UTC)
 * @param offset {@code +02:00} or {@code Z}
 * @param zone IANA zone id when known
 */
public record Moment(Instant at, String offset, Optional<String> zone) {}
