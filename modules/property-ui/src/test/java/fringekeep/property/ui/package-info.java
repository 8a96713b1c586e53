/** Tests. */
@org.jspecify.annotations.NullMarked
package fringekeep.property.ui;
