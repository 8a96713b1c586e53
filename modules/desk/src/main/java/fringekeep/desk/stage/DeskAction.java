package fringekeep.desk.stage;

import java.util.function.Consumer;
import java.util.function.Predicate;

/**
 * Something a person can do.
 *
 * @param id such as {@code scan.place}; unique
 * @param word on screen, a verb; three dots only if more is asked
 * @param mnemonic the underlined letter, one of the word's
 * @param stroke key such as {@code P} or {@code ctrl T}; empty for none. Single letters act only outside text fields. Two
 *     actions may share a key when they never apply together.
 * @param menu where it stands
 * @param onRecord whether it also stands as a word at the right of a record's title when it applies
 * @param applies whether it can be done with what is selected
 * @param work what happens, on the window thread; anything slow goes through {@link DeskHand#run}
 */
public record DeskAction(
        String id,
        String word,
        char mnemonic,
        String stroke,
        DeskMenu menu,
        boolean onRecord,
        Predicate<DeskSelection> applies,
        Consumer<DeskHand> work) {}
