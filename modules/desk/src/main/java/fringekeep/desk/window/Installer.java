package fringekeep.desk.window;

import com.formdev.flatlaf.FlatLaf;
import fringekeep.desk.look.Type;
import java.io.File;
import java.lang.System.Logger;
import java.lang.System.Logger.Level;
import javax.swing.JDialog;
import javax.swing.JFrame;
import javax.swing.SwingUtilities;
import org.openide.modules.ModuleInstall;
import org.openide.modules.Places;
import org.openide.windows.WindowManager;

/** What must be there before the window is: colours, fonts, the handler of the unforeseen. */
@SuppressWarnings("serial")
public final class Installer extends ModuleInstall {
    private static final Logger LOG = System.getLogger(Installer.class.getName());

    /** For the platform. */
    public Installer() {}

    @Override
    public void validate() {
        if (!java.awt.GraphicsEnvironment.isHeadless()) {
            Type.register();
            JFrame.setDefaultLookAndFeelDecorated(true);
            JDialog.setDefaultLookAndFeelDecorated(true);
        }
        FlatLaf.registerCustomDefaultsSource("fringekeep.desk.look", Installer.class.getClassLoader());
    }

    @Override
    public void restored() {
        if (java.awt.GraphicsEnvironment.isHeadless()) {
            return;
        }
        Thread.setDefaultUncaughtExceptionHandler((thread, fault) -> {
            LOG.log(Level.ERROR, "unforeseen in " + thread.getName(), fault);
            SwingUtilities.invokeLater(() -> Program.only().crashed(fault, log()));
        });
        WindowManager.getDefault().invokeWhenUIReady(() -> {
            Program.only().rememberedTheme();
            Program.only().started();
        });
    }

    private static String log() {
        return new File(Places.getUserDirectory(), "var/log/messages.log").getPath();
    }

    @Override
    public boolean closing() {
        Program.only().desk().closeForGood();
        return true;
    }
}
