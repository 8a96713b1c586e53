package fringekeep.scan.internal.reading;

/**
 * One line of a text file.
 *
 * @param number from 1
 * @param text without its line end
 * @param ended whether it has a line end; only the last line of a file may have none
 */
public record Line(int number, String text, boolean ended) {
    /** Where it stands, for people. */
    String place(String file, int column) {
        return file + ", line " + number + ", column " + column;
    }

    /** Whether it holds nothing but blanks. */
    boolean blank() {
        return text.isBlank();
    }
}
