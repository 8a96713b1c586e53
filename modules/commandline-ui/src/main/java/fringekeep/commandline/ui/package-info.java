/** Makes the invented laboratory from the window. */
@org.jspecify.annotations.NullMarked
package fringekeep.commandline.ui;
