package fringekeep.archive.internal.store.copy;

import fringekeep.archive.Person;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PersonId;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** {@code persons.json}: a canonical array of objects by id. */
public final class PersonsFile {
    private PersonsFile() {}

    /** Its bytes. */
    public static byte[] write(List<Person> persons) {
        List<Json> items = new ArrayList<>();
        for (Person person :
                persons.stream().sorted(Comparator.comparing(Person::id)).toList()) {
            items.add(JsonObject.EMPTY
                    .with("id", person.id().hex())
                    .with("name", person.name().map(Json::of))
                    .with("orcid", person.orcid().map(Json::of))
                    .with("mail", person.mail().map(Json::of)));
        }
        return CanonicalJson.write(new JsonArray(items));
    }

    /** Reads it. */
    public static List<Person> read(byte[] bytes) throws ProblemException {
        List<Person> persons = new ArrayList<>();
        try {
            if (CanonicalJson.read(bytes) instanceof JsonArray array) {
                for (JsonObject object : array.objects()) {
                    persons.add(new Person(
                            new PersonId(object.text("id").orElse("")),
                            object.text("name"),
                            object.text("orcid"),
                            object.text("mail")));
                }
            }
        } catch (IllegalArgumentException | IllegalStateException e) {
            throw new ProblemException(new Problem(
                    "copy.persons",
                    "The list of persons is malformed: " + e.getMessage() + ".",
                    "persons.json",
                    "Take the file from another copy, or delete it: the records do not need it."));
        }
        return persons;
    }
}
