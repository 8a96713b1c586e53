/**
 * Every method of the interferometry library as one that takes a document of inputs with units.
 *
 * <p>What lives here: names of inputs and results, units, examples, and the call of the library. What may never: a formula.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.commandline.compute;
