/** Selections, properties, quoted values: the windows of this stage. */
@org.jspecify.annotations.NullMarked
package fringekeep.property.ui;
