package fringekeep.desk.form;

import java.util.List;
import java.util.Optional;

/**
 * A row of a form.
 *
 * @param sort what it is
 * @param pointer JSON pointer of its field, list or group
 * @param depth how far it is indented
 * @param label the field in words
 * @param text as typed
 * @param shown as shown while it is not being typed
 * @param si its value in SI, or what a reference is called
 * @param siUnit SI unit
 * @param before what stood before, as shown
 * @param change how much it changed
 * @param changed whether it differs from what stood before
 * @param words a problem, a question, or a hint
 * @param answers what a question may be answered
 * @param leaf how it is typed
 */
record FormRow(
        Sort sort,
        String pointer,
        int depth,
        String label,
        String text,
        String shown,
        String si,
        String siUnit,
        String before,
        String change,
        boolean changed,
        String words,
        List<String> answers,
        Optional<Asked.Leaf> leaf) {
    /** Copies. */
    FormRow {
        answers = List.copyOf(answers);
    }

    /** What a row is. */
    enum Sort {
        /** Head of a group. */
        HEAD,
        /** Something to type. */
        FIELD,
        /** A row of a list, folded into one line or open. */
        ITEM,
        /** Adds a row to a list. */
        ADD,
        /** Shows what else may be said. */
        MORE,
        /** What is wrong with the row above. */
        PROBLEM,
        /** What is unusual about the row above. */
        QUESTION
    }

    /** Whether the keys can stand on it. */
    boolean stops() {
        return sort != Sort.HEAD && sort != Sort.PROBLEM;
    }

    /** Whether text is typed into it. */
    boolean typed() {
        return sort == Sort.FIELD || sort == Sort.ADD && leaf.isPresent();
    }

    static FormRow line(Sort sort, String pointer, int depth, String label, String words) {
        return new FormRow(
                sort, pointer, depth, label, "", "", "", "", "", "", false, words, List.of(), Optional.empty());
    }

    FormRow asking(String question, List<String> offered) {
        return new FormRow(
                Sort.QUESTION,
                pointer,
                depth,
                label,
                text,
                shown,
                si,
                siUnit,
                before,
                change,
                changed,
                question,
                offered,
                leaf);
    }
}
