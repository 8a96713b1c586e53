package fringekeep.archive.judgement;

import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What a judgement may say, and the closed list of reasons for each; words of our own. */
public enum Verdict {
    /** The record is not to be used. */
    WITHDRAWN(
            "withdrawn",
            List.of(
                    "truncated",
                    "duplicate",
                    "saturated",
                    "wrong-unit",
                    "wrong-setting",
                    "wrong-sample",
                    "wrong-file",
                    "source-unstable",
                    "laser-unstable",
                    "mode-hop",
                    "light-leak",
                    "vacuum-fault",
                    "position-fault",
                    "misaligned",
                    "drift",
                    "misread",
                    "entered-in-error",
                    "other")),
    /** Some points or one channel are not to be used. */
    MASKED(
            "masked",
            List.of(
                    "mode-hop",
                    "saturated",
                    "shutter-stuck",
                    "source-unstable",
                    "laser-unstable",
                    "light-leak",
                    "position-fault",
                    "spike",
                    "noise",
                    "vibration",
                    "drift",
                    "misread",
                    "other")),
    /** To be seen with care; outdates nothing. */
    DOUBTED(
            "doubted",
            List.of(
                    "drift",
                    "few-counts",
                    "source-unstable",
                    "laser-unstable",
                    "unusual-value",
                    "calibration-doubtful",
                    "setting-not-noted",
                    "time-doubtful",
                    "other")),
    /** Undoes other judgements. */
    RESTORED("restored", List.of("judged-in-error", "cause-mended", "checked-and-sound", "other")),
    /** Of several, this one is to be relied on. */
    PREFERRED(
            "preferred",
            List.of("more-counts", "better-model", "better-calibration", "values-mended", "agreed", "other"));

    private final String code;
    private final List<String> reasons;

    Verdict(String code, List<String> reasons) {
        this.code = code;
        this.reasons = reasons;
    }

    /** The code as written. */
    public String code() {
        return code;
    }

    /** Reason codes that may stand beside it. */
    public List<String> reasons() {
        return reasons;
    }

    /** Words for people: the code with spaces for hyphens. */
    public static String words(String code) {
        return code.replace('-', ' ').toLowerCase(Locale.ROOT);
    }

    /** The verdict of that code. */
    public static Optional<Verdict> of(String code) {
        for (Verdict verdict : values()) {
            if (verdict.code.equals(code)) {
                return Optional.of(verdict);
            }
        }
        return Optional.empty();
    }
}
