package fringekeep.bundle;

import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.bundle.internal.Bag;
import fringekeep.bundle.stated.Author;
import fringekeep.bundle.stated.BundleSettings;
import fringekeep.bundle.stated.License;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** What the tests of bundles share: invented settings, a small lineage, copies of a bundle. */
final class ExportedOnce {
    private ExportedOnce() {}

    static BundleSettings settings(String name) {
        return new BundleSettings(
                name,
                "Invented readings",
                "Invented readings and their sums.",
                LocalDate.of(2031, 5, 14),
                License.CC_BY_4_0,
                List.of(new Author("Invented Person", Optional.empty(), Optional.empty())),
                "the invented laboratory",
                List.of("invented"));
    }

    /** A total of two readings and a total, one of them with a raw file, and a judgement. */
    static Hash root(SmallArchive small) throws Exception {
        Hash one = small.reading(0.1, Optional.empty());
        Hash two = small.reading(0.2, Optional.empty());
        byte[] counts = "1,2\n".getBytes(StandardCharsets.UTF_8);
        Hash raw = small.archive().takeIn(counts).hash();
        Hash sum = small.total(List.of(
                SmallArchive.term(one), SmallArchive.term(two), new InputReference.OfRaw("raw", raw, counts.length)));
        Hash total = small.total(List.of(SmallArchive.term(sum), SmallArchive.term(one)));
        small.withdraw(two);
        return total;
    }

    static Path export(SmallArchive small, Hash root, String name, Path parent, boolean zip) throws Exception {
        return ExportBundle.export(small.archive(), List.of(root), settings(name), parent, zip, Work.QUIET)
                .place();
    }

    /** Writes the manifests of a changed bag anew, as one who hides a change would. */
    static void closeAnew(Path bag) throws Exception {
        try (Stream<Path> files = Files.list(bag)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                Files.delete(file);
            }
        }
        BundleSettings stated = settings("any");
        Bag.close(bag, stated.description(), stated.publisher(), stated.published(), Work.QUIET);
    }

    static Path copy(Path from, Path to) throws IOException {
        for (Path file : Bag.filesBelow(from, from)) {
            Path target = to.resolve(from.relativize(file).toString());
            Files.createDirectories(target.resolveSibling("."));
            Files.copy(file, target);
        }
        return to;
    }
}
