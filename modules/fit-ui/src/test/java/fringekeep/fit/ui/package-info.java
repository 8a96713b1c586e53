/** Tests. */
@org.jspecify.annotations.NullMarked
package fringekeep.fit.ui;
