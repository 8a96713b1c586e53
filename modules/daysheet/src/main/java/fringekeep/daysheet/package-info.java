/**
 * The measurement day: from the archive's day boundary to the next, what was recorded in order.
 *
 * <p>What lives here: the headless core of the day. What may never: windows. Depends on everything before it in the chain.
 * Pure values and one verb that reads an archive. Tested over nights with a clock change.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.daysheet;
