package fringekeep.bundle;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.internal.Bag;
import fringekeep.bundle.internal.Contents;
import fringekeep.bundle.internal.Layout;
import fringekeep.bundle.internal.Writing;
import fringekeep.bundle.internal.Zip;
import fringekeep.bundle.stated.BundleSettings;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;

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
        try {
            return write(archive, roots, settings, parent, zip, work);
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "bundle.io",
                    "The bundle could not be written: " + e.getMessage() + ".",
                    parent.toString(),
                    "Make room or choose another folder; nothing stands under the bundle's name."));
        }
    }

    private static Exported write(
            Archive archive, List<Hash> roots, BundleSettings settings, Path parent, boolean zip, Work work)
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
                Layout.publish(packed, target);
            } else {
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
