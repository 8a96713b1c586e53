/** The interface of one kind, and what a kind sees of its inputs. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.kind;
