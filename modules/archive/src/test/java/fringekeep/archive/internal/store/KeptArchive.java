package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Work;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import java.util.zip.Deflater;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;

/**
 * Archives kept from releases: the golden records, once as a plain copy and once as the closed archive's folder, zipped. Run
 * {@code main} with a new folder before a release and keep what it writes as {@code src/test/reference/kept-archive-<number>};
 * those of earlier releases are never made anew.
 */
final class KeptArchive {
    private static final String COPY = "copy";
    private static final String ZIP = "archive.zip";

    /** Says which process held the archive last; no part of it. */
    private static final String LOCK = "lock";

    private static final String PROPERTIES = "db/service.properties";

    private KeptArchive() {}

    /** Argument: a folder that is not there yet. */
    public static void main(String[] arguments) throws Exception {
        Path target = Files.createDirectory(Path.of(arguments[0]));
        Path work = Files.createTempDirectory("kept-archive").resolve("archive");
        try (Archive archive = Filled.golden(work)) {
            archive.copyTo(target.resolve(COPY), Work.QUIET);
        }
        zip(work, target.resolve(ZIP));
    }

    /** The plain copy of a kept archive. */
    static Path copy(Path kept) {
        return kept.resolve(COPY);
    }

    private static void zip(Path folder, Path file) throws IOException {
        try (Stream<Path> walk = Files.walk(folder);
                OutputStream out = Files.newOutputStream(file);
                ZipOutputStream zip = new ZipOutputStream(out)) {
            zip.setLevel(Deflater.BEST_COMPRESSION);
            List<Path> below = walk.filter(path -> !path.equals(folder) && !path.endsWith(LOCK))
                    .sorted()
                    .toList();
            for (Path path : below) {
                String name = folder.relativize(path).toString().replace('\\', '/');
                ZipEntry entry = new ZipEntry(Files.isDirectory(path) ? name + "/" : name);
                entry.setTime(0);
                zip.putNextEntry(entry);
                if (!entry.isDirectory()) {
                    zip.write(bytes(path));
                }
                zip.closeEntry();
            }
        }
    }

    /** A file's bytes; the database's properties without the remark that names the folder they were written in. */
    private static byte[] bytes(Path file) throws IOException {
        if (!file.endsWith(PROPERTIES)) {
            return Files.readAllBytes(file);
        }
        List<String> lines = Files.readAllLines(file, StandardCharsets.ISO_8859_1);
        String kept = lines.stream().filter(line -> !line.startsWith("#")).collect(Collectors.joining("\n", "", "\n"));
        return kept.getBytes(StandardCharsets.ISO_8859_1);
    }

    /** Unpacks the archive's folder. */
    static void unpack(Path kept, Path folder) throws IOException {
        try (ZipInputStream zip = new ZipInputStream(Files.newInputStream(kept.resolve(ZIP)))) {
            for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
                Path path = folder.resolve(entry.getName()).normalize();
                if (!path.startsWith(folder)) {
                    throw new IOException(entry.getName() + " leads out of the archive's folder");
                }
                if (entry.isDirectory()) {
                    Files.createDirectories(path);
                } else {
                    Files.createDirectories(path.resolveSibling("."));
                    Files.copy(zip, path);
                }
            }
        }
    }
}
