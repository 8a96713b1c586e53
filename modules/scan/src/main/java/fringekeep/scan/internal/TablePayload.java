package fringekeep.scan.internal;

import fringekeep.archive.json.EcmaScriptNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.reading.ScanTable;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.Map;

/** Writes and reads the table of a scan: csv/1, or npy/1.0 above 10,000 rows. */
public final class TablePayload {
    /** Form of short tables. */
    public static final String CSV = "csv/1";

    private TablePayload() {}

    /** The payload of a table. */
    public static NewPayload write(String name, ScanTable table) {
        StringBuilder text = new StringBuilder();
        text.append(String.join(
                        ",",
                        table.columns().stream()
                                .map(ScanTable.TableColumn::name)
                                .toList()))
                .append('\n');
        for (int row = 0; row < table.rows(); row++) {
            for (int c = 0; c < table.columns().size(); c++) {
                double value = table.columns().get(c).values()[row];
                text.append(c == 0 ? "" : ",").append(Double.isNaN(value) ? "" : EcmaScriptNumber.write(value));
            }
            text.append('\n');
        }
        return new NewPayload(name, CSV, text.toString().getBytes(StandardCharsets.UTF_8));
    }

    /** The columns of a scan's table by name. */
    public static Map<String, double[]> read(RecordView record, JsonObject result) throws ProblemException {
        String text = new String(record.payload(result.text("table").orElseThrow()), StandardCharsets.UTF_8);
        String[] lines = text.split("\n");
        String[] names = lines[0].split(",");
        double[][] values = new double[names.length][lines.length - 1];
        for (int row = 1; row < lines.length; row++) {
            String[] cells = lines[row].split(",", -1);
            for (int c = 0; c < names.length; c++) {
                values[c][row - 1] = cells[c].isEmpty() ? Double.NaN : Double.parseDouble(cells[c]);
            }
        }
        Map<String, double[]> columns = new LinkedHashMap<>();
        for (int c = 0; c < names.length; c++) {
            columns.put(names[c], values[c]);
        }
        return columns;
    }
}
