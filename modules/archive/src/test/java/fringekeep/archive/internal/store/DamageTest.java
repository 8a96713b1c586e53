package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.Transactor;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** One byte or one value is changed below the archive: its check finds it and names the place. */
class DamageTest {
    @TempDir
    private Path folder;

    private Path place;
    private DerbyArchive archive;
    private Hash large;

    @BeforeEach
    void fill() throws Exception {
        place = folder.resolve("archive");
        try (Archive golden = Filled.golden(place)) {
            byte[] table = ("position_m,counts\n" + "0,1\n".repeat(20_000)).getBytes(StandardCharsets.UTF_8);
            large = Hash.of(table);
            golden.record(Filled.carrying(Filled.labelled("scan", "large table"), table));
        }
        archive = (DerbyArchive) Archives.open(place, OpenKind.all(), Circumstances.real("1.0.0"));
    }

    @AfterEach
    void close() {
        archive.close();
    }

    private List<Problem> check() throws Exception {
        return archive.check(Work.QUIET);
    }

    /** Changes rows behind the archive's back, checks, and puts them back. */
    private void damage(String table, String column, String change, String expected, String named) throws Exception {
        Store store = archive.store();
        store.onWriter(transactor -> {
            run(transactor, "create table kept as select * from " + table + " with no data");
            run(transactor, "insert into kept select * from " + table);
            return true;
        });
        store.onWriter(transactor -> run(transactor, change));
        List<Problem> found = check();
        assertThat(found).as("%s.%s", table, column).isNotEmpty();
        assertThat(found.stream().map(Problem::code))
                .as("%s.%s: %s", table, column, found)
                .contains(expected);
        assertThat(found.stream().map(problem -> problem.where() + " " + problem.what()))
                .as("%s.%s", table, column)
                .anyMatch(text -> text.contains(named));
        store.onWriter(transactor -> {
            run(transactor, "delete from " + table);
            run(transactor, "insert into " + table + " select * from kept");
            run(transactor, "drop table kept");
            return true;
        });
    }

    private static int run(Transactor transactor, String text) {
        return transactor.<Integer, RuntimeException>inTransaction(c -> Sql.run(c, text));
    }

    @Test
    void aByteOfEveryStoredObjectIsFound() throws Exception {
        for (String[] one : new String[][] {
            {"journal", "n", "5", "journal.hash", "journal entry 5"},
            {"record", "n", "2", "head.hash", RecordVectors.COMPOUND.hex()},
        }) {
            String column = one[0].equals("record") ? "head" : "bytes";
            byte[] whole = bytes("select " + column + " from " + one[0] + " where n = " + one[2]);
            for (int at = 0; at < whole.length; at += Math.max(1, whole.length / 7)) {
                set("update " + one[0] + " set " + column + " = ? where n = " + one[2], turned(whole, at));
                List<Problem> found = check();
                assertThat(found.stream().map(Problem::code))
                        .as("%s byte %d", one[0], at)
                        .contains(one[3]);
                assertThat(found.stream().map(Problem::where)).anyMatch(where -> where.contains(one[4]));
            }
            set("update " + one[0] + " set " + column + " = ? where n = " + one[2], whole);
        }
        assertThat(check()).isEmpty();
    }

    @Test
    void aByteOfAPartOrPayloadIsFound() throws Exception {
        for (String table : List.of("part", "payload")) {
            byte[] key =
                    bytes("select sha from " + table + " where bytes is not null order by sha fetch first row only");
            byte[] whole =
                    bytes("select bytes from " + table + " where bytes is not null order by sha fetch first row only");
            for (int at = 0; at < whole.length; at += Math.max(1, whole.length / 7)) {
                byte[] damaged = turned(whole, at);
                archive.store()
                        .onWriter(transactor -> transactor.<Integer, RuntimeException>inTransaction(
                                c -> Sql.run(c, "update " + table + " set bytes = ? where sha = ?", damaged, key)));
                assertThat(check())
                        .as("%s byte %d", table, at)
                        .anyMatch(problem -> problem.code().equals(table + ".hash")
                                && problem.where().contains(Hash.fromBytes(key).hex()));
            }
            archive.store()
                    .onWriter(transactor -> transactor.<Integer, RuntimeException>inTransaction(
                            c -> Sql.run(c, "update " + table + " set bytes = ? where sha = ?", whole, key)));
        }
        assertThat(check()).isEmpty();
    }

    private byte[] bytes(String question) {
        return archive.store()
                .<byte[], RuntimeException>read(
                        c -> Sql.first(c, question, row -> row.getBytes(1)).orElseThrow());
    }

    private void set(String change, byte[] value) {
        archive.store()
                .onWriter(transactor ->
                        transactor.<Integer, RuntimeException>inTransaction(c -> Sql.run(c, change, value)));
    }

    private static byte[] turned(byte[] whole, int at) {
        byte[] damaged = whole.clone();
        damaged[at] ^= 1;
        return damaged;
    }

