/** Figures and statements: the windows of this stage. */
@org.jspecify.annotations.NullMarked
package fringekeep.figure.ui;
