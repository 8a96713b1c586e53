package fringekeep.desk.window;

import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.prefs.Preferences;
import org.openide.util.NbPreferences;

/** The place a person left: archive, stop, widths, light or dark. Harmless when old or lost. */
interface Memory {
    /** What was kept under a name. */
    Optional<String> get(String name);

    /** Keeps something. */
    void put(String name, String value);

    /** Keeps nothing beyond this run; for tests. */
    static Memory fleeting() {
        Map<String, String> kept = new HashMap<>();
        return new Memory() {
            @Override
            public Optional<String> get(String name) {
                return Optional.ofNullable(kept.get(name));
            }

            @Override
            public void put(String name, String value) {
                kept.put(name, value);
            }
        };
    }

    /** Kept in the user's folder by the platform, which writes it away from the window thread. */
    static Memory ofUser() {
        Preferences node = NbPreferences.forModule(Memory.class);
        return new Memory() {
            @Override
            public Optional<String> get(String name) {
                return Optional.ofNullable(node.get(name, null));
            }

            @Override
            public void put(String name, String value) {
                node.put(name, value);
            }
        };
    }
}
