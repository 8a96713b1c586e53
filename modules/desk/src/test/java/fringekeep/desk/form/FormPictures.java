package fringekeep.desk.form;

import com.formdev.flatlaf.FlatDarkLaf;
import com.formdev.flatlaf.FlatLaf;
import com.formdev.flatlaf.FlatLightLaf;
import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.json.JsonObject;
import java.awt.Component;
import java.awt.Container;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.nio.file.Path;
import javax.imageio.ImageIO;

/** Paints forms over a copy of the invented laboratory, to be looked at: folder of the copy, folder of the pictures. */
final class FormPictures {
    private FormPictures() {}

    public static void main(String[] arguments) throws Exception {
        Path pictures = Path.of(arguments[1]);
        FlatLaf.registerCustomDefaultsSource("fringekeep.desk.look", FormPictures.class.getClassLoader());
        try (Archive archive = Archives.open(Path.of(arguments[0]), LabDocuments.KINDS, Circumstances.real("test"))) {
            for (String theme : new String[] {"light", "dark"}) {
                if (theme.equals("dark")) {
                    FlatDarkLaf.setup();
                } else {
                    FlatLightLaf.setup();
                }
                paint(archive, pictures, theme);
            }
        }
    }

    private static void paint(Archive archive, Path pictures, String theme) throws Exception {
        BenchHand hand = new BenchHand(archive);
        Forms.comeAfter(hand, archive.find("setup 1"));
        FormSheet form = hand.form();
        form.model().type("/from", "2031-10-24 03:34");
        form.model().type("/content/separations/1", "10,50(5) mm");
        form.model().type("/content/beam/height", "180(10) um");
        form.way(FormState.Way.AFTER);
        form.check();
        form.table().refresh();
        form.table().go("/content/separations/1");
        for (int width : new int[] {1280, 2560}) {
            write(
                    form.component(),
                    width,
                    width == 1280 ? 658 : 1290,
                    pictures.resolve("setup-" + theme + "-" + width + ".png"));
        }
        form.way(FormState.Way.CORRECTS);
        form.pane().caution().tick(true);
        form.readCautions();
        form.model().toggle("/content/gratings/1");
        form.model().type("/content/gratings/1/laser/power", "7 kg");
        form.table().refresh();
        form.table().go("/content/gratings/1/sort");
        form.table().ask();
        write(form.component(), 1280, 658, pictures.resolve("correct-" + theme + ".png"));
        form.discard();
        for (String kind : new String[] {
            "compound",
            "batch",
            "calibration",
            "source-run",
            "velocity",
            "series",
            "quoted",
            "judgement",
            "note",
            "figure",
            "reading-profile",
            "monitor-log",
            "placement",
            "selection",
            "statement"
        }) {
            Forms.open(hand, kind, JsonObject.EMPTY);
            hand.form().focusFirst();
            write(hand.form().component(), 1280, 658, pictures.resolve(kind + "-" + theme + ".png"));
        }
        Forms.open(hand, "batch", JsonObject.EMPTY);
        hand.form().record();
        write(hand.form().component(), 1280, 658, pictures.resolve("missing-" + theme + ".png"));
        KindChoice.show(hand);
        write(hand.sheet.orElseThrow().component(), 1280, 658, pictures.resolve("kinds-" + theme + ".png"));
    }

    private static void write(Component component, int width, int height, Path file) throws Exception {
        component.setSize(width, height);
        for (int i = 0; i < 4; i++) {
            lay(component);
        }
        BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        component.paint(graphics);
        graphics.dispose();
        ImageIO.write(image, "png", file.toFile());
    }

    private static void lay(Component component) {
        synchronized (component.getTreeLock()) {
            component.doLayout();
            if (component instanceof Container container) {
                for (Component child : container.getComponents()) {
                    lay(child);
                }
            }
        }
    }
}
