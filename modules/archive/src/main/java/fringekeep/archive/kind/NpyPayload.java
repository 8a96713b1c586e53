package fringekeep.archive.kind;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Payload form {@code npy/1.0} (record format 1, section 5): one array in the published NPY format, version 1.0 (NumPy
 * Enhancement Proposal 1), little-endian, C order, header padded to the smallest multiple of 64. Absent = the one NaN
 * 0x7ff8000000000000; infinities and -0 are refused.
 */
public final class NpyPayload {
    /** Name of the form. */
    public static final String FORM = "npy/1.0";

    private static final byte[] MAGIC = {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0};
    private static final int PREFIX = MAGIC.length + 2;
    private static final int MULTIPLE = 64;
    private static final Pattern HEADER = Pattern.compile(
            "\\{'descr': '(<f8|<i4|<i8|<u2)', 'fortran_order': False, 'shape': \\(([0-9, ]*)\\), \\} *\n");

    private NpyPayload() {}

    /** Sorts of numbers an array may hold. */
    public enum Sort {
        /** Doubles. */
        REAL("<f8", 8),
        /** 32-bit integers. */
        INT("<i4", 4),
        /** 64-bit integers. */
        LONG("<i8", 8),
        /** 16-bit integers without sign. */
        UNSIGNED_SHORT("<u2", 2);

        private final String code;
        private final int bytes;

        Sort(String code, int bytes) {
            this.code = code;
            this.bytes = bytes;
        }

        static Sort of(String code) {
            return Arrays.stream(values())
                    .filter(sort -> sort.code.equals(code))
                    .findFirst()
                    .orElseThrow();
        }
    }

    /**
     * An array.
     *
     * @param sort of its numbers
     * @param shape lengths of the axes, outermost first
     * @param reals values in C order when {@code REAL}, NaN = absent; otherwise empty
     * @param integers values in C order when not {@code REAL}; otherwise empty
     */
    public record NpyArray(Sort sort, int[] shape, double[] reals, long[] integers) {
        /** Copies; -0 becomes 0, every NaN the one NaN; refuses infinities, wrong lengths and integers out of range. */
        public NpyArray {
            shape = shape.clone();
            integers = integers.clone();
            reals = cleaned(reals);
            long count = 1;
            for (int length : shape) {
                if (length < 0) {
                    throw new IllegalArgumentException("negative length in shape " + Arrays.toString(shape));
                }
                count = Math.multiplyExact(count, length);
            }
            long given = sort == Sort.REAL ? reals.length : integers.length;
            if (given != count || (sort == Sort.REAL ? integers.length : reals.length) != 0) {
                throw new IllegalArgumentException(given + " values for shape " + Arrays.toString(shape));
            }
            for (long value : integers) {
                if (!fits(sort, value)) {
                    throw new IllegalArgumentException(value + " does not fit " + sort.code);
                }
            }
        }

        private static double[] cleaned(double[] values) {
            double[] copy = values.clone();
            for (int i = 0; i < copy.length; i++) {
                if (Double.isInfinite(copy[i])) {
                    throw new IllegalArgumentException("value " + i + " is infinite");
                }
                copy[i] = Double.isNaN(copy[i]) ? Double.NaN : copy[i] + 0.0;
            }
            return copy;
        }

        private static boolean fits(Sort sort, long value) {
            return switch (sort) {
                case REAL, LONG -> true;
                case INT -> value == (int) value;
                case UNSIGNED_SHORT -> value >= 0 && value <= 0xffff;
            };
        }

        @Override
        public int[] shape() {
            return shape.clone();
        }

        @Override
        public double[] reals() {
            return reals.clone();
        }

        @Override
        public long[] integers() {
            return integers.clone();
        }

        /** All values as doubles, NaN = absent. */
        public double[] values() {
            return sort == Sort.REAL
                    ? reals.clone()
                    : Arrays.stream(integers).mapToDouble(value -> value).toArray();
        }
    }

    /** Bytes of doubles of a shape, NaN = absent. */
    public static byte[] write(double[] values, int... shape) {
        return write(new NpyArray(Sort.REAL, shape, values, new long[0]));
    }

