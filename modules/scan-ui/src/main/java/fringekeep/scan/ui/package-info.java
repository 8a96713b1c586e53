/** Taking files in, placing scans: the windows of this stage. */
@org.jspecify.annotations.NullMarked
package fringekeep.scan.ui;
