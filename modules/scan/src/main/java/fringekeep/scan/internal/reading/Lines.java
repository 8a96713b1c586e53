package fringekeep.scan.internal.reading;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.problem.ScanProblems;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.Charset;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.util.ArrayList;
import java.util.List;

/** Turns bytes into lines; refuses what is no text of the stated encoding. Line ends are LF, CR LF or CR. */
public final class Lines {
    /** Longest line read (characters). */
    static final int LONGEST = 100_000;

    /** Largest text file read (bytes). */
    public static final int LARGEST = 256 << 20;

    private static final char BYTE_ORDER_MARK = '\uFEFF';

    private Lines() {}

    /**
     * All lines of a file.
     *
     * @throws ProblemException if the file is empty or too large, bytes do not fit the encoding, a line is too long or holds a
     *     NUL character
     */
    public static List<Line> of(byte[] bytes, String encoding, String file) throws ProblemException {
        if (bytes.length == 0) {
            throw new ProblemException(ScanProblems.of("scan.file-empty", file));
        }
        if (bytes.length > LARGEST) {
            throw new ProblemException(ScanProblems.of("scan.file-too-large", file, bytes.length, LARGEST));
        }
        return split(decode(bytes, encoding, file), file);
    }

    private static CharBuffer decode(byte[] bytes, String encoding, String file) throws ProblemException {
        CharsetDecoder decoder = Charset.forName(encoding)
                .newDecoder()
                .onMalformedInput(CodingErrorAction.REPORT)
                .onUnmappableCharacter(CodingErrorAction.REPORT);
        ByteBuffer in = ByteBuffer.wrap(bytes);
        CharBuffer out = CharBuffer.allocate((int) Math.ceil(bytes.length * (double) decoder.maxCharsPerByte()) + 1);
        CoderResult result = decoder.decode(in, out, true);
        if (result.isError()) {
            throw new ProblemException(misfit(bytes, in.position(), out.flip(), encoding, file));
        }
        decoder.flush(out);
        out.flip();
        if (out.hasRemaining() && out.get(0) == BYTE_ORDER_MARK) {
            out.get();
        }
        return out.slice();
    }

    private static Problem misfit(byte[] bytes, int at, CharBuffer before, String encoding, String file) {
        int line = 1;
        int column = 1;
        for (int i = 0; i < before.length(); i++) {
            if (before.charAt(i) == '\n') {
                line++;
                column = 1;
            } else {
                column++;
            }
        }
        String code = String.format(java.util.Locale.ROOT, "%02x", bytes[at] & 0xff);
        return ScanProblems.of("scan.encoding", file + ", line " + line + ", column " + column, code, at, encoding);
    }

    private static List<Line> split(CharBuffer text, String file) throws ProblemException {
        List<Line> lines = new ArrayList<>();
        int begin = 0;
        int length = text.length();
        while (begin < length) {
            int end = endOfLine(text, begin);
            lines.add(line(text, begin, end, lines.size() + 1, end < length, file));
            boolean pair = end + 1 < length && text.charAt(end) == '\r' && text.charAt(end + 1) == '\n';
            begin = end + (pair ? 2 : 1);
        }
        return lines;
    }

    private static int endOfLine(CharBuffer text, int begin) {
        int at = begin;
        while (at < text.length() && text.charAt(at) != '\n' && text.charAt(at) != '\r') {
            at++;
        }
        return at;
    }

    private static Line line(CharBuffer text, int begin, int end, int number, boolean ended, String file)
            throws ProblemException {
        String place = file + ", line " + number + ", column ";
        if (end - begin > LONGEST) {
            throw new ProblemException(
                    ScanProblems.of("scan.line-too-long", place + (LONGEST + 1), end - begin, LONGEST));
        }
        String content = text.subSequence(begin, end).toString();
        int nul = content.indexOf('\0');
        if (nul >= 0) {
            throw new ProblemException(ScanProblems.of("scan.not-text", place + (nul + 1)));
        }
        return new Line(number, content, ended);
    }
}
