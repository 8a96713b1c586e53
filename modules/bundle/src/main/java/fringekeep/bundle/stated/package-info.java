/** What people state about a bundle: settings, authors, licence. */
@org.jspecify.annotations.NullMarked
package fringekeep.bundle.stated;
