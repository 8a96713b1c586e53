package fringekeep.uitest;

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
    private static final long PATIENCE_SECONDS = 60;

    private final Robot robot;
    private final Optional<Path> pictures = Optional.ofNullable(System.getProperty("fringekeep.uitest.pictures"))
            .map(Path::of);

    Person() {
        try {
            robot = new Robot();
        } catch (AWTException e) {
            throw new IllegalStateException("no display to press keys on", e);
        }
        robot.setAutoDelay(20);
        robot.setAutoWaitForIdle(true);
    }

    Frame frame() {
        return WindowManager.getDefault().getMainWindow();
    }

    void press(int key) {
        robot.keyPress(key);
        robot.keyRelease(key);
    }

    void press(int modifier, int key) {
        robot.keyPress(modifier);
        press(key);
        robot.keyRelease(modifier);
    }

    void type(String words) {
        for (int i = 0; i < words.length(); i++) {
            press(KeyEvent.getExtendedKeyCodeForChar(words.charAt(i)));
        }
    }

    /** Asks something on the window thread. */
    <T> T see(Supplier<T> question) {
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
        long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(PATIENCE_SECONDS);
        while (!see(seen)) {
            if (System.nanoTime() > end) {
                picture("waited-for");
                throw new AssertionError("not seen within " + PATIENCE_SECONDS + " s: " + what);
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

    /** Paints the window into a file beside the results. */
    void picture(String name) {
        pictures.ifPresent(folder -> see(() -> paint(frame(), folder.resolve(name + ".png"))));
    }

    private static Boolean paint(Component component, Path file) {
        BufferedImage image =
                new BufferedImage(component.getWidth(), component.getHeight(), BufferedImage.TYPE_INT_RGB);
        component.paint(image.getGraphics());
        try {
            Files.createDirectories(file.getParent());
            ImageIO.write(image, "png", file.toFile());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return true;
    }
}
