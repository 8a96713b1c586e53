/** Fitting by hand: the windows of this stage. */
@org.jspecify.annotations.NullMarked
package fringekeep.fit.ui;
