package fringekeep.desk.window;

import fringekeep.archive.Archive;
import fringekeep.archive.Person;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.run.Runner;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import java.util.function.Consumer;

/** Who is at the desk: asked once per archive, kept between runs, changed at any time. */
final class DeskPersons {
    private final Runner runner;
    private final Memory memory;
    private final DeskHost host;
    private final Runnable changed;
    private Optional<Archive> archive = Optional.empty();
    private Optional<Person> here = Optional.empty();

    DeskPersons(Runner runner, Memory memory, DeskHost host, Runnable changed) {
        this.runner = runner;
        this.memory = memory;
        this.host = host;
        this.changed = changed;
    }

    /** Another archive is open: who was at its desk last? */
    void open(Optional<Archive> next) {
        archive = next;
        here = Optional.empty();
        next.ifPresent(open -> runner.run(
                "persons",
                work -> open.persons(),
                persons -> memory.get(key(open))
                        .flatMap(id -> persons.stream()
                                .filter(person -> person.id().hex().equals(id))
                                .findFirst())
                        .or(() -> persons.size() == 1 ? Optional.of(persons.get(0)) : Optional.empty())
                        .ifPresent(this::sit)));
    }

    private static String key(Archive open) {
        return "person " + open.facts().id();
    }

    private void sit(Person person) {
        here = Optional.of(person);
        archive.ifPresent(open -> memory.put(key(open), person.id().hex()));
        changed.run();
    }

    /** The name of the person at the desk. */
    Optional<String> name() {
        return here.flatMap(Person::name);
    }

    /** Passes on who is at the desk; asks where nobody is. */
    void ask(Consumer<PersonId> then) {
        if (here.isPresent()) {
            then.accept(here.get().id());
        } else {
            change(then);
        }
    }

    /** Asks who is at the desk from now on. */
    void change(Consumer<PersonId> then) {
        archive.ifPresent(open -> runner.run(
                "persons",
                work -> open.persons(),
                persons -> host.askPerson(persons, answer -> answered(open, persons, answer, then))));
    }

    private void answered(Archive open, List<Person> persons, String name, Consumer<PersonId> then) {
        Person person = persons.stream()
                .filter(known -> known.name().filter(name::equals).isPresent())
                .findFirst()
                .orElseGet(() -> new Person(fresh(), Optional.of(name), Optional.empty(), Optional.empty()));
        runner.run(
                "persons",
                work -> {
                    if (!persons.contains(person)) {
                        open.savePerson(person);
                    }
                    return person;
                },
                saved -> {
                    sit(saved);
                    then.accept(saved.id());
                });
    }

    /** A new person's id. */
    static PersonId fresh() {
        return new PersonId(UUID.randomUUID().toString().replace("-", "").toLowerCase(Locale.ROOT));
    }
}
