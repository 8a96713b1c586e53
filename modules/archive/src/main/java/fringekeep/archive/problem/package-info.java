/** Expected trouble as data, progress and stop. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.problem;
