/** Problems of reading and placing scans, with their texts. */
@org.jspecify.annotations.NullMarked
package fringekeep.scan.internal.problem;
