package fringekeep.figure;

import fringekeep.archive.NewRecord;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import fringekeep.figure.internal.FigurePicture;
import fringekeep.figure.internal.FigureTable;

/** The picture of a figure that is computed but not recorded. */
public final class FigurePreview {
    private FigurePreview() {}

    /**
     * Draws what a computation gave.
     *
     * @param computed a figure with choices, result and its table of numbers
     * @throws ProblemException if its table cannot be read
     */
    public static Picture of(NewRecord computed) throws ProblemException {
        byte[] numbers = computed.payloads().stream()
                .filter(payload -> payload.name().equals(FigureTable.NAME))
                .findFirst()
                .map(NewPayload::bytes)
                .orElseThrow(() -> new IllegalArgumentException("no computed figure: it has no table of numbers"));
        return FigurePicture.of(
                computed.parts().getOrDefault(PartName.CHOICES, JsonObject.EMPTY),
                computed.parts().getOrDefault(PartName.RESULT, JsonObject.EMPTY),
                FigureTable.read(numbers));
    }
}
