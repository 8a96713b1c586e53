"""The three instruments' text files, and the traces of choppers and the slow log."""
from plan import local

HOUSE = "invented data of the demo lab"


def tab_with_comments(file, section, rows, dwell, end, operator):
    """Dialect 1, short bench: tab, decimal point, comment lines '# key: value', UTF-8."""
    lines = [f"# short bench, {HOUSE}",
             f"# start: {local(file.start).isoformat()}",
             f"# end: {local(end).isoformat()}",
             f"# points: {len(rows)}",
             f"# dwell: {dwell:g} s",
             f"# laser power: {section.reading:.3f} W",
             f"# operator: {operator}",
             "position_nm\tcounts"]
    lines += [f"{position:.4f}\t{counts}" if section.mishap == "wrong unit" else f"{position:.1f}\t{counts}"
              for position, counts in rows]
    text = "\n".join(lines) + "\n"
    if section.mishap == "truncated":
        text = "\n".join(lines[:8 + 17]) + "\n"
    if section.mishap == "cut in the middle of a row":
        text = "\n".join(lines[:8 + 20]) + "\n" + lines[8 + 20].split("\t")[0]
    return text.encode("utf-8")


def semicolon_with_decimal_comma(file, section, rows, dwell, source_temperature):
    """Dialect 2, long bench: semicolon, decimal comma, wall clock without offset, ISO 8859-1, CR LF."""
    lines = [f"Lange Bank, erfundene Daten (invented data)",
             f"Beginn = {local(file.start):%d.%m.%Y %H:%M:%S}",
             f"Punkte = {len(rows)}",
             f"Messzeit / s = {comma(dwell, 1)}",
             f"Laserleistung / W = {comma(section.reading, 3)}",
             f"Quelle / °C = {comma(source_temperature, 1)}",
             "Daten",
             "Position / µm;Zählung;Monitor / V;Dunkel"]
    lines += [f"{comma(position, 5)};{counts};{comma(monitor, 4)};{dark}" for position, counts, monitor, dark in rows]
    return ("\r\n".join(lines) + "\r\n").encode("iso-8859-1")


def comma_with_units(file, sections):
    """Dialect 3, pulsed bench: comma, units in the header row, several sections in one file, times in UTC."""
    lines = [f"pulsed bench; {HOUSE}"]
    for number, (section, start, shots, rows) in enumerate(sections, 1):
        lines += [f"[scan {number}]",
                  f"start,{start:%Y-%m-%dT%H:%M:%SZ}",
                  f"shots,{shots}",
                  f"pulse energy 2 (mJ),{section.reading:.3f}",
                  "position (nm),resonant,off-resonant"]
        lines += [f"{position:.2f},{on},{off}" for position, on, off in rows]
    return ("\n".join(lines) + "\n").encode("ascii")


def flight_trace(header, times, counts):
    """Time (ms, beginning or middle of the bin as the header says) and counts."""
    lines = [f"# {key}: {value}" for key, value in header] + ["time_ms\tcounts"]
    lines += [f"{time:.4f}\t{count}" for time, count in zip(times, counts)]
    return ("\n".join(lines) + "\n").encode("utf-8")


def slow_log(rows):
    """The logger's own clock, which is fast, in summer time to the end."""
    lines = ["time,laser power (W),pressure (mbar),hall temperature (Cel)"]
    lines += [f"{clock:%Y-%m-%dT%H:%M:%S},{power:.3f},{pressure:.2e},{temperature:.2f}"
              for clock, power, pressure, temperature in rows]
    return ("\n".join(lines) + "\n").encode("ascii")


def comma(number, digits):
    return f"{number:.{digits}f}".replace(".", ",")
