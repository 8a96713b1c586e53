package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Moment;
import fringekeep.scan.internal.problem.ScanProblems;
import fringekeep.scan.internal.reading.HeaderKey.Use;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/** Reads the header values a profile names. */
final class HeaderReader {
    private static final double LARGEST_INTEGER = 0x1p53;

    private final Profile profile;
    private final HeaderLines lines;
    private final String file;
    private final List<Problem> problems = new ArrayList<>();
    private boolean ambiguous;

    HeaderReader(Profile profile, Section section, String file) {
        this.profile = profile;
        this.lines = new HeaderLines(profile, section, file);
        this.file = file;
    }

    HeaderValues read() throws ProblemException {
        List<JsonObject> settings = new ArrayList<>();
        List<String> personal = new ArrayList<>();
        OptionalDouble exposure = OptionalDouble.empty();
        OptionalLong shots = OptionalLong.empty();
        OptionalLong rows = OptionalLong.empty();
        for (HeaderKey key : profile.header()) {
            Optional<HeaderLines.Value> value = find(key);
            if (value.isEmpty()) {
                continue;
            }
            switch (key.use()) {
                case SETTING -> setting(key, value.get()).ifPresent(settings::add);
                case PERSONAL -> personal.add(key.key() + ": " + value.get().text());
                case EXPOSURE -> exposure = exposure(key, value.get());
                case SHOTS -> shots = count(key, value.get());
                case ROWS -> rows = count(key, value.get());
                case MOMENT -> {} // several keys may tell one moment: read below
            }
        }
        Optional<Moment> start = moment("start");
        Optional<Moment> end = moment("end");
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return new HeaderValues(settings, start, end, ambiguous, exposure, shots, rows, personal);
    }

    private Optional<HeaderLines.Value> find(HeaderKey key) {
        try {
            Optional<HeaderLines.Value> value = lines.find(key.key());
            if (value.isEmpty() && key.required()) {
                problems.add(ScanProblems.of("scan.header-missing", file, key.key()));
            }
            return value;
        } catch (ProblemException e) {
            problems.addAll(e.problems());
            return Optional.empty();
        }
    }

    private Optional<JsonObject> setting(HeaderKey key, HeaderLines.Value value) {
        return quantity(key, value)
                .map(quantity -> JsonObject.EMPTY.with("name", key.name()).with("quantity", quantity));
    }

    private Optional<JsonObject> quantity(HeaderKey key, HeaderLines.Value value) {
        int end = DecimalText.end(value.text(), profile.decimal());
        Optional<String> decimal = DecimalText.normalise(value.text().substring(0, end), profile.decimal());
        if (decimal.isEmpty()) {
            problems.add(ScanProblems.of("scan.header-number", value.place(), key.key(), value.text()));
            return Optional.empty();
        }
        Optional<ColumnUnit> unit = unit(key, value, value.text().substring(end).strip());
        if (unit.isEmpty()) {
            return Optional.empty();
        }
        double si = unit.get().si(decimal.get());
        if (!Double.isFinite(si)) {
            problems.add(ScanProblems.of("scan.number-too-large", value.place(), value.text()));
            return Optional.empty();
        }
        JsonObject uncertainty = key.deviation()
                .map(text -> JsonObject.EMPTY
                        .with("sort", "stated")
                        .with("text", text)
                        .with("si", deviation(unit.get(), key, text)))
                .orElse(JsonObject.EMPTY.with("sort", "unstated"));
        return Optional.of(JsonObject.EMPTY
                .with("text", decimal.get())
                .with("unit", unit.get().code())
                .with("si", si)
                .with("uncertainty", uncertainty));
    }

    /** The profile states the deviation in its own unit; the file may use another of the same sort. */
    private static double deviation(ColumnUnit fileUnit, HeaderKey key, String text) {
        return key.unit().map(ColumnUnit::of).orElse(fileUnit).siDifference(text);
    }

    private Optional<ColumnUnit> unit(HeaderKey key, HeaderLines.Value value, String written) {
        Optional<ColumnUnit> asked = key.unit().map(ColumnUnit::of);
        if (written.isEmpty()) {
            return Optional.of(asked.orElse(ColumnUnit.ONE));
        }
        Optional<ColumnUnit> found = ColumnUnit.written(written);
        if (found.isEmpty()) {
            problems.add(ScanProblems.of("scan.header-unit", value.place(), key.key(), written));
        } else if (asked.isPresent() && !asked.get().siCode().equals(found.get().siCode())) {
            problems.add(ScanProblems.of(
                    "scan.header-unit-sort",
                    value.place(),
                    key.key(),
                    written,
                    asked.get().code()));
            return Optional.empty();
        }
        return found;
    }

    private OptionalDouble exposure(HeaderKey key, HeaderLines.Value value) {
        HeaderKey inSeconds = key.unit().isPresent() ? key : withUnit(key, "s");
        Optional<JsonObject> quantity = quantity(inSeconds, value);
        if (quantity.isEmpty()) {
            return OptionalDouble.empty();
        }
        double si = quantity.get().number("si").orElseThrow();
        if (!(si > 0)) {
            problems.add(ScanProblems.of("scan.exposure-not-positive", value.place(), value.text()));
        }
        return OptionalDouble.of(si);
    }

    private static HeaderKey withUnit(HeaderKey key, String unit) {
        return new HeaderKey(
                key.key(),
                key.use(),
                key.name(),
                key.required(),
                Optional.of(unit),
                key.deviation(),
                key.format(),
                key.offset(),
                key.zone());
    }

    private OptionalLong count(HeaderKey key, HeaderLines.Value value) {
        Optional<String> decimal = DecimalText.normalise(value.text(), profile.decimal());
        double number = decimal.map(Double::parseDouble).orElse(-1.0);
        if (number < 1 || number != Math.rint(number) || number > LARGEST_INTEGER) {
            problems.add(ScanProblems.of("scan.header-count", value.place(), key.key(), value.text()));
            return OptionalLong.empty();
        }
        return OptionalLong.of((long) number);
    }

    private Optional<Moment> moment(String which) {
        List<HeaderKey> keys = profile.header().stream()
                .filter(key -> key.use() == Use.MOMENT && key.name().equals(which))
                .toList();
        List<HeaderLines.Value> values =
                keys.stream().map(this::find).flatMap(Optional::stream).toList();
        if (keys.isEmpty() || values.size() < keys.size()) {
            return Optional.empty();
        }
        String text =
                String.join(" ", values.stream().map(HeaderLines.Value::text).toList());
        Optional<MomentText.Read> read = new MomentText(keys.get(0)).read(text);
        if (read.isEmpty()) {
            problems.add(ScanProblems.of(
                    "scan.header-moment", values.get(0).place(), keys.get(0).key(), text));
            return Optional.empty();
        }
        ambiguous |= read.get().ambiguous();
        return Optional.of(read.get().moment());
    }
}
