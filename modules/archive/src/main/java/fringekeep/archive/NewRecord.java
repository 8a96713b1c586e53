package fringekeep.archive;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What is to be recorded, before ids, salts and hashes are drawn.
 *
 * @param kind its kind
 * @param inputs what it is made from, in order
 * @param about what it speaks of
 * @param parts values of content, or choices and result, and of remark and identity; made and who are added
 * @param payloads files it carries
 * @param corrects the record it replaces
 * @param after the record it follows
 * @param person who enters or judges
 */
public record NewRecord(
        KindName kind,
        List<InputReference> inputs,
        List<AboutReference> about,
        Map<PartName, JsonObject> parts,
        List<NewPayload> payloads,
        Optional<Hash> corrects,
        Optional<After> after,
        Optional<PersonId> person) {
    /** Copies. */
    public NewRecord {
        inputs = List.copyOf(inputs);
        about = List.copyOf(about);
        parts = Map.copyOf(parts);
        payloads = List.copyOf(payloads);
    }
}