    @Test
    void aChangedColumnOfAnyTableIsFound() throws Exception {
        String scan = "(select n from record where kind = 'fit')";
        damage("journal", "act", "update journal set act = 'received' where n = 4", "journal.act", "journal entry 4");
        damage("journal", "row", "delete from journal where n = 6", "journal.gap", "journal entry 6");
        damage(
                "edge",
                "role",
                "update edge set role = 'scam' where role = 'scan' and link = 'i'",
                "edge.differs",
                "scam");
        damage(
                "edge",
                "channel",
                "update edge set channel = 'count' where channel = 'counts'",
                "edge.differs",
                "count");
        damage(
                "edge",
                "reach",
                "update edge set reach = 'r' where role = 'setup' and link = 'a'",
                "edge.differs",
                "setup");
        damage("edge", "n", "update edge set n = 3 where n = " + scan + " and seq = 0", "edge.differs", "entry 3");
        damage("edge", "row", "delete from edge where link = 'c'", "edge.differs", RecordVectors.SETUP2.hex());
        damage("raw_file", "size", "update raw_file set size = size + 1", "raw.hash", RecordVectors.RAW.hex());
        damage("raw_file", "row", "delete from raw_file", "raw.missing", RecordVectors.RAW.hex());
        damage(
                "record_part",
                "name",
                "update record_part set name = 'contend' where name = 'content' and n = 4",
                "record.parts",
                "journal entry 4");
        damage(
                "record_payload",
                "form",
                "update record_payload set form = 'csv/2' where n = 7",
                "record.payloads",
                "csv/2");
        damage(
                "payload",
                "size",
                "update payload set size = size + 1 where bytes is null",
                "payload.hash",
                large.hex());
        damage(
                "thing_number",
                "number",
                "update thing_number set number = 9 where kind = 'fit'",
                "number.differs",
                "journal entry 9");
        damage("tally", "records", "update tally set records = 7 where kind = 'scan'", "count.differs", "kind scan");
        damage("word", "word", "update word set word = 'shirt' where word = 'short'", "word.differs", "shirt");
        damage(
                "p_setup_list",
                "label",
                "update p_setup_list set label = 'long bench' where n = 4",
                "list.differs",
                "setup_list");
        assertThat(check()).isEmpty();
    }

    @Test
    void aChangedRecordRowIsFound() throws Exception {
        for (String change : List.of(
                "update record set kind = 'note' where n = 7",
                "update record set schema_number = 2 where n = 7",
                "update record set thing = x'00000000000000000000000000000000' where n = 7")) {
            archive.store().onWriter(transactor -> run(transactor, change));
            assertThat(check())
                    .as(change)
                    .anyMatch(problem -> problem.code().equals("record.columns")
                            && problem.where().contains(RecordVectors.SCAN.hex()));
            archive.store()
                    .onWriter(transactor -> run(
                            transactor,
                            "update record set kind = 'scan', schema_number = 1, thing = x'1096dec428f623b991b059c8207f3776'"
                                    + " where n = 7"));
        }
        assertThat(check()).isEmpty();
    }

    @Test
    void aByteOfAnyFileIsFoundAndAMissingOneIsNamed() throws Exception {
        for (Path file : List.of(
                place.resolve("raw/24").resolve(RecordVectors.RAW.hex()),
                place.resolve("payloads").resolve(large.hex().substring(0, 2)).resolve(large.hex()))) {
            assertThat(file.toFile().setWritable(true)).isTrue();
            byte[] whole = Files.readAllBytes(file);
            for (int at = 0; at < whole.length; at += Math.max(1, whole.length / 5)) {
                Files.write(file, turned(whole, at));
                assertThat(check())
                        .as("%s byte %d", file, at)
                        .anyMatch(problem -> problem.code().endsWith(".hash")
                                && problem.where().contains(file.toString()));
            }
            Files.delete(file);
            assertThat(check())
                    .anyMatch(problem -> problem.code().endsWith(".missing")
                            && problem.where().contains(file.toString()));
            Files.write(file, whole);
        }
        assertThat(check()).isEmpty();
    }

    @Test
    void leftoversAreNamedAndADamagedRawFileIsMendedByTakingItInAgain() throws Exception {
        byte[] bytes = "unused".getBytes(StandardCharsets.UTF_8);
        Archive.RawTaken unused = archive.takeIn(bytes);
        Files.writeString(place.resolve("aside/1234.part"), "half");
        Files.writeString(place.resolve("raw/notes.txt"), "mine");
        assertThat(check().stream().map(Problem::code))
                .containsExactlyInAnyOrder("orphan.raw", "orphan.aside", "orphan.name");

        archive.record(Filled.madeFrom(
                Filled.labelled("scan", "adopts it"), new InputReference.OfRaw("raw", unused.hash(), unused.bytes())));
        Files.delete(place.resolve("aside/1234.part"));
        Files.delete(place.resolve("raw/notes.txt"));
        Path file = place.resolve("raw/24").resolve(RecordVectors.RAW.hex());
        assertThat(file.toFile().setWritable(true)).isTrue();
        Files.writeString(file, "other");
        assertThat(check()).isNotEmpty();

        assertThat(archive.takeIn(RecordVectors.bytes(RecordVectors.RAW)).known())
                .isTrue();
        assertThat(check()).isEmpty();
    }
}
