package fringekeep.sample;

import fringekeep.archive.problem.ProblemException;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Reads one formula from left to right. */
final class FormulaReader {
    private static final int DEEPEST = 20;
    private static final long LARGEST_COUNT = 100_000_000;
    private static final int LARGEST_CHARGE = 1000;

    private final String text;
    private final Deque<Map<Atom, Long>> groups = new ArrayDeque<>();
    private int at;

    FormulaReader(String text) {
        this.text = text;
    }

    Formula read() throws ProblemException {
        groups.push(new LinkedHashMap<>());
        while (at < text.length() && !startsCharge(text.charAt(at))) {
            readOne(text.charAt(at));
        }
        int charge = charge();
        if (groups.size() > 1) {
            throw trouble("formula-bracket-open");
        }
        if (groups.element().isEmpty()) {
            throw trouble("formula-empty");
        }
        return new Formula(terms(), charge);
    }

    private List<Formula.Term> terms() {
        List<Formula.Term> terms = new ArrayList<>();
        groups.element().forEach((atom, count) -> terms.add(new Formula.Term(atom.symbol, atom.nucleons, count)));
        return terms;
    }

    private void readOne(char c) throws ProblemException {
        if (c == '(') {
            open();
        } else if (c == ')') {
            close();
        } else if (c == '[') {
            isotope();
        } else if (c >= 'A' && c <= 'Z') {
            atom(symbol(), 0);
        } else {
            throw trouble("formula-character");
        }
    }

    private void open() throws ProblemException {
        if (groups.size() > DEEPEST) {
            throw trouble("formula-deep");
        }
        groups.push(new LinkedHashMap<>());
        at++;
    }

    private void close() throws ProblemException {
        if (groups.size() == 1) {
            throw trouble("formula-bracket-closed");
        }
        if (groups.element().isEmpty()) {
            throw trouble("formula-empty");
        }
        at++;
        Map<Atom, Long> group = groups.pop();
        long count = count();
        for (Map.Entry<Atom, Long> entry : group.entrySet()) {
            add(entry.getKey(), entry.getValue() * count);
        }
    }

    private void isotope() throws ProblemException {
        int begin = at++;
        int nucleons = 0;
        while (at < text.length() && digit(text.charAt(at)) && nucleons < 1000) {
            nucleons = 10 * nucleons + text.charAt(at++) - '0';
        }
        String symbol = symbol();
        if (at >= text.length() || text.charAt(at) != ']') {
            throw trouble("formula-isotope-open");
        }
        at++;
        int of = nucleons;
        if (Elements.symbol(symbol)
                .filter(element -> element.isotopes().containsKey(of))
                .isEmpty()) {
            throw new ProblemException(Trouble.at(
                    "formula-isotope-unknown", "", text, Integer.toString(begin + 1), text.substring(begin, at)));
        }
        atom(symbol, nucleons);
    }

    /** Reads a symbol; D and T stand for the isotopes of hydrogen and are handled by {@link #atom}. */
    private String symbol() throws ProblemException {
        int begin = at;
        if (at < text.length() && text.charAt(at) >= 'A' && text.charAt(at) <= 'Z') {
            at++;
            if (at < text.length() && text.charAt(at) >= 'a' && text.charAt(at) <= 'z') {
                at++;
            }
        }
        String symbol = text.substring(begin, at);
        if (Elements.symbol(symbol).isEmpty() && !symbol.equals("D") && !symbol.equals("T")) {
            at = begin;
            throw trouble("formula-element-unknown");
        }
        return symbol;
    }

    private void atom(String symbol, int nucleons) throws ProblemException {
        Atom atom = symbol.equals("D")
                ? new Atom("H", 2)
                : symbol.equals("T") ? new Atom("H", 3) : new Atom(symbol, nucleons);
        add(atom, count());
    }

    private void add(Atom atom, long count) throws ProblemException {
        long sum = groups.element().getOrDefault(atom, 0L) + count;
        if (sum > LARGEST_COUNT) {
            throw trouble("formula-count");
        }
        groups.element().put(atom, sum);
    }

    /** Reads a count; 1 where none stands. */
    private long count() throws ProblemException {
        if (at >= text.length() || !digit(text.charAt(at))) {
            return 1;
        }
        if (text.charAt(at) == '0') {
            throw trouble("formula-count");
        }
        long count = 0;
        while (at < text.length() && digit(text.charAt(at))) {
            count = 10 * count + text.charAt(at) - '0';
            if (count > LARGEST_COUNT) {
                throw trouble("formula-count");
            }
            at++;
        }
        return count;
    }

    private int charge() throws ProblemException {
        if (at == text.length()) {
            return 0;
        }
        if (text.charAt(at) == '^') {
            return writtenCharge();
        }
        char sign = text.charAt(at);
        int size = 0;
        while (at < text.length() && text.charAt(at) == sign) {
            size++;
            at++;
        }
        return ended(sign, size);
    }

    private int writtenCharge() throws ProblemException {
        at++;
        long size = count();
        if (at >= text.length() || !sign(text.charAt(at)) || size > LARGEST_CHARGE) {
            throw trouble("formula-charge");
        }
        return ended(text.charAt(at++), (int) size);
    }

    private int ended(char sign, int size) throws ProblemException {
        if (at < text.length() || size > LARGEST_CHARGE) {
            throw trouble("formula-charge");
        }
        return sign == '+' ? size : -size;
    }

    private static boolean startsCharge(char c) {
        return c == '^' || sign(c);
    }

    private static boolean sign(char c) {
        return c == '+' || c == '-';
    }

    private static boolean digit(char c) {
        return c >= '0' && c <= '9';
    }

    private ProblemException trouble(String code) {
        String here = at < text.length() ? text.substring(at, Math.min(text.length(), at + 2)) : "";
        return new ProblemException(Trouble.at(code, "", text, Integer.toString(at + 1), here));
    }

    /** What makes atoms equal. */
    private record Atom(String symbol, int nucleons) {}
}
