package fringekeep.archive.internal.store;

import fringekeep.archive.Person;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PersonId;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/** The erasable table of persons. */
final class Persons {
    private static final int LONGEST = 200;
    private static final Pattern ORCID = Pattern.compile("\\d{4}-\\d{4}-\\d{4}-\\d{3}[\\dX]");

    private Persons() {}

    static List<Person> all(Connection c) throws SQLException {
        return Sql.list(c, "select id, name, orcid, mail from person order by id", Persons::person);
    }

    static Optional<Person> find(Connection c, PersonId id) throws SQLException {
        return Sql.first(c, "select id, name, orcid, mail from person where id = ?", Persons::person, bytes(id));
    }

    private static Person person(ResultSet row) throws SQLException {
        return new Person(
                new PersonId(HexFormat.of().formatHex(row.getBytes(1))),
                Optional.ofNullable(row.getString(2)),
                Optional.ofNullable(row.getString(3)),
                Optional.ofNullable(row.getString(4)));
    }

    static void save(Connection c, Person person) throws SQLException {
        erase(c, person.id());
        Sql.run(
                c,
                "insert into person (id, name, orcid, mail) values (?, ?, ?, ?)",
                bytes(person.id()),
                text(person.name()),
                text(person.orcid()),
                text(person.mail()));
    }

    static boolean erase(Connection c, PersonId id) throws SQLException {
        return Sql.run(c, "delete from person where id = ?", bytes(id)) > 0;
    }

    /** The person, if all members are well formed. */
    static Person examined(Person person) throws ProblemException {
        List<Problem> problems = new ArrayList<>();
        tooLong(person.name(), "name", problems);
        tooLong(person.mail(), "mail", problems);
        if (person.orcid().isPresent() && !isOrcid(person.orcid().get())) {
            problems.add(new Problem(
                    "person.orcid",
                    "\"" + person.orcid().get() + "\" is not an ORCID iD.",
                    "/orcid",
                    "Check its digits; the last one follows from the others. Nothing was changed."));
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return person;
    }

    private static void tooLong(Optional<String> text, String member, List<Problem> problems) {
        if (text.isPresent() && (text.get().isBlank() || text.get().length() > LONGEST)) {
            problems.add(new Problem(
                    "person." + member,
                    "The " + member + " has 1 to " + LONGEST + " characters.",
                    "/" + member,
                    "Shorten it or leave it out. Nothing was changed."));
        }
    }

    /** Whether form and check digit hold (ISO/IEC 7064, MOD 11-2, as ORCID iDs use it). */
    static boolean isOrcid(String text) {
        if (!ORCID.matcher(text).matches()) {
            return false;
        }
        String digits = text.replace("-", "");
        int total = 0;
        for (int i = 0; i < digits.length() - 1; i++) {
            total = (total + Character.digit(digits.charAt(i), 10)) * 2;
        }
        int check = (12 - total % 11) % 11;
        return digits.charAt(digits.length() - 1) == (check == 10 ? 'X' : (char) ('0' + check));
    }

    private static Object text(Optional<String> text) {
        return text.<Object>map(value -> value).orElse(new Sql.Null(Types.VARCHAR));
    }

    private static byte[] bytes(PersonId id) {
        return HexFormat.of().parseHex(id.hex());
    }
}
