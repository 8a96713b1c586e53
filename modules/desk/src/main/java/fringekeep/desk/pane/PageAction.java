package fringekeep.desk.pane;

/**
 * Something that can be done with the record in hand.
 *
 * @param word on screen
 * @param mnemonic the underlined letter, one of the word's
 * @param work what happens
 */
public record PageAction(String word, char mnemonic, Runnable work) {}
