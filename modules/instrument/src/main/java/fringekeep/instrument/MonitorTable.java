package fringekeep.instrument;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.sample.Entered;
import java.math.BigDecimal;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Turns the rows of a log into a table on true time, and notes what is odd about it. */
final class MonitorTable {
    private static final int MOST_PROBLEMS = 100;
    private static final int MOST_FINDINGS = 1000;
    private static final double GAP = 10;
    private static final int BETWEEN_POLLS = 1000;

    private final List<JsonObject> columns;
    private final LogTime time;
    private final Optional<Entered> clockOffset;
    private final char decimal;
    private final List<Problem> problems = new ArrayList<>();

    MonitorTable(JsonObject choices, LogTime time) {
        this.columns = MonitorReading.columns(choices).objects();
        this.time = time;
        this.clockOffset = Entered.of(choices, "clockOffset");
        this.decimal = time.decimal();
    }

    /** Name of a column in the table: words in lower case joined by underscores, and the unit. */
    static String columnName(String name, String unit) {
        StringBuilder text = new StringBuilder();
        String lower = name.toLowerCase(Locale.ROOT);
        for (int i = 0; i < lower.length(); i++) {
            char c = lower.charAt(i);
            boolean kept = c >= 'a' && c <= 'z' || c >= '0' && c <= '9';
            if (kept) {
                text.append(c);
            } else if (text.length() > 0 && text.charAt(text.length() - 1) != '_') {
                text.append('_');
            }
        }
        String plain = text.toString().replaceAll("_$", "");
        boolean letterFirst = !plain.isEmpty() && plain.charAt(0) >= 'a';
        return (letterFirst ? plain : "c" + plain) + SiUnits.suffix(unit.isEmpty() ? "1" : unit);
    }

    Outcome read(List<ColumnText.Line> lines, Work work) throws ProblemException, StoppedException {
        Instant[] instants = new Instant[lines.size()];
        List<double[]> values = new ArrayList<>();
        List<Unit> units = new ArrayList<>();
        for (JsonObject column : columns) {
            values.add(new double[lines.size()]);
            units.add(Units.parse(column.text("unit").orElse("1")));
        }
        for (int row = 0; row < lines.size() && problems.size() < MOST_PROBLEMS; row++) {
            if (row % BETWEEN_POLLS == 0) {
                work.check();
                work.progress(row, lines.size(), "reading the log");
            }
            instants[row] = instant(lines.get(row));
            for (int column = 0; column < columns.size(); column++) {
                int place = (int) columns.get(column).integer("column").orElse(0);
                values.get(column)[row] = value(lines.get(row), place, units.get(column));
            }
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return outcome(seconds(instants), instants[0], values, units);
    }

    private Instant instant(ColumnText.Line line) {
        try {
            Duration offset = clockOffset
                    .map(known -> LogTime.duration(new BigDecimal(known.si())))
                    .orElse(Duration.ZERO);
            return time.read(line).minus(offset);
        } catch (ProblemException e) {
            problems.addAll(e.problems());
            return Instant.EPOCH;
        }
    }

    private double value(ColumnText.Line line, int place, Unit unit) {
        try {
            double value =
                    ColumnText.number(line, place, decimal).map(unit::toSi).orElse(Double.NaN);
            if (Double.isInfinite(value)) {
                problems.add(ColumnText.trouble("cell-number", line, place, ColumnText.cell(line, place)));
            }
            return value;
        } catch (ProblemException e) {
            problems.addAll(e.problems());
            return Double.NaN;
        }
    }

    private static double[] seconds(Instant[] instants) {
        double[] seconds = new double[instants.length];
        for (int i = 0; i < instants.length; i++) {
            Duration since = Duration.between(instants[0], instants[i]);
            seconds[i] = new BigDecimal(since.getSeconds())
                    .add(BigDecimal.valueOf(since.getNano(), 9))
                    .doubleValue();
        }
        return seconds;
    }

    private Outcome outcome(double[] times, Instant start, List<double[]> values, List<Unit> units) {
        List<String> names = new ArrayList<>();
        List<double[]> table = new ArrayList<>();
        List<Json> described = new ArrayList<>();
        names.add("time_s");
        table.add(times);
        table.addAll(values);
        for (int i = 0; i < columns.size(); i++) {
            String name = columns.get(i).text("name").orElse("");
            String unit = SiUnits.code(units.get(i));
            names.add(columnName(name, unit));
            described.add(JsonObject.EMPTY
                    .with("column", names.get(i + 1))
                    .with("name", name)
                    .with("unit", unit));
        }
        double last = Arrays.stream(times).max().orElse(0);
        JsonObject result = JsonObject.EMPTY
                .with("table", "table")
                .with("rows", times.length)
                .with("columns", new JsonArray(described))
                .with("start", start.toString())
                .with("end", start.plus(LogTime.duration(new BigDecimal(last))).toString())
                .with(
                        "clockOffset",
                        JsonObject.EMPTY
                                .with("value", clockOffset.map(Entered::si).orElse(0.0))
                                .with(
                                        "u",
                                        clockOffset
                                                .map(Entered::deviationOrZero)
                                                .orElse(0.0)))
                .with("findings", findings(times, values));
        return new Outcome.Computed(result, List.of(TablePayload.write("table", names, table)));
    }

    private JsonArray findings(double[] times, List<double[]> values) {
        List<Json> findings = new ArrayList<>();
        double usual = usualStep(times);
        for (int i = 1; i < times.length && findings.size() < MOST_FINDINGS; i++) {
            double step = times[i] - times[i - 1];
            if (!(step > 0)) {
                findings.add(finding("time-not-ascending", i - 1, i, "The time does not go forward."));
            } else if (usual > 0 && step > GAP * usual) {
                findings.add(finding("gap", i - 1, i, "More than ten usual steps lie between these rows."));
            }
        }
        for (int column = 0; column < values.size(); column++) {
            absent(values.get(column), columns.get(column).text("name").orElse(""), findings);
        }
        return new JsonArray(findings);
    }

    private static void absent(double[] values, String name, List<Json> findings) {
        int first = -1;
        for (int i = 0; i <= values.length && findings.size() < MOST_FINDINGS; i++) {
            boolean missing = i < values.length && Double.isNaN(values[i]);
            if (missing && first < 0) {
                first = i;
            } else if (!missing && first >= 0) {
                findings.add(finding("cell-absent", first, i - 1, "No reading of " + name + "."));
                first = -1;
            }
        }
    }

    /** Median of the steps forward. */
    private static double usualStep(double[] times) {
        double[] steps = new double[Math.max(0, times.length - 1)];
        int count = 0;
        for (int i = 1; i < times.length; i++) {
            if (times[i] > times[i - 1]) {
                steps[count++] = times[i] - times[i - 1];
            }
        }
        Arrays.sort(steps, 0, count);
        return count == 0 ? 0 : steps[count / 2];
    }

    private static JsonObject finding(String code, int first, int last, String text) {
        return JsonObject.EMPTY
                .with("code", code)
                .with("rows", JsonArray.ofNumbers(first, last))
                .with("text", text);
    }
}
