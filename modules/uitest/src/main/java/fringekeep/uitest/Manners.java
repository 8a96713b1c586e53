package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.Component;
import java.awt.Container;
import java.util.ArrayList;
import java.util.List;
import javax.accessibility.Accessible;
import javax.swing.AbstractButton;
import javax.swing.JFrame;
import javax.swing.JMenu;
import javax.swing.JMenuBar;
import org.junit.jupiter.api.Test;
import org.openide.filesystems.FileObject;
import org.openide.filesystems.FileUtil;
import org.openide.windows.Mode;
import org.openide.windows.TopComponent;
import org.openide.windows.WindowManager;

/** Nothing of the platform that the program does not use is in sight, and everything can be read out. */
class Manners {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    @Test
    void theMenusAreTheProgramsOwn() {
        List<String> menus = person.see(() -> {
            JMenuBar bar = ((JFrame) person.frame()).getJMenuBar();
            List<String> names = new ArrayList<>();
            for (int i = 0; i < bar.getMenuCount(); i++) {
                JMenu menu = bar.getMenu(i);
                if (menu != null && menu.isVisible()) {
                    names.add(menu.getText());
                }
            }
            return names;
        });

        assertThat(menus)
                .isSubsetOf("Archive", "Day", "Record", "Fit", "Lineage", "Bundle", "Help")
                .contains("Archive", "Record", "Lineage", "Help");
    }

    @Test
    void oneComponentFillsTheFrameAndNoToolBarIsShown() {
        List<String> windows = person.see(() -> {
            List<String> open = new ArrayList<>();
            for (Mode mode : WindowManager.getDefault().getModes()) {
                for (TopComponent one : WindowManager.getDefault().getOpenedTopComponents(mode)) {
                    open.add(one.getClass().getSimpleName());
                }
            }
            return open;
        });

        assertThat(windows).containsExactly("DeskComponent");
        assertThat(person.see(() -> shown(person.frame(), javax.swing.JToolBar.class)))
                .isEmpty();
    }

    @Test
    void thePlatformsShortcutsAreGone() {
        FileObject shortcuts = FileUtil.getConfigFile("Shortcuts");
        List<String> left = new ArrayList<>();
        if (shortcuts != null) {
            for (FileObject one : shortcuts.getChildren()) {
                left.add(one.getNameExt());
            }
        }

        assertThat(left).as("shortcuts of the platform that still act").isEmpty();
    }

    @Test
    void everythingThatTakesTheFocusCanBeReadOut() {
        List<String> mute = person.see(() -> {
            List<String> without = new ArrayList<>();
            mute(person.frame(), without);
            return without;
        });

        assertThat(mute).isEmpty();
        assertThat(person.see(desk::quiet)).isTrue();
    }

    private static void mute(Component at, List<String> without) {
        boolean spoken = !(at instanceof Accessible accessible)
                || !at.isFocusable()
                || accessible.getAccessibleContext() == null
                || accessible.getAccessibleContext().getAccessibleName() != null
                || at instanceof AbstractButton button && !button.getText().isEmpty();
        boolean ours = at.getClass().getName().startsWith("fringekeep.");
        if (ours && at.isShowing() && !spoken) {
            without.add(at.getClass().getName());
        }
        if (at instanceof Container container) {
            for (Component child : container.getComponents()) {
                mute(child, without);
            }
        }
    }

    private static <T extends Component> List<String> shown(Component at, Class<T> type) {
        List<String> found = new ArrayList<>();
        if (type.isInstance(at) && at.isShowing() && at.getWidth() > 0 && at.getHeight() > 0) {
            found.add(at.getClass().getName());
        }
        if (at instanceof Container container) {
            for (Component child : container.getComponents()) {
                found.addAll(shown(child, type));
            }
        }
        return found;
    }
}
