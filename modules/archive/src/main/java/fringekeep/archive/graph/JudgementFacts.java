package fringekeep.archive.graph;

import fringekeep.archive.json.JsonObject;
import java.util.Optional;

/**
 * What the graph needs of a judgement's content.
 *
 * @param verdict such as {@code withdrawn}
 * @param channel the channel a mask is limited to
 */
record JudgementFacts(String verdict, Optional<String> channel) {
    static final String WITHDRAWN = "withdrawn";
    static final String MASKED = "masked";
    static final String DOUBTED = "doubted";
    static final String PREFERRED = "preferred";

    static JudgementFacts of(JsonObject content) {
        return new JudgementFacts(content.text("verdict").orElse(""), content.text("channel"));
    }

    boolean is(String asked) {
        return verdict.equals(asked);
    }
}
