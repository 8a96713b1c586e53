package fringekeep.scan.internal.reading;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Moment;
import fringekeep.scan.internal.problem.ScanProblems;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.time.temporal.TemporalAccessor;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Reads a moment as an instrument writes it, with the offset from the text, the profile, or the rules of a zone. */
final class MomentText {
    private static final Instant LEAST = Instant.parse("0001-01-01T00:00:00Z");
    private static final Instant GREATEST = Instant.parse("9999-12-31T23:59:59.999999999Z");

    private final HeaderKey key;

    MomentText(HeaderKey key) {
        this.key = key;
    }

    /**
     * A moment, and whether the local time was one that the clock shows twice.
     *
     * @param moment the moment
     * @param ambiguous whether the earlier of two was taken
     */
    record Read(Moment moment, boolean ambiguous) {}

    /** What is wrong with the profile's own format, offset and zone. */
    static List<Problem> examine(HeaderKey key, String pointer) {
        try {
            new MomentText(key).formatter();
            key.zone().ifPresent(ZoneId::of);
            key.offset().ifPresent(ZoneOffset::of);
            return List.of();
        } catch (IllegalArgumentException | DateTimeException e) {
            return List.of(ScanProblems.of("profile.moment", pointer, key.key()));
        }
    }

    /** The moment; empty if the text does not have the format or no offset is known. */
    Optional<Read> read(String text) {
        try {
            TemporalAccessor parsed = formatter().parseBest(text, OffsetDateTime::from, LocalDateTime::from);
            return parsed instanceof OffsetDateTime exact
                    ? within(moment(exact.toInstant(), exact.getOffset()), false)
                    : local((LocalDateTime) parsed);
        } catch (DateTimeException e) {
            return Optional.empty();
        }
    }

    private DateTimeFormatter formatter() {
        return key.format()
                .map(pattern -> DateTimeFormatter.ofPattern(pattern, Locale.ROOT))
                .orElse(DateTimeFormatter.ISO_DATE_TIME);
    }

    private Optional<Read> local(LocalDateTime time) {
        if (key.offset().isPresent()) {
            ZoneOffset offset = ZoneOffset.of(key.offset().get());
            return within(moment(time.toInstant(offset), offset), false);
        }
        if (key.zone().isEmpty()) {
            return Optional.empty();
        }
        List<ZoneOffset> offsets = ZoneId.of(key.zone().get()).getRules().getValidOffsets(time);
        if (offsets.isEmpty()) {
            return Optional.empty();
        }
        return within(moment(time.toInstant(offsets.get(0)), offsets.get(0)), offsets.size() > 1);
    }

    private Moment moment(Instant at, ZoneOffset offset) {
        return new Moment(at, offset.getId(), key.zone());
    }

    private static Optional<Read> within(Moment moment, boolean ambiguous) {
        boolean inside = !moment.at().isBefore(LEAST) && !moment.at().isAfter(GREATEST);
        boolean minutes = moment.offset().equals("Z") || moment.offset().length() == 6;
        return inside && minutes ? Optional.of(new Read(moment, ambiguous)) : Optional.empty();
    }
}
