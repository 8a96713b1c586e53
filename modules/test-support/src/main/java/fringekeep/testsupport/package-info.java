/** Test-only helpers shared by all modules: readers of reference data, a process killer. */
@org.jspecify.annotations.NullMarked
package fringekeep.testsupport;
