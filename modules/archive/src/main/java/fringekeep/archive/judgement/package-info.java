/** The two kinds of the archive itself: judgement and note. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.judgement;
