/** The chain strip: navigation, summary and column head at once. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.chain;
