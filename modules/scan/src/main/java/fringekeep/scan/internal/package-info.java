/** What only this module's kinds and verbs use. */
@org.jspecify.annotations.NullMarked
package fringekeep.scan.internal;
