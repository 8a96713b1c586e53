package fringekeep.uitest;

import fringekeep.desk.window.Desk;
import java.awt.AWTException;
import java.awt.Component;
import java.awt.Frame;
import java.awt.Rectangle;
import java.awt.Robot;
import java.awt.event.KeyEvent;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.lang.reflect.InvocationTargetException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Supplier;
import javax.imageio.ImageIO;
import javax.swing.SwingUtilities;
import org.openide.windows.WindowManager;

/** A person at the window: presses keys, looks, waits until something is seen. */
final class Person {
    private static final long PATIENCE_SECONDS = Long.getLong("fringekeep.uitest.patience", 60);

    private final Robot robot;
    private final Optional<Path> pictures = Optional.ofNullable(System.getProperty("fringekeep.uitest.pictures"))
            .map(Path::of);

    Person() {
        try {
            robot = new Robot();
        } catch (AWTException e) {
            throw new IllegalStateException("no display to press keys on", e);
        }
        robot.setAutoDelay(15);
    }

    Frame frame() {
        return WindowManager.getDefault().getMainWindow();
    }

    void press(int key) {
        robot.keyPress(key);
        robot.keyRelease(key);
        settle();
    }

    /**
     * Lets the window take in what was pressed. The robot's own waiting for an idle window never ends while a text cursor
     * blinks.
     */
    private void settle() {
        for (int i = 0; i < 2; i++) {
            robot.delay(15);
            see(() -> true);
        }
    }

    void press(int modifier, int key) {
        robot.keyPress(modifier);
        press(key);
        robot.keyRelease(modifier);
    }

    void press(int first, int second, int key) {
        robot.keyPress(first);
        press(second, key);
        robot.keyRelease(first);
    }

    /** Clicks the middle of a component. */
    void click(Component component) {
        java.awt.Point place = see(() -> {
            java.awt.Point corner = component.getLocationOnScreen();
            return new java.awt.Point(corner.x + component.getWidth() / 2, corner.y + component.getHeight() / 2);
        });
        click(place.x, place.y);
    }

    /** Clicks a place within a component. */
    void click(Component component, int x, int y) {
        java.awt.Point corner = see(component::getLocationOnScreen);
        click(corner.x + x, corner.y + y);
    }

    private void click(int x, int y) {
        robot.mouseMove(x, y);
        robot.mousePress(java.awt.event.InputEvent.BUTTON1_DOWN_MASK);
        robot.mouseRelease(java.awt.event.InputEvent.BUTTON1_DOWN_MASK);
        settle();
    }

    /** Drags from one place within a component to another. */
    void drag(Component component, int fromX, int fromY, int toX, int toY) {
        java.awt.Point corner = see(component::getLocationOnScreen);
        robot.mouseMove(corner.x + fromX, corner.y + fromY);
        robot.mousePress(java.awt.event.InputEvent.BUTTON1_DOWN_MASK);
        for (int i = 1; i <= 8; i++) {
            robot.mouseMove(corner.x + fromX + (toX - fromX) * i / 8, corner.y + fromY + (toY - fromY) * i / 8);
        }
        robot.mouseRelease(java.awt.event.InputEvent.BUTTON1_DOWN_MASK);
        settle();
    }

    /** The component of that name in any window that is shown, if there is one in sight. */
    Optional<Component> find(String name) {
        return see(() -> {
            for (java.awt.Window window : java.awt.Window.getWindows()) {
                if (window.isShowing()) {
                    Optional<Component> found = find(window, name);
                    if (found.isPresent()) {
                        return found;
                    }
                }
            }
            return Optional.<Component>empty();
        });
    }

    private static Optional<Component> find(Component at, String name) {
        if (name.equals(at.getName()) && at.isShowing()) {
            return Optional.of(at);
        }
        if (at instanceof java.awt.Container container) {
            for (Component child : container.getComponents()) {
                Optional<Component> found = find(child, name);
                if (found.isPresent()) {
                    return found;
                }
            }
        }
        return Optional.empty();
    }

    /** The component of that name, once it is in sight. */
    Component named(String name) {
        waitFor(name, () -> find(name).isPresent());
        return find(name).orElseThrow(() -> new AssertionError(name + " was seen and is gone"));
    }

    /** Writes words over whatever stands in the field with the focus, as pasted from elsewhere. */
    void write(String words) {
        java.awt.Toolkit.getDefaultToolkit()
                .getSystemClipboard()
                .setContents(new java.awt.datatransfer.StringSelection(words), null);
        press(KeyEvent.VK_CONTROL, KeyEvent.VK_A);
        press(KeyEvent.VK_CONTROL, KeyEvent.VK_V);
    }

