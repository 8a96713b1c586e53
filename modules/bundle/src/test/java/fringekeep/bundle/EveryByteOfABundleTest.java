package fringekeep.bundle;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.internal.Bag;
import fringekeep.testsupport.OtherProgram;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * One byte of a bundle is changed: its check names the file. The profile {@code thorough} changes every byte, the ordinary
 * build seeded ones. The same byte of all files below {@code data} is changed at once, and each must be named.
 */
class EveryByteOfABundleTest {
    private static final int POSITIONS = 40;

    @TempDir
    private static Path folder;

    private static Path bag = Path.of("");
    private static Path zip = Path.of("");
    private final SplittableRandom random = new SplittableRandom(20310514);

    @BeforeAll
    static void export() throws Exception {
        SmallArchive small = SmallArchive.found(folder.resolve("archive"));
        try (var archive = small.archive()) {
            Hash root = ExportedOnce.root(small);
            assertThat(archive.record(root)).isPresent();
            bag = ExportedOnce.export(small, root, "readings", Files.createDirectory(folder.resolve("out")), false);
            zip = ExportedOnce.export(small, root, "packed", folder, true);
        }
    }

    /** Every byte was put back. */
    @AfterAll
    static void isWhole() throws Exception {
        assertThat(check(bag).level()).isEqualTo(Level.RECOMPUTED);
    }

    private static BundleReport check(Path bundle) throws Exception {
        return CheckBundle.check(bundle, SmallArchive.kinds(), Level.RECOMPUTED, Work.QUIET);
    }

    private int[] positions(int length) {
        return OtherProgram.thorough()
                ? IntStream.range(0, length).toArray()
                : IntStream.concat(IntStream.of(0, length - 1), IntStream.generate(() -> random.nextInt(length)))
                        .limit(POSITIONS)
                        .toArray();
    }

    private static byte[] changed(byte[] whole, int at, int other) {
        byte[] copy = whole.clone();
        if (at < copy.length) {
            copy[at] ^= (byte) other;
        }
        return copy;
    }

    private static boolean names(Problem fault, Path file) {
        return (fault.where() + " " + fault.what()).contains(Bag.relative(bag, file));
    }

    @Test
    void aChangedByteOfAnyDataFileIsFoundAndNamed() throws Exception {
        List<Path> files = Bag.filesBelow(bag, bag.resolve("data"));
        List<byte[]> whole = new ArrayList<>();
        int longest = 0;
        for (Path file : files) {
            whole.add(Files.readAllBytes(file));
            longest = Math.max(longest, whole.get(whole.size() - 1).length);
        }
        for (int at : positions(longest)) {
            int other = 1 + random.nextInt(255);
            for (int i = 0; i < files.size(); i++) {
                Files.write(files.get(i), changed(whole.get(i), at, other));
            }
            BundleReport report = check(bag);
            for (int i = 0; i < files.size(); i++) {
                if (at < whole.get(i).length) {
                    Path file = files.get(i);
                    assertThat(report.allFaults())
                            .as("%s, byte %d xor %d", file, at, other)
                            .anyMatch(fault -> names(fault, file));
                }
            }
        }
        for (int i = 0; i < files.size(); i++) {
            Files.write(files.get(i), whole.get(i));
        }
    }

    @Test
    void aChangedByteOfAListOrDescriptionIsFoundAndNamed() throws Exception {
        List<Path> files = Bag.filesBelow(bag, bag).stream()
                .filter(file -> !file.startsWith(bag.resolve("data")))
                .toList();
        assertThat(files).hasSize(6);
        for (Path file : files) {
            byte[] whole = Files.readAllBytes(file);
            for (int at : positions(whole.length)) {
                // the bit that tells capital from small letters is the hardest to notice in a checksum
                for (int other : new int[] {0x20, 1 + random.nextInt(255)}) {
                    Files.write(file, changed(whole, at, other));
                    assertThat(check(bag).allFaults())
                            .as("%s, byte %d xor %d", file, at, other)
                            .anyMatch(fault -> names(fault, file));
                }
            }
            Files.write(file, whole);
        }
    }

    @Test
    void aZipWithAChangedByteIsRefusedOrHoldsTheSameFiles() throws Exception {
        byte[] whole = Files.readAllBytes(zip);
        Path changed = folder.resolve("changed.zip");
        int refused = 0;
        for (int at : positions(whole.length)) {
            Files.write(changed, changed(whole, at, 1 + random.nextInt(255)));
            try {
                BundleReport report = check(changed);
                // times and version numbers of a zip protect nothing: then all that is unpacked is whole
                refused += report.level() == Level.RECOMPUTED ? 0 : 1;
                assertThat(report.level() == Level.RECOMPUTED)
                        .as("byte %d: %s", at, report.allFaults())
                        .isEqualTo(report.allFaults().isEmpty());
            } catch (ProblemException e) {
                assertThat(e.problems().get(0).where()).contains("changed.zip");
                refused++;
            }
        }
        assertThat(refused).isPositive();
    }
}
