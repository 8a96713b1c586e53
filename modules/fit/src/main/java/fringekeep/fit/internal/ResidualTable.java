package fringekeep.fit.internal;

import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.NpyPayload;
import fringekeep.archive.problem.ProblemException;
import fringekeep.fit.internal.FitAnswer.RowSource;
import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeFit;
import java.util.ArrayList;
import java.util.List;

/** The rows of a fit with what was expected of them: a payload of the fit, read again for drawings and tables. */
public final class ResidualTable {
    private static final List<String> NAMES =
            List.of("input", "row", "position_m", "exposure", "counts", "fitted_counts", "residual", "used");
    private static final int MOST_CSV_ROWS = 10_000;

    private ResidualTable() {}

    /**
     * One row.
     *
     * @param source scan and row; the first scan's for a sum
     * @param position as fitted: calibrated, and shifted by the phase where scans were shifted (m)
     * @param exposure seconds or shots
     * @param counts as read, or the sum of them
     * @param fitted expected counts, NaN for rows left out
     * @param residual over the standard deviation expected, NaN for rows left out
     * @param used whether the fit used the row
     */
    public record Row(
            RowSource source,
            double position,
            double exposure,
            double counts,
            double fitted,
            double residual,
            boolean used) {}

    /** All rows of an answer in the order of the fitted data. */
    public static List<Row> rows(FitAnswer answer) {
        List<Row> rows = new ArrayList<>();
        for (int k = 0; k < answer.fits().size(); k++) {
            rows.addAll(rows(answer.fits().get(k), answer.rows().get(k)));
        }
        return rows;
    }

    private static List<Row> rows(FringeFit fit, List<RowSource> sources) {
        FringeData data = fit.data();
        double[] positions = data.positions();
        double[] counts = data.counts();
        double[] exposures = data.exposures();
        double[] expected = fit.expectedCounts();
        double[] residuals = fit.standardisedResiduals();
        boolean[] masked = data.masked();
        List<Row> rows = new ArrayList<>();
        int used = 0;
        for (int i = 0; i < data.size(); i++) {
            double fitted = masked[i] ? Double.NaN : expected[used];
            double residual = masked[i] ? Double.NaN : residuals[used];
            used += masked[i] ? 0 : 1;
            rows.add(new Row(sources.get(i), positions[i], exposures[i], counts[i], fitted, residual, !masked[i]));
        }
        return rows;
    }

    /** The payload. */
    public static NewPayload payload(String name, FitAnswer answer) {
        List<Row> rows = rows(answer);
        List<double[]> columns = List.of(
                rows.stream().mapToDouble(row -> row.source().input()).toArray(),
                rows.stream().mapToDouble(row -> row.source().row()).toArray(),
                rows.stream().mapToDouble(Row::position).toArray(),
                rows.stream().mapToDouble(Row::exposure).toArray(),
                rows.stream().mapToDouble(Row::counts).toArray(),
                rows.stream().mapToDouble(Row::fitted).toArray(),
                rows.stream().mapToDouble(Row::residual).toArray(),
                rows.stream().mapToDouble(row -> row.used() ? 1 : 0).toArray());
        if (rows.size() <= MOST_CSV_ROWS) {
            return new NewPayload(name, CsvPayload.FORM, CsvPayload.write(NAMES, columns));
        }
        double[] values = new double[rows.size() * NAMES.size()];
        for (int c = 0; c < NAMES.size(); c++) {
            for (int row = 0; row < rows.size(); row++) {
                values[row * NAMES.size() + c] = columns.get(c)[row];
            }
        }
        return new NewPayload(name, NpyPayload.FORM, NpyPayload.write(values, rows.size(), NAMES.size()));
    }

    /**
     * Reads a payload again.
     *
     * @throws ProblemException if it is not such a table
     */
    public static List<Row> read(byte[] bytes, String form) throws ProblemException {
        double[][] columns = form.equals(CsvPayload.FORM) ? csv(bytes) : npy(bytes);
        List<Row> rows = new ArrayList<>();
        for (int i = 0; i < columns[0].length; i++) {
            RowSource source = new RowSource((int) columns[0][i], (int) columns[1][i]);
            rows.add(new Row(
                    source,
                    columns[2][i],
                    columns[3][i],
                    columns[4][i],
                    columns[5][i],
                    columns[6][i],
                    columns[7][i] == 1));
        }
        return rows;
    }

    private static double[][] csv(byte[] bytes) throws ProblemException {
        CsvPayload.Table table = CsvPayload.read(bytes);
        double[][] columns = new double[NAMES.size()][];
        for (int c = 0; c < columns.length; c++) {
            String name = NAMES.get(c);
            columns[c] = table.numbers(name)
                    .orElseThrow(() -> new ProblemException(FitProblems.of("fit.residual-table", "", name)));
        }
        return columns;
    }

    private static double[][] npy(byte[] bytes) throws ProblemException {
        NpyPayload.NpyArray array = NpyPayload.read(bytes);
        int[] shape = array.shape();
        if (shape.length != 2 || shape[1] != NAMES.size()) {
            throw new ProblemException(FitProblems.of("fit.residual-table", "", String.join(", ", NAMES)));
        }
        double[] values = array.values();
        double[][] columns = new double[NAMES.size()][shape[0]];
        for (int i = 0; i < values.length; i++) {
            columns[i % NAMES.size()][i / NAMES.size()] = values[i];
        }
        return columns;
    }
}
