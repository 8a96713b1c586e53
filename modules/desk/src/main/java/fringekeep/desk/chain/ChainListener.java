package fringekeep.desk.chain;

import fringekeep.archive.graph.StateName;

/** What a person does on the strip. */
public interface ChainListener {
    /** Opens a stop, from 0. */
    void open(int stop);

    /** Opens a stop with those in a state only. */
    void filter(int stop, StateName state);

    /** Opens a stop with those linked with the selection only. */
    void linked(int stop);

    /** Opens the choice of what is in view. */
    void chooseView();

    /** Looks for words. */
    void find(String words);
}
