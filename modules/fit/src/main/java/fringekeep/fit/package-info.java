/**
 * Fringe fits of one or many scans.
 *
 * <p><b>What lives here:</b> the kind {@code fit} with its methods; {@link fringekeep.fit.GatherInputs}, which pins what a fit is
 * made from; {@link fringekeep.fit.FitScans} and {@link fringekeep.fit.UnfittedScans}; the facet {@link
 * fringekeep.fit.FringeFacet}.
 * <p><b>What may never:</b> statistics of its own: the estimators are those of interferometry; a computation that looks anything
 * up beyond its inputs; a plausible number where a fit failed.
 * <p><b>Depends on:</b> archive, drawing, interferometry, and the stages before it in the chain.
 * <p><b>Thread rule:</b> kind and computation are stateless; a verb is used by one thread at a time.
 * <p><b>Tested by:</b> the golden fit of the record format, fits of general statistical programs on the same files, and verbs on
 * a real archive.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.fit;
