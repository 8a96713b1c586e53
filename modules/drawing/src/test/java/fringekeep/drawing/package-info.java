@org.jspecify.annotations.NullMarked
package fringekeep.drawing;
