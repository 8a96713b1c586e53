package fringekeep.archive.kind;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/**
 * One kind of record. Pure and thread-safe: no SQL, windows, clock, locale or network. Announced in
 * {@code META-INF/services/fringekeep.archive.kind.RecordKind}.
 */
public interface RecordKind {
    /** Name of the kind. */
    KindName kind();

    /** Schema number written by this program; every earlier one stays readable. */
    int schema();

    /** Published JSON Schema (draft 2020-12) of that number: one object with a member per part. */
    JsonObject jsonSchema(int number);

    /**
     * Lifts the value of a part from one schema number to the next, in memory only.
     *
     * @param number schema number of {@code value}, less than {@link #schema()}
     */
    default JsonObject lift(PartName part, int number, JsonObject value) {
        throw new IllegalArgumentException(kind() + " has no schema number " + (number + 1) + " to lift to");
    }

    /** Salted parts a record of this kind may have. */
    Set<PartName> sealedParts();

    /** Whether records of this kind are computed (choices and result) or entered (content). Velocity may be either. */
    default boolean mayBeComputed() {
        return computation().isPresent();
    }

    /** Inputs a record may have. */
    List<Role> inputRoles();

    /** What a record may speak of. */
    List<Role> aboutRoles();

    /** Whether a record may carry {@code after}: setup, calibration, batch, series and reading-profile. */
    default boolean mayContinue() {
        return false;
    }

    /** All that is wrong with a record beyond its schema and its roles; {@code where} is a JSON pointer into the parts. */
    List<Problem> examine(Parts parts, Inputs inputs);

    /**
     * What is wrong with a record as the one that holds from an instant on (a calibration is valid from that very instant);
     * {@code where} is a JSON pointer into the parts.
     */
    default List<Problem> examineContinuation(Parts parts, Instant from) {
        return List.of();
    }

    /** How results are computed; absent for what people enter. */
    default Optional<Computation> computation() {
        return Optional.empty();
    }

    /** A facet this record offers to those who take it as input. */
    default <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        return Optional.empty();
    }

    /** Declared tables; the first is what lists show. */
    List<Projection> projections();

    /** Rows of one declared table for one record: 0 to n. */
    Stream<Row> rows(Projection projection, RecordView record, Inputs inputs);

    /** What the record is called in lists and lineage, without its number. */
    Title title(RecordView record, Inputs inputs);

    /** Pictures of the record. */
    default List<Picture> drawings(RecordView record, Inputs inputs) {
        return List.of();
    }

    /** The record's facts as tables for people and bundles. */
    default List<FlatTable> tables(RecordView record, Inputs inputs) {
        return List.of();
    }

    /**
     * What the record answers, for {@code preferred}: two current records of one kind with an equal question are rivals.
     * Empty for kinds that answer none (record format 1, section 7).
     */
    default Optional<String> question(RecordView record, Inputs inputs) {
        return Optional.empty();
    }

    /** Words to be found by, from parts that are not withheld. */
    default Stream<String> words(RecordView record) {
        return Stream.empty();
    }
}
