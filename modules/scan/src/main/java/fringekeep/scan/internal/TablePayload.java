package fringekeep.scan.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.NpyPayload;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.ScanTable;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Writes and reads the table of a scan: csv/1, or npy/1.0 (rows by columns) above 10,000 rows. */
public final class TablePayload {
    /** Most rows of a csv/1 table. */
    private static final int MOST_CSV_ROWS = 10_000;

    private TablePayload() {}

    /** The payload of a table. */
    public static NewPayload write(String name, ScanTable table) {
        if (table.rows() > MOST_CSV_ROWS) {
            return new NewPayload(name, NpyPayload.FORM, npy(table));
        }
        List<String> names =
                table.columns().stream().map(ScanTable.TableColumn::name).toList();
        List<double[]> columns =
                table.columns().stream().map(ScanTable.TableColumn::values).toList();
        return new NewPayload(name, CsvPayload.FORM, CsvPayload.write(names, columns));
    }

    private static byte[] npy(ScanTable table) {
        int width = table.columns().size();
        double[] values = new double[table.rows() * width];
        for (int c = 0; c < width; c++) {
            double[] column = table.columns().get(c).values();
            for (int row = 0; row < column.length; row++) {
                values[row * width + c] = column[row];
            }
        }
        return NpyPayload.write(values, table.rows(), width);
    }

    /** The columns of a scan's table by name. */
    public static Map<String, double[]> read(RecordView record, JsonObject result) throws ProblemException {
        byte[] bytes = record.payload(result.text("table").orElse(""));
        List<String> names = result.array("columns").texts();
        return names.isEmpty() ? csv(bytes) : columns(NpyPayload.read(bytes), names);
    }

    private static Map<String, double[]> csv(byte[] bytes) throws ProblemException {
        Map<String, double[]> columns = new LinkedHashMap<>();
        CsvPayload.Table table = CsvPayload.read(bytes);
        for (CsvPayload.Column column : table.columns()) {
            table.numbers(column.name()).ifPresent(values -> columns.put(column.name(), values));
        }
        return columns;
    }

    private static Map<String, double[]> columns(NpyPayload.NpyArray array, List<String> names)
            throws ProblemException {
        int[] shape = array.shape();
        if (shape.length != 2 || shape[1] != names.size()) {
            throw new ProblemException(ScanProblems.of("scan.table-column", "", String.join(", ", names)));
        }
        double[] values = array.values();
        Map<String, double[]> columns = new LinkedHashMap<>();
        for (int c = 0; c < names.size(); c++) {
            double[] column = new double[shape[0]];
            for (int row = 0; row < column.length; row++) {
                column[row] = values[row * names.size() + c];
            }
            columns.put(names.get(c), column);
        }
        return columns;
    }
}
