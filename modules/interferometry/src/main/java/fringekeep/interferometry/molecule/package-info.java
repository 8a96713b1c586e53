/** Properties of molecules from interference data: fits with covariance, shared uncertainties and honest warnings. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.molecule;
