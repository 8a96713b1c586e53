package fringekeep.sample;

import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/** Sizes of a cluster with their shares, which need not sum to 1. */
record ClusterSizes(long[] sizes, double[] shares) {
    /** Most nodes a shape is laid on; a wider one takes every second, third … size. */
    private static final long MOST = 401;

    static Optional<ClusterSizes> read(JsonObject sizes, String at, List<Problem> problems) {
        return switch (sizes.text("sort").orElse("")) {
            case "list" -> list(sizes.array("shares"), at + "/shares", problems);
            case "normal" -> shape(sizes, false, at, problems);
            case "lognormal" -> shape(sizes, true, at, problems);
            default -> {
                problems.add(Trouble.at("sizes-sort", at + "/sort"));
                yield Optional.empty();
            }
        };
    }

    private static Optional<ClusterSizes> list(JsonArray given, String at, List<Problem> problems) {
        int before = problems.size();
        if (given.items().isEmpty()) {
            problems.add(Trouble.at("missing", at, "shares"));
        }
        long[] sizes = new long[given.items().size()];
        double[] shares = new double[sizes.length];
        for (int i = 0; i < sizes.length; i++) {
            JsonObject one = given.items().get(i) instanceof JsonObject object ? object : JsonObject.EMPTY;
            OptionalLong size = one.integer("size");
            OptionalDouble share = one.number("share");
            if (size.isEmpty() || size.getAsLong() < 1) {
                problems.add(Trouble.at("size", at + "/" + i + "/size"));
            }
            if (share.isEmpty() || !(share.getAsDouble() > 0)) {
                problems.add(Trouble.at("share", at + "/" + i + "/share"));
            }
            sizes[i] = size.orElse(0);
            shares[i] = share.orElse(0);
            if (i > 0 && size.isPresent() && sizes[i] <= sizes[i - 1]) {
                problems.add(Trouble.at("not-ascending", at + "/" + i + "/size"));
            }
        }
        return problems.size() > before ? Optional.empty() : Optional.of(new ClusterSizes(sizes, shares));
    }

    private static Optional<ClusterSizes> shape(
            JsonObject given, boolean logarithmic, String at, List<Problem> problems) {
        OptionalDouble mean = given.number("mean");
        OptionalDouble spread = given.number("spread");
        if (mean.isEmpty() || !(mean.getAsDouble() >= 1) || mean.getAsDouble() > 1e7) {
            problems.add(Trouble.at("size-mean", at + "/mean"));
            return Optional.empty();
        }
        if (spread.isEmpty() || !(spread.getAsDouble() > 0) || spread.getAsDouble() > 1e7) {
            problems.add(Trouble.at("size-spread", at + "/spread"));
            return Optional.empty();
        }
        return Optional.of(laidOut(mean.getAsDouble(), spread.getAsDouble(), logarithmic));
    }

    /** Lays a shape on whole numbers within five standard deviations. */
    private static ClusterSizes laidOut(double mean, double spread, boolean logarithmic) {
        double width = StrictMath.log1p(spread / mean * (spread / mean));
        double centre = StrictMath.log(mean) - width / 2;
        double reach = 5 * Math.sqrt(width);
        double low = logarithmic ? StrictMath.exp(centre - reach) : mean - 5 * spread;
        double high = logarithmic ? StrictMath.exp(centre + reach) : mean + 5 * spread;
        long first = Math.max(1, (long) Math.floor(low));
        long last = Math.max(first, (long) Math.ceil(Math.min(high, 1e9)));
        long step = (last - first) / MOST + 1;
        int count = (int) ((last - first) / step + 1);
        long[] sizes = new long[count];
        double[] off = new double[count];
        for (int i = 0; i < count; i++) {
            sizes[i] = first + i * step;
            off[i] = logarithmic ? (StrictMath.log(sizes[i]) - centre) / Math.sqrt(width) : (sizes[i] - mean) / spread;
        }
        return new ClusterSizes(sizes, shares(sizes, off, logarithmic));
    }

    /** Shares relative to the likeliest size, so that a narrow shape between two whole numbers does not vanish. */
    private static double[] shares(long[] sizes, double[] off, boolean logarithmic) {
        double nearest = Double.MAX_VALUE;
        for (double one : off) {
            nearest = Math.min(nearest, one * one);
        }
        double[] shares = new double[off.length];
        for (int i = 0; i < off.length; i++) {
            shares[i] = StrictMath.exp((nearest - off[i] * off[i]) / 2) / (logarithmic ? sizes[i] : 1);
        }
        return shares;
    }
}
