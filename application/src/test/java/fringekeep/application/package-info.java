/** Tests on the assembled application. */
@org.jspecify.annotations.NullMarked
package fringekeep.application;
