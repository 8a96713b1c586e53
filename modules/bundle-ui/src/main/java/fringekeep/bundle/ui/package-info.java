/** Export and check of datasets: the windows of this stage. */
@org.jspecify.annotations.NullMarked
package fringekeep.bundle.ui;
