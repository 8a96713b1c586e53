package fringekeep.archive.json;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;

/** Reads UTF-8 strictly: no replacement characters for what is not UTF-8. */
final class Utf8Text {
    private Utf8Text() {}

    static String decode(byte[] bytes) throws ProblemException {
        CharsetDecoder decoder = StandardCharsets.UTF_8
                .newDecoder()
                .onMalformedInput(CodingErrorAction.REPORT)
                .onUnmappableCharacter(CodingErrorAction.REPORT);
        ByteBuffer source = ByteBuffer.wrap(bytes);
        CharBuffer target = CharBuffer.allocate(bytes.length);
        try {
            var result = decoder.decode(source, target, true);
            if (result.isError()) {
                result.throwException();
            }
        } catch (CharacterCodingException e) {
            throw new ProblemException(new Problem(
                    "json.not-utf8",
                    "Byte " + source.position() + " (counted from 0) is not UTF-8.",
                    "byte " + source.position(),
                    "Save the text as UTF-8; nothing has been stored."));
        }
        return target.flip().toString();
    }
}
