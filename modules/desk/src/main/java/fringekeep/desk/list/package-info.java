/** Lists over any declared table: pages by key, groups, filter words, a plot column. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.list;
