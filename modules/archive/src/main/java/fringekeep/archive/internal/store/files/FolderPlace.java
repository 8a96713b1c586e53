package fringekeep.archive.internal.store.files;

import fringekeep.archive.problem.Problem;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/**
 * Whether a folder is a place where an archive is safe. On a network folder two machines can write at once and forcing to
 * disk may be a promise only; a folder that another program copies between machines changes files behind the database's
 * back.
 */
public final class FolderPlace {
    private static final Set<String> NETWORK = Set.of(
            "nfs",
            "nfs3",
            "nfs4",
            "cifs",
            "smb",
            "smb2",
            "smb3",
            "smbfs",
            "smb-share",
            "afs",
            "afpfs",
            "ncpfs",
            "coda",
            "davfs",
            "webdav",
            "sshfs",
            "9p",
            "ceph",
            "glusterfs",
            "lustre",
            "gfs2",
            "ocfs2",
            "vboxsf",
            "prl_fs",
            "vmhgfs",
            "drvfs",
            "rclone",
            "osxfuse",
            "macfuse");

    /** Files that programs which copy folders between machines keep at the top of such a folder. */
    private static final List<String> SYNC_MARKERS = List.of(
            ".stfolder",
            ".csync_journal.db",
            ".owncloudsync.log",
            ".nextcloudsync.log",
            ".dropbox.cache",
            ".tmp.drivedownload",
            ".849C9593-D756-4E56-8D6E-42412F2A707B",
            ".sync.ffs_db",
            ".seafile-data",
            ".unison");

    private FolderPlace() {}

    /** What is wrong with that place, if anything. */
    public static Optional<Problem> examine(Path folder) throws IOException {
        Path existing = folder.toAbsolutePath().normalize();
        while (existing != null && !Files.exists(existing)) {
            existing = existing.getParent();
        }
        if (existing == null) {
            return Optional.empty();
        }
        Path real = existing.toRealPath();
        Optional<Problem> network = examineType(Files.getFileStore(real).type(), folder);
        return network.isPresent() || real.startsWith("\\\\") ? network : syncMarker(real, folder);
    }

    /** What is wrong with a place on a file system of that type, if anything. */
    public static Optional<Problem> examineType(String type, Path folder) {
        String name = type.toLowerCase(Locale.ROOT);
        boolean network = NETWORK.contains(name) || (name.startsWith("fuse.") && !name.equals("fuse.ntfs-3g"));
        if (!network) {
            return Optional.empty();
        }
        return Optional.of(new Problem(
                "archive.network-folder",
                "The folder lies on a network or shared file system (" + type + "), where an archive is not safe.",
                folder.toString(),
                "Keep the archive on a disk of this machine and put plain copies on the network folder."
                        + " Nothing was changed."));
    }

    private static Optional<Problem> syncMarker(Path real, Path folder) {
        for (Path above = real; above != null; above = above.getParent()) {
            for (String marker : SYNC_MARKERS) {
                if (Files.exists(above.resolve(marker))) {
                    return Optional.of(synchronised(above.resolve(marker), folder));
                }
            }
        }
        return Optional.empty();
    }

    private static Problem synchronised(Path marker, Path folder) {
        return new Problem(
                "archive.sync-folder",
                "The folder is copied between machines by another program (" + marker + " says so),"
                        + " which would tear the archive apart.",
                folder.toString(),
                "Keep the archive outside that folder and put plain copies into it. Nothing was changed.");
    }
}
