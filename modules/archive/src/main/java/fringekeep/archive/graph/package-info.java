/** States of records worked out from the graph of inputs, about, corrects and after. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.graph;
