package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.Person;
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

/** A desk without a window over a real archive; jobs are done at once. */
final class BenchHand implements DeskHand {
    final List<Problem> problems = new ArrayList<>();
    final List<String> said = new ArrayList<>();
    final List<Hash> opened = new ArrayList<>();
    private final Archive archive;
    private final Runner runner = new Runner(Runnable::run, Runnable::run);
    Optional<DeskSheet> sheet = Optional.empty();
    DeskSelection selection = new DeskSelection(true, Optional.empty(), List.of(), Optional.empty());
    List<Path> files = List.of();

    BenchHand(Archive archive) {
        this.archive = archive;
        runner.onTrouble(problems::addAll);
    }

    FormSheet form() {
        return (FormSheet) sheet.orElseThrow();
    }

    void select(String kind, Hash... records) {
        selection = new DeskSelection(true, Optional.of(kind), List.of(records), Optional.of(records[0]));
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
    public <T> void run(String place, Job<T> job, Consumer<T> done) {
        runner.run(place, job, done);
    }

    @Override
    public <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed) {
        runner.run(place, job, done, failed);
    }

    @Override
    public void stop(String place) {
        runner.stop(place);
    }

    @Override
    public void show(DeskSheet next) {
        sheet.ifPresent(DeskSheet::left);
        sheet = Optional.of(next);
    }

    @Override
    public void back() {
        sheet.ifPresent(DeskSheet::left);
        sheet = Optional.empty();
    }

    @Override
    public void open(Hash record) {
        back();
        opened.add(record);
    }

    @Override
    public void list(String kind, List<Hash> records, String words) {
        throw new AssertionError("not asked for");
    }

    @Override
    public void say(List<Problem> next) {
        problems.addAll(next);
    }

    @Override
    public void done(String words) {
        said.add(words);
    }

    @Override
    public void person(Consumer<PersonId> then) {
        then.accept(archive.persons().get(0).id());
    }

    @Override
    public Optional<String> personName() {
        return archive.persons().stream().findFirst().flatMap(Person::name);
    }

    @Override
    public List<Path> chooseFiles(String title) {
        return files;
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
    public void save(Picture picture) {
        throw new AssertionError("not asked for");
    }

    @Override
    public Optional<String> remembered(String name) {
        return Optional.empty();
    }

    @Override
    public void remember(String name, String value) {}
}
