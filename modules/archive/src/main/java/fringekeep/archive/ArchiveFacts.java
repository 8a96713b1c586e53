package fringekeep.archive;

import fringekeep.archive.record.ArchiveId;
import java.nio.file.Path;

/**
 * What an archive is.
 *
 * @param id from entry 1
 * @param title the lab's name for it
 * @param dayBoundary {@code HH:MM} at which a measurement day begins
 * @param zone IANA zone of the lab
 * @param invented whether its data are invented (a demonstration)
 * @param watermark last committed journal entry
 * @param folder where it lies
 */
public record ArchiveFacts(
        ArchiveId id, String title, String dayBoundary, String zone, boolean invented, long watermark, Path folder) {}
