/** Lineage, recompute, outdated, suppose, budget, sign-off. */
@org.jspecify.annotations.NullMarked
package fringekeep.audit;
