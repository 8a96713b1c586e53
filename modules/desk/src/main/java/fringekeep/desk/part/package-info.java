/** Parts that every sheet uses: buttons, the progress line, the line that says what is wrong. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.part;
