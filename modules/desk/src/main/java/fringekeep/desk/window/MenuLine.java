package fringekeep.desk.window;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Texts;
import java.awt.Dimension;
import java.util.List;
import javax.swing.JMenu;
import javax.swing.JMenuBar;
import javax.swing.JMenuItem;
import javax.swing.KeyStroke;

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
        JMenu archive = menu(bar, "menu.archive", 'A');
        item(archive, "menu.archive.open", "ctrl O", program::chooseArchive);
        item(archive, "menu.archive.found", "", program::foundArchive);
        item(archive, "menu.archive.close", "", desk::closeArchive);
        archive.addSeparator();
        item(archive, "menu.archive.dark", "ctrl L", program::switchTheme);
        archive.addSeparator();
        item(archive, "menu.archive.quit", "ctrl Q", program::quit);
        JMenu record = menu(bar, "menu.record", 'R');
        item(record, "menu.record.find", "ctrl F", desk::focusFind);
        record.addSeparator();
        List<fringekeep.desk.session.Stops.Stop> stops =
                fringekeep.desk.session.Stops.shipped().all();
        for (int i = 0; i < stops.size(); i++) {
            int stop = i;
            JMenuItem item = new JMenuItem(stops.get(i).label());
            item.addActionListener(event -> desk.openStop(stop));
            record.add(item);
        }
        JMenu lineage = menu(bar, "menu.lineage", 'L');
        item(lineage, "menu.lineage.trace", "", desk::trace);
        item(lineage, "menu.lineage.back", "", desk::back);
        JMenu help = menu(bar, "menu.help", 'H');
        item(help, "menu.help.keys", "F1", desk::keys);
        item(help, "menu.help.about", "", () -> about(program));
        return bar;
    }

    private static void about(Program program) {
        program.say(
                TEXTS.of("menu.help.about"), List.of(new Problem("desk.about", TEXTS.of("about", "1.0.0"), "", "")));
    }

    private static JMenu menu(JMenuBar bar, String key, char mnemonic) {
        JMenu menu = new JMenu(TEXTS.of(key));
        menu.setMnemonic(mnemonic);
        bar.add(menu);
        return menu;
    }

    private static void item(JMenu menu, String key, String stroke, Runnable work) {
        JMenuItem item = new JMenuItem(TEXTS.of(key));
        if (!stroke.isEmpty()) {
            item.setAccelerator(KeyStroke.getKeyStroke(stroke));
        }
        item.addActionListener(event -> work.run());
        menu.add(item);
    }
}
