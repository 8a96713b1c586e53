/**
 * The headless program: one command per verb, no prompts, progress on the error stream, data on the output stream.
 *
 * <p>What lives here: parsing, messages, exit codes. What may never: a rule that a window would need too. Exit codes: 0 done, 1
 * could not (the reason stands on the error stream in three parts), 2 wrong use, 3 stopped on request, 70 unexpected failure (a
 * log file is named).
 */
@org.jspecify.annotations.NullMarked
package fringekeep.commandline;
