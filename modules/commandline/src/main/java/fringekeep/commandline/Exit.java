package fringekeep.commandline;

/** Exit codes of the headless program. */
final class Exit {
    /** Done, and nothing found wrong. */
    static final int DONE = 0;

    /** Could not, or a check found faults. */
    static final int COULD_NOT = 1;

    /** Wrong use of the command. */
    static final int WRONG_USE = 2;

    /** Stopped on request; what was finished stays. */
    static final int STOPPED = 3;

    /** A failure nobody expected. */
    static final int UNEXPECTED = 70;

    private Exit() {}
}
