package fringekeep.audit.ui;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Mark;
import fringekeep.desk.part.VerdictTable;
import java.util.List;
import java.util.Map;

/**
 * A comparison as it is shown.
 *
 * @param subtitle how much was compared, and when
 * @param answers one sentence per record asked about
 * @param counts the four columns
 * @param groups rows by kind
 * @param beside what stands beside a row, by record
 */
public record VerdictView(
        String subtitle,
        List<Answer> answers,
        List<VerdictTable.Count> counts,
        List<VerdictTable.Group> groups,
        Map<Hash, Beside> beside) {
    /** Copies. */
    public VerdictView {
        answers = List.copyOf(answers);
        counts = List.copyOf(counts);
        groups = List.copyOf(groups);
        beside = Map.copyOf(beside);
    }

    /** One sentence with its shape. */
    public record Answer(Mark mark, String words) {}

    /**
     * What stands beside the rows of one record.
     *
     * @param title its label
     * @param fingerprint short form
     * @param mark shape of its verdict
     * @param sentence why
     * @param facts name, kept, now
     * @param intervals values that moved, to be drawn
     */
    public record Beside(
            String title,
            String fingerprint,
            Mark mark,
            String sentence,
            List<List<String>> facts,
            List<Interval> intervals) {
        /** Copies. */
        public Beside {
            facts = List.copyOf(facts);
            intervals = List.copyOf(intervals);
        }
    }

    /** One value with its uncertainty, kept and now. */
    public record Interval(String what, double kept, double now, double deviation) {}
}
