package fringekeep.audit;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.lineage.Lineage;
import fringekeep.archive.lineage.LineageRecord;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;

/**
 * A lineage as indented text: each record once, below the first that was made from it, like ones gathered into one line unless
 * all are asked for.
 */
public final class TraceText {
    private static final int GATHERED_FROM = 4;

    private final Lineage lineage;
    private final Graph graph;
    private final boolean all;
    private final Map<Hash, LineageRecord> byHash = new LinkedHashMap<>();
    private final Set<Hash> shown = new HashSet<>();
    private final StringBuilder text = new StringBuilder();

    private TraceText(Lineage lineage, Graph graph, boolean all) {
        this.lineage = lineage;
        this.graph = graph;
        this.all = all;
        lineage.records().forEach(record -> byHash.put(record.fingerprint(), record));
    }

    /**
     * The text.
     *
     * @param all whether like records are written out one by one
     */
    public static String of(Lineage lineage, Graph graph, boolean all) {
        TraceText trace = new TraceText(lineage, graph, all);
        lineage.roots().forEach(root -> trace.record(root, "", 0));
        trace.foot();
        return trace.text.toString();
    }

    private void record(Hash hash, String role, int depth) {
        LineageRecord record = byHash.get(hash);
        if (record == null) {
            line(depth, role, hash.shortForm() + "  not at hand");
            return;
        }
        boolean again = !shown.add(hash);
        line(
                depth,
                role,
                record.label() + "  " + record.title().text() + "  " + hash.shortForm() + states(hash)
                        + (again ? "  (above)" : method(record)));
        if (!again) {
            inputs(record, depth + 1);
        }
    }

    private static String method(LineageRecord record) {
        return record.view()
                .choices()
                .text("method")
                .map(method -> "  by " + method)
                .orElse("");
    }

    private String states(Hash hash) {
        List<String> words = graph.states(hash).stream()
                .sorted()
                .map(StateName::name)
                .map(name -> name.toLowerCase(Locale.ROOT))
                .toList();
        return words.isEmpty() ? "" : "  [" + String.join(", ", words) + "]";
    }

    private void inputs(LineageRecord record, int depth) {
        Map<String, List<Hash>> gathered = new LinkedHashMap<>();
        for (InputReference input : record.view().head().inputs()) {
            if (input instanceof InputReference.OfRecord of) {
                String kind = byHash.containsKey(of.record())
                        ? byHash.get(of.record()).view().head().kind().text()
                        : "";
                gathered.computeIfAbsent(of.role() + "\n" + kind, key -> new ArrayList<>())
                        .add(of.record());
            } else if (input instanceof InputReference.OfRaw raw) {
                line(depth, raw.role(), "raw file " + raw.raw().hex() + "  " + raw.bytes() + " bytes");
            }
        }
        gathered.forEach((key, group) -> group(key.substring(0, key.indexOf('\n')), group, depth));
    }

    private void group(String role, List<Hash> group, int depth) {
        if (all || group.size() < GATHERED_FROM) {
            group.forEach(hash -> record(hash, role, depth));
            return;
        }
        LineageRecord first = byHash.get(group.get(0));
        LineageRecord last = byHash.get(group.get(group.size() - 1));
        String span = first == null || last == null ? "" : ": " + first.label() + " to " + last.label();
        line(
                depth,
                role,
                group.size() + " "
                        + (first == null
                                ? "records"
                                : first.view().head().kind().text()) + span + ", the first of them:");
        record(group.get(0), role, depth + 1);
    }

    private void line(int depth, String role, String words) {
        text.append("  ".repeat(depth))
                .append(role.isEmpty() ? "" : role + ": ")
                .append(words)
                .append('\n');
    }

    private void foot() {
        long computed = lineage.records().stream()
                .filter(record -> record.view().part(PartName.RESULT).isPresent())
                .count();
        text.append(lineage.records().size())
                .append(" records, ")
                .append(computed)
                .append(" of them computed, ");
        text.append(lineage.rawFiles().size()).append(" raw files, ");
        text.append(lineage.rawFiles().values().stream()
                        .mapToLong(Long::longValue)
                        .sum())
                .append(" bytes of counts");
        if (!lineage.absent().isEmpty()) {
            text.append(", ").append(lineage.absent().size()).append(" records not at hand");
        }
        text.append('\n');
    }
}
