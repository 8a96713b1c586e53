package fringekeep.archive.internal.store;

import fringekeep.archive.Archive.PurgeTarget;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import java.io.IOException;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Pattern;

/**
 * Taking bytes away for cause, and refusing them when they come again. Hash and reason stay in the journal. The entry is
 * committed first, then the file goes and the database's freed pages; what a crash leaves in between is removed at the next
 * opening.
 */
final class Purging {
    private static final Pattern REASON = Pattern.compile("[a-z]+(-[a-z]+)*");
    private static final int LONGEST_TEXT = 2_000;
    private final Store store;
    private final Projections projections;

    Purging(Store store, Projections projections) {
        this.store = store;
        this.projections = projections;
    }

    /** Says that bytes were purged. */
    static Problem refused(Hash hash, String where) {
        return new Problem(
                "bytes.purged",
                "The bytes with SHA-256 " + hash + " were purged from this archive for cause.",
                where,
                "See the journal for the reason. They are not taken in again; nothing has been stored.");
    }

    /** Purges, and works out anew what records say that had the part. */
    void purge(PurgeTarget target, Hash hash, String reason, String text, Arriving withoutIt) throws ProblemException {
        requireReason(reason, text);
        Act.Purged act = new Act.Purged(target.name().toLowerCase(Locale.ROOT), hash, reason, text);
        List<Renewal> renewals = target == PurgeTarget.PART ? renewals(hash, withoutIt) : List.of();
        store.<Boolean, ProblemException>write((c, progress) -> {
            require(c, target, hash);
            progress.append(c, act);
            delete(c, target, hash);
            for (Renewal renewal : renewals) {
                renewal.write(c, projections);
            }
            FreedPages.note(c, touched(target, renewals));
            return true;
        });
        deleteFile(target, hash);
        new FreedPages(store).clean();
    }

    /** Tables that held the bytes, or words and rows worked out from them. */
    private Set<String> touched(PurgeTarget target, List<Renewal> renewals) {
        return switch (target) {
            case RAW -> Set.of();
            case PAYLOAD -> Set.of("PAYLOAD");
            case PART -> {
                Set<String> tables = new TreeSet<>(Set.of("PART", "WORD"));
                renewals.forEach(renewal ->
                        tables.addAll(projections.tables(renewal.record().kind())));
                yield tables;
            }
        };
    }

    private static void requireReason(String reason, String text) throws ProblemException {
        if (!REASON.matcher(reason).matches()
                || reason.length() > 40
                || text.isBlank()
                || text.length() > LONGEST_TEXT) {
            throw new ProblemException(new Problem(
                    "purge.reason",
                    "Purging needs a reason code (lower-case words joined by hyphens) and 1 to " + LONGEST_TEXT
                            + " characters of explanation.",
                    "",
                    "Give both. Nothing was changed."));
        }
    }

    private List<Renewal> renewals(Hash part, Arriving withoutIt) {
        List<Records.HeadRow> users = store.<List<Records.HeadRow>, RuntimeException>read(c -> {
            List<Records.HeadRow> found = new ArrayList<>();
            for (long n : PartsTable.usersOfPart(c, part)) {
                found.addAll(Records.heads(c, n, n));
            }
            return found;
        });
        List<Renewal> renewals = new ArrayList<>();
        for (Records.HeadRow user : users) {
            renewals.add(Renewal.of(user.record(), HeadReading.head(user), withoutIt));
        }
        return renewals;
    }

    private void require(Connection c, PurgeTarget target, Hash hash) throws SQLException, ProblemException {
        boolean here =
                switch (target) {
                    case RAW -> PartsTable.rawSize(c, hash).isPresent() || rawOrphan(hash);
                    case PAYLOAD -> PartsTable.payload(c, hash, Long.MAX_VALUE).isPresent();
                    case PART -> PartsTable.part(c, hash, Long.MAX_VALUE).isPresent();
                };
        if (!here) {
            throw new ProblemException(new Problem(
                    "purge.nothing",
                    "There is no " + target.name().toLowerCase(Locale.ROOT) + " with SHA-256 " + hash + ".",
                    "",
                    "Check the hash. Nothing was changed."));
        }
        if (target == PurgeTarget.PART) {
            requireSalted(c, hash);
        }
    }

    private boolean rawOrphan(Hash hash) {
        try {
            return store.raw().size(hash).isPresent();
        } catch (IOException e) {
            throw new StoreFailure("Looking for raw file " + hash, e);
        }
    }

    private static void requireSalted(Connection c, Hash part) throws SQLException, ProblemException {
        List<String> names = Sql.list(
                c, "select distinct name from record_part where sha = ?", row -> row.getString(1), part.bytes());
        for (String name : names) {
            if (!PartName.of(name).map(PartName::salted).orElse(false)) {
                throw new ProblemException(new Problem(
                        "purge.unsalted",
                        "The part is \"" + name + "\", which is never taken away singly.",
                        "",
                        "Only who, remark and identity can be purged. Nothing was changed."));
            }
        }
    }

    private static void delete(Connection c, PurgeTarget target, Hash hash) throws SQLException {
        String text =
                switch (target) {
                    case RAW -> "delete from raw_file where sha = ?";
                    case PAYLOAD -> "delete from payload where sha = ?";
                    case PART -> "delete from part where sha = ?";
                };
        Sql.run(c, text, hash.bytes());
    }

    private void deleteFile(PurgeTarget target, Hash hash) {
        try {
            switch (target) {
                case RAW -> store.raw().delete(hash);
                case PAYLOAD -> store.payloads().delete(hash);
                case PART -> {
                    // parts lie in the database only
                }
            }
        } catch (IOException e) {
            throw new StoreFailure("Removing the purged file " + hash + "; it is tried again at the next opening", e);
        }
    }

    /** Removes files and freed pages of what was purged when a crash came before they were gone. */
    static void sweep(Store store) {
        for (Hash hash : store.state().purged()) {
            try {
                store.raw().delete(hash);
                store.payloads().delete(hash);
            } catch (IOException e) {
                throw new StoreFailure("Removing the purged file " + hash, e);
            }
        }
        new FreedPages(store).clean();
    }
}
