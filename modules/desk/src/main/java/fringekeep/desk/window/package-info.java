/** The one window: frame, menu line, sheets, status line, keys. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.window;
