package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * What the script calls records: {@code scan of FILE}, {@code scan of FILE section N}, {@code fit of FILE}, or kind and
 * number. Each means the record that is current then.
 */
final class LabNames {
    private static final String SCAN = "scan of ";
    private static final String FIT = "fit of ";
    private static final String SECTION = " section ";

    private final Archive archive;
    private final Map<String, Hash> known = new HashMap<>();

    LabNames(Archive archive) {
        this.archive = archive;
    }

    /** Remembers the scans of a file, one a section; a file that was there before keeps its own. */
    void scansOf(String file, List<Hash> scans) {
        for (int i = 0; i < scans.size(); i++) {
            known.put(SCAN + file + SECTION + i, scans.get(i));
        }
        if (!scans.isEmpty()) {
            known.put(SCAN + file, scans.get(0));
        }
    }

    /** Remembers the fit of a scan by the scan's name. */
    void fitOf(String scan, Hash fit) {
        known.put(FIT + scan.substring(SCAN.length()), fit);
    }

    /** The record. */
    Hash find(String reference) throws ProblemException {
        Hash named = known.get(reference);
        if (named != null) {
            return archive.graph().current(named).orElse(named);
        }
        if (reference.startsWith(SCAN) || reference.startsWith(FIT)) {
            throw new ProblemException(new Problem(
                    "demo.no-record",
                    "There is no " + reference + ".",
                    "",
                    "Take the sample data that came with the program."));
        }
        return archive.find(reference);
    }

    /** All records of an array of names. */
    List<Hash> all(JsonArray references) throws ProblemException {
        List<Hash> found = new ArrayList<>();
        for (Json reference : references.items()) {
            found.add(find(LabReplay.name(reference)));
        }
        return List.copyOf(found);
    }
}
