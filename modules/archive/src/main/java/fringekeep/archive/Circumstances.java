package fringekeep.archive;

import java.security.SecureRandom;
import java.time.Instant;
import java.time.ZoneId;
import java.util.function.Supplier;

/**
 * What an archive takes from outside: clock, random source, zone and build. A demonstration passes scripted ones, so that the
 * same program makes the same bytes on every machine.
 *
 * @param clock the instant now
 * @param random sixteen fresh bytes at each call
 * @param zone zone for the offset of {@code made}
 * @param build program version
 */
public record Circumstances(Supplier<Instant> clock, Supplier<byte[]> random, ZoneId zone, String build) {
    /** The real clock and a cryptographic generator. */
    public static Circumstances real(String build) {
        SecureRandom generator = new SecureRandom();
        return new Circumstances(
                () -> Instant.now().truncatedTo(java.time.temporal.ChronoUnit.MILLIS),
                () -> {
                    byte[] bytes = new byte[16];
                    generator.nextBytes(bytes);
                    return bytes;
                },
                ZoneId.systemDefault(),
                build);
    }
}
