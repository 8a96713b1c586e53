package fringekeep.archive.graph;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Numbers for names that repeat: kinds, roles, channels. */
final class Names {
    static final int NONE = -1;
    private final List<String> names;
    private final Map<String, Integer> numbers;
    private final int most;

    Names(int most) {
        this(most, new ArrayList<>(), new HashMap<>());
    }

    private Names(int most, List<String> names, Map<String, Integer> numbers) {
        this.most = most;
        this.names = names;
        this.numbers = numbers;
    }

    int findOrAdd(String name) {
        Integer known = numbers.get(name);
        if (known != null) {
            return known;
        }
        if (names.size() == most) {
            throw new IllegalStateException("more than " + most + " different names of roles, channels or kinds");
        }
        names.add(name);
        numbers.put(name, names.size() - 1);
        return names.size() - 1;
    }

    int find(String name) {
        return numbers.getOrDefault(name, NONE);
    }

    String name(int number) {
        return names.get(number);
    }

    Names frozen() {
        return new Names(most, List.copyOf(names), Map.copyOf(numbers));
    }
}
