/**
 * Reading profile, scan, series and placement, and the verbs that take raw files in and place scans.
 *
 * <p><b>What lives here:</b> how text files are read by a profile into a table in SI with findings; the kinds {@code
 * reading-profile}, {@code scan}, {@code series}, {@code placement}; {@link fringekeep.scan.TakeInFiles}, {@link
 * fringekeep.scan.GuessProfile}, {@link fringekeep.scan.PlaceScans}; the facets {@link fringekeep.scan.SettingsFacet} and {@link
 * fringekeep.scan.PlacementFacet}.
 * <p><b>What may never:</b> a scan that knows its run, setup or batch; a judgement made while reading; a half-read file.
 * <p><b>Depends on:</b> archive, drawing, and the stages before it in the chain.
 * <p><b>Thread rule:</b> kinds are stateless; a verb is used by one thread at a time.
 * <p><b>Tested by:</b> the golden vectors of the record format, three dialects, a thousand damaged files, and verbs on a real
 * archive.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.scan;
