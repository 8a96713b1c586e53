package fringekeep.archive.making;

import fringekeep.archive.Circumstances;
import fringekeep.archive.record.Hash;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.Arrays;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.Supplier;

/**
 * Circumstances that are the same on every machine, for invented data and tests: blocks SHA-256(seed text, 8-byte big-endian
 * counter) as random source (record format 1, section 13), and a clock that is told or steps by a second. Ids and salts are
 * predictable, so an archive made with it must say that it is invented.
 */
public final class ScriptedCircumstances {
    private ScriptedCircumstances() {}

    /** With a clock of the caller's. */
    public static Circumstances of(String seed, Supplier<Instant> clock, ZoneId zone, String build) {
        AtomicLong counter = new AtomicLong();
        return new Circumstances(clock, () -> block(seed, counter.getAndIncrement()), zone, build);
    }

    /** With a clock that begins at an instant and goes on by a second at each look. */
    public static Circumstances stepping(String seed, Instant start, ZoneId zone, String build) {
        AtomicLong seconds = new AtomicLong();
        return of(seed, () -> start.plus(Duration.ofSeconds(seconds.getAndIncrement())), zone, build);
    }

    private static byte[] block(String seed, long counter) {
        MessageDigest digest = Hash.digest();
        digest.update(seed.getBytes(StandardCharsets.UTF_8));
        digest.update(ByteBuffer.allocate(Long.BYTES).putLong(counter).array());
        return Arrays.copyOf(digest.digest(), 16);
    }
}
