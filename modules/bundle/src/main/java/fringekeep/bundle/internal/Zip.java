package fringekeep.bundle.internal;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.zip.CRC32;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;

/**
 * A bundle as one file. Stored, not deflated, with sorted names and a fixed time, so that the same bundle gives the same
 * bytes everywhere: deflate depends on the library at hand, and the format's times on the zone.
 */
public final class Zip {
    /** Not 1980-01-01, which the platform takes as a mark and answers with a zone-dependent field. */
    private static final LocalDateTime TIME = LocalDateTime.of(1980, 2, 1, 0, 0);

    private static final int MOST_ENTRIES = 2_000_000;
    private static final long MOST_BYTES = 1L << 40;
    private static final Pattern DRIVE = Pattern.compile("[A-Za-z]:.*");

    private Zip() {}

    /** Packs a folder; entry names begin with the folder's name. */
    public static void pack(Path folder, Path zip, Work work) throws IOException, StoppedException {
        List<Path> files = Bag.filesBelow(folder, folder);
        try (ZipOutputStream out =
                new ZipOutputStream(new BufferedOutputStream(Files.newOutputStream(zip)), StandardCharsets.UTF_8)) {
            for (int i = 0; i < files.size(); i++) {
                work.check();
                work.progress(i, files.size(), "packing");
                ZipEntry entry = new ZipEntry(folder.getFileName() + "/" + Bag.relative(folder, files.get(i)));
                entry.setTimeLocal(TIME);
                entry.setMethod(ZipEntry.STORED);
                entry.setSize(Files.size(files.get(i)));
                entry.setCrc(crc(files.get(i)));
                out.putNextEntry(entry);
                Files.copy(files.get(i), out);
                out.closeEntry();
            }
        }
    }

    private static long crc(Path file) throws IOException {
        CRC32 crc = new CRC32();
        byte[] buffer = new byte[1 << 16];
        try (InputStream in = Files.newInputStream(file)) {
            for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                crc.update(buffer, 0, n);
            }
        }
        return crc.getValue();
    }

    /**
     * Unpacks into an empty folder.
     *
     * @return the one folder the bundle lies in
     * @throws ProblemException if a name leads out of the folder, two names differ only in case, or the file is no bundle
     */
    public static Path unpack(Path zip, Path into, Work work) throws IOException, ProblemException, StoppedException {
        Set<String> names = new HashSet<>();
        long bytes = 0;
        String top = "";
        try (ZipInputStream in = new ZipInputStream(Files.newInputStream(zip), StandardCharsets.UTF_8)) {
            for (ZipEntry entry = in.getNextEntry(); entry != null; entry = in.getNextEntry()) {
                work.check();
                work.progress(names.size(), 0, "unpacking");
                String name = entry.getName();
                requireSafe(zip, name, names);
                if (entry.isDirectory()) {
                    continue;
                }
                String first = name.contains("/") ? name.substring(0, name.indexOf('/')) : "";
                if (first.isEmpty() || (!top.isEmpty() && !top.equals(first))) {
                    throw refused(zip, "bundle.zip-layout", "The zip does not hold one folder with everything in it.");
                }
                top = first;
                bytes += copy(in, into.resolve(name), MOST_BYTES - bytes, zip);
            }
        } catch (IllegalArgumentException | java.util.zip.ZipException e) {
            throw refused(zip, "bundle.zip-damaged", "The zip cannot be read: " + e.getMessage() + ".");
        }
        if (top.isEmpty()) {
            throw refused(zip, "bundle.zip-empty", "The file is no zip, or an empty one.");
        }
        return into.resolve(top);
    }

    private static long copy(InputStream in, Path file, long most, Path zip) throws IOException, ProblemException {
        Files.createDirectories(java.util.Objects.requireNonNull(file.getParent()));
        long bytes = 0;
        byte[] buffer = new byte[1 << 16];
        try (OutputStream out = Files.newOutputStream(file)) {
            for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                bytes += n;
                if (bytes > most) {
                    throw refused(zip, "bundle.zip-size", "The zip unpacks to more than 2^40 bytes.");
                }
                out.write(buffer, 0, n);
            }
        }
        return bytes;
    }

    private static void requireSafe(Path zip, String name, Set<String> names) throws ProblemException {
        if (unsafe(name)) {
            throw refused(zip, "bundle.unsafe-path", "A name leads out of the folder: " + name + ".");
        }
        if (!names.add(name.toLowerCase(Locale.ROOT))) {
            throw refused(zip, "bundle.same-name", "Two names differ only in case: " + name + ".");
        }
        if (names.size() > MOST_ENTRIES) {
            throw refused(zip, "bundle.zip-size", "The zip has more than " + MOST_ENTRIES + " entries.");
        }
    }

    /** Whether a path could leave the folder it is meant for, on any system. */
    static boolean unsafe(String path) {
        return path.startsWith("/")
                || path.contains("\\")
                || path.indexOf(0) >= 0
                || DRIVE.matcher(path).matches()
                || List.of(path.split("/")).contains("..");
    }

    private static ProblemException refused(Path zip, String code, String what) {
        return new ProblemException(new Problem(
                code, what, zip.toString(), "Get the bundle again from where it came; nothing was unpacked for good."));
    }
}
