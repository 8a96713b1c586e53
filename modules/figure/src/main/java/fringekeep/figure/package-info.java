/** Figures and statements as printed. */
@org.jspecify.annotations.NullMarked
package fringekeep.figure;
