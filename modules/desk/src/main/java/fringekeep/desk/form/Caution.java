package fringekeep.desk.form;

/**
 * Something that can hurt someone.
 *
 * @param title what is dangerous
 * @param advice the usual caution, ending with a sentence that defers to the local rules
 */
public record Caution(String title, String advice) {}
