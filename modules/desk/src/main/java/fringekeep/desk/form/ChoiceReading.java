package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.stage.DeskHand;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.stream.Stream;

/** What may be chosen in a row: codes of the schema, or current records that may play a role. */
final class ChoiceReading {
    private static final int MOST = 300;

    private final DeskHand hand;
    private final FormKind kind;

    ChoiceReading(DeskHand hand, FormKind kind) {
        this.hand = hand;
        this.kind = kind;
    }

    /** Codes in words; empty for rows in which records are named. */
    Optional<List<ChoiceList.Option>> codes(FormRow row) {
        Optional<Asked.Leaf> leaf = row.leaf();
        if (leaf.isEmpty()) {
            return Optional.of(List.of());
        }
        String path = FormKind.path(row.pointer());
        return switch (leaf.get().sort()) {
            case CHOICE -> Optional.of(options(leaf.get(), path));
            case CHOICES -> {
                List<ChoiceList.Option> options = new ArrayList<>(options(leaf.get(), path));
                options.add(new ChoiceList.Option(LeafText.NONE, ""));
                yield Optional.of(List.copyOf(options));
            }
            case FLAG -> Optional.of(plain(LeafText.YES, LeafText.NO));
            case MARKED -> Optional.of(plain(LeafText.YES));
            case RECORD -> Optional.empty();
            case TEXT, WORDS, QUANTITY, NUMBER, INTEGER, MOMENT, INSTANT, NUMBERS, RANGES, FILE ->
                Optional.of(List.of());
        };
    }

    private List<ChoiceList.Option> options(Asked.Leaf leaf, String path) {
        return leaf.options().stream()
                .map(code -> new ChoiceList.Option(kind.words().code(path, code), meaning(leaf, code)))
                .toList();
    }

    private static List<ChoiceList.Option> plain(String... words) {
        return Stream.of(words).map(word -> new ChoiceList.Option(word, "")).toList();
    }

    /** What the schema says about a code: {@code material: slits in a membrane; …}. */
    private static String meaning(Asked.Leaf leaf, String code) {
        String marked = "; " + leaf.description();
        int at = marked.indexOf("; " + code + ": ");
        if (at < 0) {
            return "";
        }
        String rest = marked.substring(at + code.length() + 4);
        int end = rest.indexOf(';');
        return (end < 0 ? rest : rest.substring(0, end)).replaceAll("\\.$", "");
    }

    /** Current records that may be named in a row, newest first. */
    void records(FormRow row, Consumer<List<ChoiceList.Option>> then) {
        Register register = hand.register();
        Archive archive = hand.archive();
        List<String> steps = fringekeep.archive.json.JsonPointer.steps(row.pointer());
        List<String> kinds = kinds(steps, row);
        hand.run("form choices", work -> read(archive, register, kinds), then);
    }

    private List<String> kinds(List<String> steps, FormRow row) {
        return kind.roles().stream()
                .filter(part -> part.member().equals(steps.get(0)) && !part.file())
                .filter(part -> steps.get(1).equals("+" + part.role().name())
                        || row.label().startsWith(label(part)))
                .findFirst()
                .map(part -> part.role().kinds().stream()
                        .map(KindName::text)
                        .sorted()
                        .toList())
                .orElse(List.of());
    }

    private String label(FormKind.Part part) {
        return kind.words()
                .text(part.path() + ".label")
                .orElseGet(() -> FormWords.spoken(part.role().name()));
    }

    private static List<ChoiceList.Option> read(Archive archive, Register register, List<String> kinds) {
        List<ChoiceList.Option> options = new ArrayList<>();
        for (String one : kinds) {
            List<Hash> records = new ArrayList<>(register.current(one));
            Collections.reverse(records);
            for (Hash record : records.subList(0, Math.min(MOST, records.size()))) {
                String words = archive.record(record)
                        .map(view -> Names.title(archive, view).text())
                        .orElse("");
                options.add(new ChoiceList.Option(archive.label(record), words));
            }
        }
        return options;
    }
}
