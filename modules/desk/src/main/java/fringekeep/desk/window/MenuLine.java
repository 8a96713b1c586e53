package fringekeep.desk.window;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskAction;
import fringekeep.desk.stage.DeskMenu;
import fringekeep.desk.stage.DeskSelection;
import java.awt.Component;
import java.awt.Dimension;
import java.util.List;
import java.util.Locale;
import javax.swing.JMenu;
import javax.swing.JMenuBar;
import javax.swing.JMenuItem;
import javax.swing.KeyStroke;
import javax.swing.event.MenuEvent;
import javax.swing.event.MenuListener;

/** The menus. */
public final class MenuLine {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", MenuLine.class);

    private MenuLine() {}

    /** Made by the platform for its frame. */
    public static JMenuBar create() {
        Program program = Program.only();
        Desk desk = program.desk();
        JMenuBar bar = new JMenuBar();
        bar.setPreferredSize(new Dimension(400, 30));
        JMenu archive = menu(bar, "menu.archive", 'A', desk, DeskMenu.ARCHIVE);
        item(archive, "menu.archive.open", "ctrl O", program::chooseArchive);
        item(archive, "menu.archive.found", "", desk::askToFound);
        item(archive, "menu.archive.try", "", program::tryInvented);
        item(archive, "menu.archive.close", "", desk::closeArchive);
        archive.addSeparator();
        stageItems(archive, desk, DeskMenu.ARCHIVE);
        item(archive, "menu.archive.person", "", () -> desk.persons().change(person -> {}));
        item(archive, "menu.archive.dark", "ctrl L", program::switchTheme);
        archive.addSeparator();
        item(archive, "menu.archive.quit", "ctrl Q", program::quit);
        JMenu day = new JMenu(TEXTS.of("menu.day"));
        day.setMnemonic('D');
        if (stageItems(day, desk, DeskMenu.DAY)) {
            refreshing(day, desk);
            bar.add(day);
        }
        JMenu record = menu(bar, "menu.record", 'R', desk, DeskMenu.RECORD);
        item(record, "menu.record.find", "ctrl F", desk::focusFind);
        record.addSeparator();
        if (stageItems(record, desk, DeskMenu.RECORD)) {
            record.addSeparator();
        }
        List<fringekeep.desk.session.Stops.Stop> stops =
                fringekeep.desk.session.Stops.shipped().all();
        for (int i = 0; i < stops.size(); i++) {
            int stop = i;
            JMenuItem item = new JMenuItem(stops.get(i).label());
            item.addActionListener(event -> desk.openStop(stop));
            record.add(item);
        }
        JMenu fit = new JMenu(TEXTS.of("menu.fit"));
        fit.setMnemonic('F');
        if (stageItems(fit, desk, DeskMenu.FIT)) {
            refreshing(fit, desk);
            bar.add(fit);
        }
        JMenu lineage = menu(bar, "menu.lineage", 'L', desk, DeskMenu.LINEAGE);
        item(lineage, "menu.lineage.trace", "", desk::trace);
        item(lineage, "menu.lineage.back", "", desk::back);
        stageItems(lineage, desk, DeskMenu.LINEAGE);
        JMenu bundle = new JMenu(TEXTS.of("menu.bundle"));
        bundle.setMnemonic('B');
        if (stageItems(bundle, desk, DeskMenu.BUNDLE)) {
            refreshing(bundle, desk);
            bar.add(bundle);
        }
        JMenu help = menu(bar, "menu.help", 'H', desk, DeskMenu.HELP);
        item(help, "menu.help.keys", "F1", desk::keys);
        item(help, "menu.help.about", "", () -> about(program));
        return bar;
    }

    private static void about(Program program) {
        program.say(
                TEXTS.of("menu.help.about"), List.of(new Problem("desk.about", TEXTS.of("about", "1.0.0"), "", "")));
    }

    private static JMenu menu(JMenuBar bar, String key, char mnemonic, Desk desk, DeskMenu which) {
        JMenu menu = new JMenu(TEXTS.of(key));
        menu.setMnemonic(mnemonic);
        menu.setName(which.name());
        bar.add(menu);
        refreshing(menu, desk);
        return menu;
    }

    /** Adds what stages can do; answers whether there is anything. */
    private static boolean stageItems(JMenu menu, Desk desk, DeskMenu which) {
        for (DeskAction action : desk.stages().in(which)) {
            JMenuItem item = new JMenuItem(action.word());
            item.setName(action.id());
            if (!action.stroke().isEmpty()) {
                // shown only: the key itself is bound on the desk, where single letters spare text fields
                item.setText(action.word() + "   " + shown(action.stroke()));
            }
            item.putClientProperty("fringekeep.action", action);
            item.addActionListener(event -> desk.doIt(action));
            menu.add(item);
        }
        return !desk.stages().in(which).isEmpty();
    }

    /** {@code ctrl shift T} as {@code Ctrl Shift T}. */
    static String shown(String stroke) {
        StringBuilder words = new StringBuilder();
        for (String word : stroke.split(" ")) {
            words.append(words.isEmpty() ? "" : " ")
                    .append(Character.toUpperCase(word.charAt(0)))
                    .append(word.substring(1).toLowerCase(Locale.ROOT));
        }
        return words.toString();
    }

    /** Greys what cannot be done with what is selected whenever the menu opens. */
    private static void refreshing(JMenu menu, Desk desk) {
        menu.addMenuListener(new MenuListener() {
            @Override
            public void menuSelected(MenuEvent event) {
                DeskSelection now = desk.selection();
                for (Component item : menu.getMenuComponents()) {
                    if (item instanceof JMenuItem entry
                            && entry.getClientProperty("fringekeep.action") instanceof DeskAction action) {
                        entry.setEnabled(action.applies().test(now));
                    }
                }
            }

            @Override
            public void menuDeselected(MenuEvent event) {
                // nothing to put back
            }

            @Override
            public void menuCanceled(MenuEvent event) {
                // nothing to put back
            }
        });
    }

    private static void item(JMenu menu, String key, String stroke, Runnable work) {
        JMenuItem item = new JMenuItem(TEXTS.of(key));
        item.setName(key);
        if (!stroke.isEmpty()) {
            item.setAccelerator(KeyStroke.getKeyStroke(stroke));
        }
        item.addActionListener(event -> work.run());
        menu.add(item);
    }
}
