/** The measurement day; watching a folder. */
@org.jspecify.annotations.NullMarked
package fringekeep.daysheet;
