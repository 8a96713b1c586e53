/** The pane of one record of any kind: who it is, how it stands, its drawings beside its facts, its lineage line. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.pane;
