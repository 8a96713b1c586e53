package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Prepared;
import fringekeep.archive.internal.store.db.Migration;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.testsupport.OtherProgram;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** A program of its own that works on an archive until it halts at a random moment, as in a power cut of the program. */
final class KilledProgram {
    private static final int STEPS_A_ROUND = 6;
    private final PrintStream out = new PrintStream(System.out, true, StandardCharsets.UTF_8);
    private final Path folder;
    private final Random random;
    private final long round;

    private KilledProgram(Path folder, long round) {
        this.folder = folder;
        this.random = new Random(round);
        this.round = round;
    }

    /** Arguments: what to do, the archive's folder, the round. */
    public static void main(String[] arguments) throws Exception {
        KilledProgram program = new KilledProgram(Path.of(arguments[1]), Long.parseLong(arguments[2]));
        boolean whileOpening = program.round % 4 == 3;
        if (whileOpening) {
            program.haltSoon();
        }
        switch (arguments[0]) {
            case "record" -> program.record();
            case "rebuild" -> program.rebuild();
            case "migrate" -> program.migrate();
            case "copy" -> program.copy();
            default -> throw new IllegalArgumentException(arguments[0]);
        }
    }

    private void haltSoon() {
        OtherProgram.haltWithin(random, 500);
    }

    private Archive open(Kinds kinds, List<Migration> migrations) throws Exception {
        return new Opening(folder, kinds, Circumstances.real("1.0.0"), migrations).open();
    }

    private void record() throws Exception {
        Archive archive = open(OpenKind.all(), Migration.all());
        // on a slow machine a halt counted from here may come before anything was acknowledged, and then proves little
        boolean afterTheFirst = round % 2 == 0;
        if (!afterTheFirst) {
            haltSoon();
        }
        for (int i = 0; ; i++) {
            byte[] raw = ("round " + round + " file " + i).getBytes(StandardCharsets.UTF_8);
            Archive.RawTaken taken = archive.takeIn(raw);
            List<Prepared> prepared = new ArrayList<>();
            prepared.add(archive.prepare(
                    Filled.madeFrom(
                            Filled.carrying(Filled.labelled("scan", "scan " + i), table(i)),
                            new InputReference.OfRaw("raw", taken.hash(), taken.bytes())),
                    prepared));
            Hash scan = prepared.get(0).fingerprint();
            prepared.add(archive.prepare(Filled.labelled("placement", "signal", Filled.thing("scan", scan)), prepared));
            archive.record(prepared).forEach(recorded -> out.println("done " + recorded.fingerprint()));
            if (i == 0 && afterTheFirst) {
                haltSoon();
            }
        }
    }

    /** Every fourth table is too large for the database. */
    private static byte[] table(int i) {
        String row = "0," + i + "\n";
        return ("position_m,counts\n" + row.repeat(i % 4 == 3 ? 20_000 : 1)).getBytes(StandardCharsets.UTF_8);
    }

    private void rebuild() throws Exception {
        Archive archive = open(round % 2 == 0 ? OpenKind.later() : OpenKind.all(), Migration.all());
        haltSoon();
        for (int i = 0; ; i++) {
            out.println("done "
                    + archive.record(Filled.labelled("note", "round " + round + " note " + i))
                            .fingerprint());
            archive.rebuildProjections(Work.QUIET);
        }
    }

    private void migrate() throws Exception {
        haltSoon();
        Archive archive = open(OpenKind.all(), steps(round));
        for (int i = 0; ; i++) {
            out.println("done "
                    + archive.record(Filled.labelled("note", "round " + round + " note " + i))
                            .fingerprint());
        }
    }

    /** The program's own steps, and more with every round, as later programs would bring. */
    static List<Migration> steps(long round) {
        List<Migration> steps = new ArrayList<>(Migration.all());
        for (int i = 0; i < STEPS_A_ROUND * (round + 1); i++) {
            int number = steps.size() + 1;
            steps.add(new Migration(
                    number,
                    "create table later_" + number + " (n bigint primary key, text varchar(100));\n"
                            + "create index later_"
                            + number + "_text on later_" + number + " (text);\n" + "insert into later_" + number
                            + " select n, kind from record;\n"));
        }
        return steps;
    }

    private void copy() throws Exception {
        Archive archive = open(OpenKind.all(), Migration.all());
        haltSoon();
        for (int i = 0; ; i++) {
            archive.takeIn(("copied " + round + " " + i).getBytes(StandardCharsets.UTF_8));
            out.println("done "
                    + archive.record(Filled.labelled("note", "round " + round + " note " + i))
                            .fingerprint());
            archive.copyTo(folder.resolveSibling("copy"), Work.QUIET);
            out.println("copied " + archive.facts().watermark());
        }
    }
}
