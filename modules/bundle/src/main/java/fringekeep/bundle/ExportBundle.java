package fringekeep.bundle;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.bundle.internal.Bag;
import fringekeep.bundle.internal.Contents;
import fringekeep.bundle.internal.Layout;
import fringekeep.bundle.internal.Writing;
import fringekeep.bundle.internal.Zip;
import fringekeep.bundle.stated.BundleSettings;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Consumer;

/**
 * Exports records with everything they rest on as a folder that strangers check with standard tools. The bundle is written
 * aside and gets its name only when every byte is on the disk: a stopped or killed export leaves nothing under the final name.
 */
public final class ExportBundle {
    private static final String ASIDE = ".aside";

    private ExportBundle() {}

    /** What was written. */
    public record Exported(Path place, int records, int rawFiles, int absent) {}

    /** What would go in, without writing anything. */
    public record Preview(int records, int rawFiles, long rawBytes, List<Hash> absent) {}

    /**
     * What one kind brings into an export.
     *
     * @param records how many records
     * @param rawFiles raw files that records of this kind were made from, each counted where it is met first
     * @param rawBytes their length together
     * @param outdated how many of its records are outdated
     */
    public record KindShare(int records, int rawFiles, long rawBytes, int outdated) {}

    /**
     * What would go in by kind, without writing anything. Reads every record: away from the window thread only.
     *
     * @return shares by the kind's name
     */
    public static SortedMap<String, KindShare> shares(Archive archive, List<Hash> roots) {
        Graph graph = archive.graph();
        SortedMap<String, KindShare> shares = new TreeMap<>();
        Set<Hash> met = new HashSet<>();
        for (LineageRecord record : Contents.of(archive, roots).lineage().records()) {
            int files = 0;
            long bytes = 0;
            for (InputReference input : record.view().head().inputs()) {
                if (input instanceof InputReference.OfRaw raw && met.add(raw.raw())) {
                    files++;
                    bytes += raw.bytes();
                }
            }
            int outdated = graph.states(record.fingerprint()).contains(StateName.OUTDATED) ? 1 : 0;
            KindShare one = new KindShare(1, files, bytes, outdated);
            shares.merge(record.view().head().kind().text(), one, ExportBundle::sum);
        }
        return shares;
    }

    private static KindShare sum(KindShare a, KindShare b) {
        return new KindShare(
                a.records() + b.records(),
                a.rawFiles() + b.rawFiles(),
                a.rawBytes() + b.rawBytes(),
                a.outdated() + b.outdated());
    }

    /** Counts what an export of these roots would hold. */
    public static Preview preview(Archive archive, List<Hash> roots) {
        Contents contents = Contents.of(archive, roots);
        long bytes = contents.lineage().rawFiles().values().stream()
                .mapToLong(Long::longValue)
                .sum();
        return new Preview(
                contents.lineage().records().size(),
                contents.lineage().rawFiles().size(),
                bytes,
                List.copyOf(contents.lineage().absent()));
    }

    /**
     * Exports into a folder {@code <parent>/<name>}, or a file {@code <parent>/<name>.zip}.
     *
     * @param roots what the dataset is for, usually a figure and its statements; at least one
     * @throws ProblemException if a root is not at hand, a raw file is missing, or the name is taken; nothing was written
     */
    public static Exported export(
            Archive archive, List<Hash> roots, BundleSettings settings, Path parent, boolean zip, Work work)
            throws ProblemException, StoppedException {
        return export(archive, roots, settings, parent, zip, work, written -> {});
    }

    /**
     * What was written, and what the check of it found.
     *
     * @param exported what was written
     * @param report holds at least up to lineage; records that do not come out again are its faults
     */
    public record CheckedExport(Exported exported, BundleReport report) {}

