/** Selection, property and quoted values. */
@org.jspecify.annotations.NullMarked
package fringekeep.property;
