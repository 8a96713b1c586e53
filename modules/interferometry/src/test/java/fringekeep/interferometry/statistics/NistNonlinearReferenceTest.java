package fringekeep.interferometry.statistics;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The 27 nonlinear sets of the Statistical Reference Datasets of NIST, from both starts: at least 8 certified digits on the
 * parameters, 6 on their standard deviations and on the residual standard deviation. No set needs its second start. README.txt
 * beside the files tells where they came from.
 */
class NistNonlinearReferenceTest {
    private static final Path FOLDER = Path.of("src/test/reference/nist-nonlinear");

    private static final List<String> SETS = List.of(
            "Bennett5",
            "BoxBOD",
            "Chwirut1",
            "Chwirut2",
            "DanWood",
            "ENSO",
            "Eckerle4",
            "Gauss1",
            "Gauss2",
            "Gauss3",
            "Hahn1",
            "Kirby2",
            "Lanczos1",
            "Lanczos2",
            "Lanczos3",
            "MGH09",
            "MGH10",
            "MGH17",
            "Misra1a",
            "Misra1b",
            "Misra1c",
            "Misra1d",
            "Nelson",
            "Rat42",
            "Rat43",
            "Roszman1",
            "Thurber");

    record Reference(
            String name,
            double[] first,
            double[] second,
            double[] certified,
            double[] deviations,
            double sum,
            double residualDeviation,
            double[] y,
            double[][] x) {
        double[] start(int which) {
            return which == 1 ? first : second;
        }
    }

    static Stream<org.junit.jupiter.params.provider.Arguments> starts() {
        return SETS.stream()
                .flatMap(set ->
                        Stream.of(1, 2).map(start -> org.junit.jupiter.params.provider.Arguments.of(set, start)));
    }

    private static Reference read(String name) throws IOException {
        List<String> lines = Files.readAllLines(FOLDER.resolve(name + ".dat"));
        Pattern parameter = Pattern.compile("^\\s*b\\d+\\s*=\\s*(\\S+)\\s+(\\S+)\\s+(\\S+)\\s+(\\S+)\\s*$");
        List<double[]> parameters = new ArrayList<>();
        double sum = 0;
        double deviation = 0;
        List<double[]> rows = new ArrayList<>();
        for (int i = 0; i < lines.size(); i++) {
            String line = lines.get(i);
            Matcher matcher = parameter.matcher(line);
            if (matcher.matches()) {
                parameters.add(new double[] {
                    Double.parseDouble(matcher.group(1)), Double.parseDouble(matcher.group(2)),
                    Double.parseDouble(matcher.group(3)), Double.parseDouble(matcher.group(4))
                });
            }
            if (line.startsWith("Residual Sum of Squares:")) {
                sum = Double.parseDouble(line.substring(line.indexOf(':') + 1).trim());
            }
            if (line.startsWith("Residual Standard Deviation:")) {
                deviation =
                        Double.parseDouble(line.substring(line.indexOf(':') + 1).trim());
            }
            if (i >= 60 && !line.isBlank()) {
                rows.add(Stream.of(line.trim().split("\\s+"))
                        .mapToDouble(Double::parseDouble)
                        .toArray());
            }
        }
        boolean logarithm = name.equals("Nelson");
        double[] y = rows.stream()
                .mapToDouble(row -> logarithm ? StrictMath.log(row[0]) : row[0])
                .toArray();
        double[][] x = rows.stream()
                .map(row -> java.util.Arrays.copyOfRange(row, 1, row.length))
                .toArray(double[][]::new);
        return new Reference(
                name,
                column(parameters, 0),
                column(parameters, 1),
                column(parameters, 2),
                column(parameters, 3),
                sum,
                deviation,
                y,
                x);
    }

    private static double[] column(List<double[]> rows, int column) {
        return rows.stream().mapToDouble(row -> row[column]).toArray();
    }

