package fringekeep.drawing;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.Set;
import org.apache.fontbox.ttf.TTFParser;
import org.apache.fontbox.ttf.TTFSubsetter;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.io.RandomAccessReadBuffer;

/** The shipped face, cut down to the letters a picture uses. */
final class FaceSubset {
    private static final List<String> TABLES = List.of(
            "head", "hhea", "loca", "maxp", "cvt ", "prep", "glyf", "hmtx", "fpgm", "OS/2", "cmap", "name", "post");

    private FaceSubset() {}

    static byte[] of(Set<Integer> letters) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (InputStream stream = Lettering.regularFace();
                TrueTypeFont face = new TTFParser().parse(new RandomAccessReadBuffer(stream))) {
            TTFSubsetter subsetter = new TTFSubsetter(face, TABLES);
            subsetter.addAll(letters);
            subsetter.writeToStream(bytes);
        } catch (IOException e) {
            throw new UncheckedIOException("cutting the shipped font", e);
        }
        return bytes.toByteArray();
    }
}
