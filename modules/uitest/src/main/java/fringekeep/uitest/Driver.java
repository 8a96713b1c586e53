package fringekeep.uitest;

import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.platform.engine.TestExecutionResult;
import org.junit.platform.engine.discovery.DiscoverySelectors;
import org.junit.platform.launcher.LauncherDiscoveryRequest;
import org.junit.platform.launcher.TestExecutionListener;
import org.junit.platform.launcher.TestIdentifier;
import org.junit.platform.launcher.core.LauncherDiscoveryRequestBuilder;
import org.junit.platform.launcher.core.LauncherFactory;
import org.openide.LifecycleManager;
import org.openide.modules.ModuleInstall;
import org.openide.windows.WindowManager;

/** Runs the tests once the window is up, writes one line per test, and ends the application. */
@SuppressWarnings("serial")
public final class Driver extends ModuleInstall {
    private static final long MOST_MILLISECONDS = 250;

    /** In the order in which a person would do it; one line each. */
    private static final List<Class<?>> TESTS = List.of(
            WalkToRawCounts.class,
            Screens.class,
            FormsByHand.class,
            AuditByHand.class,
            FitByHand.class,
            PropertyByHand.class,
            FigureByHand.class,
            TakeInByHand.class,
            BundleByHand.class,
            ListsAndViews.class,
            Manners.class,
            FirstStart.class);

    /** For the platform. */
    public Driver() {}

    @Override
    public void restored() {
        Optional.ofNullable(System.getProperty("fringekeep.uitest.out"))
                .map(Path::of)
                .ifPresent(out -> WindowManager.getDefault().invokeWhenUIReady(() -> start(out)));
    }

    private static void start(Path out) {
        BusyWatch.install();
        Thread thread = new Thread(() -> run(out), "tests inside the application");
        thread.setContextClassLoader(Driver.class.getClassLoader());
        thread.start();
    }

    /** All tests, or the one class that is asked for. */
    private static List<Class<?>> chosen() {
        String only = System.getProperty("fringekeep.uitest.only", "");
        return TESTS.stream()
                .filter(test -> only.isEmpty() || test.getSimpleName().equals(only))
                .toList();
    }

    private static void run(Path out) {
        StringBuilder lines = new StringBuilder();
        Person person = new Person();
        Desk desk = person.see(() -> Program.only().desk());
        person.waitForLong("the archive", () -> desk.recordPane().page().isPresent() && desk.quiet());
        LauncherDiscoveryRequest request = LauncherDiscoveryRequestBuilder.request()
                .selectors(
                        chosen().stream().map(DiscoverySelectors::selectClass).toList())
                .build();
        LauncherFactory.create().execute(request, new TestExecutionListener() {
            @Override
            public void executionStarted(TestIdentifier test) {
                if (test.isTest()) {
                    BusyWatch.reset();
                }
            }

            @Override
            public void executionFinished(TestIdentifier test, TestExecutionResult result) {
                if (test.isTest() || result.getStatus() != TestExecutionResult.Status.SUCCESSFUL) {
                    lines.append(line(test, result));
                }
                if (test.isTest()) {
                    lines.append(busy(test));
                    write(out, lines);
                }
            }
        });
        try {
            write(out, lines);
        } finally {
            LifecycleManager.getDefault().exit();
        }
    }

    /** After each test, so that what passed is known even of a run that is cut off. */
    private static void write(Path out, StringBuilder lines) {
        try {
            Files.writeString(out, lines.toString(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException("the results cannot be written", e);
        }
    }

    /** How long the window thread was taken up at most; too long is a failure of its own. */
    private static String busy(TestIdentifier test) {
        boolean longer = BusyWatch.worstMilliseconds() > MOST_MILLISECONDS;
        return (longer ? "BLOCKED" : "BUSY") + "\twindow thread in " + test.getDisplayName() + "\t"
                + BusyWatch.report().replaceAll("\\s+", " ") + "\n";
    }

    private static String line(TestIdentifier test, TestExecutionResult result) {
        String fault = result.getThrowable()
                .map(thrown -> thrown + " at "
                        + List.of(thrown.getStackTrace()).stream().limit(8).toList())
                .orElse("");
        return result.getStatus() + "\t" + test.getDisplayName() + "\t" + fault.replaceAll("\\s+", " ") + "\n";
    }
}
