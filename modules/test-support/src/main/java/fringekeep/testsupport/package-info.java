/** Test-only helpers shared by all modules: programs of their own that are killed. */
@org.jspecify.annotations.NullMarked
package fringekeep.testsupport;
