package fringekeep.instrument;

import fringekeep.archive.problem.ProblemException;
import java.math.BigDecimal;
import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * How a log writes its times.
 *
 * @param column place of the column from 0
 * @param form code of the schema
 * @param offset offset of times that state none; absent where none is needed
 * @param start instant of zero, form {@code seconds}
 * @param decimal decimal sign
 */
record LogTime(int column, String form, Optional<ZoneOffset> offset, Optional<Instant> start, char decimal) {
    private static final Pattern ISO = Pattern.compile(
            "(\\d{4}-\\d{2}-\\d{2})[T ](\\d{2}:\\d{2}(?::\\d{2}(?:[.,]\\d{1,9})?)?)\\s*(Z|[+-]\\d{2}:?\\d{2})?");
    private static final Pattern NUMERIC = Pattern.compile(
            "(\\d{1,2})[./-](\\d{1,2})[./-](\\d{4})[ T]+(\\d{1,2}):(\\d{2})(?::(\\d{2})(?:[.,](\\d{1,9}))?)?");

    /**
     * The time of a row by the log's clock.
     *
     * @throws ProblemException if the cell holds no time of that form, or the offset is needed and not given
     */
    Instant read(ColumnText.Line line) throws ProblemException {
        String cell = ColumnText.cell(line, column);
        try {
            return switch (form) {
                case "iso" -> iso(line, cell);
                case "day-first" -> numeric(line, cell, 1, 2);
                case "month-first" -> numeric(line, cell, 2, 1);
                case "epoch-seconds" -> Instant.EPOCH.plus(seconds(line));
                case "seconds" ->
                    start.orElseThrow(() -> problem("time-start", line, cell)).plus(seconds(line));
                default -> throw problem("time-form", line, cell);
            };
        } catch (DateTimeException | ArithmeticException e) {
            throw problem("time-form", line, cell);
        }
    }

    private Duration seconds(ColumnText.Line line) throws ProblemException {
        BigDecimal seconds = ColumnText.number(line, column, decimal).orElseThrow(() -> problem("time-form", line, ""));
        return duration(seconds);
    }

    /** A duration of so many seconds, to the nanosecond. */
    static Duration duration(BigDecimal seconds) {
        BigDecimal whole = seconds.setScale(0, java.math.RoundingMode.FLOOR);
        long nanos = seconds.subtract(whole)
                .movePointRight(9)
                .setScale(0, java.math.RoundingMode.HALF_EVEN)
                .longValueExact();
        return Duration.ofSeconds(whole.longValueExact(), nanos);
    }

    private Instant iso(ColumnText.Line line, String cell) throws ProblemException {
        Matcher matcher = ISO.matcher(cell);
        if (!matcher.matches()) {
            throw problem("time-form", line, cell);
        }
        String local = matcher.group(1) + "T" + matcher.group(2).replace(',', '.');
        String zone = matcher.group(3);
        if (zone == null) {
            return LocalDateTime.parse(local).toInstant(required(line, cell));
        }
        String colon = zone.length() == 5 ? zone.substring(0, 3) + ":" + zone.substring(3) : zone;
        return OffsetDateTime.parse(local + colon).toInstant();
    }

    private Instant numeric(ColumnText.Line line, String cell, int day, int month) throws ProblemException {
        Matcher matcher = NUMERIC.matcher(cell);
        if (!matcher.matches()) {
            throw problem("time-form", line, cell);
        }
        int second = matcher.group(6) == null ? 0 : Integer.parseInt(matcher.group(6));
        String fraction = matcher.group(7) == null ? "0" : matcher.group(7);
        int nanos = Integer.parseInt((fraction + "00000000").substring(0, 9));
        return LocalDateTime.of(
                        Integer.parseInt(matcher.group(3)),
                        Integer.parseInt(matcher.group(month)),
                        Integer.parseInt(matcher.group(day)),
                        Integer.parseInt(matcher.group(4)),
                        Integer.parseInt(matcher.group(5)),
                        second,
                        nanos)
                .toInstant(required(line, cell));
    }

    private ZoneOffset required(ColumnText.Line line, String cell) throws ProblemException {
        return offset.orElseThrow(() -> problem("time-offset", line, cell));
    }

    private ProblemException problem(String code, ColumnText.Line line, String cell) {
        return new ProblemException(ColumnText.trouble(code, line, column, cell));
    }
}
