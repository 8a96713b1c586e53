package fringekeep.bundle;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.internal.Bag;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Bundles of a real archive: whole, changed by a byte, and changed by someone who mends the manifests. */
class BundleTest {
    @TempDir
    private static Path shared;

    @TempDir
    private Path folder;

    private static SmallArchive small;
    private static Hash root;
    private static Path good;

    @BeforeAll
    static void export() throws Exception {
        small = SmallArchive.found(shared.resolve("archive"));
        root = ExportedOnce.root(small);
        good = ExportedOnce.export(small, root, "readings", Files.createDirectory(shared.resolve("out")), false);
    }

    @AfterAll
    static void close() {
        small.archive().close();
    }

    private static BundleReport check(Path bundle) throws Exception {
        return CheckBundle.check(bundle, SmallArchive.kinds(), Level.RECOMPUTED, Work.QUIET);
    }

    @Test
    void folderAndZipHoldAtTheHighestLevel() throws Exception {
        Path zip = ExportedOnce.export(small, root, "packed", folder, true);

        for (Path bundle : List.of(good, zip)) {
            BundleReport report = check(bundle);
            assertThat(report.allFaults()).isEmpty();
            assertThat(report.level()).isEqualTo(Level.RECOMPUTED);
            assertThat(report.records()).isEqualTo(5);
            assertThat(report.recomputed()).containsEntry("same bits", 2);
        }
    }

    @Test
    void whatGoesInIsCountedByKind() {
        assertThat(ExportBundle.shares(small.archive(), List.of(root)).values().stream()
                        .mapToInt(ExportBundle.KindShare::records)
                        .sum())
                .isEqualTo(ExportBundle.preview(small.archive(), List.of(root)).records());
        assertThat(ExportBundle.shares(small.archive(), List.of(root)).values().stream()
                        .mapToLong(ExportBundle.KindShare::rawBytes)
                        .sum())
                .isEqualTo(ExportBundle.preview(small.archive(), List.of(root)).rawBytes());
    }

    @Test
    void aCheckedExportTellsOfEveryLevelAndAStoppedOneLeavesNothing() throws Exception {
        List<Level> told = new java.util.ArrayList<>();
        ExportBundle.CheckedExport checked = ExportBundle.exportChecked(
                small.archive(),
                List.of(root),
                ExportedOnce.settings("checked"),
                folder,
                true,
                Work.QUIET,
                level -> told.add(level.level()));

        assertThat(checked.exported().place()).isRegularFile();
        assertThat(checked.report().level()).isEqualTo(Level.RECOMPUTED);
        assertThat(told)
                .containsExactly(Level.FILES_INTACT, Level.METADATA_VALID, Level.LINEAGE_FOLLOWS, Level.RECOMPUTED);

        for (int reports = 1; reports < 40; reports += 3) {
            StopAfter work = new StopAfter(reports);
            Path into = Files.createDirectory(folder.resolve("stopped-" + reports));
            Throwable stopping = org.assertj.core.api.Assertions.catchThrowable(() -> ExportBundle.exportChecked(
                    small.archive(), List.of(root), ExportedOnce.settings("stopped"), into, false, work, level -> {}));
            try (java.util.stream.Stream<Path> left = Files.list(into)) {
                boolean stopped = stopping instanceof fringekeep.archive.problem.StoppedException;
                assertThat(stopped || stopping == null)
                        .as("after %d reports", reports)
                        .isTrue();
                assertThat(left.count()).as("stopped after %d reports", reports).isEqualTo(stopped ? 0 : 1);
            }
        }
    }

    /** Work that is stopped once it has reported so often. */
    private static final class StopAfter implements Work {
        private final int most;
        private int reports;

        StopAfter(int most) {
            this.most = most;
        }

        @Override
        public void progress(long done, long total, String what) {
            reports++;
        }

        @Override
        public boolean stopped() {
            return reports >= most;
        }
    }

    @Test
    void twoExportsHaveTheSameBytes() throws Exception {
        Path again = ExportedOnce.export(small, root, "readings", folder, false);

        List<Path> files = Bag.filesBelow(good, good);
        assertThat(Bag.filesBelow(again, again)).hasSameSizeAs(files);
        for (Path file : files) {
            assertThat(again.resolve(good.relativize(file).toString())).hasSameBinaryContentAs(file);
        }
        Path first = ExportedOnce.export(small, root, "packed", Files.createDirectory(folder.resolve("a")), true);
        Path second = ExportedOnce.export(small, root, "packed", Files.createDirectory(folder.resolve("b")), true);
        assertThat(first).hasSameBinaryContentAs(second);
    }

