/**
 * The archive as its users see it: what can be read, recorded, checked and copied.
 *
 * <p>Packages below form no circle: json, problem &larr; quantity, record &larr; listing &larr; kind (with {@code Kinds},
 * resolver and sources) &larr; facet, graph &larr; this package (interfaces and plain records only, nothing of {@code
 * internal}) &larr; internal.records, detached, entry &larr; internal.store &larr; opening (with {@code Archives}, the way to
 * found, open and restore).
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive;
