package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Numbers;
import fringekeep.archive.internal.store.tables.Numbers.ThingNumber;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Finds what people write: a label, a short form, a fingerprint. */
final class Finding {
    private static final Pattern FINGERPRINT = Pattern.compile("[0-9a-fA-F]{64}");
    private static final Pattern LABEL = Pattern.compile(
            "(?<kind>[a-z][a-z -]*?)[ -]*0*(?<number>[1-9]\\d{0,17})"
                    + "(?: *\\((?<title>.+)\\))?"
                    + "(?: +from +(?<from>\\S+))?"
                    + "(?: *(?<letters>[a-z]{1,3}))?",
            Pattern.CASE_INSENSITIVE);
    private static final String DIGITS = "ABCDEFGHIJKLMNOPQRSTUVWXYZ234567";
    private final Connection c;
    private final State state;
    private final Labels labels;

    Finding(Connection c, State state) {
        this.c = c;
        this.state = state;
        this.labels = new Labels(c, state.archive(), state.watermark());
    }

    /** The one record meant. */
    Located find(String reference) throws SQLException, ProblemException {
        String text = reference.strip();
        if (FINGERPRINT.matcher(text).matches()) {
            Hash hash = new Hash(text.toLowerCase(Locale.ROOT));
            return Records.find(c, hash, state.watermark()).orElseThrow(() -> nothing(reference));
        }
        Optional<Located> labelled = byLabel(text, reference);
        if (labelled.isPresent()) {
            return labelled.get();
        }
        return byShortForm(text, reference);
    }

    private Optional<Located> byLabel(String text, String reference) throws SQLException, ProblemException {
        Matcher label = LABEL.matcher(text);
        if (!label.matches()) {
            return Optional.empty();
        }
        Optional<String> kind = kind(label.group("kind"));
        if (kind.isEmpty()) {
            return Optional.empty();
        }
        List<ThingNumber> things =
                things(kind.get(), Long.parseLong(label.group("number")), Optional.ofNullable(label.group("title")));
        List<Located> records = new ArrayList<>();
        for (ThingNumber thing : things) {
            records.addAll(Records.ofThing(c, thing.thing(), state.watermark()));
        }
        if (records.isEmpty()) {
            return Optional.empty();
        }
        List<Located> meant =
                meant(records, Optional.ofNullable(label.group("from")), Optional.ofNullable(label.group("letters")));
        return Optional.of(one(meant, reference));
    }

    /** The kind so written: without regard to case, spaces, hyphens. */
    private Optional<String> kind(String written) {
        String bare = bare(written);
        return state.tallies().keySet().stream()
                .filter(kind -> bare(kind).equals(bare))
                .findFirst();
    }

    private static String bare(String text) {
        return text.replaceAll("[ -]", "").toLowerCase(Locale.ROOT);
    }

    private List<ThingNumber> things(String kind, long number, Optional<String> title) throws SQLException {
        if (title.isEmpty()) {
            List<ThingNumber> own = Numbers.find(c, state.archive(), kind, number, state.watermark());
            if (!own.isEmpty()) {
                return own;
            }
        }
        List<ThingNumber> found = new ArrayList<>();
        for (Map.Entry<ArchiveId, String> origin : Numbers.origins(c).entrySet()) {
            boolean asked = title.isEmpty()
                    || title.get().equalsIgnoreCase(origin.getValue())
                    || origin.getKey().hex().startsWith(title.get().toLowerCase(Locale.ROOT));
            if (asked) {
                found.addAll(Numbers.find(c, origin.getKey(), kind, number, state.watermark()));
            }
        }
        return found;
    }

