package fringekeep.interferometry.farfield;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A camera image of a far-field pattern and its reduction to a profile across the orders.
 *
 * <p>Rows run along the grating slits (the direction of fall), columns across the orders. Steps: pixels far above the
 * median of their eight neighbours are hot and left out; the background is a plane through the medians of the four
 * corners' blocks; each row is moved by the tilt; the rest of each column is summed. The uncertainty of a bin is that
 * of its own counts (gain times signal plus read noise per pixel). Thread rule: immutable.
 */
public final class CameraImage {
    private final double[][] pixels;

    /**
     * Keeps an image.
     *
     * @param pixels values by row and column, finite, at least 4 by 4, all rows equally long
     */
    public CameraImage(double[][] pixels) {
        if (pixels.length < 4 || pixels[0].length < 4) {
            throw new IllegalArgumentException("an image has at least 4 by 4 pixels");
        }
        this.pixels = new double[pixels.length][];
        for (int row = 0; row < pixels.length; row++) {
            if (pixels[row].length != pixels[0].length) {
                throw new IllegalArgumentException(
                        "row " + row + " has " + pixels[row].length + " pixels, the first has " + pixels[0].length);
            }
            for (double value : pixels[row]) {
                if (!Double.isFinite(value)) {
                    throw new IllegalArgumentException("row " + row + " holds a pixel that is not finite");
                }
            }
            this.pixels[row] = pixels[row].clone();
        }
    }

    /**
     * How the image is reduced.
     *
     * @param firstRow    first row summed
     * @param lastRow     last row summed, included
     * @param tilt        columns by which the pattern moves per row (dx/drow), linear interpolation between pixels
     * @param hotDeviates a pixel that exceeds the median of its neighbours by this many of its standard deviations is
     *     hot
     * @param gain        variance per signal unit (1 for photon counts)
     * @param readNoise   standard deviation of an empty pixel, &gt; 0
     * @param corner      side of the corner blocks that hold background only (pixels), &ge; 1
     */
    public record Reduction(
            int firstRow, int lastRow, double tilt, double hotDeviates, double gain, double readNoise, int corner) {
        /** Checks the numbers. */
        public Reduction {
            if (firstRow < 0 || lastRow < firstRow || corner < 1) {
                throw new IllegalArgumentException("rows " + firstRow + " to " + lastRow + " with corners of " + corner
                        + " pixels cannot be reduced");
            }
            if (!(hotDeviates > 0.0 && gain >= 0.0 && readNoise > 0.0) || !Double.isFinite(tilt)) {
                throw new IllegalArgumentException("hot-pixel limit " + hotDeviates + ", gain " + gain + ", read noise "
                        + readNoise + " and tilt " + tilt + " must be finite and positive");
            }
        }
    }

    /** Place of a pixel. */
    public record Pixel(int row, int column) {}

    /**
     * A profile across the orders.
     *
     * @param values        background-free sum per column, scaled up where hot pixels were left out
     * @param uncertainties standard uncertainty per column
     * @param hot           pixels left out
     */
    public record Profile(double[] values, double[] uncertainties, List<Pixel> hot) {
        /** Keeps an own list. */
        public Profile {
            hot = List.copyOf(hot);
        }
    }

    /**
     * Reduces the image.
     *
     * @param reduction rows, tilt, noise, background
     * @return the profile, one bin per column
     */
    public Profile profile(Reduction reduction) {
        if (reduction.lastRow() >= pixels.length
                || 2 * reduction.corner() > Math.min(pixels.length, pixels[0].length)) {
            throw new IllegalArgumentException(
                    "the image has " + pixels.length + " rows of " + pixels[0].length + " pixels; rows to "
                            + reduction.lastRow() + " and corners of " + reduction.corner() + " do not fit");
        }
        List<Pixel> hot = new ArrayList<>();
        double[] plane = background(reduction.corner());
        int columns = pixels[0].length;
        double[] sums = new double[columns];
        double[] variances = new double[columns];
        double[] shares = new double[columns];
        double middle = 0.5 * (reduction.firstRow() + reduction.lastRow());
        for (int row = reduction.firstRow(); row <= reduction.lastRow(); row++) {
            for (int column = 0; column < columns; column++) {
                if (isHot(row, column, reduction)) {
                    hot.add(new Pixel(row, column));
                } else {
                    double place = column - reduction.tilt() * (row - middle);
                    double signal = pixels[row][column] - (plane[0] + plane[1] * row + plane[2] * column);
                    spread(place, signal, variance(pixels[row][column], reduction), sums, variances, shares);
                }
            }
        }
        return scaled(sums, variances, shares, reduction.lastRow() - reduction.firstRow() + 1, hot);
    }

