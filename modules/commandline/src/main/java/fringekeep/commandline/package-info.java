/** The headless program. */
@org.jspecify.annotations.NullMarked
package fringekeep.commandline;
