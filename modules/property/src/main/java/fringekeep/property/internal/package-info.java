/** How a property is asked of interferometry and how its answer is written down. */
@org.jspecify.annotations.NullMarked
package fringekeep.property.internal;
