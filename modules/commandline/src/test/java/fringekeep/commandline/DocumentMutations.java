package fringekeep.commandline;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.json.PrettyJson;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/** Damages JSON documents at random, each time in another way: as bytes, as text, and as members and values. */
final class DocumentMutations {
    /** How many sorts of damage there are; {@link #of} takes them in turn. */
    static final int SORTS = 16;

    private static final String[] NUMBERS = {
        "1e308",
        "-1e308",
        "1e309",
        "5e-324",
        "1e-400",
        "-0",
        "0",
        "-1",
        "9007199254740993",
        "1E400000000",
        "00",
        ".5",
        "NaN"
    };
    private static final String[] TEXTS = {
        "",
        " ",
        "\\u0000",
        "\\ud800",
        "\\u202e",
        "/etc/passwd",
        "../..",
        "266.0(1",
        "1e999 nm",
        "10 parsec",
        "1,000 W",
        "2031-13-45T99:99:99Z",
        "scan 99999999999999999999",
        "compound 0",
        "fit -1",
        "ZZZZ ZZZZ"
    };
    private final SplittableRandom random;

    DocumentMutations(long seed) {
        random = new SplittableRandom(seed);
    }

    /** The document with one sort of damage. */
    byte[] of(JsonObject document, int sort) {
        String text = new String(PrettyJson.write(document), StandardCharsets.UTF_8);
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        return switch (sort % SORTS) {
            case 0 -> Arrays.copyOf(bytes, random.nextInt(bytes.length));
            case 1 -> flipped(bytes, 1);
            case 2 -> flipped(bytes, 2 + random.nextInt(20));
            case 3 -> text.getBytes(random.nextBoolean() ? StandardCharsets.UTF_16 : StandardCharsets.UTF_16LE);
            case 4 -> inserted(text, "é€ß").getBytes(StandardCharsets.ISO_8859_1);
            case 5 -> utf8(replaced(text, any(NUMBERS)));
            case 6 -> utf8(replaced(text, "9".repeat(1 + random.nextInt(4_000))));
            case 7 -> utf8(replaced(text, nested("[", "]")));
            case 8 -> utf8(replaced(text, nested("{\"a\":", "}").replace(":}", ":1}")));
            case 9 -> utf8(replaced(text, '"' + any(TEXTS) + '"'));
            case 10 -> utf8(replaced(text, '"' + "x".repeat(random.nextInt(2_000_000)) + '"'));
            case 11 -> utf8(text.replaceFirst("\\{", "{" + member(text) + ','));
            case 12 -> utf8(inserted(text, any("{", "}", "[", "]", ",", ":", "\"", "\\", "null", "\u0000", "\ufeff")));
            case 13 -> randomBytes();
            default -> PrettyJson.write(changed(document));
        };
    }

    private String any(String... choices) {
        return choices[random.nextInt(choices.length)];
    }

    private static byte[] utf8(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    private byte[] flipped(byte[] bytes, int bits) {
        byte[] copy = bytes.clone();
        for (int i = 0; i < bits; i++) {
            copy[random.nextInt(copy.length)] ^= (byte) (1 << random.nextInt(8));
        }
        return copy;
    }

    private String inserted(String text, String piece) {
        int at = random.nextInt(text.length());
        return text.substring(0, at) + piece + text.substring(at);
    }

    private String nested(String open, String close) {
        int depth = 1 + random.nextInt(random.nextBoolean() ? 40 : 100_000);
        return open.repeat(depth) + close.repeat(depth);
    }

    private byte[] randomBytes() {
        byte[] bytes = new byte[random.nextInt(4_000)];
        random.nextBytes(bytes);
        return bytes;
    }

    /** Puts something in the place of a value that stands behind a colon. */
    private String replaced(String text, String value) {
        int colon = colon(text);
        int end = colon + 1;
        while (end < text.length() && ",}\n".indexOf(text.charAt(end)) < 0) {
            end++;
        }
        return text.substring(0, colon + 1) + value + text.substring(end);
    }

    private int colon(String text) {
        List<Integer> colons = new ArrayList<>();
        for (int at = text.indexOf("\":"); at >= 0; at = text.indexOf("\":", at + 1)) {
            colons.add(at + 1);
        }
        return colons.get(random.nextInt(colons.size()));
    }

    /** A member of the document, to stand in it twice. */
    private String member(String text) {
        int colon = colon(text);
        return text.substring(text.lastIndexOf('"', colon - 2), colon) + random.nextInt(10);
    }

    /** One to three members or items lost, doubled, renamed or of another sort. */
    private JsonObject changed(JsonObject document) {
        JsonObject now = document;
        for (int i = random.nextInt(3); i >= 0; i--) {
            now = (JsonObject) changed(now, 0);
        }
        return now;
    }

    private Json changed(Json value, int depth) {
        boolean deeper = depth == 0 || random.nextInt(4) > 0;
        if (deeper && value instanceof JsonObject object && !object.members().isEmpty()) {
            return member(object, depth);
        }
        if (deeper && value instanceof JsonArray array && !array.items().isEmpty()) {
            return item(array, depth);
        }
        return depth == 0 ? value : other();
    }

    private Json member(JsonObject object, int depth) {
        List<String> names = List.copyOf(object.members().keySet());
        String name = names.get(random.nextInt(names.size()));
        Json value = object.get(name).orElseThrow();
        return switch (random.nextInt(8)) {
            case 0 -> object.without(name);
            case 1 -> object.without(name).with(name + "X", value);
            default -> object.with(name, changed(value, depth + 1));
        };
    }

    private Json item(JsonArray array, int depth) {
        List<Json> items = new ArrayList<>(array.items());
        int at = random.nextInt(items.size());
        switch (random.nextInt(4)) {
            case 0 -> items.remove(at);
            case 1 -> items.add(items.get(at));
            default -> items.set(at, changed(items.get(at), depth + 1));
        }
        return new JsonArray(items);
    }

    private Json other() {
        return switch (random.nextInt(6)) {
            case 0 -> new JsonArray(List.of());
            case 1 -> JsonObject.EMPTY;
            case 2 -> new JsonBoolean(random.nextBoolean());
            case 3 -> new JsonText(any("", " ", "nm", "266.0(1) nm", "scan 1", "/", "counts", "Z", "1", "é"));
            default -> new JsonNumber(new double[] {0, -1, 1e308, 5e-324, 0.5, 1e15, 401}[random.nextInt(7)]);
        };
    }
}
