package fringekeep.desk.look;

import static org.assertj.core.api.Assertions.assertThat;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.util.Arrays;
import java.util.HashSet;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class MarkTest {
    @ParameterizedTest
    @EnumSource(Mark.class)
    void everyShapePaintsWithinItsSquare(Mark mark) {
        BufferedImage image = paint(mark);

        int inside = 0;
        for (int y = 0; y < 40; y++) {
            for (int x = 0; x < 40; x++) {
                boolean inked = image.getRGB(x, y) != Color.WHITE.getRGB();
                boolean within = x >= 7 && x < 33 && y >= 7 && y < 33;
                assertThat(inked && !within).as("ink at " + x + ", " + y).isFalse();
                inside += inked ? 1 : 0;
            }
        }
        assertThat(inside).isGreaterThan(20);
    }

    @Test
    void noTwoShapesLookAlike() {
        Set<Integer> seen = new HashSet<>();
        for (Mark mark : Mark.values()) {
            seen.add(Arrays.hashCode(paint(mark).getRGB(0, 0, 40, 40, new int[1600], 0, 40)));
        }

        assertThat(seen).hasSameSizeAs(Mark.values());
    }

    /** WCAG 2.1, 1.4.3 (contrast of text, 4.5 : 1): relative luminance as defined there. */
    @Test
    void textKeepsItsContrastByDay() {
        for (Ink text : new Ink[] {Ink.INK, Ink.INK2, Ink.INK3}) {
            for (Ink ground : new Ink[] {Ink.GROUND, Ink.SHEET, Ink.WELL}) {
                assertThat(contrast(text.color(), ground.color()))
                        .as(text + " on " + ground)
                        .isGreaterThan(4.5);
            }
        }
    }

    private static double contrast(Color one, Color other) {
        double a = luminance(one);
        double b = luminance(other);
        return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
    }

    private static double luminance(Color color) {
        return 0.2126 * linear(color.getRed()) + 0.7152 * linear(color.getGreen()) + 0.0722 * linear(color.getBlue());
    }

    private static double linear(int channel) {
        double share = channel / 255.0;
        return share <= 0.03928 ? share / 12.92 : StrictMath.pow((share + 0.055) / 1.055, 2.4);
    }

    private static BufferedImage paint(Mark mark) {
        BufferedImage image = new BufferedImage(40, 40, BufferedImage.TYPE_INT_RGB);
        Graphics2D g = image.createGraphics();
        g.setColor(Color.WHITE);
        g.fillRect(0, 0, 40, 40);
        mark.paint(g, 8, 8, 24);
        g.dispose();
        return image;
    }
}
