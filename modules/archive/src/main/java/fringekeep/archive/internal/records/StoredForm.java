package fringekeep.archive.internal.records;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;

/** Which form an object of the archive says it has: the domains of hashes are kept apart inside the bytes. */
final class StoredForm {
    private StoredForm() {}

    static void require(JsonObject object, String form) throws ProblemException {
        String found = object.text("fringekeep").orElse("");
        if (found.equals(form)) {
            return;
        }
        String sort = form.substring(0, form.indexOf('/') + 1);
        boolean newer = found.startsWith(sort) && found.length() > sort.length();
        throw new ProblemException(new Problem(
                newer ? "record.newer-form" : "record.other-sort",
                newer
                        ? "The object has the form \"" + found + "\", which this program does not know."
                        : "The object says it is \"" + found + "\", where \"" + form + "\" is expected.",
                "/fringekeep",
                newer ? "Use a newer program." : "Check which hash was meant."));
    }

    static JsonObject object(Json value, String pointer) throws ProblemException {
        if (value instanceof JsonObject object) {
            return object;
        }
        throw new ProblemException(new Problem("record.member", "Here an object is expected.", pointer, ""));
    }
}
