package fringekeep.archive.facet;

/**
 * Counts on a rectangular grid of pixels.
 *
 * @param width pixels across
 * @param height pixels down
 * @param counts row by row from the top, width &times; height values
 * @param pixelWidth size of a pixel across (m)
 * @param pixelHeight size of a pixel down (m)
 */
public record Image(int width, int height, double[] counts, double pixelWidth, double pixelHeight) {
    /** Copies. */
    public Image {
        counts = counts.clone();
    }
}
