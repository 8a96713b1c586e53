package fringekeep.desk.pane;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.desk.look.Mark;
import fringekeep.desk.pane.RecordPage.Attached;
import fringekeep.desk.pane.RecordPage.Note;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.States;
import fringekeep.desk.session.Stops;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Judgements and notes that speak of a record, and the files that came with them. */
final class PageNotes {
    private final Archive archive;
    private final Register register;
    private final Stops stops;
    private final Clock clock;

    PageNotes(Archive archive, Register register, Stops stops, Clock clock) {
        this.archive = archive;
        this.register = register;
        this.stops = stops;
        this.clock = clock;
    }

    List<Note> of(Hash record) {
        List<Note> notes = new ArrayList<>();
        Stream.concat(Stream.of(record), register.graph().speakingOf(record).stream())
                .filter(other -> stops.entry("notes", "kinds")
                        .contains(register.kind(other).orElse("")))
                .flatMap(other -> archive.record(other).stream())
                .map(view -> note(view, register.kind(view.fingerprint()).orElse("")))
                .filter(note -> !note.record().equals(record) || !note.files().isEmpty())
                .forEach(notes::add);
        return notes;
    }

    private Note note(RecordView view, String kind) {
        JsonObject content = view.content();
        String verdict = content.text("verdict").orElse("");
        String reason = content.text("reason").orElse("").replace('-', ' ');
        String heading = content.text("heading").orElse(kind);
        String words =
                view.part(PartName.REMARK).flatMap(part -> part.text("text")).orElse("");
        String when = archive.recorded(view.fingerprint())
                .map(at -> clock.moment(at.at()))
                .orElse("");
        String who = view.part(PartName.WHO)
                .flatMap(part -> part.text("person"))
                .map(id -> PageFacts.person(archive, id))
                .orElse("");
        Optional<Mark> mark = Stream.of(StateName.values())
                .filter(state -> state.name().equalsIgnoreCase(verdict))
                .findFirst()
                .map(States::mark);
        String text = verdict.isEmpty() ? heading : reason.isEmpty() ? verdict : verdict + ": " + reason;
        String small = Stream.of(when, who, words)
                .filter(part -> !part.isEmpty())
                .reduce((one, other) -> one + ", " + other)
                .orElse("");
        return new Note(view.fingerprint(), mark, text, small, files(view));
    }

    /** Attached files in the order of the inputs, with the names their record gives them. */
    private List<Attached> files(RecordView view) {
        List<String> roles = stops.entry("notes", "attachments");
        List<JsonObject> named = view.content().array("attachments").objects();
        List<Attached> files = new ArrayList<>();
        for (InputReference input : view.head().inputs()) {
            if (input instanceof InputReference.OfRaw raw && roles.contains(raw.role())) {
                String name = files.size() < named.size()
                        ? named.get(files.size()).text("name").orElse("")
                        : "";
                files.add(new Attached(name.isEmpty() ? raw.raw().hex().substring(0, 12) : name, raw.raw()));
            }
        }
        return files;
    }
}
