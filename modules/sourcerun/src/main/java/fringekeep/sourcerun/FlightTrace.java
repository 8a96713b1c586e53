package fringekeep.sourcerun;

import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.instrument.ColumnText;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Counts against time of flight in equal bins.
 *
 * @param first reading of the time axis at bin 0 (s)
 * @param width width of the bins (s), &gt; 0
 * @param counts whole, not negative, at least {@link #LEAST_BINS}
 */
record FlightTrace(double first, double width, double[] counts) {
    private static final int LEAST_BINS = 8;
    private static final double UNEVEN = 0.02;
    private static final int MOST_PROBLEMS = 100;

    /**
     * The trace among the inputs: a raw file read as the choices say, or a record that offers counts against time.
     *
     * @throws ProblemException if there is none or it cannot be used
     */
    static FlightTrace of(JsonObject choices, Inputs inputs) throws ProblemException {
        List<Input> traces = inputs.role("trace");
        if (traces.size() != 1) {
            throw new ProblemException(Trouble.at("trace-missing", "/inputs"));
        }
        Input trace = traces.get(0);
        return trace.raw() ? ofRaw(choices, trace) : ofRecord(trace);
    }

    private static FlightTrace ofRaw(JsonObject choices, Input trace) throws ProblemException {
        byte[] bytes = trace.rawBytes().orElseThrow(() -> new ProblemException(Trouble.at("trace-missing", "/inputs")));
        JsonObject reading = choices.object("reading").orElse(JsonObject.EMPTY);
        char decimal = reading.text("decimal").orElse(".").charAt(0);
        ColumnText.Form form = new ColumnText.Form(
                reading.text("encoding").orElse("UTF-8"),
                reading.text("delimiter").orElse("tab"),
                decimal,
                reading.text("comment").orElse(""),
                (int) reading.integer("skip").orElse(0));
        Unit unit = Units.parse(reading.text("timeUnit").orElse("s"));
        int timeColumn = (int) reading.integer("timeColumn").orElse(0);
        int countsColumn = (int) reading.integer("countsColumn").orElse(1);
        List<Double> times = new ArrayList<>();
        List<Double> counts = new ArrayList<>();
        List<Problem> problems = new ArrayList<>();
        for (ColumnText.Line line : ColumnText.read(bytes, form)) {
            cell(line, timeColumn, decimal, problems).ifPresent(time -> times.add(unit.toSi(time)));
            cell(line, countsColumn, decimal, problems).ifPresent(count -> counts.add(count.doubleValue()));
            if (problems.size() >= MOST_PROBLEMS) {
                break;
            }
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return checked(array(times), array(counts));
    }

    private static Optional<BigDecimal> cell(ColumnText.Line line, int column, char decimal, List<Problem> problems) {
        try {
            Optional<BigDecimal> number = ColumnText.number(line, column, decimal);
            if (number.isEmpty()) {
                problems.add(Trouble.at("trace-absent", "line " + line.number() + ", column " + (column + 1)));
            }
            return number;
        } catch (ProblemException e) {
            problems.addAll(e.problems());
            return Optional.empty();
        }
    }

    private static FlightTrace ofRecord(Input trace) throws ProblemException {
        CountTable table = trace.facet(CountTable.class)
                .orElseThrow(() -> new ProblemException(Trouble.at("trace-missing", "/inputs")));
        Optional<CountTable.Column> time =
                table.axes().stream().filter(axis -> axis.unit().equals("s")).findFirst();
        Optional<CountTable.Column> counts =
                trace.channel().isPresent() ? table.channel(trace.channel().get()) : table.channel("counts");
        if (time.isEmpty() || counts.isEmpty()) {
            throw new ProblemException(Trouble.at("trace-axis", "/inputs"));
        }
        return checked(time.get().values(), counts.get().values());
    }

    private static FlightTrace checked(double[] times, double[] counts) throws ProblemException {
        if (times.length < LEAST_BINS || times.length != counts.length) {
            throw new ProblemException(Trouble.at("trace-short", "/inputs", Integer.toString(times.length)));
        }
        double width = (times[times.length - 1] - times[0]) / (times.length - 1);
        for (int i = 0; i < times.length; i++) {
            if (!(Math.abs(times[i] - times[0] - i * width) <= UNEVEN * width)) {
                throw new ProblemException(Trouble.at("trace-uneven", "/inputs", Integer.toString(i)));
            }
            if (!(counts[i] >= 0) || counts[i] != Math.rint(counts[i]) || counts[i] > 1e15) {
                throw new ProblemException(Trouble.at("trace-counts", "/inputs", Integer.toString(i)));
            }
        }
        return new FlightTrace(times[0], width, counts);
    }

    private static double[] array(List<Double> numbers) {
        return numbers.stream().mapToDouble(Double::doubleValue).toArray();
    }

    double total() {
        double total = 0;
        for (double count : counts) {
            total += count;
        }
        return total;
    }
}
