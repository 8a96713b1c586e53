package fringekeep.archive.internal.store;

import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.util.List;

/** Hashes every part again, and looks for those that records made here should have. */
final class PartCheck {
    private final Snapshot at;
    private final Faults faults;

    /** A row of table part. */
    private record PartRow(Hash sha256, long n, byte[] bytes) {}

    /** A part that a record names. */
    private record Named(long n, String name, Hash sha256, String act) {}

    PartCheck(Snapshot at, Faults faults) {
        this.at = at;
        this.faults = faults;
    }

    void check(Work work) throws StoppedException {
        at.<PartRow>eachPage(
                work,
                "parts",
                new byte[32],
                (c, after) -> Sql.list(
                        c,
                        "select sha, n, bytes from part where sha > ? and n <= ? order by sha"
                                + " fetch first 200 rows only",
                        row -> new PartRow(Hash.fromBytes(row.getBytes(1)), row.getLong(2), row.getBytes(3)),
                        after,
                        at.watermark()),
                row -> row.sha256().bytes(),
                this::part);
        missing();
    }

    private void part(PartRow row) {
        List<Named> users = users(row.sha256());
        String where = "part " + row.sha256()
                + (users.isEmpty()
                        ? ""
                        : ", " + users.get(0).name() + " of journal entry "
                                + users.get(0).n());
        if (!Hash.of(row.bytes()).equals(row.sha256())) {
            faults.damaged("part.hash", "The part's bytes are not those of its hash.", where);
            return;
        }
        if (users.isEmpty()) {
            faults.damaged("part.surplus", "The part belongs to no record.", where);
        } else if (users.stream().noneMatch(user -> user.n() == row.n()) && !suppliedBy(row)) {
            faults.damaged(
                    "part.entry", "The part came with entry " + row.n() + ", says the table; it did not.", where);
        }
        try {
            String name = PartCodec.read(row.bytes()).name().text();
            if (users.stream().anyMatch(user -> !user.name().equals(name))) {
                faults.damaged("part.name", "The part calls itself \"" + name + "\".", where);
            }
        } catch (ProblemException e) {
            faults.damaged(
                    "part.form",
                    "The part cannot be read: " + e.problems().get(0).what(),
                    where);
        }
    }

    private List<Named> users(Hash part) {
        return at.read(c -> Sql.list(
                c,
                "select q.n, q.name, q.sha, j.act from record_part q, journal j where q.sha = ? and j.n = q.n"
                        + " order by q.n",
                row -> new Named(row.getLong(1), row.getString(2), Hash.fromBytes(row.getBytes(3)), row.getString(4)),
                part.bytes()));
    }

    private boolean suppliedBy(PartRow row) {
        return at.count("select count(*) from journal where n = ? and act = 'supplied'", row.n()) == 1;
    }

    /** Parts of records made here that are neither at hand nor purged; records received may lack some. */
    private void missing() {
        List<Named> absent = at.read(c -> Sql.list(
                c,
                "select q.n, q.name, q.sha, j.act from record_part q, journal j where j.n = q.n and q.n <= ?"
                        + " and not exists (select 1 from part p where p.sha = q.sha) order by q.n, q.name",
                row -> new Named(row.getLong(1), row.getString(2), Hash.fromBytes(row.getBytes(3)), row.getString(4)),
                at.watermark()));
        for (Named part : absent) {
            if (!part.act().equals("received") && !at.purged(part.sha256())) {
                faults.damaged(
                        "part.missing",
                        "The part " + part.name() + " is missing.",
                        "journal entry " + part.n() + ", part " + part.sha256());
            }
        }
    }
}
