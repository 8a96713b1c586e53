/**
 * Lineage walks, recompute, outdated, suppose, next revision.
 *
 * <p>What lives here: questions about records of any kind, answered through the kinds' interface. What may never: a kind by
 * name. Depends on archive, drawing and interferometry. Everything here runs off the window thread, reports progress and can
 * be stopped; nothing is recorded but by {@link fringekeep.audit.NextRevision#record}.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.audit;
