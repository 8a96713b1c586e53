package fringekeep.scan;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.scan.internal.ProfileRules;
import fringekeep.scan.internal.Rows;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

/** Reading profile: how text files of one instrument are read. Entered by people; may continue. */
public final class ReadingProfileKind implements RecordKind {
    /** Name of the kind. */
    public static final KindName NAME = new KindName("reading-profile");

    private static final Projection TABLE = new Projection(
            "reading_profile",
            NAME,
            List.of(
                    Column.text("label", "profile"),
                    Column.text("separator", "delimiter"),
                    Column.text("decimal_sign", "decimal"),
                    Column.text("text_encoding", "encoding"),
                    Column.text("axes", "axes"),
                    Column.text("channels", "channels")),
            List.of(List.of("label")));

    @Override
    public KindName kind() {
        return NAME;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return SchemaResource.read(ReadingProfileKind.class, "reading-profile-" + number + ".schema.json");
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public boolean mayContinue() {
        return true;
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return ProfileRules.examine(parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY));
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        return Stream.of(new Rows()
                .text("label", content.text("label"))
                .text("separator", content.text("delimiter").map(ReadingProfileKind::word))
                .text("decimal_sign", content.text("decimal"))
                .text("text_encoding", content.text("encoding"))
                .text("axes", names(content, "axis"))
                .text("channels", names(content, "channel"))
                .row());
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        String text = content.text("label").orElse("profile");
        return new Title(text, names(content, "axis") + "; " + names(content, "channel"));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return record.content().text("label").stream();
    }

    private static String word(String delimiter) {
        return switch (delimiter) {
            case "\t" -> "tab";
            case "," -> "comma";
            case ";" -> "semicolon";
            default -> delimiter;
        };
    }

    private static String names(JsonObject content, String member) {
        return String.join(
                ", ",
                content.array("columns").objects().stream()
                        .flatMap(column -> column.text(member).stream())
                        .toList());
    }
}
