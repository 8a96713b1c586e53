package fringekeep.commandline.ui;

import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.commandline.LabReplay;
import fringekeep.desk.stage.InventedLab;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.openide.util.lookup.ServiceProvider;

/** The invented laboratory from the sample data that lie beside the program. */
@ServiceProvider(service = InventedLab.class)
public final class ShippedLab implements InventedLab {
    /** For the service loader. */
    public ShippedLab() {}

    @Override
    public void make(Path folder, Kinds kinds, String build, Work work) throws ProblemException, StoppedException {
        LabReplay.replay(samples(), folder, kinds, build, work).archive().close();
    }

    /** The program's folder holds its clusters, one of them the platform's. */
    private static Path samples() throws ProblemException {
        Optional<Path> beside = Optional.ofNullable(System.getProperty("netbeans.home"))
                .map(Path::of)
                .map(Path::toAbsolutePath)
                .map(Path::getParent)
                .map(program -> program.resolve("sample-data"));
        return beside.filter(Files::isDirectory)
                .orElseThrow(() -> new ProblemException(new Problem(
                        "desk.sample-data",
                        "The sample data of the invented laboratory are not there.",
                        beside.map(Path::toString).orElse("sample-data"),
                        "Unpack the program anew: the folder sample-data lies beside its folder bin.")));
    }
}