    /** Bytes of an array. */
    public static byte[] write(NpyArray array) {
        byte[] header = header(array).getBytes(StandardCharsets.US_ASCII);
        int count = array.sort == Sort.REAL ? array.reals.length : array.integers.length;
        ByteBuffer buffer = ByteBuffer.allocate(
                        Math.addExact(PREFIX + header.length, Math.multiplyExact(count, array.sort.bytes)))
                .order(ByteOrder.LITTLE_ENDIAN);
        buffer.put(MAGIC).putShort((short) header.length).put(header);
        for (int i = 0; i < count; i++) {
            switch (array.sort) {
                case REAL -> buffer.putDouble(array.reals[i]);
                case INT -> buffer.putInt((int) array.integers[i]);
                case LONG -> buffer.putLong(array.integers[i]);
                case UNSIGNED_SHORT -> buffer.putShort((short) array.integers[i]);
            }
        }
        return buffer.array();
    }

    private static String header(NpyArray array) {
        StringBuilder shape = new StringBuilder();
        for (int length : array.shape) {
            shape.append(shape.isEmpty() ? "" : ", ").append(length);
        }
        String tuple = array.shape.length == 1 ? shape + "," : shape.toString();
        String text = "{'descr': '" + array.sort.code + "', 'fortran_order': False, 'shape': (" + tuple + "), }";
        int whole = PREFIX + text.length() + 1;
        int padding = (MULTIPLE - whole % MULTIPLE) % MULTIPLE;
        return text + " ".repeat(padding) + "\n";
    }

    /**
     * Reads an array.
     *
     * @throws ProblemException if the bytes are not exactly of this form
     */
    public static NpyArray read(byte[] bytes) throws ProblemException {
        if (bytes.length < PREFIX || !Arrays.equals(bytes, 0, MAGIC.length, MAGIC, 0, MAGIC.length)) {
            throw problem("The bytes do not begin as an NPY array of version 1.0 does.");
        }
        ByteBuffer buffer = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        int length = buffer.getShort(MAGIC.length) & 0xffff;
        if (PREFIX + length > bytes.length) {
            throw problem("The header of the NPY array is cut off.");
        }
        Matcher header = HEADER.matcher(new String(bytes, PREFIX, length, StandardCharsets.US_ASCII));
        if (!header.matches()) {
            throw problem("The header of the NPY array names a layout that is not kept here.");
        }
        NpyArray array = array(header, buffer.position(PREFIX + length));
        if (!Arrays.equals(bytes, write(array))) {
            throw problem("The NPY array is not in the one form its numbers have (infinity, -0 or another header).");
        }
        return array;
    }

    private static NpyArray array(Matcher header, ByteBuffer buffer) throws ProblemException {
        Sort sort = Sort.of(header.group(1));
        try {
            int[] shape = Arrays.stream(header.group(2).split(","))
                    .map(String::strip)
                    .filter(text -> !text.isEmpty())
                    .mapToInt(Integer::parseInt)
                    .toArray();
            long count = Arrays.stream(shape).asLongStream().reduce(1, Math::multiplyExact);
            if (count != buffer.remaining() / sort.bytes || buffer.remaining() % sort.bytes != 0) {
                throw problem(
                        "The NPY array has " + buffer.remaining() + " bytes of numbers for " + count + " of them.");
            }
            return values(sort, shape, (int) count, buffer);
        } catch (ArithmeticException | IllegalArgumentException e) {
            throw problem("The NPY array cannot be read: " + e.getMessage() + ".");
        }
    }

    private static NpyArray values(Sort sort, int[] shape, int count, ByteBuffer buffer) {
        double[] reals = new double[sort == Sort.REAL ? count : 0];
        long[] integers = new long[sort == Sort.REAL ? 0 : count];
        for (int i = 0; i < count; i++) {
            switch (sort) {
                case REAL -> reals[i] = buffer.getDouble();
                case INT -> integers[i] = buffer.getInt();
                case LONG -> integers[i] = buffer.getLong();
                case UNSIGNED_SHORT -> integers[i] = buffer.getShort() & 0xffff;
            }
        }
        return new NpyArray(sort, shape, reals, integers);
    }

    private static ProblemException problem(String what) {
        return new ProblemException(new Problem("payload.form", what, "", "Write the array anew from its source."));
    }
}
