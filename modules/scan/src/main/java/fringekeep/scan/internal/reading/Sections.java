package fringekeep.scan.internal.reading;

import java.util.ArrayList;
import java.util.List;

/** Parts the lines of a file into sections, and each section into header and rows. */
final class Sections {
    private final Profile profile;

    Sections(Profile profile) {
        this.profile = profile;
    }

    /** The sections in the order of the file; none if the profile's section marker does not occur. */
    List<Section> split(List<Line> lines) {
        if (profile.sectionMarker().isEmpty()) {
            return List.of(section(List.of(), lines));
        }
        List<Line> shared = new ArrayList<>();
        List<List<Line>> parts = new ArrayList<>();
        for (Line line : lines) {
            if (line.text().startsWith(profile.sectionMarker())) {
                parts.add(new ArrayList<>());
            }
            (parts.isEmpty() ? shared : parts.get(parts.size() - 1)).add(line);
        }
        List<Line> common = shared.stream()
                .filter(line -> !line.blank())
                .map(this::withoutComment)
                .toList();
        return parts.stream().map(part -> section(common, part)).toList();
    }

    private Section section(List<Line> shared, List<Line> lines) {
        List<Line> header = new ArrayList<>();
        List<Line> names = new ArrayList<>();
        List<Line> rows = new ArrayList<>();
        int from = afterMarker(lines);
        int skip = profile.skip();
        for (int i = 0; i < lines.size(); i++) {
            Line line = lines.get(i);
            boolean marker = i == 0 && !profile.sectionMarker().isEmpty();
            if (line.blank()) {
                continue;
            }
            if (marker || i < from || comment(line)) {
                header.add(withoutComment(line));
            } else if (skip > 0) {
                skip--;
                header.add(line);
                names = List.of(line);
            } else {
                rows.add(line);
            }
        }
        return new Section(shared, header, names, rows);
    }

    /** Place of the first line behind the data marker; 0 without a marker, all lines when it is missing. */
    private int afterMarker(List<Line> lines) {
        if (profile.dataMarker().isEmpty()) {
            return 0;
        }
        for (int i = 0; i < lines.size(); i++) {
            if (lines.get(i).text().strip().equals(profile.dataMarker())) {
                return i + 1;
            }
        }
        return lines.size();
    }

    private boolean comment(Line line) {
        return !profile.comment().isEmpty() && line.text().stripLeading().startsWith(profile.comment());
    }

    private Line withoutComment(Line line) {
        if (!comment(line)) {
            return line;
        }
        String text = line.text().stripLeading().substring(profile.comment().length());
        return new Line(line.number(), text, line.ended());
    }
}
