package fringekeep.property.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.run.Job;
import fringekeep.desk.run.Runner;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.Picture;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** A desk without a window whose jobs run at once. */
final class QuietDesk implements DeskHand {
    final List<Problem> said = new ArrayList<>();
    final List<String> done = new ArrayList<>();
    final List<DeskSheet> shown = new ArrayList<>();
    private final Archive archive;
    private final PersonId person;
    private final Runner runner;
    private DeskSelection selection = new DeskSelection(true, Optional.empty(), List.of(), Optional.empty());

    QuietDesk(Archive archive, PersonId person) {
        this(archive, person, new Runner(Runnable::run, Runnable::run));
    }

    QuietDesk(Archive archive, PersonId person, Runner runner) {
        this.archive = archive;
        this.person = person;
        this.runner = runner;
        runner.onTrouble(said::addAll);
    }

    void select(String kind, List<Hash> records) {
        selection = new DeskSelection(true, Optional.of(kind), records, Optional.of(records.get(0)));
    }

    @Override
    public Archive archive() {
        return archive;
    }

    @Override
    public Register register() {
        return Register.read(archive, Stops.shipped());
    }

    @Override
    public DeskSelection selection() {
        return selection;
    }

    @Override
    public <T> void run(String place, Job<T> job, Consumer<T> then) {
        runner.run(place, job, then);
    }

    @Override
    public <T> void run(String place, Job<T> job, Consumer<T> then, Consumer<List<Problem>> failed) {
        runner.run(place, job, then, failed);
    }

    @Override
    public void stop(String place) {
        runner.stop(place);
    }

    @Override
    public void show(DeskSheet sheet) {
        shown.add(sheet);
    }

    @Override
    public void back() {}

    @Override
    public void open(Hash record) {}

    @Override
    public void list(String kind, List<Hash> records, String words) {}

    @Override
    public void say(List<Problem> problems) {
        said.addAll(problems);
    }

    @Override
    public void done(String words) {
        done.add(words);
    }

    @Override
    public void person(Consumer<PersonId> then) {
        then.accept(person);
    }

    @Override
    public Optional<String> personName() {
        return Optional.of("A. Person");
    }

    @Override
    public List<Path> chooseFiles(String title) {
        return List.of();
    }

    @Override
    public Optional<Path> chooseFolder(String title) {
        return Optional.empty();
    }

    @Override
    public Optional<Path> chooseToSave(String title, String suggested) {
        return Optional.empty();
    }

    @Override
    public void save(Picture picture) {}

    @Override
    public Optional<String> remembered(String name) {
        return Optional.empty();
    }

    @Override
    public void remember(String name, String value) {}
}
