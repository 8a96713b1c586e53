package fringekeep.desk.window;

import java.nio.file.Path;
import java.util.Map;
import java.util.Set;
import javax.swing.SwingUtilities;
import org.netbeans.spi.sendopts.Env;
import org.netbeans.spi.sendopts.Option;
import org.netbeans.spi.sendopts.OptionProcessor;
import org.openide.util.lookup.ServiceProvider;

/** {@code --archive FOLDER}: opens an archive, also in a program that runs already. */
@ServiceProvider(service = OptionProcessor.class)
public final class OpenOption extends OptionProcessor {
    private static final Option ARCHIVE = Option.requiredArgument(Option.NO_SHORT_NAME, "archive");

    /** For the platform. */
    public OpenOption() {}

    @Override
    protected Set<Option> getOptions() {
        return Set.of(ARCHIVE);
    }

    @Override
    protected void process(Env env, Map<Option, String[]> values) {
        String[] folders = values.get(ARCHIVE);
        if (folders != null && folders.length == 1) {
            Path folder = env.getCurrentDirectory().toPath().resolve(folders[0]);
            SwingUtilities.invokeLater(() -> Program.only().openArchive(folder));
        }
    }
}
