/** Export, check and read back of a dataset bundle. */
@org.jspecify.annotations.NullMarked
package fringekeep.bundle;
