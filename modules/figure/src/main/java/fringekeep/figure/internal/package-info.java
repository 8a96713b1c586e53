/** How a figure's table is made and turned into a picture. */
@org.jspecify.annotations.NullMarked
package fringekeep.figure.internal;
