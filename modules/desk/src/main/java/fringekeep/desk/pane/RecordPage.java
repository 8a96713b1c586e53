package fringekeep.desk.pane;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Mark;
import fringekeep.desk.session.States.Sentence;
import fringekeep.drawing.Picture;
import java.util.List;
import java.util.Optional;

/**
 * All that the pane shows of one record.
 *
 * @param record fingerprint
 * @param label such as "scan 0412"
 * @param identity one sentence
 * @param states one sentence per state
 * @param pictures drawings
 * @param besides facts of the record drawn with it (a scan's fit), then those of others of its like in short
 * @param tables tables of its kind
 * @param groups its own facts
 * @param notes judgements and notes that speak of it
 * @param knots its lineage from left to right
 */
public record RecordPage(
        Hash record,
        String label,
        String identity,
        List<Sentence> states,
        List<Picture> pictures,
        List<Beside> besides,
        List<PageTable> tables,
        List<FactGroup> groups,
        List<Note> notes,
        List<Knot> knots) {
    /** Copies. */
    public RecordPage {
        states = List.copyOf(states);
        pictures = List.copyOf(pictures);
        besides = List.copyOf(besides);
        tables = List.copyOf(tables);
        groups = List.copyOf(groups);
        notes = List.copyOf(notes);
        knots = List.copyOf(knots);
    }

    /** A record whose drawing and facts stand beside this one. */
    public record Beside(Hash record, String label, Optional<Mark> mark, String word, List<Fact> facts) {
        /** Copies. */
        public Beside {
            facts = List.copyOf(facts);
        }
    }

    /**
     * A judgement or a note.
     *
     * @param text what, in a few words
     * @param small when, by whom, and the words
     * @param files files that came with it
     */
    public record Note(Hash record, Optional<Mark> mark, String text, String small, List<Attached> files) {
        /** Copies. */
        public Note {
            files = List.copyOf(files);
        }
    }

    /** An attached file: what it was called, and its bytes by hash. */
    public record Attached(String name, Hash raw) {}

    /**
     * A place of the lineage line.
     *
     * @param stop word above
     * @param text numbers, or how many
     * @param records what it stands for; empty for raw files
     * @param mark state of one of them
     * @param here whether the record in hand stands here
     */
    public record Knot(String stop, String text, List<Hash> records, Optional<Mark> mark, boolean here) {
        /** Copies. */
        public Knot {
            records = List.copyOf(records);
        }
    }
}
