/**
 * What is sent through the interferometer: compounds with their masses, and the batches that go into the source.
 *
 * <p>Lives here: the kinds compound and batch, formulas, masses from standard atomic weights and isotope masses, the usual
 * cautions. Never here: files, clocks, windows, later stages. Depends on archive and drawing. Thread rule: everything is
 * immutable. Tested against published masses and the golden records of record format 1.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.sample;
