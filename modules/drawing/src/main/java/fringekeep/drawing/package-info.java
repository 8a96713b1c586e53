/** Plain axes, series and marks in; SVG, PDF, PNG and a screen painter out. */
@org.jspecify.annotations.NullMarked
package fringekeep.drawing;
