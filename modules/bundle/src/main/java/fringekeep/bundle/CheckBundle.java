package fringekeep.bundle;

import fringekeep.archive.kind.Kinds;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.lineage.Recomputing;
import fringekeep.archive.making.Resolver;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.internal.BagFaults;
import fringekeep.bundle.internal.FolderSource;
import fringekeep.bundle.internal.Layout;
import fringekeep.bundle.internal.LineageFaults;
import fringekeep.bundle.internal.MetadataFaults;
import fringekeep.bundle.internal.Zip;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Consumer;

/** Checks a bundle without any archive, level by level; a level is only asked when the one before holds. */
public final class CheckBundle {
    private final Path bag;
    private final Kinds kinds;
    private final Work work;
    private final Consumer<LevelChecked> told;
    private final SortedMap<Level, List<Problem>> faults = new TreeMap<>();
    private final SortedMap<String, Integer> recomputed = new TreeMap<>();
    private final List<String> notes = new ArrayList<>();
    private int records;

    private CheckBundle(Path bag, Kinds kinds, Work work, Consumer<LevelChecked> told) {
        this.bag = bag;
        this.kinds = kinds;
        this.work = work;
        this.told = told;
    }

    /**
     * Checks a folder or a zip.
     *
     * @param kinds kinds that can recompute; records of others are carried and noted
     * @param most the highest level asked
     * @throws ProblemException if there is no bundle to check at all
     */
    public static BundleReport check(Path bundle, Kinds kinds, Level most, Work work)
            throws ProblemException, StoppedException {
        return check(bundle, kinds, most, work, level -> {});
    }

    /**
     * A level that was asked.
     *
     * @param level the level
     * @param faults what is wrong; empty when it holds
     */
    public record LevelChecked(Level level, List<Problem> faults) {
        /** Copies. */
        public LevelChecked {
            faults = List.copyOf(faults);
        }
    }

    /**
     * The same, telling of each level as soon as it was asked.
     *
     * @param told hears of each level, on the calling thread
     */
    public static BundleReport check(Path bundle, Kinds kinds, Level most, Work work, Consumer<LevelChecked> told)
            throws ProblemException, StoppedException {
        try {
            if (Files.isDirectory(bundle)) {
                return new CheckBundle(bundle, kinds, work, told).run(most);
            }
            if (!Files.isRegularFile(bundle)) {
                throw problem("bundle.not-there", "There is no such folder or file.", bundle);
            }
            Path aside = Files.createTempDirectory("fringekeep-check-");
            try {
                return new CheckBundle(Zip.unpack(bundle, aside, work), kinds, work, told).run(most);
            } finally {
                Layout.remove(aside);
            }
        } catch (IOException e) {
            throw problem("bundle.io", "The bundle could not be read: " + e.getMessage() + ".", bundle);
        }
    }

    private static ProblemException problem(String code, String what, Path where) {
        return new ProblemException(
                new Problem(code, what, where.toString(), "Name the folder that holds bagit.txt, or its zip."));
    }

    private BundleReport run(Level most) throws IOException, StoppedException {
        Level reached = Level.NONE;
        for (Level level : List.of(Level.FILES_INTACT, Level.METADATA_VALID, Level.LINEAGE_FOLLOWS, Level.RECOMPUTED)) {
            if (level.compareTo(most) > 0) {
                break;
            }
            List<Problem> found = level(level);
            told.accept(new LevelChecked(level, found));
            if (!found.isEmpty()) {
                faults.put(level, found);
                break;
            }
            reached = level;
        }
        return new BundleReport(reached, faults, records, recomputed, notes);
    }

    private List<Problem> level(Level level) throws IOException, StoppedException {
        Path data = bag.resolve("data");
        try {
            return switch (level) {
                case NONE -> List.of();
                case FILES_INTACT -> BagFaults.of(bag, work);
                case METADATA_VALID -> MetadataFaults.of(data);
                case LINEAGE_FOLLOWS -> lineage(data);
                case RECOMPUTED -> recomputed(data);
            };
        } catch (IllegalStateException | ClassCastException | IndexOutOfBoundsException e) {
            // intact files whose content has another form than any export gives them
            return List.of(new Problem(
                    "bundle.malformed",
                    "A document of the bundle does not have the form it should: " + e.getMessage() + ".",
                    level.words(),
                    "Get the bundle again from where it came, or export it anew."));
        }
    }

    private List<Problem> lineage(Path data) throws IOException, StoppedException {
        LineageFaults check = LineageFaults.of(data, kinds, work);
        records = check.heads().size();
        notes.addAll(check.notes());
        return check.faults();
    }

    private List<Problem> recomputed(Path data) throws IOException, StoppedException {
        Resolver resolver = new Resolver(kinds, new FolderSource(data));
        List<Hash> heads = LineageFaults.of(data, kinds, work).heads();
        List<Problem> found = new ArrayList<>();
        for (int i = 0; i < heads.size(); i++) {
            work.check();
            work.progress(i, heads.size(), "recomputing");
            Hash record = heads.get(i);
            Recomputed outcome =
                    Recomputing.recompute(resolver.record(record).orElseThrow(), resolver.inputs(record), kinds, work);
            String words = outcome.verdict().words()
                    + (outcome.verdict() == Recomputed.Verdict.NOT_COMPUTABLE ? " (" + outcome.reason() + ")" : "");
            recomputed.merge(words, 1, Integer::sum);
            boolean holds = outcome.verdict() == Recomputed.Verdict.SAME_BITS
                    || outcome.verdict() == Recomputed.Verdict.LAST_PLACES
                    || outcome.reason().equals("entered");
            if (!holds) {
                found.add(new Problem(
                        "bundle.not-recomputed",
                        "A record does not come out as recorded: " + words + differences(outcome) + ".",
                        Layout.record(record),
                        "See with which program version it was made (part made), and recompute with that."));
            }
        }
        return found;
    }

    private static String differences(Recomputed outcome) {
        return outcome.differences().stream()
                .limit(3)
                .map(each -> ", " + each.pointer() + " kept " + each.kept() + " now " + each.now())
                .reduce("", String::concat);
    }
}
