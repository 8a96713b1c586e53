package fringekeep.archive.internal.store;

import fringekeep.archive.Circumstances;
import fringekeep.archive.record.Hash;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;
import java.util.HexFormat;

/** Clock and random source that say what a test tells them to. */
final class Script {
    private final Deque<byte[]> next = new ArrayDeque<>();
    private Instant now = Instant.parse("2031-05-14T09:00:00Z");
    private int drawn;

    void at(String instant) {
        now = Instant.parse(instant);
    }

    /** The next sixteen bytes, as 32 digits. */
    void draw(String hex) {
        next.add(HexFormat.of().parseHex(hex));
    }

    Circumstances circumstances() {
        return new Circumstances(this::clock, this::random, ZoneId.of("Etc/GMT-2"), "1.0.0");
    }

    private synchronized Instant clock() {
        return now;
    }

    private synchronized byte[] random() {
        byte[] told = next.poll();
        return told != null
                ? told
                : Arrays.copyOf(
                        Hash.of(("draw " + drawn++).getBytes(StandardCharsets.UTF_8))
                                .bytes(),
                        16);
    }
}