    /** Narrows the records of a thing to those that letters and begin name; without them, to the one that holds now. */
    private List<Located> meant(List<Located> records, Optional<String> from, Optional<String> letters)
            throws SQLException {
        Map<Long, String> names = labels.of(records);
        List<Located> meant = new ArrayList<>();
        Set<Long> replaced = replaced(records);
        for (Located record : records) {
            String name = names.getOrDefault(record.node(), "");
            String letter = name.matches(".* [a-z]{1,3}") ? name.substring(name.lastIndexOf(' ') + 1) : "a";
            boolean begins = from.isEmpty() || name.contains(" from " + from.get());
            boolean lettered =
                    letters.isPresent() ? letters.get().equalsIgnoreCase(letter) : !replaced.contains(record.node());
            if (begins && lettered) {
                meant.add(record);
            }
        }
        return from.isPresent() ? meant : latestSegment(meant, names, letters.isPresent());
    }

    /** Of several segments the one that began last; a letter without a begin means the first segment. */
    private static List<Located> latestSegment(List<Located> meant, Map<Long, String> names, boolean lettered) {
        Map<String, List<Located>> segments = new TreeMap<>();
        for (Located record : meant) {
            String name = names.getOrDefault(record.node(), "");
            int from = name.indexOf(" from ");
            String begin = from < 0 ? "" : name.substring(from).replaceFirst(" [a-z]{1,3}$", "");
            segments.computeIfAbsent(begin, key -> new ArrayList<>()).add(record);
        }
        if (segments.isEmpty()) {
            return meant;
        }
        List<String> begins = new ArrayList<>(segments.keySet());
        begins.sort(Comparator.comparing(Finding::instantOf));
        return segments.getOrDefault(begins.get(lettered ? 0 : begins.size() - 1), meant);
    }

    private static java.time.Instant instantOf(String begin) {
        return begin.isEmpty() ? java.time.Instant.MIN : java.time.Instant.parse(begin.substring(" from ".length()));
    }

    private Set<Long> replaced(Collection<Located> records) throws SQLException {
        List<Long> nodes = records.stream().map(Located::node).toList();
        Set<Long> replaced = new HashSet<>();
        for (Edge edge : Edges.to(c, nodes, Edges.CORRECTS, state.watermark())) {
            replaced.add(edge.dst());
        }
        return replaced;
    }

    private Located byShortForm(String text, String reference) throws SQLException, ProblemException {
        String digits = text.replaceAll("[ -]", "")
                .toUpperCase(Locale.ROOT)
                .replace('0', 'O')
                .replace('1', 'I')
                .replace('8', 'B');
        if (digits.length() != 8 || !digits.chars().allMatch(digit -> DIGITS.indexOf(digit) >= 0)) {
            throw nothing(reference);
        }
        long bits = 0;
        for (int i = 0; i < digits.length(); i++) {
            bits = bits << 5 | DIGITS.indexOf(digits.charAt(i));
        }
        String beginning = String.format(Locale.ROOT, "%010x", bits);
        Hash from = new Hash(beginning + "0".repeat(54));
        Hash to = new Hash(beginning + "f".repeat(54));
        return one(Records.between(c, from, to, state.watermark()), reference);
    }

    private Located one(List<Located> found, String reference) throws SQLException, ProblemException {
        if (found.size() == 1) {
            return found.get(0);
        }
        if (found.isEmpty()) {
            throw nothing(reference);
        }
        List<String> candidates = new ArrayList<>();
        Map<Long, String> names = labels.of(found);
        for (Located record : found) {
            candidates.add(names.getOrDefault(record.node(), "") + " (" + record.fingerprint() + ")");
        }
        throw new ProblemException(new Problem(
                "reference.ambiguous",
                "\"" + reference + "\" may mean any of " + found.size() + ": " + String.join(", ", candidates) + ".",
                reference,
                "Name the one you mean by its 64 digits."));
    }

    private static ProblemException nothing(String reference) {
        return new ProblemException(new Problem(
                "reference.unknown",
                "Nothing in this archive is called \"" + reference + "\".",
                reference,
                "Write a number such as \"scan 412\" or \"scan 412 b\", a short form, or 64 hexadecimal digits."));
    }
}
