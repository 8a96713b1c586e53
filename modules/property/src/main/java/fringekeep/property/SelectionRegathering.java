package fringekeep.property;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.Regathering;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The next revision of a selection: revised fits take the places of the old ones, fits that fell away are left out. */
public final class SelectionRegathering implements Regathering {
    @Override
    public KindName kind() {
        return new KindName("selection");
    }

    @Override
    public Optional<NewRecord> regather(Archive archive, Hash record, StandIn standIn, List<Prepared> prepared)
            throws ProblemException {
        RecordView view = archive.record(record).orElseThrow();
        Lists lists = new Lists(view);
        for (InputReference input : view.head().inputs()) {
            if (input instanceof InputReference.OfRecord of && of.role().equals(SelectionKind.TAKEN)) {
                lists.take(of.record(), standIn);
            }
        }
        return lists.taken.isEmpty() ? Optional.empty() : Optional.of(lists.request(record));
    }

    /** The lists of the new selection while they are being made. */
    private static final class Lists {
        private final RecordView view;
        private final List<Hash> taken = new ArrayList<>();
        private final List<Hash> because = new ArrayList<>();
        private final List<AboutReference> about = new ArrayList<>();
        private final List<Left> left = new ArrayList<>();

        private record Left(long about, String reason, Optional<Hash> because) {}

        Lists(RecordView view) {
            this.view = view;
            about.addAll(view.head().about());
            for (JsonObject each : view.content().array("left").objects()) {
                left.add(new Left(
                        each.integer("about").orElseThrow(), each.text("reason").orElseThrow(), judgement(each)));
            }
        }

        private Optional<Hash> judgement(JsonObject each) {
            if (each.integer("because").isEmpty()) {
                return Optional.empty();
            }
            InputReference input =
                    view.head().inputs().get((int) each.integer("because").getAsLong());
            return input instanceof InputReference.OfRecord of ? Optional.of(of.record()) : Optional.empty();
        }

        void take(Hash fit, StandIn standIn) {
            Optional<Hash> now = standIn.of(fit);
            if (now.isPresent()) {
                taken.add(now.get());
                return;
            }
            left.add(new Left(
                    about.size(), "withdrawn", standIn.because(fit).stream().findFirst()));
            about.add(new AboutReference(SelectionKind.LEFT_OUT, fit, AboutReference.Reach.RECORD));
        }

        NewRecord request(Hash corrects) {
            left.forEach(each -> each.because()
                    .filter(judgement -> !because.contains(judgement))
                    .ifPresent(because::add));
            List<InputReference> inputs = new ArrayList<>();
            taken.forEach(fit -> inputs.add(new InputReference.OfRecord(SelectionKind.TAKEN, fit)));
            because.forEach(judgement -> inputs.add(new InputReference.OfRecord(SelectionKind.BECAUSE, judgement)));
            List<Json> reasons = left.stream()
                    .<Json>map(each -> JsonObject.EMPTY
                            .with("about", each.about())
                            .with("reason", each.reason())
                            .with(
                                    "because",
                                    each.because()
                                            .map(judgement -> Json.of(taken.size() + because.indexOf(judgement)))))
                    .toList();
            return new NewRecord(
                    view.head().kind(),
                    inputs,
                    about,
                    Map.of(PartName.CONTENT, view.content().with("left", new JsonArray(reasons))),
                    List.of(),
                    Optional.of(corrects),
                    Optional.empty(),
                    Optional.empty());
        }
    }
}
