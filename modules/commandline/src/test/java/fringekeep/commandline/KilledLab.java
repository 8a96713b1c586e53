package fringekeep.commandline;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.JournalLine;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.fit.FitScans;
import fringekeep.scan.TakeInFiles;
import fringekeep.testsupport.OtherProgram;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;

/** A program that takes files in or fits scans with the real kinds and verbs until it halts at a random moment. */
final class KilledLab {
    private static final int LONGEST = 700;
    private static final int ENTRIES = 1_000;
    private static final int FILES = 40;
    private final PrintStream out = new PrintStream(System.out, true, StandardCharsets.UTF_8);
    private final Path place;
    private final int round;
    private final AtomicBoolean halting = new AtomicBoolean();

    private KilledLab(Path place, int round) {
        this.place = place;
        this.round = round;
    }

    /** Arguments: {@code take-in} or {@code fit}, the archive's folder, the round. */
    public static void main(String[] arguments) throws Exception {
        KilledLab lab = new KilledLab(Path.of(arguments[1]), Integer.parseInt(arguments[2]));
        if (lab.round % 4 == 3) {
            lab.haltSoon();
        }
        Archive archive = Archives.open(lab.place, Session.kinds(), Session.circumstances());
        lab.tellWhatIsRecorded(archive);
        // every other round ends only after something was acknowledged, however slow the machine is
        if (lab.round % 2 == 1) {
            lab.haltSoon();
        }
        if (arguments[0].equals("fit")) {
            lab.fit(archive);
        } else {
            lab.takeIn(archive);
        }
    }

    private void haltSoon() {
        if (halting.compareAndSet(false, true)) {
            OtherProgram.haltWithin(new Random(round), LONGEST);
        }
    }

    /** Writes a line for each record after the commit that holds it, as callers are told. */
    private void tellWhatIsRecorded(Archive archive) {
        AtomicLong told = new AtomicLong(archive.facts().watermark());
        archive.onCommit(watermark -> {
            for (JournalLine line : archive.journalLines(told.get() + 1, ENTRIES)) {
                line.record().ifPresent(record -> out.println("done " + record));
            }
            told.set(watermark);
            haltSoon();
        });
    }

    private void fit(Archive archive) throws ProblemException {
        List<FitScans.Request> requests = requests(archive);
        for (int pass = 0; ; pass++) {
            List<FitScans.FitOutcome> outcomes = new FitScans(archive).fitEach(requests, Optional.empty(), Work.QUIET);
            for (FitScans.FitOutcome outcome : outcomes) {
                if (outcome.fit().isEmpty()) {
                    throw new IllegalStateException("pass " + pass + ": " + outcome.problems());
                }
            }
        }
    }

    /** What the lab's own fits asked, asked again, so that each new fit corrects the one before. */
    private static List<FitScans.Request> requests(Archive archive) {
        List<FitScans.Request> requests = new ArrayList<>();
        for (Hash fit : archive.records("fit", 1, ENTRIES)) {
            RecordView record = archive.record(fit).orElseThrow();
            if (record.head().corrects().isEmpty()) {
                List<Input> inputs = archive.inputs(fit).all();
                Input scan = inputs.stream()
                        .filter(input -> input.role().equals("scan"))
                        .findFirst()
                        .orElseThrow();
                requests.add(new FitScans.Request(
                        targets(inputs, "scan"),
                        scan.channel().orElseThrow(),
                        record.part(PartName.CHOICES).orElseThrow(),
                        targets(inputs, "reference"),
                        targets(inputs, "background"),
                        List.of(),
                        true));
            }
        }
        return requests;
    }

    private static List<Hash> targets(List<Input> inputs, String role) {
        return inputs.stream()
                .filter(input -> input.role().equals(role))
                .map(Input::target)
                .toList();
    }

    private void takeIn(Archive archive) throws ProblemException, IOException {
        Path folder = Files.createDirectories(place.resolveSibling("arriving-" + round));
        Hash profile = archive.find("reading-profile 1");
        String text = Files.readString(ReducedLab.SAMPLES.resolve("raw/day-1/sb-1005.txt"));
        for (int pass = 0; ; pass++) {
            List<Path> files = new ArrayList<>();
            for (int i = 0; i < FILES; i++) {
                String name = "round-" + round + "-" + pass + "-" + i + ".txt";
                files.add(Files.writeString(folder.resolve(name), text + "# " + name + "\n"));
            }
            List<TakeInFiles.FileOutcome> outcomes = new TakeInFiles(archive)
                    .takeIn(new TakeInFiles.Request(files, Optional.of(profile), false, Optional.empty()), Work.QUIET);
            for (TakeInFiles.FileOutcome outcome : outcomes) {
                if (outcome.state() != TakeInFiles.State.TAKEN_IN) {
                    throw new IllegalStateException("pass " + pass + ": " + outcome);
                }
            }
        }
    }
}
