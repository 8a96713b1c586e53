package fringekeep.bundle.ui;

import com.formdev.flatlaf.FlatDarkLaf;
import com.formdev.flatlaf.FlatLaf;
import com.formdev.flatlaf.FlatLightLaf;
import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.ui.BundleDraft.Writer;
import java.awt.Component;
import java.awt.Container;
import java.awt.image.BufferedImage;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import javax.imageio.ImageIO;

/** Paints the sheets into files (archive, folder for exports, folder for pictures); not part of the test run. */
final class SheetPictures {
    private SheetPictures() {}

    public static void main(String[] args) throws Exception {
        Path into = Files.createDirectories(Path.of(args[1]));
        Path pictures = Files.createDirectories(Path.of(args[2]));
        Kinds kinds = Kinds.announced(SheetPictures.class.getClassLoader());
        try (Archive archive = Archives.open(Path.of(args[0]), kinds, Circumstances.real("1.0.0"))) {
            FlatLaf.registerCustomDefaultsSource("fringekeep.desk.look", SheetPictures.class.getClassLoader());
            for (boolean dark : new boolean[] {false, true}) {
                boolean set = dark ? FlatDarkLaf.setup() : FlatLightLaf.setup();
                if (!set) {
                    throw new IllegalStateException("no look");
                }
                String tone = dark ? "dark" : "light";
                TestHand hand = new TestHand(archive);
                List<Hash> figures = archive.records("figure", 1, 1);
                archive.drafts().remove(ExportSheet.DRAFT);
                ExportSheet empty = new ExportSheet(hand, Runnable::run, figures);
                paint(empty.component(), pictures, "export-empty-" + tone);
                ExportSheet sheet = new ExportSheet(hand, Runnable::run, figures);
                sheet.pane()
                        .fields()
                        .fill(new BundleDraft(
                                "figure-1-" + tone,
                                "Polarizability of three invented molecules",
                                "Counts, fits and results behind figure 1 of the demo lab. All data are invented.",
                                "2031-11-02",
                                "CC-BY-4.0",
                                "demo lab",
                                "invented data, polarizability",
                                List.of(
                                        new Writer("Ottla Vireen", "0000-0002-1825-0097", "demo lab"),
                                        new Writer("Sennet Oduya", "", "demo lab")),
                                into.toString(),
                                false));
                sheet.checks().progress("records", 110, 343);
                sheet.pane().checks(sheet.checks().lines());
                sheet.pane().running(true, "figure-1");
                paint(sheet.component(), pictures, "export-slow-" + tone);
                sheet.pane().running(false, "figure-1");
                sheet.press();
                paint(sheet.component(), pictures, "export-done-" + tone);
                ExportSheet again = new ExportSheet(hand, Runnable::run, figures);
                again.press();
                paint(again.component(), pictures, "export-failed-" + tone);
                CheckSheet check = new CheckSheet(hand, Runnable::run);
                paint(check.component(), pictures, "check-empty-" + tone);
                Path bundle = into.resolve("figure-1-" + tone);
                check.check(bundle);
                paint(check.component(), pictures, "check-holds-" + tone);
                try (Stream<Path> all = Files.walk(bundle.resolve("data/raw"))) {
                    for (Path raw :
                            all.filter(Files::isRegularFile).sorted().limit(5).toList()) {
                        Files.writeString(raw, "changed");
                    }
                }
                check.check(bundle);
                paint(check.component(), pictures, "check-fails-" + tone);
            }
        }
    }

    private static void paint(Component component, Path folder, String name) throws Exception {
        for (int[] size : new int[][] {{1280, 656}, {2560, 1280}}) {
            component.setSize(size[0], size[1]);
            for (int i = 0; i < 5; i++) {
                lay(component);
            }
            BufferedImage image = new BufferedImage(size[0], size[1], BufferedImage.TYPE_INT_RGB);
            component.paint(image.getGraphics());
            ImageIO.write(
                    image, "png", folder.resolve(name + "-" + size[0] + ".png").toFile());
        }
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
