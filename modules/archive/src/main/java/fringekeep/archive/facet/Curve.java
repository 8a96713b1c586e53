package fringekeep.archive.facet;

/**
 * One quantity against another.
 *
 * @param xName name of the abscissa
 * @param xUnit UCUM code (SI)
 * @param x abscissae (SI)
 * @param yName name of the ordinate
 * @param yUnit UCUM code (SI)
 * @param y ordinates (SI), same length
 */
public record Curve(String xName, String xUnit, double[] x, String yName, String yUnit, double[] y) {
    /** Copies. */
    public Curve {
        x = x.clone();
        y = y.clone();
    }
}
