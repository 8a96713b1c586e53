package fringekeep.bundle.internal;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.bundle.internal.Table.Field;
import fringekeep.bundle.internal.Table.ForeignKey;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/** The tables of a bundle: its records, how they are linked, its raw files, and one table per declared projection. */
final class Tables {
    private final Archive archive;
    private final Contents contents;

    private Tables(Archive archive, Contents contents) {
        this.archive = archive;
        this.contents = contents;
    }

    static List<Table> of(Archive archive, Contents contents) {
        Tables tables = new Tables(archive, contents);
        List<Table> all = new ArrayList<>(List.of(tables.records(), tables.links(), tables.rawFiles()));
        all.addAll(tables.projections());
        return List.copyOf(all);
    }

    private Table records() {
        List<List<Optional<String>>> rows = new ArrayList<>();
        for (LineageRecord record : contents.lineage().records()) {
            Head head = record.view().head();
            Optional<Archive.Recorded> recorded = archive.recorded(record.fingerprint());
            rows.add(List.of(
                    Optional.of(record.fingerprint().hex()),
                    Optional.of(record.label()),
                    Optional.of(head.kind().text()),
                    Optional.of(Integer.toString(head.schema())),
                    Optional.of(head.thing().hex()),
                    Optional.of(record.title().text()),
                    recorded.map(at -> Long.toString(at.n())),
                    recorded.map(at -> at.at().toString()),
                    head.corrects().map(Hash::hex),
                    head.after().map(after -> after.record().hex()),
                    head.after().map(after -> after.from().toString())));
        }
        return new Table(
                "records",
                "every record of this dataset; its head is the file records/<record>",
                List.of(
                        new Field("record", "string", "", "fingerprint: SHA-256 of the head"),
                        new Field("label", "string", "", "what the laboratory calls it"),
                        new Field("kind", "string", "", "kind of record"),
                        new Field("schema", "integer", "1", "number of the kind's schema"),
                        new Field("thing", "string", "", "what the record is of; shared by its corrections"),
                        new Field("title", "string", "", "title"),
                        new Field("journal_entry", "integer", "1", "entry of the archive's journal"),
                        new Field("recorded_at", "datetime", "", "when it was recorded"),
                        new Field("corrects", "string", "", "record it replaces"),
                        new Field("after", "string", "", "record it follows"),
                        new Field("after_from", "datetime", "", "from when on")),
                List.of("record"),
                List.of(),
                rows);
    }

    private Table links() {
        List<List<Optional<String>>> rows = new ArrayList<>();
        for (LineageRecord record : contents.lineage().records()) {
            Head head = record.view().head();
            for (int i = 0; i < head.inputs().size(); i++) {
                InputReference input = head.inputs().get(i);
                Optional<InputReference.OfRecord> of =
                        input instanceof InputReference.OfRecord pinned ? Optional.of(pinned) : Optional.empty();
                Optional<String> raw = input instanceof InputReference.OfRaw file
                        ? Optional.of(file.raw().hex())
                        : Optional.empty();
                rows.add(List.of(
                        Optional.of(record.fingerprint().hex()),
                        Optional.of(Integer.toString(i)),
                        Optional.of(input.role()),
                        of.map(pinned -> pinned.record().hex()),
                        raw,
                        of.flatMap(InputReference.OfRecord::channel)));
            }
        }
        return new Table(
                "made-from",
                "what each record was made from, in the order its parts refer to",
                List.of(
                        new Field("record", "string", "", "the record made"),
                        new Field("position", "integer", "1", "position among its inputs, from 0"),
                        new Field("role", "string", "", "the part the input plays"),
                        new Field("input_record", "string", "", "the record it was made from"),
                        new Field("input_raw", "string", "", "or the raw file"),
                        new Field("channel", "string", "", "which channel of it")),
                List.of("record", "position"),
                List.of(
                        new ForeignKey("record", "records", "record"),
                        new ForeignKey("input_record", "records", "record"),
                        new ForeignKey("input_raw", "raw-files", "raw")),
                rows);
    }

    private Table rawFiles() {
        List<List<Optional<String>>> rows = new ArrayList<>();
        contents.lineage()
                .rawFiles()
                .forEach((raw, bytes) -> rows.add(List.of(
                        Optional.of(raw.hex()), Optional.of(Long.toString(bytes)), Optional.of(Layout.raw(raw)))));
        return new Table(
                "raw-files",
                "files as the instruments wrote them, each named by its SHA-256",
                List.of(
                        new Field("raw", "string", "", "SHA-256 of its bytes"),
                        new Field("size_bytes", "integer", "By", "length"),
                        new Field("path", "string", "", "where it stands in this dataset")),
                List.of("raw"),
                List.of(),
                rows);
    }

    private List<Table> projections() {
        SortedMap<String, Table> tables = new TreeMap<>();
        for (RecordKind kind : archive.kinds().all()) {
            List<LineageRecord> own = contents.lineage().records().stream()
                    .filter(record -> record.view().head().kind().equals(kind.kind()))
                    .toList();
            for (Projection projection : own.isEmpty() ? List.<Projection>of() : kind.projections()) {
                Table table = projection(kind, projection, own);
                tables.put(table.name(), table);
            }
        }
        return List.copyOf(tables.values());
    }

    private static Table projection(RecordKind kind, Projection projection, List<LineageRecord> records) {
        List<Field> fields = new ArrayList<>();
        fields.add(new Field("record", "string", "", "fingerprint of the record"));
        fields.add(new Field("label", "string", "", "what the laboratory calls it"));
        fields.add(new Field("row", "integer", "1", "row of the record, from 0"));
        for (Column column : projection.columns()) {
            fields.add(new Field(column.name(), type(column.sort()), column.unit(), title(projection, column)));
        }
        List<List<Optional<String>>> rows = new ArrayList<>();
        for (LineageRecord record : records) {
            List<Row> own =
                    kind.rows(projection, record.view(), record.inputs()).toList();
            for (int i = 0; i < own.size(); i++) {
                List<Optional<String>> cells = new ArrayList<>();
                cells.add(Optional.of(record.fingerprint().hex()));
                cells.add(Optional.of(record.label()));
                cells.add(Optional.of(Integer.toString(i)));
                for (Column column : projection.columns()) {
                    cells.add(Optional.ofNullable(own.get(i).values().get(column.name()))
                            .map(Tables::cell));
                }
                rows.add(cells);
            }
        }
        return new Table(
                projection.name().replace('_', '-'),
                kind.kind().text().replace('-', ' ') + ": " + projection.name().replace('_', ' '),
                fields,
                List.of("record", "row"),
                List.of(new ForeignKey("record", "records", "record")),
                rows);
    }

    private static String title(Projection projection, Column column) {
        if (column.deviationOf().isEmpty()) {
            return column.label();
        }
        return projection.columns().stream()
                .filter(other -> other.name().equals(column.deviationOf()))
                .map(other -> "standard uncertainty of: " + other.label())
                .findFirst()
                .orElse(column.label());
    }

    private static String type(Column.Sort sort) {
        return switch (sort) {
            case TEXT, HASH -> "string";
            case REAL -> "number";
            case INTEGER -> "integer";
            case INSTANT -> "datetime";
            case FLAG -> "boolean";
        };
    }

    private static String cell(Object value) {
        if (value instanceof Double number) {
            return Table.number(number);
        }
        if (value instanceof Instant instant) {
            return instant.toString();
        }
        return value.toString();
    }
}
