package fringekeep.desk.look;

import fringekeep.drawing.Theme;
import java.awt.Color;
import java.util.Locale;
import javax.swing.UIManager;

/** Colours by their use, read from the theme at each painting, so that a change of theme needs a repaint only. */
public enum Ink {
    /** Menu line, strip, status line. */
    GROUND(0xF1EFE8),
    /** Lists, records, ledgers. */
    SHEET(0xFCFBF7),
    /** What is out of sight in a linked strip. */
    WELL(0xF6F4EE),
    /** Text. */
    INK(0x1B2024),
    /** Secondary text. */
    INK2(0x454C52),
    /** Struck or dim text. */
    INK3(0x656C71),
    /** Row line. */
    HAIR(0xDAD6CA),
    /** Group line. */
    RULE(0x85827A),
    /** Main line. */
    STRONG(0x1B2024),
    /** Selected row. */
    SEL(0xE2ECF4),
    /** Focus frame. */
    SELRULE(0x0072B2),
    /** Solid curve, fitted fringe. */
    QUANTUM(0x0072B2),
    /** Dashed curve. */
    CLASSICAL(0xD55E00),
    /** Ring, corner, "different". */
    MARK(0xC24F00),
    /** Masked. */
    PURPLE(0xB2588F),
    /** Ground of caution lines. */
    CAUTION(0xFBF3D9),
    /** Rule of caution lines, question. */
    CAUTIONRULE(0xA87700),
    /** Double rule before the notes. */
    MARGIN(0xE5B9B0),
    /** The one main button of a sheet. */
    PRESS(0x1B2024),
    /** Text on it. */
    ONPRESS(0xFCFBF7);

    private final String key = "Fringekeep." + name().toLowerCase(Locale.ROOT);
    private final Color paper;

    Ink(int paper) {
        this.paper = new Color(paper);
    }

    /** The colour now; by day where no theme is set (tests without a look and feel). */
    public Color color() {
        Color color = UIManager.getColor(key);
        return color == null ? paper : color;
    }

    /** Whether the dark theme is on. */
    public static boolean dark() {
        Color sheet = SHEET.color();
        return sheet.getRed() + sheet.getGreen() + sheet.getBlue() < 3 * 128;
    }

    /** The drawing theme that goes with the colours. */
    public static Theme theme() {
        return dark() ? Theme.DARK : Theme.LIGHT;
    }
}
