package fringekeep.drawing;

import java.util.List;

/**
 * A picture in plain terms: panels side by side in rows of {@code columns}. Says what is drawn, never how many pixels it
 * takes, so that the same value becomes SVG, PDF, PNG or a painting on the screen.
 *
 * @param title words above the picture, may be empty
 * @param widthMillimetres width on paper (mm), &gt; 0
 * @param heightMillimetres height on paper (mm), &gt; 0
 * @param columns panels in a row, &ge; 1
 * @param panels the panels, in reading order; a panel without name and heading whose
 *     x axis equals that of the one above shares it (residuals below a fringe)
 */
public record Picture(
        String title, double widthMillimetres, double heightMillimetres, int columns, List<Panel> panels) {
    /** Checks sizes and copies the list. */
    public Picture {
        if (!(widthMillimetres > 0) || !(heightMillimetres > 0)) {
            throw new IllegalArgumentException(
                    "picture of " + widthMillimetres + " mm by " + heightMillimetres + " mm: both must be positive");
        }
        if (columns < 1) {
            throw new IllegalArgumentException("columns " + columns + ": at least 1");
        }
        panels = List.copyOf(panels);
    }
}
