/** Tests that run inside the real application, as a person would use it; never shipped. */
@org.jspecify.annotations.NullMarked
package fringekeep.uitest;
