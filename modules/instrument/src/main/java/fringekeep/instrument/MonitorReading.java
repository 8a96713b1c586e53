package fringekeep.instrument;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;

/** Method {@code monitor.read/1}: reads a slow log from one raw file and puts it on true time. */
final class MonitorReading implements Computation {
    static final String METHOD = "monitor.read/1";

    @Override
    public List<MethodId> methods() {
        return List.of(new MethodId(METHOD));
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        JsonObject complete = choices;
        for (String[] option : new String[][] {
            {"method", METHOD},
            {"constants", "CODATA 2018"},
            {"encoding", "UTF-8"},
            {"delimiter", ","},
            {"decimal", "."}
        }) {
            if (complete.get(option[0]).isEmpty()) {
                complete = complete.with(option[0], option[1]);
            }
        }
        if (complete.get("header").isEmpty()) {
            complete = complete.with("header", fringekeep.archive.json.Json.of(true));
        }
        if (complete.get("skip").isEmpty()) {
            complete = complete.with("skip", 0);
        }
        List<Problem> problems = MonitorRules.choices(complete);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return complete;
    }

    @Override
    public Outcome compute(JsonObject choices, Inputs inputs, Work work) throws StoppedException {
        List<Problem> problems = MonitorRules.choices(choices);
        if (!problems.isEmpty()) {
            return new Outcome.NoResult(problems);
        }
        try {
            List<ColumnText.Line> lines = ColumnText.read(raw(inputs), form(choices));
            boolean header = choices.flag("header").orElse(true);
            List<ColumnText.Line> rows = header && !lines.isEmpty() ? lines.subList(1, lines.size()) : lines;
            if (rows.isEmpty()) {
                throw new ProblemException(Trouble.at("log-empty", "/choices"));
            }
            return new MonitorTable(choices, time(choices)).read(rows, work);
        } catch (ProblemException e) {
            return new Outcome.NoResult(e.problems());
        }
    }

    private static byte[] raw(Inputs inputs) throws ProblemException {
        List<Input> raw = inputs.role("raw");
        if (raw.size() != 1) {
            throw new ProblemException(Trouble.at("raw-missing", "/inputs"));
        }
        return raw.get(0).rawBytes().orElseThrow(() -> new ProblemException(Trouble.at("raw-missing", "/inputs")));
    }

    static ColumnText.Form form(JsonObject choices) {
        int skip = (int) choices.integer("skip").orElse(0);
        return new ColumnText.Form(
                choices.text("encoding").orElse("UTF-8"),
                choices.text("delimiter").orElse(","),
                choices.text("decimal").orElse(".").charAt(0),
                choices.text("comment").orElse(""),
                skip);
    }

    private static LogTime time(JsonObject choices) {
        JsonObject time = choices.object("time").orElse(JsonObject.EMPTY);
        Optional<ZoneOffset> offset = time.text("offset").map(ZoneOffset::of);
        Optional<Instant> start = CalibrationReader.instant(time, "start");
        return new LogTime(
                (int) time.integer("column").orElse(0),
                time.text("form").orElse(""),
                offset,
                start,
                choices.text("decimal").orElse(".").charAt(0));
    }

    static JsonArray columns(JsonObject choices) {
        return choices.array("columns");
    }
}