    @Test
    void aChangedByteOfAnyFileIsFoundAndNamed() throws Exception {
        Path bag = ExportedOnce.copy(good, folder.resolve("bag"));
        for (Path file : Bag.filesBelow(bag, bag)) {
            byte[] whole = Files.readAllBytes(file);
            byte[] changed = whole.clone();
            changed[changed.length / 2] ^= 1;
            Files.write(file, changed);
            BundleReport report = check(bag);
            assertThat(report.level()).as("changed %s", file).isEqualTo(Level.NONE);
            assertThat(report.allFaults())
                    .anyMatch(fault -> (fault.where() + fault.what())
                            .contains(file.getFileName().toString()));
            Files.write(file, whole);
        }
        assertThat(check(bag).level()).isEqualTo(Level.RECOMPUTED);
    }

    @Test
    void aChangedRecordIsCaughtThoughTheManifestsWereMended() throws Exception {
        for (String kind : List.of("records", "raw")) {
            Path bag = ExportedOnce.copy(good, folder.resolve(kind));
            Path file = Bag.filesBelow(bag, bag.resolve("data").resolve(kind)).get(0);
            byte[] bytes = Files.readAllBytes(file);
            bytes[bytes.length / 2] ^= 1;
            Files.write(file, bytes);
            ExportedOnce.closeAnew(bag);

            BundleReport report = check(bag);

            assertThat(report.faults()).as(kind).isNotEmpty();
            assertThat(report.level()).as(kind).isLessThan(Level.LINEAGE_FOLLOWS);
        }
    }

    @Test
    void aChangedTableIsCaughtThoughTheManifestsWereMended() throws Exception {
        Path bag = ExportedOnce.copy(good, folder.resolve("bag"));
        List<Path> tables = Bag.filesBelow(bag, bag.resolve("data")).stream()
                .filter(file -> file.toString().endsWith(".csv"))
                .toList();
        assertThat(tables).isNotEmpty();
        byte[] bytes = Files.readAllBytes(tables.get(0));
        bytes[bytes.length - 3] ^= 1;
        Files.write(tables.get(0), bytes);
        ExportedOnce.closeAnew(bag);

        assertThat(check(bag).level()).isEqualTo(Level.FILES_INTACT);
        assertThat(check(bag).faults()).containsOnlyKeys(Level.METADATA_VALID);
    }

    @ParameterizedTest
    @ValueSource(strings = {"ro-crate-metadata.json", "datapackage.json", "provenance/prov.json"})
    void malformedDocumentsGiveFaultsAndNeverAnException(String document) throws Exception {
        int number = 0;
        String text = Files.readString(good.resolve("data").resolve(document));
        for (String bad : List.of(
                "",
                "{",
                "[]",
                "7",
                "null",
                "{}",
                text.substring(0, text.length() / 2),
                text.replace("{", "[").replace("}", "]"),
                "{\"@graph\":7,\"resources\":7,\"entity\":7,\"wasGeneratedBy\":[1],\"wasDerivedFrom\":[1]}",
                "{\"@graph\":[7],\"resources\":[7],\"wasGeneratedBy\":{\"a\":7},\"wasDerivedFrom\":{\"a\":7}}")) {
            Path bag = ExportedOnce.copy(good, folder.resolve("bag-" + number++));
            Files.writeString(bag.resolve("data").resolve(document), bad);
            ExportedOnce.closeAnew(bag);

            BundleReport report = check(bag);

            assertThat(report.level()).as(bad).isEqualTo(Level.FILES_INTACT);
            assertThat(report.allFaults()).as(bad).isNotEmpty();
        }
    }

    private String refusal(List<Hash> roots, Path parent) {
        return catchThrowableOfType(
                        ProblemException.class,
                        () -> ExportBundle.export(
                                small.archive(), roots, ExportedOnce.settings("readings"), parent, false, Work.QUIET))
                .problems()
                .stream()
                .map(Problem::code)
                .findFirst()
                .orElseThrow();
    }

    @Test
    void refusedExportsWriteNothing() throws Exception {
        assertThat(refusal(List.of(), folder)).isEqualTo("bundle.no-root");
        assertThat(refusal(List.of(Hash.of(new byte[0])), folder)).isEqualTo("bundle.root-absent");
        assertThat(refusal(List.of(root), shared.resolve("archive/sub"))).isEqualTo("bundle.inside-archive");
        assertThat(refusal(List.of(root), good.resolveSibling("."))).startsWith("bundle.");
        assertThat(folder).isEmptyDirectory();
        assertThat(check(good).level()).isEqualTo(Level.RECOMPUTED);
    }
}
