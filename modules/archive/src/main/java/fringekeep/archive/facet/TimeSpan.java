package fringekeep.archive.facet;

import fringekeep.archive.record.Moment;
import java.util.Optional;

/** From when to when something lasted; the end is absent while it lasts or when it is not known. */
public record TimeSpan(Moment start, Optional<Moment> end) {}
