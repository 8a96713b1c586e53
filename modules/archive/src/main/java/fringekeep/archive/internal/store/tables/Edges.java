package fringekeep.archive.internal.store.tables;

import fringekeep.archive.internal.store.db.Sql;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Collection;
import java.util.List;
import java.util.Optional;

/** Questions to table edge. */
public final class Edges {
    /** Made from. */
    public static final String INPUT = "i";
    /** Speaks of. */
    public static final String ABOUT = "a";
    /** Replaces. */
    public static final String CORRECTS = "c";
    /** Follows. */
    public static final String AFTER = "f";
    /** Reaches all records of the thing. */
    public static final String THING = "t";
    /** Reaches that record alone. */
    public static final String RECORD = "r";

    private static final String COLUMNS = "src, link, seq, role, dst, channel, reach, n";

    private Edges() {}

    /** Edges that leave nodes, by source, link and place. */
    public static List<Edge> from(Connection c, Collection<Long> nodes, long watermark) throws SQLException {
        return Sql.in(
                c,
                "select " + COLUMNS + " from edge where src in (" + Sql.MARKS + ") and n <= ?",
                nodes,
                Edge::of,
                watermark);
    }

    /** Edges of one link that leave nodes. */
    public static List<Edge> from(Connection c, Collection<Long> nodes, String link, long watermark)
            throws SQLException {
        return Sql.in(
                c,
                "select " + COLUMNS + " from edge where src in (" + Sql.MARKS + ") and link = ? and n <= ?",
                nodes,
                Edge::of,
                link,
                watermark);
    }

    /** Edges that arrive at nodes. */
    public static List<Edge> to(Connection c, Collection<Long> nodes, long watermark) throws SQLException {
        return Sql.in(
                c,
                "select " + COLUMNS + " from edge where dst in (" + Sql.MARKS + ") and n <= ?",
                nodes,
                Edge::of,
                watermark);
    }

    /** Edges of one link that arrive at nodes. */
    public static List<Edge> to(Connection c, Collection<Long> nodes, String link, long watermark) throws SQLException {
        return Sql.in(
                c,
                "select " + COLUMNS + " from edge where dst in (" + Sql.MARKS + ") and link = ? and n <= ?",
                nodes,
                Edge::of,
                link,
                watermark);
    }

    /** Edges written with entries {@code from} to {@code to}; for checks. */
    public static List<Edge> ofNode(Connection c, long node) throws SQLException {
        return Sql.list(c, "select " + COLUMNS + " from edge where src = ? order by link, seq", Edge::of, node);
    }

    /**
     * An edge.
     *
     * @param src node of the record whose head holds it
     * @param link which member
     * @param seq place within the member, from 0
     * @param role role, empty for corrects and after
     * @param dst node of the target
     * @param channel channel meant
     * @param reach of about
     * @param n entry of the source
     */
    public record Edge(
            long src,
            String link,
            int seq,
            String role,
            long dst,
            Optional<String> channel,
            Optional<String> reach,
            long n) {
        static Edge of(ResultSet row) throws SQLException {
            return new Edge(
                    row.getLong(1),
                    row.getString(2),
                    row.getInt(3),
                    row.getString(4),
                    row.getLong(5),
                    Optional.ofNullable(row.getString(6)),
                    Optional.ofNullable(row.getString(7)),
                    row.getLong(8));
        }
    }
}
