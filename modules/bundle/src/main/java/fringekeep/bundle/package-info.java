/**
 * Export and check of a dataset bundle: a closed graph of records and raw files in, published standards out.
 *
 * <p>What lives here: the folder layout, the bag (RFC 8493), the crate's metadata (RO-Crate 1.2), the tables with their
 * description (Data Package 2), provenance (PROV-JSON), and an independent checker. What may never: a kind by name, a query
 * beyond what is handed in, metadata that nobody stated, overwriting in place. Depends on archive and drawing. Stateless;
 * long work reports progress and can be stopped, and a stopped export leaves nothing under the final name.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.bundle;
