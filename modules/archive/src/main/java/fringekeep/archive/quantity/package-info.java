/** Entered quantities: text and unit as typed, the exact SI value, the uncertainty in its four sorts. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.quantity;