    void type(String words) {
        for (int i = 0; i < words.length(); i++) {
            press(KeyEvent.getExtendedKeyCodeForChar(words.charAt(i)));
        }
    }

    /** Chooses an entry of a menu by its name. */
    void menu(String name) {
        see(() -> {
            javax.swing.JMenuBar bar = ((javax.swing.JFrame) frame()).getJMenuBar();
            for (int i = 0; i < bar.getMenuCount(); i++) {
                for (Component item : bar.getMenu(i).getMenuComponents()) {
                    if (name.equals(item.getName()) && item instanceof javax.swing.JMenuItem entry) {
                        SwingUtilities.invokeLater(entry::doClick);
                        return true;
                    }
                }
            }
            throw new AssertionError("no entry " + name + " in any menu");
        });
    }

    /** Answers who is at the desk when the program asks. */
    void sitDown() {
        Desk desk = see(() -> fringekeep.desk.window.Program.only().desk());
        waitFor("the persons of the archive", desk::quiet);
        if (see(() -> desk.hand().personName().isEmpty())) {
            if (find("person").isEmpty()) {
                menu("menu.archive.person");
            }
            named("person");
            write("A. Tester");
            press(KeyEvent.VK_ENTER);
        }
    }

    /** Asks something on the window thread. */
    <T> T see(Supplier<T> question) {
        if (SwingUtilities.isEventDispatchThread()) {
            return question.get();
        }
        AtomicReference<T> answer = new AtomicReference<>();
        try {
            SwingUtilities.invokeAndWait(() -> answer.set(question.get()));
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("interrupted", e);
        } catch (InvocationTargetException e) {
            throw new IllegalStateException(e.getCause());
        }
        return Objects.requireNonNull(answer.get());
    }

    /** Waits until something is seen. */
    void waitFor(String what, Supplier<Boolean> seen) {
        waitFor(what, seen, PATIENCE_SECONDS);
    }

    /** Waits for what takes its time, such as recomputing all that stands behind a figure. */
    void waitForLong(String what, Supplier<Boolean> seen) {
        waitFor(what, seen, 4 * PATIENCE_SECONDS);
    }

    private void waitFor(String what, Supplier<Boolean> seen, long patience) {
        long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(patience);
        while (!see(seen)) {
            if (System.nanoTime() > end) {
                picture("waited-for-" + what.replaceAll("[^A-Za-z0-9]+", "-"));
                throw new AssertionError("not seen within " + patience + " s: " + what);
            }
            pause();
        }
    }

    private static void pause() {
        try {
            if (new CountDownLatch(1).await(50, TimeUnit.MILLISECONDS)) {
                throw new AssertionError("nobody counts down");
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("interrupted", e);
        }
    }

    /** Gives the window a size and waits until it has it. */
    void resize(int width, int height) {
        see(() -> {
            frame().setExtendedState(Frame.NORMAL);
            frame().setBounds(new Rectangle(0, 0, width, height));
            frame().validate();
            return true;
        });
        waitFor("window of " + width, () -> frame().getWidth() == width);
    }

    /** Paints the window into a file beside the results, at the scale of the screen. */
    void picture(String name) {
        pictures.ifPresent(folder -> see(() -> {
            double scale = scale();
            String file = name + (scale > 1 ? "-at-" + Math.round(scale * 100) : "") + ".png";
            return write(paint(frame(), scale), folder.resolve(file));
        }));
    }

    private double scale() {
        return frame().getGraphicsConfiguration().getDefaultTransform().getScaleX();
    }

    /** How many colours the window shows. */
    int colours() {
        return see(() -> {
            BufferedImage image = paint(frame(), 1);
            java.util.Set<Integer> colours = new java.util.HashSet<>();
            for (int y = 0; y < image.getHeight(); y += 2) {
                for (int x = 0; x < image.getWidth(); x++) {
                    colours.add(image.getRGB(x, y));
                }
            }
            return colours.size();
        });
    }

    private static BufferedImage paint(Component component, double scale) {
        BufferedImage image = new BufferedImage(
                (int) (component.getWidth() * scale),
                (int) (component.getHeight() * scale),
                BufferedImage.TYPE_INT_RGB);
        java.awt.Graphics2D graphics = image.createGraphics();
        graphics.scale(scale, scale);
        component.paint(graphics);
        graphics.dispose();
        return image;
    }

    private static Boolean write(BufferedImage image, Path file) {
        try {
            Files.createDirectories(file.getParent());
            ImageIO.write(image, "png", file.toFile());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return true;
    }
}
