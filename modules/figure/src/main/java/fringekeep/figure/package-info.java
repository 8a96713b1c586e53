/**
 * The last stage: figures (numbers and drawing instructions) and statements (a number as printed).
 *
 * <p>What lives here: how a figure's table comes about from what its inputs offer, how it is drawn, how a printed number is
 * checked against the value it was rounded from. What may never: a number of its own. Depends on archive, drawing and the
 * stages before it. Pure and stateless. Tested with records in memory.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.figure;
