package fringekeep.property.ui;

import java.awt.Component;
import java.awt.Container;
import java.awt.image.BufferedImage;

/** Lays a component out without a display and paints it. */
final class Painting {
    private Painting() {}

    static BufferedImage of(Component component, int width, int height) {
        component.setSize(width, height);
        for (int i = 0; i < 4; i++) {
            lay(component);
        }
        BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        component.paint(image.getGraphics());
        return image;
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
