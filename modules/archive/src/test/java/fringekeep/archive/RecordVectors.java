package fringekeep.archive;

import fringekeep.archive.record.Hash;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;

/** The golden vectors of record format 1, section 17 (see src/test/reference/record-vectors/ORIGIN.md). */
public final class RecordVectors {
    public static final Path FOLDER = Path.of("src/test/reference/record-vectors");
    public static final Hash COMPOUND = new Hash("19a9eb9a03703836fbf434bb067ccd6085335a1dcef1a304faebfdabb71cd1b7");
    public static final Hash BATCH = new Hash("17462761a834274fca0d33b625e4980625ac88d40e2a672481762d3b509b6b29");
    public static final Hash SETUP = new Hash("f3572ff1248a4c20a5cba4a26d9f0d55e7cae14b353ae2ecee625a396404ff4b");
    public static final Hash RUN = new Hash("401afd5ce40d6a7626ec59d48d4d01c784318f3a3f0b7ac2d2d5bbc303b26465");
    public static final Hash PROFILE = new Hash("3cc14783b716a26c16a98af38b65a7700da337eaef0d55d8c79f18277bba88d6");
    public static final Hash SCAN = new Hash("a3c226ba9bfde80e9d8cafe6347101ba33b230cd9588a269aa7f78a8baa908c8");
    public static final Hash PLACEMENT = new Hash("c131de7e76ca0dd7394a6fcde02e9da877d14465cbd2b54c9296c90975dc0b36");
    public static final Hash FIT = new Hash("09a4e8050046bb0ba29c2c9ef904ac0bb7992844069ef146bd3056d67459f134");
    public static final Hash MASK = new Hash("12c8b314429ee4e6c295de10544974030461c6a4903d2968644f3c0deec42de7");
    public static final Hash SETUP2 = new Hash("abb27baf757a6343815b1bd4e615cf93f35e2f043c2671953bec8bc3b1b2695d");
    public static final Hash RAW = new Hash("2430a13b82f0347a4de0e1742062781b782a93af9df666fa17b27f3fff056504");
    public static final Hash TABLE = new Hash("6a5430803b990ff1443108e0793d983edea72bd7c5594a576a60499f8f3377cb");

    private RecordVectors() {}

    public static byte[] bytes(Hash hash) {
        try {
            return Files.readAllBytes(FOLDER.resolve(hash.hex()));
        } catch (IOException e) {
            throw new UncheckedIOException("golden vector " + hash, e);
        }
    }

    /** All vectors by hash. */
    public static SortedMap<Hash, byte[]> all() {
        SortedMap<Hash, byte[]> all = new TreeMap<>();
        try (Stream<Path> files = Files.list(FOLDER)) {
            files.map(file -> file.getFileName().toString())
                    .filter(name -> name.length() == 64)
                    .map(Hash::new)
                    .forEach(hash -> all.put(hash, bytes(hash)));
        } catch (IOException e) {
            throw new UncheckedIOException("golden vectors", e);
        }
        return all;
    }

    /** The vectors that are objects of one form, such as {@code head/1}. */
    public static SortedMap<Hash, byte[]> ofForm(String form) {
        SortedMap<Hash, byte[]> found = all();
        String mark = "\"fringekeep\":\"" + form + "\"";
        found.values().removeIf(bytes -> !new String(bytes, StandardCharsets.UTF_8).contains(mark));
        return found;
    }
}
