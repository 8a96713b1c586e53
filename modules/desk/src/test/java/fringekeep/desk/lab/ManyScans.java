package fringekeep.desk.lab;

import fringekeep.archive.Archive;
import fringekeep.archive.ArchiveFacts;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import java.lang.reflect.Proxy;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;

/**
 * An archive of very many scans that are made up as they are asked for: the scan of entry n has power (n mod 97) W and ended n
 * minutes after the first day. Asking it while painting is a mistake in code.
 */
public final class ManyScans {
    private static final Instant BEGIN = Instant.parse("2031-01-01T06:00:00Z");
    private static final Column ENDED = Column.instant("ended", "ended");
    private static final Column POWER = Column.real("laser_power_w", "P", "W", "W");
    private static final Set<String> QUIET = Set.of("facts", "kinds", "graph", "graphReady", "onCommit", "toString");

    private final int count;
    private final InventedKind kind =
            new InventedKind("scan", new Projection("scan", new KindName("scan"), List.of(ENDED, POWER), List.of()));

    /** Set while something is painted. */
    public final AtomicBoolean painting = new AtomicBoolean();

    /** How many rows were ever given out. */
    public final AtomicLong given = new AtomicLong();

    /** An archive of so many scans. */
    public ManyScans(int count) {
        this.count = count;
    }

    /** The scan of an entry, from 1. */
    public static Hash scan(long n) {
        byte[] bytes = new byte[32];
        ByteBuffer.wrap(bytes).putLong(n * 0x9E3779B97F4A7C15L).putLong(n);
        return Hash.fromBytes(bytes);
    }

    private static long entry(Hash scan) {
        return ByteBuffer.wrap(scan.bytes()).getLong(8);
    }

    private Page.Line line(long n) {
        given.incrementAndGet();
        return new Page.Line(
                scan(n), n, "scan " + n, new Row(Map.of("ended", BEGIN.plusSeconds(60 * n), "laser_power_w", (double)
                        (n % 97))));
    }

    private Page page(Listing listing) {
        long from = listing.after().map(Page.Key::n).orElse(0L) + 1;
        List<Page.Line> lines = new ArrayList<>();
        for (long n = from; n <= count && lines.size() < listing.limit(); n++) {
            lines.add(line(n));
        }
        long last = from + lines.size() - 1;
        return new Page(
                lines, last < count ? Optional.of(new Page.Key(Optional.empty(), last, 0)) : Optional.empty(), count);
    }

    private List<Hash> records(long from, int limit) {
        List<Hash> records = new ArrayList<>();
        for (long n = Math.max(1, from); n <= count && records.size() < limit; n++) {
            records.add(scan(n));
        }
        return records;
    }

    private Optional<RecordView> view(Hash scan) {
        kind.rows.put(scan, line(entry(scan)).row());
        return Optional.of(new InventedLab.View(scan, "scan", Map.of()));
    }

    private Graph graph() {
        return (Graph) Proxy.newProxyInstance(
                ManyScans.class.getClassLoader(),
                new Class<?>[] {Graph.class},
                (proxy, method, arguments) -> switch (method.getName()) {
                    case "watermark" -> (long) count;
                    case "states", "outdated" -> Set.<StateName>of();
                    case "current" -> Optional.of((Hash) arguments[0]);
                    case "links", "judgements", "rivals", "upstream", "downstream", "speakingOf", "causes" -> List.of();
                    default -> throw new IllegalStateException("lists do not ask " + method);
                });
    }

    /** The archive. */
    public Archive archive() {
        Graph graph = graph();
        return (Archive) Proxy.newProxyInstance(
                ManyScans.class.getClassLoader(), new Class<?>[] {Archive.class}, (proxy, method, arguments) -> {
                    if (painting.get() && !QUIET.contains(method.getName())) {
                        throw new IllegalStateException("asked while painting: " + method);
                    }
                    return switch (method.getName()) {
                        case "facts" ->
                            new ArchiveFacts(
                                    new ArchiveId("1".repeat(32)),
                                    "Many",
                                    "06:00",
                                    "Etc/UTC",
                                    true,
                                    count,
                                    Path.of("many"));
                        case "kinds" -> new Kinds(List.of(kind));
                        case "counts" -> Map.of("scan", (long) count);
                        case "records" ->
                            arguments[0].equals("scan") ? records((long) arguments[1], (int) arguments[2]) : List.of();
                        case "recorded" -> {
                            long n = entry((Hash) arguments[0]);
                            yield Optional.of(new Archive.Recorded(
                                    (Hash) arguments[0], n, "scan " + n, BEGIN.plusSeconds(60 * n)));
                        }
                        case "record" -> view((Hash) arguments[0]);
                        case "inputs" -> InventedLab.NONE;
                        case "label" -> "scan " + entry((Hash) arguments[0]);
                        case "list" -> page((Listing) arguments[0]);
                        case "graph" -> graph;
                        case "graphReady" -> true;
                        default -> throw new IllegalStateException("lists do not ask " + method);
                    };
                });
    }
}
