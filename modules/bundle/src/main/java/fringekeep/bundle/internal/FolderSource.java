package fringekeep.bundle.internal;

import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.OptionalLong;

/** Bytes of a bundle's records by hash. Trusts no name: bytes whose hash differs from their file's name are not at hand. */
public final class FolderSource implements RecordSource {
    private final Path data;

    /** The folder {@code data} of a bundle. */
    public FolderSource(Path data) {
        this.data = data;
    }

    private Optional<byte[]> bytes(String path, Hash hash) {
        Path file = data.resolve(path);
        if (!Files.isRegularFile(file)) {
            return Optional.empty();
        }
        try {
            byte[] bytes = Files.readAllBytes(file);
            return Hash.of(bytes).equals(hash) ? Optional.of(bytes) : Optional.empty();
        } catch (IOException e) {
            throw new UncheckedIOException("reading " + file, e);
        }
    }

    @Override
    public Optional<byte[]> head(Hash fingerprint) {
        return bytes(Layout.record(fingerprint), fingerprint);
    }

    @Override
    public Optional<byte[]> part(Hash part) {
        return bytes(Layout.record(part), part);
    }

    @Override
    public Optional<byte[]> payload(Hash payload) {
        return bytes(Layout.payload(payload), payload);
    }

    @Override
    public Optional<byte[]> raw(Hash raw) {
        return bytes(Layout.raw(raw), raw);
    }

    @Override
    public OptionalLong rawLength(Hash raw) {
        Path file = data.resolve(Layout.raw(raw));
        try {
            return Files.isRegularFile(file) ? OptionalLong.of(Files.size(file)) : OptionalLong.empty();
        } catch (IOException e) {
            throw new UncheckedIOException("reading " + file, e);
        }
    }
}
