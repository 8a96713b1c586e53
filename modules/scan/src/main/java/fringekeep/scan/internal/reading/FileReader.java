package fringekeep.scan.internal.reading;

import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.problem.ScanProblems;
import java.util.List;
import java.util.Optional;

/** Reads a text file by a profile, section by section. A section is read whole or refused with all that is wrong with it. */
public final class FileReader {
    private final Profile profile;
    private final String file;
    private final List<Section> sections;

    /**
     * Decodes a file and parts it into sections.
     *
     * @param file name for people, used in problems
     * @throws ProblemException if the bytes are no text in the profile's encoding or hold no section
     */
    public FileReader(Profile profile, byte[] bytes, String file) throws ProblemException {
        this.profile = profile;
        this.file = file;
        this.sections = new Sections(profile).split(Lines.of(bytes, profile.encoding(), file));
        if (sections.isEmpty()) {
            throw new ProblemException(ScanProblems.of("scan.no-section", file, profile.sectionMarker()));
        }
    }

    /** How many sections the file has, at least 1. */
    public int sections() {
        return sections.size();
    }

    /**
     * Reads one section.
     *
     * @param number from 0
     * @throws ProblemException all that is wrong with it, each with line and column
     */
    public Reading read(int number) throws ProblemException {
        if (number < 0 || number >= sections.size()) {
            throw new ProblemException(ScanProblems.of("scan.section", file, number, sections.size()));
        }
        Section section = sections.get(number);
        HeaderValues header = new HeaderReader(profile, section, file).read();
        TableReader.Rows rows = new TableReader(profile, file).read(section);
        Exposure exposure = Exposure.of(profile, header, rows.table(), file);
        List<Finding> findings = new Findings(profile, rows.table(), exposure).all(header, rows, Optional.of(section));
        return new Reading(rows.table(), exposure, header, findings, profile.fileTimeIsEnd());
    }
}
