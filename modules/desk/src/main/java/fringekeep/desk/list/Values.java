package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.session.Register;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * One column over all records of a kind, by place, in eight bytes a record: numbers as they are (SI), instants in seconds,
 * texts as numbers of words. Not-a-number where there is no value.
 *
 * @param numbers by place
 * @param words for texts: the word of each number; empty otherwise
 */
record Values(double[] numbers, List<String> words) {
    private static final int PAGE = 5_000;

    /** Reads a column of a declared table, page by page. */
    static Values read(
            Archive archive, Register register, String kind, Projection table, Column column, String saying, Work work)
            throws ProblemException, StoppedException {
        double[] numbers = new double[register.size(kind)];
        Arrays.fill(numbers, Double.NaN);
        Map<String, Integer> codes = new HashMap<>();
        List<String> words = new ArrayList<>();
        Optional<Page.Key> after = Optional.empty();
        long read = 0;
        do {
            work.check();
            Page page = archive.list(
                    new Listing(table.name(), List.of(), false, List.of(), Optional.empty(), "n", false, after, PAGE));
            for (Page.Line line : page.rows()) {
                int place = register.place(line.record());
                Object value = line.row().values().get(column.name());
                if (place >= 0 && value != null && Double.isNaN(numbers[place])) {
                    numbers[place] = number(value, codes, words);
                }
            }
            after = page.last();
            read += page.rows().size();
            work.progress(read, numbers.length, saying);
        } while (after.isPresent());
        return new Values(numbers, words);
    }

    private static double number(Object value, Map<String, Integer> codes, List<String> words) {
        if (value instanceof Double number) {
            return number;
        } else if (value instanceof Long whole) {
            return whole;
        } else if (value instanceof Instant at) {
            return at.getEpochSecond() + 1e-9 * at.getNano();
        } else if (value instanceof Boolean flag) {
            return flag ? 1 : 0;
        }
        String text = value.toString();
        Integer known = codes.get(text);
        if (known == null) {
            known = words.size();
            codes.put(text, known);
            words.add(text);
        }
        return known;
    }

    /** For texts: numbers that stand in the order of the words; others as they are. */
    double[] ranks() {
        if (words.isEmpty()) {
            return numbers;
        }
        int[] sorted = IntStream.range(0, words.size())
                .boxed()
                .sorted(Comparator.comparing(words::get))
                .mapToInt(Integer::intValue)
                .toArray();
        double[] rank = new double[words.size()];
        for (int i = 0; i < rank.length; i++) {
            rank[sorted[i]] = i;
        }
        double[] ranks = new double[numbers.length];
        for (int i = 0; i < ranks.length; i++) {
            ranks[i] = Double.isNaN(numbers[i]) ? Double.NaN : rank[(int) numbers[i]];
        }
        return ranks;
    }
}
