/** Work away from the window thread, with progress, stop and problems. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.run;
