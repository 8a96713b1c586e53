package fringekeep.bundle.internal;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Verifies a bag: complete (every file listed, every listed file there) and valid (every checksum holds), RFC 8493, section 3.
 */
public final class BagFaults {
    private static final Pattern LINE = Pattern.compile("([0-9a-fA-F]+)[ \\t]+(?:\\*|)(.+)");
    private static final Pattern OXUM = Pattern.compile("(?m)^Payload-Oxum:\\s*(\\d+)\\.(\\d+)\\s*$");
    private static final String UNTOUCHED = "Get the bundle again from where it came; nothing here was changed.";

    private final Path bag;
    private final List<Problem> faults = new ArrayList<>();
    private final SortedMap<String, SortedMap<String, String>> found = new TreeMap<>();

    private BagFaults(Path bag) {
        this.bag = bag;
    }

    /** All faults of a bag, empty when it is complete and valid. */
    public static List<Problem> of(Path bag, Work work) throws IOException, StoppedException {
        BagFaults check = new BagFaults(bag);
        check.run(work);
        return List.copyOf(check.faults);
    }

    private void run(Work work) throws IOException, StoppedException {
        declaration();
        List<Path> payload = Bag.filesBelow(bag, bag.resolve("data"));
        List<Path> all = Bag.filesBelow(bag, bag);
        long octets = 0;
        for (int i = 0; i < all.size(); i++) {
            work.check();
            work.progress(i, all.size(), "checksums");
            Path file = all.get(i);
            if (Files.isSymbolicLink(file)) {
                fault("bundle.link", "A link stands where a file should.", Bag.relative(bag, file));
                continue;
            }
            found.put(Bag.relative(bag, file), Bag.checksums(file));
            octets += payload.contains(file) ? Files.size(file) : 0;
        }
        for (String algorithm : Bag.ALGORITHMS.keySet()) {
            manifest("manifest-" + algorithm + ".txt", algorithm, payloadPaths(payload), true);
            manifest("tagmanifest-" + algorithm + ".txt", algorithm, tagPaths(), false);
            spelling("tagmanifest-" + algorithm + ".txt", algorithm);
        }
        oxum(octets, payload.size());
    }

    private static SortedSet<String> tagPathsOf(Iterable<String> names) {
        SortedSet<String> tags = new TreeSet<>();
        for (String name : names) {
            if (!name.startsWith("data/") && !name.startsWith("tagmanifest-")) {
                tags.add(name);
            }
        }
        return tags;
    }

    private SortedSet<String> tagPaths() {
        return tagPathsOf(found.keySet());
    }

    private SortedSet<String> payloadPaths(List<Path> payload) {
        SortedSet<String> paths = new TreeSet<>();
        payload.forEach(file -> paths.add(Bag.relative(bag, file)));
        return paths;
    }

    private void declaration() throws IOException {
        Path file = bag.resolve("bagit.txt");
        if (!Files.isRegularFile(file)) {
            fault("bundle.no-declaration", "The bundle has no bagit.txt.", "bagit.txt");
        } else if (!text(file).equals(Bag.DECLARATION)) {
            fault("bundle.declaration", "bagit.txt does not say version 1.0 in UTF-8.", "bagit.txt");
        }
    }

    private void manifest(String name, String algorithm, SortedSet<String> expected, boolean required)
            throws IOException {
        Path file = bag.resolve(name);
        if (!Files.isRegularFile(file)) {
            fault("bundle.no-manifest", "The list of checksums " + name + " is missing.", name);
            return;
        }
        SortedSet<String> listed = new TreeSet<>();
        String[] lines = text(file).split("\n");
        for (int i = 0; i < lines.length; i++) {
            line(name, i + 1, lines[i], algorithm, listed);
        }
        SortedSet<String> unlisted = new TreeSet<>(expected);
        unlisted.removeAll(listed);
        for (String path : unlisted) {
            fault(required ? "bundle.unlisted" : "bundle.unlisted-tag", path + " is not listed in " + name + ".", path);
        }
    }

    /** No checksum protects the last lists, so only their exact spelling tells that no byte of them was changed. */
    private void spelling(String name, String algorithm) throws IOException {
        SortedMap<String, String> sums = new TreeMap<>();
        for (String path : tagPaths()) {
            String sum = found.getOrDefault(path, new TreeMap<>()).get(algorithm);
            sums.put(path, java.util.Objects.requireNonNull(sum, path));
        }
        Path file = bag.resolve(name);
        if (faults.isEmpty() && !text(file).equals(Bag.manifest(sums))) {
            fault(
                    "bundle.list-spelling",
                    name + " says what it should, but not as bundles are written: checksums in lower case, two spaces,"
                            + " paths in order.",
                    name);
        }
    }

    private void line(String manifest, int number, String line, String algorithm, SortedSet<String> listed) {
        Matcher parts = LINE.matcher(line);
        String where = manifest + ", line " + number;
        if (!parts.matches()) {
            fault("bundle.manifest-line", "A line is not a checksum and a path.", where);
            return;
        }
        String path = Bag.decode(parts.group(2).strip());
        if (Zip.unsafe(path)) {
            fault("bundle.unsafe-path", "A path leads out of the bundle: " + path + ".", where);
            return;
        }
        if (!listed.add(path)) {
            fault("bundle.listed-twice", path + " is listed twice.", where);
        }
        SortedMap<String, String> sums = found.get(path);
        if (sums == null) {
            fault("bundle.missing-file", path + " is listed but not there.", where);
        } else if (!parts.group(1).equalsIgnoreCase(sums.get(algorithm))) {
            fault(
                    "bundle.changed-file",
                    path + " was changed, or its line in " + manifest + ": the " + algorithm + " differs.",
                    path);
        }
    }

    private void oxum(long octets, int files) throws IOException {
        Path file = bag.resolve("bag-info.txt");
        if (!Files.isRegularFile(file)) {
            fault("bundle.no-information", "The bundle has no bag-info.txt.", "bag-info.txt");
            return;
        }
        Matcher oxum = OXUM.matcher(text(file));
        boolean agrees = oxum.find()
                && oxum.group(1).equals(Long.toString(octets))
                && oxum.group(2).equals(Integer.toString(files));
        if (!agrees) {
            fault(
                    "bundle.oxum",
                    "bag-info.txt does not state the payload found: " + octets + " bytes in " + files + " files.",
                    "bag-info.txt, Payload-Oxum");
        }
    }

    private String text(Path file) throws IOException {
        try {
            return StandardCharsets.UTF_8
                    .newDecoder()
                    .decode(java.nio.ByteBuffer.wrap(Files.readAllBytes(file)))
                    .toString();
        } catch (CharacterCodingException e) {
            fault("bundle.encoding", "A tag file is not UTF-8.", Bag.relative(bag, file));
            return "";
        }
    }

    private void fault(String code, String what, String where) {
        faults.add(new Problem(code, what, where, UNTOUCHED));
    }
}
