package fringekeep.desk.window;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.list.Question;
import fringekeep.desk.run.Job;
import fringekeep.desk.run.Runner;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.Picture;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** The desk as stages see it. */
final class Hand implements DeskHand {
    private final Desk desk;
    private final Runner runner;
    private final DeskHost host;
    private final Memory memory;

    Hand(Desk desk, Runner runner, DeskHost host, Memory memory) {
        this.desk = desk;
        this.runner = runner;
        this.host = host;
        this.memory = memory;
    }

    @Override
    public Archive archive() {
        return desk.archive().orElseThrow(() -> new IllegalStateException("no archive is open"));
    }

    @Override
    public Register register() {
        return desk.register().orElseThrow(() -> new IllegalStateException("the archive is still being read"));
    }

    @Override
    public DeskSelection selection() {
        return desk.selection();
    }

    @Override
    public Optional<String> openKind() {
        Stops stops = Stops.shipped();
        Optional<String> listed = selection().kind();
        return listed.filter(kind -> stops.of(kind).equals(Optional.of(desk.stopShown())))
                .or(() -> Optional.of(stops.all().get(desk.stopShown()).kind()));
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
    public void show(DeskSheet sheet) {
        desk.show(sheet);
    }

    @Override
    public void back() {
        desk.back();
    }

    @Override
    public void open(Hash record) {
        desk.open(record);
    }

    @Override
    public void list(String kind, List<Hash> records, String words) {
        desk.openList(new Question(
                kind,
                Optional.empty(),
                Optional.empty(),
                "",
                Optional.of(new Question.Among(new HashSet<>(records), words)),
                Optional.empty(),
                Optional.empty()));
    }

    @Override
    public void say(List<Problem> problems) {
        desk.say(problems);
    }

    @Override
    public void done(String words) {
        desk.done(words);
    }

    @Override
    public void person(Consumer<PersonId> then) {
        desk.persons().ask(then);
    }

    @Override
    public Optional<String> personName() {
        return desk.persons().name();
    }

    @Override
    public List<Path> chooseFiles(String title) {
        return host.chooseFiles(title);
    }

    @Override
    public Optional<Path> chooseFolder(String title) {
        return host.chooseFolder(title);
    }

    @Override
    public Optional<Path> chooseToSave(String title, String suggested) {
        return host.chooseToSave(title, suggested);
    }

    @Override
    public void save(Picture picture) {
        host.save(picture);
    }

    @Override
    public Optional<String> remembered(String name) {
        return memory.get(name);
    }

    @Override
    public void remember(String name, String value) {
        memory.put(name, value);
    }
}
