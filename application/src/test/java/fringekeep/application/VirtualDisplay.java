package fringekeep.application;

import java.io.BufferedReader;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Optional;

/** A display without a screen, so that tests disturb nobody. */
final class VirtualDisplay implements AutoCloseable {
    private final Process server;
    private final String name;

    private VirtualDisplay(Process server, String name) {
        this.server = server;
        this.name = name;
    }

    static VirtualDisplay start(int width, int height) throws IOException {
        Process server = new ProcessBuilder(
                        // a key that is held while the window thread works must not repeat: it would switch the theme
                        // back
                        "Xvfb",
                        "-r",
                        "-displayfd",
                        "1",
                        "-screen",
                        "0",
                        width + "x" + height + "x24",
                        "-nolisten",
                        "tcp")
                .redirectError(ProcessBuilder.Redirect.DISCARD)
                .start();
        BufferedReader reader = server.inputReader(StandardCharsets.US_ASCII);
        String number = Optional.ofNullable(reader.readLine())
                .orElseThrow(() -> new IllegalStateException("Xvfb does not start; is it installed?"));
        return new VirtualDisplay(server, ":" + number.strip());
    }

    String name() {
        return name;
    }

    @Override
    public void close() {
        server.destroy();
    }
}
