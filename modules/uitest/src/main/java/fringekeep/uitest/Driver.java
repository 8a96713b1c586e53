package fringekeep.uitest;

import java.io.IOException;
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

    private static void run(Path out) {
        StringBuilder lines = new StringBuilder();
        LauncherDiscoveryRequest request = LauncherDiscoveryRequestBuilder.request()
                .selectors(DiscoverySelectors.selectClass(WalkToRawCounts.class))
                .build();
        LauncherFactory.create().execute(request, new TestExecutionListener() {
            @Override
            public void executionFinished(TestIdentifier test, TestExecutionResult result) {
                if (test.isTest() || result.getStatus() != TestExecutionResult.Status.SUCCESSFUL) {
                    lines.append(line(test, result));
                }
            }
        });
        lines.append("BUSY\t").append(BusyWatch.report()).append('\n');
        try {
            Files.writeString(out, lines.toString(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new IllegalStateException("the results cannot be written", e);
        } finally {
            LifecycleManager.getDefault().exit();
        }
    }

    private static String line(TestIdentifier test, TestExecutionResult result) {
        String fault = result.getThrowable()
                .map(thrown -> thrown + " at "
                        + List.of(thrown.getStackTrace()).stream().limit(8).toList())
                .orElse("");
        return result.getStatus() + "\t" + test.getDisplayName() + "\t" + fault.replaceAll("\\s+", " ") + "\n";
    }
}