    /**
     * The same, and checks what was written as a stranger would before it gets its name: at every level, up to recomputing.
     *
     * @param told hears of each level that was checked, on the calling thread
     * @throws ProblemException also if files, descriptions or lineage do not hold; nothing stands under the name then. Records
     *     that do not come out again (of a kind or method that this program does not know, say) are told in the report and are
     *     no reason to refuse: they are exported as they were recorded
     */
    public static CheckedExport exportChecked(
            Archive archive,
            List<Hash> roots,
            BundleSettings settings,
            Path parent,
            boolean zip,
            Work work,
            Consumer<CheckBundle.LevelChecked> told)
            throws ProblemException, StoppedException {
        List<BundleReport> reports = new ArrayList<>();
        Exported exported = export(archive, roots, settings, parent, zip, work, written -> {
            BundleReport report = CheckBundle.check(written, archive.kinds(), Level.RECOMPUTED, work, told);
            if (report.level().compareTo(Level.LINEAGE_FOLLOWS) < 0) {
                throw new ProblemException(report.allFaults());
            }
            reports.add(report);
        });
        return new CheckedExport(exported, reports.get(0));
    }

    /** What is done with the finished bundle before it gets its name. */
    private interface BeforeNaming {
        void look(Path written) throws ProblemException, StoppedException;
    }

    private static Exported export(
            Archive archive,
            List<Hash> roots,
            BundleSettings settings,
            Path parent,
            boolean zip,
            Work work,
            BeforeNaming before)
            throws ProblemException, StoppedException {
        try {
            return write(archive, roots, settings, parent, zip, work, before);
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "bundle.io",
                    "The bundle could not be written: " + e.getMessage() + ".",
                    parent.toString(),
                    "Make room or choose another folder; nothing stands under the bundle's name."));
        }
    }

    private static Exported write(
            Archive archive,
            List<Hash> roots,
            BundleSettings settings,
            Path parent,
            boolean zip,
            Work work,
            BeforeNaming before)
            throws IOException, ProblemException, StoppedException {
        Path target = parent.resolve(settings.name() + (zip ? ".zip" : ""));
        Layout.requireFree(target);
        requireOutside(archive, parent);
        Contents contents = Contents.of(archive, roots);
        requireRoots(contents, roots);
        Path aside = parent.resolve("." + settings.name() + ASIDE);
        Layout.remove(aside);
        Path bag = aside.resolve(settings.name());
        try {
            Files.createDirectories(bag.resolve("data"));
            Writing.write(archive, contents, settings, bag.resolve("data"), work);
            Bag.close(bag, settings.description(), settings.publisher(), settings.published(), work);
            if (zip) {
                Path packed = aside.resolve(settings.name() + ".zip");
                Zip.pack(bag, packed, work);
                before.look(packed);
                work.check();
                Layout.publish(packed, target);
            } else {
                before.look(bag);
                work.check();
                Layout.publish(bag, target);
            }
        } finally {
            Layout.remove(aside);
        }
        return new Exported(
                target,
                contents.lineage().records().size(),
                contents.lineage().rawFiles().size(),
                contents.lineage().absent().size());
    }

    private static void requireOutside(Archive archive, Path parent) throws ProblemException {
        Path folder = archive.facts().folder().toAbsolutePath().normalize();
        if (parent.toAbsolutePath().normalize().startsWith(folder)) {
            throw new ProblemException(new Problem(
                    "bundle.inside-archive",
                    "The bundle would stand inside the archive.",
                    parent.toString(),
                    "Choose a folder outside " + folder + "; nothing was written."));
        }
    }

    private static void requireRoots(Contents contents, List<Hash> roots) throws ProblemException {
        if (roots.isEmpty()) {
            throw new ProblemException(new Problem(
                    "bundle.no-root",
                    "Nothing was named to export.",
                    "",
                    "Name at least one record, such as figure 1."));
        }
        for (Hash root : roots) {
            if (contents.lineage().record(root).isEmpty()) {
                throw new ProblemException(new Problem(
                        "bundle.root-absent",
                        "A record to export is not at hand.",
                        root.hex(),
                        "Name a record of this archive; nothing was written."));
            }
        }
    }
}
