package fringekeep.interferometry.nearfield;

/** How the molecule's motion is described. */
public enum Description {
    /** Matter waves. */
    QUANTUM,
    /** Point particles on straight rays, deflected by the local force of each grating: the shadow pattern. */
    CLASSICAL
}
