/** An open archive as the window sees it: the ten stops, which record is of which kind, what is linked with what, names. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.session;