    private static double variance(double value, Reduction reduction) {
        return reduction.gain() * Math.max(0.0, value) + reduction.readNoise() * reduction.readNoise();
    }

    private static void spread(
            double place, double signal, double variance, double[] sums, double[] variances, double[] shares) {
        int left = (int) Math.floor(place);
        double part = place - left;
        put(left, 1.0 - part, signal, variance, sums, variances, shares);
        put(left + 1, part, signal, variance, sums, variances, shares);
    }

    private static void put(
            int column,
            double part,
            double signal,
            double variance,
            double[] sums,
            double[] variances,
            double[] shares) {
        if (column >= 0 && column < sums.length && part > 0.0) {
            sums[column] += part * signal;
            variances[column] += part * part * variance;
            shares[column] += part;
        }
    }

    private static Profile scaled(double[] sums, double[] variances, double[] shares, int rows, List<Pixel> hot) {
        double[] values = new double[sums.length];
        double[] uncertainties = new double[sums.length];
        for (int k = 0; k < sums.length; k++) {
            double factor = shares[k] > 0.0 ? rows / shares[k] : 0.0;
            values[k] = sums[k] * factor;
            uncertainties[k] = shares[k] > 0.0 ? Math.sqrt(variances[k]) * factor : Double.POSITIVE_INFINITY;
        }
        return new Profile(values, uncertainties, hot);
    }

    private boolean isHot(int row, int column, Reduction reduction) {
        double[] neighbours = new double[8];
        int count = 0;
        for (int dr = -1; dr <= 1; dr++) {
            for (int dc = -1; dc <= 1; dc++) {
                int r = row + dr;
                int c = column + dc;
                boolean inside = r >= 0 && c >= 0 && r < pixels.length && c < pixels[0].length;
                if (inside && (dr != 0 || dc != 0)) {
                    neighbours[count++] = pixels[r][c];
                }
            }
        }
        double median = median(Arrays.copyOf(neighbours, count));
        return pixels[row][column] - median > reduction.hotDeviates() * Math.sqrt(variance(median, reduction));
    }

    /** Offset and slopes of a plane through the corner medians, by least squares (exact for a plane). */
    private double[] background(int corner) {
        int rows = pixels.length;
        int columns = pixels[0].length;
        double topLeft = block(0, 0, corner);
        double topRight = block(0, columns - corner, corner);
        double bottomLeft = block(rows - corner, 0, corner);
        double bottomRight = block(rows - corner, columns - corner, corner);
        double perRow = 0.5 * (bottomLeft + bottomRight - topLeft - topRight) / Math.max(1, rows - corner);
        double perColumn = 0.5 * (topRight + bottomRight - topLeft - bottomLeft) / Math.max(1, columns - corner);
        double mean = 0.25 * (topLeft + topRight + bottomLeft + bottomRight);
        return new double[] {mean - perRow * 0.5 * (rows - 1) - perColumn * 0.5 * (columns - 1), perRow, perColumn};
    }

    private double block(int row, int column, int side) {
        double[] values = new double[side * side];
        for (int k = 0; k < values.length; k++) {
            values[k] = pixels[row + k / side][column + k % side];
        }
        return median(values);
    }

    private static double median(double[] values) {
        Arrays.sort(values);
        int half = values.length / 2;
        return values.length % 2 == 1 ? values[half] : 0.5 * (values[half - 1] + values[half]);
    }
}
