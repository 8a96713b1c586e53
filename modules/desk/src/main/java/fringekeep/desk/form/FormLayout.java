package fringekeep.desk.form;

import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Rectangle;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** Where rows and columns of a form stand. */
final class FormLayout {
    static final int ROW = 22;
    private static final int HEAD = 30;
    private static final int WORDS = 62;
    private static final int INDENT = 10;
    private static final int LABEL = 12;

    private final List<FormRow> rows;
    private final int[] tops;
    private final int width;
    private final boolean compares;

    FormLayout(List<FormRow> rows, int width, boolean compares) {
        this.rows = rows;
        this.width = width;
        this.compares = compares;
        this.tops = new int[rows.size() + 1];
        for (int i = 0; i < rows.size(); i++) {
            tops[i + 1] = tops[i] + heightOf(rows.get(i));
        }
    }

    private static int heightOf(FormRow row) {
        return row.sort() == FormRow.Sort.HEAD ? HEAD : tall(row) ? WORDS : ROW;
    }

    /** Whether a row takes text of several lines. */
    static boolean tall(FormRow row) {
        return row.pointer().equals("/remark/text") && row.sort() == FormRow.Sort.FIELD;
    }

    List<FormRow> rows() {
        return rows;
    }

    int height() {
        return tops[rows.size()] + 8;
    }

    int top(int index) {
        return tops[index];
    }

    Rectangle bounds(int index) {
        return index < 0 || index >= rows.size()
                ? new Rectangle()
                : new Rectangle(0, tops[index], width, tops[index + 1] - tops[index]);
    }

    /** The row at a height; -1 where there is none. */
    int at(int y) {
        for (int i = 0; i < rows.size(); i++) {
            if (y >= tops[i] && y < tops[i + 1]) {
                return i;
            }
        }
        return -1;
    }

    // ---- columns

    double label(FormRow row) {
        return LABEL + (double) INDENT * row.depth();
    }

    double now() {
        return Math.rint(width < 1300 ? 178 : 230);
    }

    /** Right end of the column of SI values. */
    double siEnd() {
        return Math.rint(compares ? width * 0.547 : width * 0.72);
    }

    double unit() {
        return siEnd() + 12;
    }

    double before() {
        return compares ? Math.rint(width * 0.609) : width;
    }

    double end() {
        return width;
    }

    boolean compares() {
        return compares;
    }

    /** Where the text field of a row stands. */
    Rectangle field(int index) {
        FormRow row = rows.get(index);
        boolean quantity =
                row.leaf().filter(leaf -> leaf.sort() == Asked.Sort.QUANTITY).isPresent();
        double room = tall(row) ? (compares ? before() : end()) - now() - 6 : quantity ? 196 : siEnd() - now() - 110;
        int wide = (int) Math.max(quantity ? 196 : 220, Math.min(room, end() - now()));
        return new Rectangle((int) now() - 6, tops[index], wide, tops[index + 1] - tops[index]);
    }

    // ---- answers

    /** Where the answers of a question begin, and where they end. */
    double[] answers(int index) {
        FormRow row = rows.get(index);
        double x = now() + 16 + Lettering.width(row.words(), Type.BODY) + 12;
        double[] places = new double[2 * row.answers().size()];
        for (int i = 0; i < row.answers().size(); i++) {
            places[2 * i] = x;
            x += Lettering.width(row.answers().get(i), Type.BODY);
            places[2 * i + 1] = x;
            x += 14;
        }
        return places;
    }

    /** The answer at a place of a question's row. */
    OptionalInt answerAt(int index, int x) {
        double[] places = answers(index);
        for (int i = 0; 2 * i < places.length; i++) {
            if (x >= places[2 * i] - 4 && x <= places[2 * i + 1] + 4) {
                return OptionalInt.of(i);
            }
        }
        return OptionalInt.empty();
    }

    Optional<Integer> answer(int index, int x) {
        OptionalInt found = answerAt(index, x);
        return found.isPresent() ? Optional.of(found.getAsInt()) : Optional.empty();
    }

    /** The row of a list that a row stands for, or the entry of a role. */
    static Optional<String> item(FormRow row, FormModel model) {
        String pointer = row.pointer();
        if (pointer.matches("/(about|inputs)/[0-9]+/(record|raw)")) {
            return Optional.of(pointer.substring(0, pointer.lastIndexOf('/')));
        }
        if (row.sort() == FormRow.Sort.ITEM || row.sort() == FormRow.Sort.FIELD && pointer.matches(".*/[0-9]+")) {
            return inList(pointer, model);
        }
        int slash = pointer.lastIndexOf('/');
        String above = slash < 0 ? "" : pointer.substring(0, slash);
        boolean named = above.matches(".*/[0-9]+")
                && model.kind().words().text(FormKind.path(above) + ".named").isPresent();
        return named && row.sort() == FormRow.Sort.FIELD ? inList(above, model) : Optional.empty();
    }

    private static Optional<String> inList(String pointer, FormModel model) {
        int slash = pointer.lastIndexOf('/');
        int index = Integer.parseInt(pointer.substring(slash + 1));
        boolean there = index < TypedTree.size(model.state().typed(), pointer.substring(0, slash));
        return there ? Optional.of(pointer) : Optional.empty();
    }
}
