/** Constants of nature, one class per published set; a result names the set it was computed with. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.constants;
