package fringekeep.scan.ui;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.session.Register;
import java.util.List;

/** Current scans that no current placement speaks of; read from the register, without the archive. */
final class UnplacedScans {
    private UnplacedScans() {}

    static List<Hash> of(Register register) {
        Graph graph = register.graph();
        return register.current("scan").stream()
                .filter(scan -> !graph.states(scan).contains(StateName.WITHDRAWN))
                .filter(scan -> graph.speakingOf(scan).stream().noneMatch(other -> placement(register, other)))
                .toList();
    }

    private static boolean placement(Register register, Hash record) {
        return register.kind(record).filter("placement"::equals).isPresent()
                && !register.graph().states(record).contains(StateName.CORRECTED);
    }
}
