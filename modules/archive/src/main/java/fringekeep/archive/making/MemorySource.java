package fringekeep.archive.making;

import fringekeep.archive.Prepared;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.util.Collection;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.concurrent.ConcurrentHashMap;

/** Stored bytes held in memory: for prepared records, bundle folders, supposed changes and tests. Thread-safe. */
public final class MemorySource implements RecordSource {
    private final Map<Hash, byte[]> heads = new ConcurrentHashMap<>();
    private final Map<Hash, byte[]> parts = new ConcurrentHashMap<>();
    private final Map<Hash, byte[]> payloads = new ConcurrentHashMap<>();
    private final Map<Hash, byte[]> raws = new ConcurrentHashMap<>();

    /** An empty one. */
    public MemorySource() {}

    /** One that holds prepared records. */
    public static MemorySource of(Collection<Prepared> records) {
        MemorySource source = new MemorySource();
        records.forEach(source::add);
        return source;
    }

    /** Adds head, parts and payloads of a prepared record. */
    public void add(Prepared record) {
        heads.put(record.fingerprint(), record.headBytes());
        parts.putAll(record.parts());
        record.payloads().forEach(payload -> payloads.put(payload.hash(), payload.bytes()));
    }

    /** Adds the bytes of a head. */
    public Hash addHead(byte[] bytes) {
        return put(heads, bytes);
    }

    /** Adds the bytes of a part. */
    public Hash addPart(byte[] bytes) {
        return put(parts, bytes);
    }

    /** Adds the bytes of a payload. */
    public Hash addPayload(byte[] bytes) {
        return put(payloads, bytes);
    }

    /** Adds the bytes of a raw file. */
    public Hash addRaw(byte[] bytes) {
        return put(raws, bytes);
    }

    private static Hash put(Map<Hash, byte[]> map, byte[] bytes) {
        Hash hash = Hash.of(bytes);
        map.put(hash, bytes.clone());
        return hash;
    }

    @Override
    public Optional<byte[]> head(Hash fingerprint) {
        return get(heads, fingerprint);
    }

    @Override
    public Optional<byte[]> part(Hash part) {
        return get(parts, part);
    }

    @Override
    public Optional<byte[]> payload(Hash payload) {
        return get(payloads, payload);
    }

    @Override
    public Optional<byte[]> raw(Hash raw) {
        return get(raws, raw);
    }

    @Override
    public OptionalLong rawLength(Hash raw) {
        byte[] bytes = raws.get(raw);
        return bytes == null ? OptionalLong.empty() : OptionalLong.of(bytes.length);
    }

    private static Optional<byte[]> get(Map<Hash, byte[]> map, Hash hash) {
        return Optional.ofNullable(map.get(hash)).map(byte[]::clone);
    }
}
