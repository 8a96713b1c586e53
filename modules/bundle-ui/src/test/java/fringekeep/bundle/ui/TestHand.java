package fringekeep.bundle.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.run.Job;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSelection;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.Picture;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;

/** A desk without window: jobs run at once on the calling thread, or wait when told to. */
final class TestHand implements DeskHand {
    final List<Problem> problems = new ArrayList<>();
    final List<DeskSheet> shown = new ArrayList<>();
    final Map<String, String> memory = new HashMap<>();
    List<Path> chosen = List.of();
    String done = "";
    int backs;
    int stopAfter = Integer.MAX_VALUE;

    private final Archive archive;

    TestHand(Archive archive) {
        this.archive = archive;
    }

    /** Work that is asked to stop once it has reported so often. */
    private final class Watched implements Work {
        private int reports;

        @Override
        public void progress(long now, long total, String what) {
            reports++;
        }

        @Override
        public boolean stopped() {
            return reports >= stopAfter;
        }
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
        return new DeskSelection(true, Optional.empty(), List.of(), Optional.empty());
    }

    @Override
    public <T> void run(String place, Job<T> job, Consumer<T> then) {
        run(place, job, then, problems::addAll);
    }

    @Override
    public <T> void run(String place, Job<T> job, Consumer<T> then, Consumer<List<Problem>> failed) {
        T answer;
        try {
            answer = job.work(new Watched());
        } catch (ProblemException e) {
            failed.accept(e.problems());
            return;
        } catch (StoppedException e) {
            return; // as on the desk: a stopped job answers nothing
        }
        then.accept(answer);
    }

    @Override
    public void stop(String place) {
        stopAfter = 0;
    }

    @Override
    public void show(DeskSheet sheet) {
        shown.add(sheet);
    }

    @Override
    public void back() {
        backs++;
    }

    @Override
    public void open(Hash record) {
        throw new IllegalStateException("nothing is opened here");
    }

    @Override
    public void list(String kind, List<Hash> records, String words) {
        throw new IllegalStateException("nothing is listed here");
    }

    @Override
    public void say(List<Problem> next) {
        problems.clear();
        problems.addAll(next);
    }

    @Override
    public void done(String words) {
        done = words;
    }

    @Override
    public void person(Consumer<PersonId> then) {
        then.accept(SmallArchive.PERSON);
    }

    @Override
    public Optional<String> personName() {
        return Optional.of("N. N.");
    }

    @Override
    public List<Path> chooseFiles(String title) {
        return chosen;
    }

    @Override
    public Optional<Path> chooseFolder(String title) {
        return chosen.stream().findFirst();
    }

    @Override
    public Optional<Path> chooseToSave(String title, String suggested) {
        return Optional.empty();
    }

    @Override
    public void save(Picture picture) {
        throw new IllegalStateException("nothing is saved here");
    }

    @Override
    public Optional<String> remembered(String name) {
        return Optional.ofNullable(memory.get(name));
    }

    @Override
    public void remember(String name, String value) {
        memory.put(name, value);
    }
}