    private static Dual formula(String name, Dual[] b, double[] point) {
        double x = point[0];
        int p = b.length;
        Dual one = Dual.constant(1, p);
        return switch (name) {
            case "Bennett5" ->
                b[0].times(b[1].plus(x).power(Dual.constant(-1, p).over(b[2])));
            case "BoxBOD", "Misra1a" -> b[0].times(one.minus(b[1].times(-x).exp()));
            case "Chwirut1", "Chwirut2" -> b[0].times(-x).exp().over(b[1].plus(b[2].times(x)));
            case "DanWood" -> b[0].times(Dual.constant(x, p).power(b[1]));
            case "ENSO" ->
                b[0].plus(b[1].times(StrictMath.cos(2 * Math.PI * x / 12)))
                        .plus(b[2].times(StrictMath.sin(2 * Math.PI * x / 12)))
                        .plus(wave(b[3], b[4], b[5], x))
                        .plus(wave(b[6], b[7], b[8], x));
            case "Eckerle4" ->
                b[0].over(b[1])
                        .times(square(b[2].plus(-x).over(b[1])).times(-0.5).exp());
            case "Gauss1", "Gauss2", "Gauss3" ->
                b[0].times(b[1].times(-x).exp())
                        .plus(b[2].times(
                                square(b[3].plus(-x).over(b[4])).times(-1).exp()))
                        .plus(b[5].times(
                                square(b[6].plus(-x).over(b[7])).times(-1).exp()));
            case "Hahn1", "Thurber" -> cubic(b[0], b[1], b[2], b[3], x).over(cubic(one, b[4], b[5], b[6], x));
            case "Kirby2" ->
                b[0].plus(b[1].times(x))
                        .plus(b[2].times(x * x))
                        .over(one.plus(b[3].times(x)).plus(b[4].times(x * x)));
            case "Lanczos1", "Lanczos2", "Lanczos3" ->
                decay(b[0], b[1], x).plus(decay(b[2], b[3], x)).plus(decay(b[4], b[5], x));
            case "MGH09" ->
                b[0].times(b[1].times(x).plus(x * x))
                        .over(b[2].times(x).plus(x * x).plus(b[3]));
            case "MGH10" -> b[0].times(b[1].over(b[2].plus(x)).exp());
            case "MGH17" -> b[0].plus(decay(b[1], b[3], x)).plus(decay(b[2], b[4], x));
            case "Misra1b" -> b[0].times(one.minus(b[1].times(0.5 * x).plus(1).power(-2)));
            case "Misra1c" -> b[0].times(one.minus(b[1].times(2 * x).plus(1).power(-0.5)));
            case "Misra1d" -> b[0].times(b[1]).times(x).over(b[1].times(x).plus(1));
            case "Nelson" ->
                b[0].minus(b[1].times(x).times(b[2].times(-point[1]).exp()));
            case "Rat42" -> b[0].over(b[1].minus(b[2].times(x)).exp().plus(1));
            case "Rat43" -> b[0].over(b[1].minus(b[2].times(x)).exp().plus(1).power(one.over(b[3])));
            case "Roszman1" ->
                b[0].minus(b[1].times(x))
                        .minus(b[2].over(b[3].times(-1).plus(x)).arctan().times(1 / Math.PI));
            default -> throw new AssertionError(name);
        };
    }

    private static Dual square(Dual a) {
        return a.times(a);
    }

    private static Dual decay(Dual amplitude, Dual rate, double x) {
        return amplitude.times(rate.times(-x).exp());
    }

    private static Dual wave(Dual period, Dual cosine, Dual sine, double x) {
        Dual angle = Dual.constant(2 * Math.PI * x, period.gradient().length).over(period);
        return cosine.times(angle.cos()).plus(sine.times(angle.sin()));
    }

    private static Dual cubic(Dual a, Dual b, Dual c, Dual d, double x) {
        return a.plus(b.times(x)).plus(c.times(x * x)).plus(d.times(x * x * x));
    }

    private static ParametricModel model(Reference set) {
        int p = set.certified().length;
        return new ParametricModel() {
            @Override
            public int parameters() {
                return p;
            }

            @Override
            public int points() {
                return set.y().length;
            }

            @Override
            public boolean evaluate(double[] theta, double[] values, double[] slopes) {
                Dual[] b = new Dual[p];
                for (int j = 0; j < p; j++) {
                    b[j] = Dual.variable(theta[j], j, p);
                }
                for (int i = 0; i < values.length; i++) {
                    Dual point = formula(set.name(), b, set.x()[i]);
                    if (!Double.isFinite(point.value())) {
                        return false;
                    }
                    values[i] = point.value();
                    System.arraycopy(point.gradient(), 0, slopes, i * p, p);
                }
                return true;
            }
        };
    }

    static double digits(double value, double certified) {
        return value == certified ? 16 : -StrictMath.log10(Math.abs(value - certified) / Math.abs(certified));
    }

    @ParameterizedTest
    @MethodSource("starts")
    void certifiedDigits(String name, int start) throws IOException {
        Reference set = read(name);
        double[] ones = new double[set.y().length];
        java.util.Arrays.fill(ones, 1);

        CurveFitOutcome outcome = CurveFitter.squares(model(set), set.y(), ones, set.start(start));

        CurveFit fit = outcome.orThrow();
        double worst = 16;
        double worstDeviation = 16;
        for (int j = 0; j < set.certified().length; j++) {
            worst = Math.min(worst, digits(fit.values()[j], set.certified()[j]));
            worstDeviation = Math.min(worstDeviation, digits(fit.scaledDeviation(j), set.deviations()[j]));
        }
        assertThat(worst).as("certified digits of the parameters").isGreaterThanOrEqualTo(8);
        // The residuals of Lanczos1 are rounding alone; its certified deviations have no digits to reach.
        if (!name.equals("Lanczos1")) {
            assertThat(worstDeviation).as("certified digits of the deviations").isGreaterThanOrEqualTo(6);
            assertThat(digits(Math.sqrt(fit.residualVariance()), set.residualDeviation()))
                    .as("certified digits of the residual deviation")
                    .isGreaterThanOrEqualTo(6);
        }
    }
}
