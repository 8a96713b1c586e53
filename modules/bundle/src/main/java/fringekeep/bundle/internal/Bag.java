package fringekeep.bundle.internal;

import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.LocalDate;
import java.util.HexFormat;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;

/**
 * Writes the tag files of a bag around a finished {@code data} folder.
 *
 * <p>Source: RFC 8493, The BagIt File Packaging Format (V1.0), 2018, sections 2.1 and 2.2. Two spaces stand between hash and
 * path, so that {@code sha256sum -c} and {@code sha512sum -c} read the manifests as they are.
 */
public final class Bag {
    /** Algorithms of the manifests, by their name in file names, with the name the platform knows. */
    public static final SortedMap<String, String> ALGORITHMS = java.util.Collections.unmodifiableSortedMap(
            new TreeMap<>(java.util.Map.of("sha256", "SHA-256", "sha512", "SHA-512")));

    /** First tag file, exactly two lines. */
    public static final String DECLARATION = "BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n";

    private static final int LONGEST_LINE = 79;

    private Bag() {}

    /**
     * Writes manifests, declaration and description.
     *
     * @param bag folder that holds the payload
     * @param description one paragraph
     * @param organisation who answers for the dataset
     * @param date day of bagging, from the export's settings and not from the clock, so that two exports agree
     */
    public static void close(Path bag, String description, String organisation, LocalDate date, Work work)
            throws IOException, StoppedException {
        List<Path> payload = filesBelow(bag, bag.resolve("data"));
        SortedMap<String, SortedMap<String, String>> sums = new TreeMap<>();
        ALGORITHMS.keySet().forEach(name -> sums.put(name, new TreeMap<>()));
        long octets = 0;
        for (int i = 0; i < payload.size(); i++) {
            work.check();
            work.progress(i, payload.size(), "checksums");
            Path file = payload.get(i);
            String path = relative(bag, file);
            SortedMap<String, String> found = checksums(file);
            found.forEach((name, sum) -> of(sums, name).put(path, sum));
            octets += Files.size(file);
        }
        write(bag.resolve("bagit.txt"), DECLARATION);
        for (String name : ALGORITHMS.keySet()) {
            write(bag.resolve("manifest-" + name + ".txt"), manifest(of(sums, name)));
        }
        write(bag.resolve("bag-info.txt"), information(description, organisation, date, octets, payload.size()));
        writeTagManifests(bag);
    }

    private static SortedMap<String, String> of(SortedMap<String, SortedMap<String, String>> sums, String algorithm) {
        return java.util.Objects.requireNonNull(sums.get(algorithm), algorithm);
    }

    private static void writeTagManifests(Path bag) throws IOException {
        List<String> tags = List.of("bag-info.txt", "bagit.txt", "manifest-sha256.txt", "manifest-sha512.txt");
        for (String name : ALGORITHMS.keySet()) {
            SortedMap<String, String> sums = new TreeMap<>();
            for (String tag : tags) {
                sums.put(tag, checksums(bag.resolve(tag)).get(name));
            }
            write(bag.resolve("tagmanifest-" + name + ".txt"), manifest(sums));
        }
    }

    private static String information(String description, String organisation, LocalDate date, long octets, int files) {
        StringBuilder text = new StringBuilder();
        fold(text, "Source-Organization", organisation);
        fold(text, "External-Description", description);
        fold(text, "Bagging-Date", date.toString());
        fold(text, "Payload-Oxum", octets + "." + files);
        return text.toString();
    }

    /** One label with its value; long values go on in further lines that begin with white space (RFC 8493, 2.2.2). */
    static void fold(StringBuilder text, String label, String value) {
        StringBuilder line = new StringBuilder(label).append(':');
        for (String word : value.strip().split("\\s+")) {
            if (line.length() + 1 + word.length() > LONGEST_LINE) {
                text.append(line).append('\n');
                line.setLength(0);
            }
            line.append(' ').append(word);
        }
        text.append(line).append('\n');
    }

    /** A list of checksums by path, as every bundle has it: digits in lower case, two spaces, the path, a line end. */
    static String manifest(SortedMap<String, String> sums) {
        StringBuilder text = new StringBuilder();
        sums.forEach((path, sum) ->
                text.append(sum).append("  ").append(encode(path)).append('\n'));
        return text.toString();
    }

    /** LF, CR and percent signs of a path as RFC 8493, 2.1.3 writes them. */
    static String encode(String path) {
        return path.replace("%", "%25").replace("\n", "%0A").replace("\r", "%0D");
    }

    /** The reverse of {@link #encode}. */
    static String decode(String path) {
        return path.replace("%0A", "\n")
                .replace("%0a", "\n")
                .replace("%0D", "\r")
                .replace("%0d", "\r")
                .replace("%25", "%");
    }

    /** Regular files below a folder in the order of their paths' UTF-16 code units. */
    public static List<Path> filesBelow(Path base, Path folder) throws IOException {
        if (!Files.isDirectory(folder)) {
            return List.of();
        }
        try (Stream<Path> all = Files.walk(folder)) {
            return all.filter(path -> !Files.isDirectory(path))
                    .sorted((a, b) -> relative(base, a).compareTo(relative(base, b)))
                    .toList();
        }
    }

    /** A path below a base with {@code /} between its names. */
    public static String relative(Path base, Path file) {
        StringBuilder text = new StringBuilder();
        for (Path name : base.relativize(file)) {
            text.append(text.length() == 0 ? "" : "/").append(name);
        }
        return text.toString();
    }

    /** Both checksums of a file, read once. */
    public static SortedMap<String, String> checksums(Path file) throws IOException {
        SortedMap<String, MessageDigest> digests = new TreeMap<>();
        ALGORITHMS.forEach((name, algorithm) -> digests.put(name, digest(algorithm)));
        byte[] buffer = new byte[1 << 16];
        try (InputStream in = Files.newInputStream(file)) {
            for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                for (MessageDigest digest : digests.values()) {
                    digest.update(buffer, 0, n);
                }
            }
        }
        SortedMap<String, String> sums = new TreeMap<>();
        digests.forEach((name, digest) -> sums.put(name, HexFormat.of().formatHex(digest.digest())));
        return sums;
    }

    private static MessageDigest digest(String algorithm) {
        try {
            return MessageDigest.getInstance(algorithm);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has " + algorithm, e);
        }
    }

    private static void write(Path file, String text) throws IOException {
        Files.write(file, text.getBytes(StandardCharsets.UTF_8));
    }
}
