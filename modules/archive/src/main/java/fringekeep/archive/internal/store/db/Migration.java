package fringekeep.archive.internal.store.db;

import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;

/**
 * One step forward of the tables.
 *
 * @param number 1, 2, 3 …
 * @param text its statements, each ended by a semicolon at the end of a line
 */
public record Migration(int number, String text) {
    private static final List<String> NAMES = List.of("V001__records.sql", "V002__counts.sql", "V003__freed.sql");

    /** All steps of this program in order. */
    public static List<Migration> all() {
        return NAMES.stream()
                .map(name -> new Migration(Integer.parseInt(name.substring(1, 4)), read(name)))
                .toList();
    }

    private static String read(String name) {
        try (InputStream in = Migration.class.getResourceAsStream(name)) {
            if (in == null) {
                throw new IllegalStateException("migration " + name + " is not in the program");
            }
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new StoreFailure("Reading migration " + name, e);
        }
    }

    /** The checksum that is kept. */
    public Hash checksum() {
        return Hash.of(text.getBytes(StandardCharsets.UTF_8));
    }

    /** Its statements. */
    public List<String> statements() {
        String code = text.lines().filter(line -> !line.startsWith("--")).reduce("", (a, b) -> a + b + "\n");
        return Arrays.stream(code.split(";\\s*\\n"))
                .map(String::strip)
                .filter(statement -> !statement.isEmpty())
                .toList();
    }
}
