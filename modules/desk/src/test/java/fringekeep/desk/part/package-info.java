/** Tests. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.part;
