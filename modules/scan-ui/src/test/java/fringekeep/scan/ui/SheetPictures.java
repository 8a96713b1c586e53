package fringekeep.scan.ui;

import com.formdev.flatlaf.FlatDarkLaf;
import com.formdev.flatlaf.FlatLaf;
import com.formdev.flatlaf.FlatLightLaf;
import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.record.Hash;
import java.awt.Component;
import java.awt.Container;
import java.awt.image.BufferedImage;
import java.io.File;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import javax.imageio.ImageIO;

/**
 * Paints the sheets into files (archive, folder with raw files, folder for pictures); not part of the test run.
 */
final class SheetPictures {
    private SheetPictures() {}

    public static void main(String[] args) throws Exception {
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
                List<Path> files = new ArrayList<>();
                try (Stream<Path> all = Files.walk(Path.of(args[1]))) {
                    all.filter(Files::isRegularFile).sorted().forEach(files::add);
                }
                TestHand hand = new TestHand(archive);
                TakeInSheet empty = new TakeInSheet(hand, Runnable::run, scans -> {});
                paint(empty.component(), pictures, "take-in-empty-" + tone);
                TakeInSheet full = new TakeInSheet(hand, Runnable::run, scans -> {});
                full.add(files);
                full.pane().table().setRowSelectionInterval(3, 3);
                paint(full.component(), pictures, "take-in-full-" + tone);
                int bad = full.model().lines().stream()
                        .map(FileLine::stand)
                        .toList()
                        .indexOf(FileLine.Stand.REFUSED);
                full.pane().table().setRowSelectionInterval(bad, bad);
                paint(full.component(), pictures, "take-in-refused-" + tone);
                full.pane().summary(full.model(), true, full.model().ready().size() + 7, "");
                paint(full.component(), pictures, "take-in-slow-" + tone);
                List<Hash> scans = archive.records("scan", 1, 10_000);
                PlaceSheet place = new PlaceSheet(hand, scans.subList(10, 19));
                paint(place.component(), pictures, "place-known-" + tone);
                place.pane().choosePurpose(fringekeep.scan.PlacementFacet.Purpose.REFERENCE);
                paint(place.component(), pictures, "place-corrects-" + tone);
                List<Hash> unplaced = new ArrayList<>(UnplacedScans.of(hand.register()));
                if (!unplaced.isEmpty()) {
                    paint(new PlaceSheet(hand, unplaced).component(), pictures, "place-unplaced-" + tone);
                }
            }
        }
    }

    private static void paint(Component component, Path folder, String name) throws Exception {
        for (int[] size : new int[][] {{1280, 656}, {2560, 1280}}) {
            component.setSize(size[0], size[1]);
            for (int i = 0; i < 4; i++) {
                lay(component);
            }
            BufferedImage image = new BufferedImage(size[0], size[1], BufferedImage.TYPE_INT_RGB);
            component.paint(image.getGraphics());
            File file = folder.resolve(name + "-" + size[0] + ".png").toFile();
            ImageIO.write(image, "png", file);
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
