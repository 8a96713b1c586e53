/** Recomputing, supposing, next revisions: the windows of this stage. */
@org.jspecify.annotations.NullMarked
package fringekeep.audit.ui;
