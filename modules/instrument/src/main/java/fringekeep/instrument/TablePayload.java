package fringekeep.instrument;

import fringekeep.archive.json.EcmaScriptNumber;
import fringekeep.archive.kind.NewPayload;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/**
 * A table of numbers as a payload: {@code csv/1} up to 10,000 rows, {@code npy/1.0} above (record format 1, section 5; the
 * layout of NPY 1.0 is that of the NumPy documentation, module numpy.lib.format).
 */
final class TablePayload {
    private static final int LARGEST_TEXT = 10_000;
    private static final int BLOCK = 64;
    private static final byte[] MAGIC = {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0};

    private TablePayload() {}

    /** Writes columns of equal length; NaN means absent. */
    static NewPayload write(String name, List<String> columns, List<double[]> values) {
        int rows = values.get(0).length;
        return rows > LARGEST_TEXT
                ? new NewPayload(name, "npy/1.0", npy(values, rows))
                : new NewPayload(name, "csv/1", csv(columns, values, rows));
    }

    private static byte[] csv(List<String> columns, List<double[]> values, int rows) {
        StringBuilder text = new StringBuilder(String.join(",", columns)).append('\n');
        for (int row = 0; row < rows; row++) {
            for (int column = 0; column < values.size(); column++) {
                double value = values.get(column)[row];
                text.append(column == 0 ? "" : ",").append(Double.isNaN(value) ? "" : EcmaScriptNumber.write(value));
            }
            text.append('\n');
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }

    private static byte[] npy(List<double[]> values, int rows) {
        String shape = "{'descr': '<f8', 'fortran_order': False, 'shape': (" + rows + ", " + values.size() + "), }";
        int unpadded = MAGIC.length + 2 + shape.length() + 1;
        int padding = (BLOCK - unpadded % BLOCK) % BLOCK;
        String header = shape + " ".repeat(padding) + "\n";
        ByteBuffer bytes = ByteBuffer.allocate(unpadded + padding + 8 * rows * values.size())
                .order(ByteOrder.LITTLE_ENDIAN)
                .put(MAGIC)
                .putShort((short) header.length())
                .put(header.getBytes(StandardCharsets.US_ASCII));
        for (int row = 0; row < rows; row++) {
            for (double[] column : values) {
                bytes.putDouble(Double.isNaN(column[row]) ? Double.NaN : column[row] + 0.0);
            }
        }
        return bytes.array();
    }

    /**
     * Reads the columns of a payload that {@link #write} made.
     *
     * @throws IllegalArgumentException if the bytes are not of that form
     */
    static List<double[]> read(byte[] bytes, int columns) {
        return bytes.length > 0 && bytes[0] == MAGIC[0] ? readNpy(bytes, columns) : readCsv(bytes, columns);
    }

    private static List<double[]> readCsv(byte[] bytes, int columns) {
        String[] lines = new String(bytes, StandardCharsets.UTF_8).split("\n");
        List<double[]> values = empty(columns, lines.length - 1);
        for (int row = 1; row < lines.length; row++) {
            String[] cells = lines[row].split(",", -1);
            if (cells.length != columns) {
                throw new IllegalArgumentException("row " + row + " has " + cells.length + " cells, not " + columns);
            }
            for (int column = 0; column < columns; column++) {
                values.get(column)[row - 1] = cells[column].isEmpty() ? Double.NaN : Double.parseDouble(cells[column]);
            }
        }
        return values;
    }

    private static List<double[]> readNpy(byte[] bytes, int columns) {
        ByteBuffer buffer = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        int start = MAGIC.length + 2 + (buffer.getShort(MAGIC.length) & 0xFFFF);
        int cells = (bytes.length - start) / 8;
        if (start > bytes.length || cells % columns != 0) {
            throw new IllegalArgumentException(cells + " cells in " + columns + " columns");
        }
        List<double[]> values = empty(columns, cells / columns);
        buffer.position(start);
        for (int row = 0; row < cells / columns; row++) {
            for (int column = 0; column < columns; column++) {
                values.get(column)[row] = buffer.getDouble();
            }
        }
        return values;
    }

    private static List<double[]> empty(int columns, int rows) {
        List<double[]> values = new ArrayList<>();
        for (int i = 0; i < columns; i++) {
            values.add(new double[Math.max(0, rows)]);
        }
        return values;
    }
}
