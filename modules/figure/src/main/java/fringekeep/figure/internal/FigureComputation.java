package fringekeep.figure.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.util.ArrayList;
import java.util.List;

/** Method {@code figure.table/1}: the numbers of every series in the units of its axes, as one table. */
public final class FigureComputation implements Computation {
    private static final MethodId TABLE = new MethodId("figure.table/1");

    @Override
    public List<MethodId> methods() {
        return List.of(TABLE);
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        JsonObject complete = choices.text("method").isPresent() ? choices : choices.with("method", TABLE.text());
        return complete.text("constants").isPresent() ? complete : complete.with("constants", "CODATA 2018");
    }

    @Override
    public Outcome compute(JsonObject choices, Inputs inputs, Work work) throws StoppedException {
        List<Problem> problems = new ArrayList<>();
        List<Json> series = new ArrayList<>();
        FigureTable table = new FigureTable();
        List<JsonObject> panels = choices.array("panels").objects();
        for (int i = 0; i < panels.size(); i++) {
            List<JsonObject> asked = panels.get(i).array("series").objects();
            for (int j = 0; j < asked.size(); j++) {
                work.check();
                PlotRequest request = PlotRequest.of(panels.get(i), asked.get(j), j);
                try {
                    Numbers numbers = Gathering.gather(request, request.pointer(i), inputs);
                    table.add(request, numbers);
                    series.add(described(request, numbers));
                } catch (ProblemException e) {
                    problems.addAll(e.problems());
                }
            }
        }
        if (!problems.isEmpty()) {
            return new Outcome.NoResult(problems);
        }
        JsonObject result = JsonObject.EMPTY.with("table", FigureTable.NAME).with("series", new JsonArray(series));
        return new Outcome.Computed(result, List.of(new NewPayload(FigureTable.NAME, "csv/1", table.bytes())));
    }

    private static JsonObject described(PlotRequest request, Numbers numbers) {
        return JsonObject.EMPTY
                .with("panel", request.panel())
                .with("position", request.position())
                .with("sort", numbers.sort())
                .with("label", numbers.label())
                .with("rows", numbers.rows());
    }
}
