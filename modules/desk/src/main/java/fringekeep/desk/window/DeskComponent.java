package fringekeep.desk.window;

import java.awt.BorderLayout;
import java.awt.datatransfer.DataFlavor;
import java.awt.datatransfer.UnsupportedFlavorException;
import java.io.File;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import javax.swing.TransferHandler;
import org.openide.windows.TopComponent;

/** Fills the frame with the desk. */
@TopComponent.Description(preferredID = "desk", persistenceType = TopComponent.PERSISTENCE_ALWAYS)
@TopComponent.Registration(mode = "editor", openAtStartup = true)
@SuppressWarnings("serial")
public final class DeskComponent extends TopComponent {
    /** For the platform. */
    public DeskComponent() {
        setLayout(new BorderLayout());
        setName("Fringekeep");
        putClientProperty(PROP_CLOSING_DISABLED, true);
        putClientProperty(PROP_DRAGGING_DISABLED, true);
        putClientProperty(PROP_UNDOCKING_DISABLED, true);
        putClientProperty(PROP_SLIDING_DISABLED, true);
        putClientProperty(PROP_MAXIMIZATION_DISABLED, true);
        add(Program.only().desk(), BorderLayout.CENTER);
        setTransferHandler(new FolderDrop());
    }

    @Override
    public boolean requestFocusInWindow() {
        Program.only().desk().focusRows();
        return true;
    }

    @Override
    protected String preferredID() {
        return "desk";
    }

    /** An archive's folder is opened by dropping it. */
    private static final class FolderDrop extends TransferHandler {
        @Override
        public boolean canImport(TransferSupport support) {
            return support.isDataFlavorSupported(DataFlavor.javaFileListFlavor);
        }

        @Override
        public boolean importData(TransferSupport support) {
            try {
                Object files = support.getTransferable().getTransferData(DataFlavor.javaFileListFlavor);
                List<Path> paths = files instanceof List<?> list
                        ? list.stream()
                                .filter(File.class::isInstance)
                                .map(File.class::cast)
                                .map(File::toPath)
                                .toList()
                        : List.of();
                return !paths.isEmpty() && Program.only().dropped(paths);
            } catch (UnsupportedFlavorException | IOException e) {
                throw new IllegalStateException("the dropped files cannot be read", e);
            }
        }
    }
}
