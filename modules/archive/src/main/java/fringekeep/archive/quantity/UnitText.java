package fringekeep.archive.quantity;

import java.util.LinkedHashMap;
import java.util.Map;

/** Unit codes as people write and read them. */
final class UnitText {
    private static final String SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";
    private static final Map<String, String> SPOKEN = new LinkedHashMap<>();

    static {
        SPOKEN.put("°C", "Cel");
        SPOKEN.put("℃", "Cel");
        SPOKEN.put("°", "deg");
        SPOKEN.put("Å", "Ao");
        SPOKEN.put("\u212B", "Ao");
        SPOKEN.put("Ω", "Ohm");
        SPOKEN.put("\u2126", "Ohm");
        SPOKEN.put("µ", "u");
        SPOKEN.put("\u03BC", "u");
        SPOKEN.put("·", ".");
        SPOKEN.put("⋅", ".");
        SPOKEN.put("*", ".");
    }

    private UnitText() {}

    /** The UCUM code for a unit as typed: signs, superscripts and spaces of everyday writing are understood. */
    static String code(String typed) {
        String code = plainDigits(typed.strip());
        for (Map.Entry<String, String> spoken : SPOKEN.entrySet()) {
            code = code.replace(spoken.getKey(), spoken.getValue());
        }
        code = code.replaceAll("\\s*([./])\\s*", "$1").replaceAll("\\s+", ".");
        code = code.replaceAll("\\b(?:counts?|cts)\\b(?!})", "{count}").replaceAll("\\bshots?\\b(?!})", "{shot}");
        code = code.replaceAll("\\b(?:Da|amu)\\b", "u").replaceAll("\\^", "");
        return code.isEmpty() ? "1" : code;
    }

    /** Superscript digits and signs as plain ones. */
    static String plainDigits(String text) {
        StringBuilder plain = new StringBuilder(text.length());
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            int digit = SUPERSCRIPTS.indexOf(c);
            if (digit >= 0) {
                plain.append((char) ('0' + digit));
            } else {
                plain.append(c == '⁻' || c == '−' ? '-' : c == '⁺' ? '+' : c);
            }
        }
        return plain.toString();
    }

    /** An integer in superscript digits with a superscript minus. */
    static String superscript(int number) {
        StringBuilder text = new StringBuilder();
        for (char c : Integer.toString(number).toCharArray()) {
            text.append(c == '-' ? '⁻' : SUPERSCRIPTS.charAt(c - '0'));
        }
        return text.toString();
    }

    /** A UCUM code as people read it. */
    static String shown(String code) {
        StringBuilder shown = new StringBuilder();
        for (String piece : code.split("(?<=[./])|(?=[./])")) {
            shown.append(piece.equals(".") ? "\u2009" : piece.equals("/") ? "/" : component(piece));
        }
        return shown.toString();
    }

    private static String component(String piece) {
        if (piece.startsWith("{")) {
            return piece.substring(1, piece.length() - 1);
        }
        String bare = piece.replaceAll("\\{[^{}]*}", "");
        String power = bare.replaceAll("^[^0-9+-]*", "");
        String atom = bare.substring(0, bare.length() - power.length());
        return atom.isEmpty() ? bare : atom(atom) + (power.isEmpty() ? "" : superscript(Integer.parseInt(power)));
    }

    private static String atom(String atom) {
        return switch (atom) {
            case "Cel" -> "°C";
            case "Ao" -> "Å";
            case "deg" -> "°";
            case "Ohm" -> "Ω";
            case "[ppm]" -> "ppm";
            case "[ppb]" -> "ppb";
            default -> atom.length() > 1 && atom.startsWith("u") ? "µ" + atom.substring(1) : ohm(atom);
        };
    }

    private static String ohm(String atom) {
        return atom.endsWith("Ohm") ? atom.substring(0, atom.length() - 3) + "Ω" : atom;
    }
}
