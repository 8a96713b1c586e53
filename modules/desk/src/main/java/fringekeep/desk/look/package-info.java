/** Colours by name, type sizes, shapes, hairlines and words: everything that is painted takes its look from here. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.look;
