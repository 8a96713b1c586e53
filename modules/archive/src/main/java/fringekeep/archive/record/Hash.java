package fringekeep.archive.record;

import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/**
 * A SHA-256 as 64 lower-case hexadecimal digits: the fingerprint of a record (of its head), or the hash of a part, a raw
 * file or a payload.
 */
public record Hash(String hex) implements Comparable<Hash> {
    /** Checks the form. */
    public Hash {
        if (hex.length() != 64 || !hex.chars().allMatch(c -> (c >= '0' && c <= '9') || (c >= 'a' && c <= 'f'))) {
            throw new IllegalArgumentException("not 64 lower-case hexadecimal digits: " + hex);
        }
    }

    /** The hash of some bytes. */
    public static Hash of(byte[] bytes) {
        return new Hash(HexFormat.of().formatHex(digest().digest(bytes)));
    }

    /** From the 32 bytes of a digest. */
    public static Hash fromBytes(byte[] digest) {
        return new Hash(HexFormat.of().formatHex(digest));
    }

    /** A fresh SHA-256 digest. */
    public static MessageDigest digest() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }

    /** The 32 bytes. */
    public byte[] bytes() {
        return HexFormat.of().parseHex(hex);
    }

    /** Short form for eyes only: RFC 4648 Base32 of the first five bytes as two groups of four. */
    public String shortForm() {
        long bits = Long.parseLong(hex.substring(0, 10), 16);
        String alphabet = "ABCDEFGHIJKLMNOPQRSTUVWXYZ234567";
        StringBuilder text = new StringBuilder(9);
        for (int group = 7; group >= 0; group--) {
            text.append(alphabet.charAt((int) (bits >>> (5 * group)) & 31));
            if (group == 4) {
                text.append(' ');
            }
        }
        return text.toString();
    }

    @Override
    public int compareTo(Hash other) {
        return hex.compareTo(other.hex);
    }

    @Override
    public String toString() {
        return hex;
    }
}
