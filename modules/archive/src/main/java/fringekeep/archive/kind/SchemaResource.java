package fringekeep.archive.kind;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/** Reads the JSON Schemas that modules carry as resources beside their classes. */
public final class SchemaResource {
    private static final int LARGEST = 4 << 20;
    private static final int DEEPEST = 200;

    private static final Map<Place, JsonObject> READ = new ConcurrentHashMap<>();

    private SchemaResource() {}

    private record Place(Class<?> beside, String name) {}

    /**
     * Reads a resource in the package of a class, once.
     *
     * @throws IllegalStateException if there is none or it is not a JSON object: a mistake in the program
     */
    public static JsonObject read(Class<?> beside, String name) {
        return READ.computeIfAbsent(new Place(beside, name), SchemaResource::read);
    }

    private static JsonObject read(Place place) {
        Class<?> beside = place.beside();
        String name = place.name();
        try (InputStream stream = beside.getResourceAsStream(name)) {
            if (stream == null) {
                throw new IllegalStateException("no resource " + name + " beside " + beside.getName());
            }
            if (JsonDocument.read(stream.readAllBytes(), LARGEST, DEEPEST).value() instanceof JsonObject object) {
                return object;
            }
            throw new IllegalStateException("resource " + name + " is not a JSON object");
        } catch (IOException e) {
            throw new UncheckedIOException("reading resource " + name, e);
        } catch (ProblemException e) {
            throw new IllegalStateException(
                    "resource " + name + ": " + e.problems().get(0), e);
        }
    }

    /** The definitions all schemas share: quantity, moment, estimate, instant, hash, id, covariance, text. */
    public static JsonObject common() {
        return read(SchemaResource.class, "common-1.schema.json");
    }
}
