package fringekeep.archive.internal.store.files;

import fringekeep.archive.problem.Problem;
import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.FileStore;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Iterator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/**
 * Whether a folder is a place where an archive is safe. On a network folder two machines can write at once and forcing to
 * disk may be a promise only. It is known by the protocol the file system is named for, by running outside the system's
 * kernel, by a source that names another machine ({@code machine:folder}, {@code //machine/share}), or by a path that
 * does. Folders that another program keeps the same on several machines have no common sign; those are recognised that
 * hold, in themselves or in a folder above them below the person's home, a hidden entry whose name begins with the word sync.
 * Whoever chooses the folder has to keep the archive out of the others.
 */
public final class FolderPlace {
    /** File systems named for the protocol that reaches them, without the number of the protocol's version. */
    private static final Set<String> PROTOCOLS =
            Set.of("nfs", "cifs", "smb", "smbfs", "afs", "afpfs", "9p", "dav", "davfs", "webdav", "sshfs", "ftpfs");

    /** Running outside the kernel, but on a disk of this machine: what such a file system on a block device is called. */
    private static final String ON_A_DISK = "fuseblk";

    private static final List<String> KEPT_THE_SAME = List.of(".sync", ".csync", "._sync");

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
        FileStore store = Files.getFileStore(real);
        String root = real.getRoot() == null ? "" : real.getRoot().toString();
        Optional<Problem> network = examineStore(store.type(), root.startsWith("\\\\") ? root : store.name(), folder);
        return network.isPresent()
                ? network
                : examineNeighbours(real, Path.of(System.getProperty("user.home", "")), folder);
    }

    /**
     * What is wrong with a place whose folders are kept the same on several machines, if that shows.
     *
     * @param existing the innermost folder that is there
     * @param home where looking ends: a person's home holds settings of such programs without being kept by them
     */
    public static Optional<Problem> examineNeighbours(Path existing, Path home, Path folder) throws IOException {
        for (Path here = existing; here != null && !here.equals(home); here = here.getParent()) {
            Optional<Path> mark = mark(here);
            if (mark.isPresent()) {
                return Optional.of(new Problem(
                        "archive.sync-folder",
                        "The folder seems to be kept the same on several machines: " + mark.get() + " says so.",
                        folder.toString(),
                        "Keep the archive in a folder of this machine alone and put plain copies there."
                                + " Nothing was changed."));
            }
        }
        return Optional.empty();
    }

    /** A folder that may not be listed tells nothing; its file system was examined already. */
    private static Optional<Path> mark(Path folder) throws IOException {
        if (!Files.isDirectory(folder) || !Files.isReadable(folder)) {
            return Optional.empty();
        }
        try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder, FolderPlace::marks)) {
            Iterator<Path> marks = entries.iterator();
            return marks.hasNext() ? Optional.of(marks.next()) : Optional.empty();
        }
    }

    private static boolean marks(Path entry) {
        Path name = entry.getFileName();
        String text = name == null ? "" : name.toString().toLowerCase(Locale.ROOT);
        return KEPT_THE_SAME.stream().anyMatch(text::startsWith);
    }

    /**
     * What is wrong with a place on such a file system, if anything.
     *
     * @param type what the operating system calls the file system
     * @param source what it lies on: a device, another machine's folder, or a name that says nothing
     */
    public static Optional<Problem> examineStore(String type, String source, Path folder) {
        if (!byProtocol(type.toLowerCase(Locale.ROOT)) && !elsewhere(source)) {
            return Optional.empty();
        }
        return Optional.of(new Problem(
                "archive.network-folder",
                "The folder lies on a network or shared file system (" + type + ", " + source
                        + "), where an archive is not safe.",
                folder.toString(),
                "Keep the archive on a disk of this machine and put plain copies on the network folder."
                        + " Nothing was changed."));
    }

    private static boolean byProtocol(String type) {
        boolean outsideTheKernel = type.startsWith("fuse") && !type.equals(ON_A_DISK);
        return outsideTheKernel || PROTOCOLS.contains(type) || PROTOCOLS.contains(type.replaceFirst("[0-9]+$", ""));
    }

    /** {@code machine:folder} or two leading strokes; a drive letter is not a machine. */
    private static boolean elsewhere(String source) {
        return source.startsWith("//")
                || source.startsWith("\\\\")
                || (source.indexOf(":/") > 1 && !source.startsWith("/"));
    }
}
