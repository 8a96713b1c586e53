/** The ruled sheet: lineage of one record in the columns of the strip, rows by time, raw counts beside. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.lineage;
