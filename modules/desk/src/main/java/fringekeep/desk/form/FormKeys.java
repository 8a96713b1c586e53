package fringekeep.desk.form;

import java.awt.event.InputEvent;
import java.awt.event.KeyEvent;

/** What keys do in the rows of a form. */
final class FormKeys {
    private final FormTable table;

    FormKeys(FormTable table) {
        this.table = table;
    }

    /** Does what a key says; answers whether it was one of the table's. */
    boolean pressed(KeyEvent event) {
        boolean control = (event.getModifiersEx() & InputEvent.CTRL_DOWN_MASK) != 0;
        boolean shift = (event.getModifiersEx() & InputEvent.SHIFT_DOWN_MASK) != 0;
        if (event.isAltDown()) {
            return false;
        }
        return switch (event.getKeyCode()) {
            case KeyEvent.VK_ENTER -> !control && enter(shift);
            case KeyEvent.VK_TAB -> !control && walk(!shift);
            case KeyEvent.VK_DOWN -> !control && down();
            case KeyEvent.VK_UP -> !control && up();
            case KeyEvent.VK_F2 -> done(table::nextChange);
            case KeyEvent.VK_F4 -> done(table::ask);
            case KeyEvent.VK_DELETE -> control && done(table::remove);
            case KeyEvent.VK_ESCAPE -> table.choices().isOpen() && done(table.choices()::close);
            case KeyEvent.VK_SPACE -> !typing() && done(table::act);
            case KeyEvent.VK_RIGHT -> !typing() && done(() -> table.answer(1));
            case KeyEvent.VK_LEFT -> !typing() && done(() -> table.answer(0));
            default -> false;
        };
    }

    private boolean typing() {
        return table.row().filter(FormRow::typed).isPresent();
    }

    private static boolean done(Runnable work) {
        work.run();
        return true;
    }

    /** Whether more may be chosen in the same field. */
    private boolean several() {
        return table.row()
                .flatMap(FormRow::leaf)
                .filter(leaf -> leaf.sort() == Asked.Sort.CHOICES)
                .isPresent();
    }

    private boolean tall() {
        return table.row().filter(FormLayout::tall).isPresent();
    }

    private boolean enter(boolean shift) {
        if (tall() && shift) {
            table.field().replaceSelection("\n");
            return true;
        }
        if (table.choices().isOpen() && table.choices().takeChosen()) {
            return several() || walk(true);
        }
        boolean acts = table.row()
                .filter(row -> row.sort() == FormRow.Sort.ITEM
                        || row.sort() == FormRow.Sort.MORE
                        || row.sort() == FormRow.Sort.QUESTION
                        || row.sort() == FormRow.Sort.ADD && row.leaf().isEmpty())
                .isPresent();
        if (acts && !shift) {
            table.act();
            return true;
        }
        return walk(!shift);
    }

    private boolean walk(boolean forwards) {
        return done(forwards ? table::forward : table::backward);
    }

    private boolean down() {
        if (table.choices().isOpen()) {
            return done(() -> table.choices().move(1));
        }
        boolean chosen = table.row()
                .flatMap(FormRow::leaf)
                .filter(leaf -> switch (leaf.sort()) {
                    case CHOICE, CHOICES, RECORD, FLAG, MARKED -> true;
                    case TEXT, WORDS, QUANTITY, NUMBER, INTEGER, MOMENT, INSTANT, NUMBERS, RANGES, FILE -> false;
                })
                .isPresent();
        if (chosen) {
            return done(table::ask);
        }
        return !tall() && walk(true);
    }

    private boolean up() {
        if (table.choices().isOpen()) {
            return done(() -> table.choices().move(-1));
        }
        return !tall() && walk(false);
    }
}
