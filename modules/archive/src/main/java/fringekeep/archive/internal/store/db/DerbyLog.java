package fringekeep.archive.internal.store.db;

import java.io.StringWriter;
import java.io.Writer;

/** Takes the lines the database would write into a file of its own in the working folder, and passes them to the log. */
public final class DerbyLog {
    private static final System.Logger LOG = System.getLogger(DerbyLog.class.getName());

    private DerbyLog() {}

    /** Called by the database by name (property {@code derby.stream.error.method}). */
    public static Writer writer() {
        return new StringWriter() {
            @Override
            public void flush() {
                synchronized (getBuffer()) {
                    String text = getBuffer().toString().strip();
                    getBuffer().setLength(0);
                    if (!text.isEmpty()) {
                        LOG.log(System.Logger.Level.DEBUG, text);
                    }
                }
            }
        };
    }
}
