package fringekeep.archive.internal.store.copy;

import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

/** Bytes of a plain copy by hash. */
public final class CopySource implements RecordSource {
    private final CopyFolder folder;
    private final Map<Hash, Place> places = new HashMap<>();
    private final HashedFiles raw;
    private final HashedFiles payloads;

    /** Where a line's bytes lie. */
    private record Place(int file, long offset, int length) {}

    CopySource(CopyFolder folder) {
        this.folder = folder;
        this.raw = new HashedFiles(folder.raw(), folder.aside());
        this.payloads = new HashedFiles(folder.payloads(), folder.aside());
    }

    void add(Hash hash, int file, long offset, int length) {
        places.putIfAbsent(hash, new Place(file, offset, length));
    }

    /** Whether the bytes of a head or part stand in the copy. */
    public boolean has(Hash hash) {
        return places.containsKey(hash);
    }

    @Override
    public Optional<byte[]> head(Hash fingerprint) {
        return line(fingerprint);
    }

    @Override
    public Optional<byte[]> part(Hash part) {
        return line(part);
    }

    private Optional<byte[]> line(Hash hash) {
        Place place = places.get(hash);
        if (place == null) {
            return Optional.empty();
        }
        ByteBuffer bytes = ByteBuffer.allocate(place.length());
        try (FileChannel channel = FileChannel.open(folder.records(place.file()))) {
            while (bytes.hasRemaining()) {
                if (channel.read(bytes, place.offset() + bytes.position()) < 0) {
                    throw new IOException("the file ended early");
                }
            }
        } catch (IOException e) {
            throw new StoreFailure("Reading " + folder.records(place.file()), e);
        }
        return Optional.of(bytes.array());
    }

    @Override
    public Optional<byte[]> payload(Hash payload) {
        return bytes(payloads, payload);
    }

    @Override
    public Optional<byte[]> raw(Hash hash) {
        return bytes(raw, hash);
    }

    private static Optional<byte[]> bytes(HashedFiles files, Hash hash) {
        try {
            Optional<InputStream> in = files.open(hash);
            if (in.isEmpty()) {
                return Optional.empty();
            }
            try (InputStream open = in.get()) {
                return Optional.of(open.readAllBytes());
            }
        } catch (IOException e) {
            throw new StoreFailure("Reading " + files.path(hash), e);
        }
    }
}
