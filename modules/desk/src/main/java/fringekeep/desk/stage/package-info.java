/** What stages add to the desk: actions in menus and on keys, sheets below the strip, an ear for dropped files. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.stage;
