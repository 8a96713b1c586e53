package fringekeep.fit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.stage.DeskHand;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;

/** Looks scans up by what people write: numbers, labels, fingerprints, with commas between. */
final class FoundScans {
    private FoundScans() {}

    static void of(DeskHand desk, String role, String written, FieldRow row, Consumer<List<Hash>> then) {
        Archive archive = desk.archive();
        desk.run(
                "fit.look-up." + role,
                work -> found(archive, written),
                found -> {
                    row.fault("");
                    then.accept(found);
                },
                problems -> row.fault(problems.get(0).what()));
    }

    private static List<Hash> found(Archive archive, String written) throws ProblemException {
        List<Hash> found = new ArrayList<>();
        for (String name : written.split("[,;]", -1)) {
            String reference = name.strip();
            if (!reference.isEmpty()) {
                boolean number = reference.chars().allMatch(Character::isDigit);
                found.add(archive.find(number ? "scan " + reference : reference));
            }
        }
        return found;
    }
}
