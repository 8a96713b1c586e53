package fringekeep.archive.record;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * The head of a record: its hash is the record's fingerprint. See record format 1, section 3.
 *
 * @param kind the kind
 * @param schema schema number of the kind, &ge; 1
 * @param thing what the record is of
 * @param inputs what it was made from, in order
 * @param about what it speaks of
 * @param payloads files it carries
 * @param parts unsalted parts by name
 * @param sealed salted parts by name
 * @param corrects the record it replaces
 * @param after the record it follows from an instant on
 */
public record Head(
        KindName kind,
        int schema,
        ThingId thing,
        List<InputReference> inputs,
        List<AboutReference> about,
        List<PayloadReference> payloads,
        SortedMap<String, Hash> parts,
        SortedMap<String, Hash> sealed,
        Optional<Hash> corrects,
        Optional<After> after) {
    /** Copies the collections. */
    public Head {
        inputs = List.copyOf(inputs);
        about = List.copyOf(about);
        payloads = List.copyOf(payloads);
        parts = java.util.Collections.unmodifiableSortedMap(new TreeMap<>((Map<String, Hash>) parts));
        sealed = java.util.Collections.unmodifiableSortedMap(new TreeMap<>((Map<String, Hash>) sealed));
    }
}
