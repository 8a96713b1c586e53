/** How fits are worked out, written and drawn; used by this module's kind and verbs only. */
@org.jspecify.annotations.NullMarked
package fringekeep.fit.internal;
