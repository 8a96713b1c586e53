package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.internal.store.tables.PartsTable.Listed;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Hashes raw files and payloads again, and looks for what is missing and what is left over in the folders. */
final class FileCheck {
    private static final String PUT_BACK = "Put the true file there from a copy; a raw file can be taken in again.";
    private final Snapshot at;
    private final Faults faults;

    /** A file that a record names. */
    private record Named(long n, Hash sha256) {}

    FileCheck(Snapshot at, Faults faults) {
        this.at = at;
        this.faults = faults;
    }

    void check(Work work) throws StoppedException {
        try {
            listed(true, work);
            listed(false, work);
            missing();
            orphans(true, at.store().raw(), work);
            orphans(false, at.store().payloads(), work);
            aside();
        } catch (IOException e) {
            throw new StoreFailure("Reading the archive's files", e);
        }
    }

    private void listed(boolean raw, Work work) throws StoppedException {
        at.<Listed>eachPage(
                work,
                raw ? "raw files" : "payloads",
                new byte[32],
                (c, after) -> PartsTable.page(c, raw, after, at.watermark()),
                row -> row.sha256().bytes(),
                row -> one(raw, row));
    }

    private void one(boolean raw, Listed row) {
        String where = (raw ? "raw file " : "payload ") + row.sha256() + ", journal entry " + row.n();
        if (!raw) {
            Optional<byte[]> inTable = at.read(c -> PartsTable.payload(c, row.sha256(), at.watermark()))
                    .flatMap(PartsTable.Payload::bytes);
            if (inTable.isPresent()) {
                if (inTable.get().length != row.size()
                        || !Hash.of(inTable.get()).equals(row.sha256())) {
                    faults.damaged("payload.hash", "The payload's bytes are not those of its hash and length.", where);
                }
                used(raw, row, where);
                return;
            }
        }
        file(raw, row, where);
        used(raw, row, where);
    }

    private void file(boolean raw, Listed row, String where) {
        HashedFiles files = raw ? at.store().raw() : at.store().payloads();
        String sort = raw ? "raw" : "payload";
        try {
            Optional<Long> size = files.size(row.sha256());
            String place = files.path(row.sha256()) + ", " + where;
            if (size.isEmpty()) {
                if (!at.purged(row.sha256())) {
                    faults.add(sort + ".missing", "The file is missing.", place, PUT_BACK);
                }
            } else if (size.get() != row.size() || !files.rehash(row.sha256()).equals(row.sha256())) {
                faults.add(sort + ".hash", "The file's bytes are not those that were taken in.", place, PUT_BACK);
            }
        } catch (IOException e) {
            faults.add(sort + ".unreadable", "The file cannot be read: " + e + ".", where, PUT_BACK);
        }
    }

    /** Whether the row's length and entry are those of a record that names the file. */
    private void used(boolean raw, Listed row, String where) {
        long users = raw
                ? at.count(
                        "select count(*) from node x, edge e where x.sha = ? and e.dst = x.id and e.link = 'i' and e.n = ?",
                        row.sha256().bytes(),
                        row.n())
                : at.count(
                        "select count(*) from record_payload where sha = ? and size = ? and n = ?",
                        row.sha256().bytes(),
                        row.size(),
                        row.n());
        if (users == 0) {
            faults.damaged("file.entry", "No record of that entry names the file with that length.", where);
        }
    }

    /** Files of records made here that are neither listed nor purged; records received may lack some. */
    private void missing() {
        List<Named> raws = named("select e.n, x.sha from edge e, node x, journal j where x.id = e.dst and x.sort = 'w'"
                + " and j.n = e.n and j.act = 'recorded' and e.n <= ?"
                + " and not exists (select 1 from raw_file f where f.sha = x.sha) order by e.n");
        List<Named> payloads = named("select q.n, q.sha from record_payload q, journal j where j.n = q.n"
                + " and j.act = 'recorded' and q.n <= ?"
                + " and not exists (select 1 from payload p where p.sha = q.sha) order by q.n");
        report("raw.missing", "raw file ", raws);
        report("payload.missing", "payload ", payloads);
    }

    private List<Named> named(String question) {
        return at.read(c -> Sql.list(
                c, question, row -> new Named(row.getLong(1), Hash.fromBytes(row.getBytes(2))), at.watermark()));
    }

    private void report(String code, String sort, List<Named> absent) {
        for (Named file : absent) {
            if (!at.purged(file.sha256())) {
                faults.damaged(
                        code,
                        "A record names a file that the archive does not have.",
                        sort + file.sha256() + ", journal entry " + file.n());
            }
        }
    }

    private void orphans(boolean raw, HashedFiles files, Work work) throws IOException, StoppedException {
        for (Path file : files.all()) {
            work.check();
            orphan(raw, files, file);
        }
    }

    private void orphan(boolean raw, HashedFiles files, Path file) throws IOException {
        String name = file.getFileName().toString();
        if (!name.matches("[0-9a-f]{64}") || !files.path(new Hash(name)).equals(file)) {
            faults.orphan("orphan.name", "A file lies here that no archive puts here.", file.toString());
            return;
        }
        Hash hash = new Hash(name);
        boolean known = raw
                ? at.read(c -> PartsTable.rawSize(c, hash)).isPresent()
                : at.read(c -> PartsTable.payload(c, hash, Long.MAX_VALUE)).isPresent();
        if (known) {
            return;
        }
        if (at.purged(hash)) {
            faults.add(
                    "purged.present",
                    "The file was purged but lies here.",
                    file.toString(),
                    "Close the archive and open it again: it is removed then.");
        } else if (!files.rehash(hash).equals(hash)) {
            faults.orphan(
                    "orphan.damaged",
                    "No record names the file, and its bytes are not those of its name.",
                    file.toString());
        } else {
            faults.orphan(raw ? "orphan.raw" : "orphan.payload", "No record names the file.", file.toString());
        }
    }

    private void aside() throws IOException {
        if (!Files.isDirectory(at.store().folder().aside())) {
            return;
        }
        try (Stream<Path> files = Files.list(at.store().folder().aside())) {
            files.sorted()
                    .filter(file -> !file.equals(at.store().folder().formerDatabase()))
                    .forEach(file -> faults.orphan(
                            "orphan.aside", "A file was left where files are written first.", file.toString()));
        }
    }
}
