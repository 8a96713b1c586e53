package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;

/** Whether a judgement stands: nothing corrects it and no standing judgement undoes it (record format 1, section 8). */
final class Standing {
    private final Connection c;

    Standing(Connection c) {
        this.c = c;
    }

    boolean stands(long judgement) throws SQLException {
        if (!Edges.to(c, List.of(judgement), Edges.CORRECTS, Long.MAX_VALUE).isEmpty()) {
            return false;
        }
        for (Edge edge : Edges.to(c, List.of(judgement), Edges.ABOUT, Long.MAX_VALUE)) {
            if (edge.role().equals("undoes") && isJudgement(edge.src()) && stands(edge.src())) {
                return false;
            }
        }
        return true;
    }

    private boolean isJudgement(long node) throws SQLException {
        Located record = Records.byNode(c, List.of(node), Long.MAX_VALUE).get(node);
        return record != null && record.kind().text().equals("judgement");
    }
}
