package fringekeep.drawing;

import java.awt.Color;

/** Colours for paper, a light and a dark screen. Series are those of Okabe and Ito, some darkened for shapes on paper. */
public enum Theme {
    /** White paper, black ink. */
    PAPER(
            0xFFFFFF,
            0xDAD6CA,
            0x85827A,
            new int[] {
                0x1B2024, 0x454C52, 0x656C71, 0x0072B2, 0xD55E00, 0xB2588F, 0xC24F00, 0x009E73, 0xE69F00, 0xCC79A7,
                0x56B4E9
            },
            0xCFE3F1,
            0xF7DFCC),
    /** The ledger's sheet by day. */
    LIGHT(
            0xFCFBF7,
            0xDAD6CA,
            0x85827A,
            new int[] {
                0x1B2024, 0x454C52, 0x656C71, 0x0072B2, 0xD55E00, 0xB2588F, 0xC24F00, 0x009E73, 0xE69F00, 0xCC79A7,
                0x56B4E9
            },
            0xCFE3F1,
            0xF7DFCC),
    /** The ledger's sheet by night. */
    DARK(
            0x191D20,
            0x2D3337,
            0x697278,
            new int[] {
                0xD8D9D3, 0xB0B5B5, 0x8C9396, 0x56B4E9, 0xE69F00, 0xCC79A7, 0xF08A3C, 0x2FBF97, 0xE6C34D, 0xDDA0C4,
                0x8FCBEF
            },
            0x1F3B4C,
            0x40321A);

    private final Color ground;
    private final Color hair;
    private final Color rule;
    private final int[] tones;
    private final Color quantumBand;
    private final Color classicalBand;

    Theme(int ground, int hair, int rule, int[] tones, int quantumBand, int classicalBand) {
        this.ground = new Color(ground);
        this.hair = new Color(hair);
        this.rule = new Color(rule);
        this.tones = tones;
        this.quantumBand = new Color(quantumBand);
        this.classicalBand = new Color(classicalBand);
    }

    /** What lies behind everything. */
    public Color ground() {
        return ground;
    }

    /** Grid lines. */
    public Color hair() {
        return hair;
    }

    /** Axes and ticks. */
    public Color rule() {
        return rule;
    }

    /** Colour of a tone. */
    public Color color(Tone tone) {
        return new Color(tones[tone.ordinal()]);
    }

    /** Colour of a band of a tone: opaque, so that no output needs transparency. */
    public Color band(Tone tone) {
        return switch (tone) {
            case QUANTUM -> quantumBand;
            case CLASSICAL -> classicalBand;
            case INK, INK_SECOND, QUIET, MASKED, MARK, SERIES_THREE, SERIES_FOUR, SERIES_FIVE, SERIES_SIX ->
                mix(color(tone), ground, 4);
        };
    }

    private static Color mix(Color one, Color many, int parts) {
        return new Color(
                (one.getRed() + many.getRed() * parts) / (parts + 1),
                (one.getGreen() + many.getGreen() * parts) / (parts + 1),
                (one.getBlue() + many.getBlue() * parts) / (parts + 1));
    }
}
