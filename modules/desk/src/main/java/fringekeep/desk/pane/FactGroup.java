package fringekeep.desk.pane;

import java.util.List;

/**
 * Facts under one heading.
 *
 * @param heading such as "gratings"
 * @param facts its rows
 */
public record FactGroup(String heading, List<Fact> facts) {
    /** Copies. */
    public FactGroup {
        facts = List.copyOf(facts);
    }

    /** Whether any fact shows what was entered beside the SI value. */
    public boolean entered() {
        return facts.stream().anyMatch(fact -> !fact.entered().isEmpty());
    }
}
