#!/usr/bin/python3
"""Makes the raw files of the demo lab and truth.json.

    /usr/bin/python3 generate.py                        the demo lab itself, into the folder above
    /usr/bin/python3 generate.py --seed 7 --out DIR     another throw of the dice of the same lab

Needs Python 3.11 and Debian's python3-numpy (1.24). The same seed gives the same bytes.
"""
import argparse
import json
import math
from datetime import datetime, timedelta
from pathlib import Path

import numpy as np

import counting
import dialects
import fringes
import flights
import lab
from plan import SPACING, SUMMER, days, local, shown_twice

SEED = 20311014
OPERATORS = {1: "Ottla Vireen", 2: "Bram Quillow", 3: "Ottla Vireen", 4: "Sefa Lindmoor"}
SOURCE_TEMPERATURE = {3: -118.0, 4: -121.5}             # of the cluster source, degrees Celsius
CLOCK_OFFSET = {1: 137, 2: 138, 3: 141, 4: 143}         # s, how much the logger's clock is fast


def scan_files(seed, planned, known):
    """Yields (file, bytes, truth rows) for every scan file of the lab."""
    written = {}
    for day in planned:
        wander = counting.random_for(seed, f"phase, day {day.number}")
        phase = 2 * math.pi * wander.random_sample()
        for file in day.files:
            if file.copy_of:
                yield file, written[file.copy_of], [dict(truth_of(file, 0, file.sections[0], None), copyOf=file.copy_of,
                                                         mishap="duplicate")]
                continue
            generator = counting.random_for(seed, file.name)
            blocks, rows_of_truth = [], []
            for number, section in enumerate(file.sections):
                phase += file.phase_step * wander.standard_normal()
                found = counting.expected(file, section, known, phase)
                blocks.append((section, *table(generator, file, section, found)))
                rows_of_truth.append(truth_of(file, number, section, (phase, *found)))
            written[file.name] = as_text(file, blocks)
            yield file, written[file.name], rows_of_truth


def table(generator, file, section, found):
    """Rows as the instrument writes them, in its own units."""
    positions, particles, _, dark, _, _ = found
    if file.bench == "pulsed":
        off = np.full(len(positions), particles.mean())
        return (list(zip(positions * 1e9, generator.poisson(particles + dark), generator.poisson(off + dark))),)
    bench = counting.BENCHES[file.bench]
    counts = counting.counted(generator, particles + dark, counting.DWELL[file.bench], bench.dead_time)
    if file.bench == "short":
        shown = positions * (1e6 if section.mishap == "wrong unit" else 1e9)
        return (list(zip(shown, np.minimum(counts, counting.FULL_SCALE))),)
    darks = generator.poisson(np.full(len(positions), dark))
    monitor = 0.012 + 2.4 * section.reading * (1 + 0.004 * generator.standard_normal(len(positions)))
    if section.mishap == "position jumps back":
        back = counting.JUMP_STEPS * counting.STEP["long"]
        positions = positions - back * (np.arange(len(positions)) >= counting.JUMP_ROW)
    return (list(zip(positions * 1e6, counts, monitor, darks)),)


def as_text(file, blocks):
    if file.bench == "pulsed":
        starts = [file.start + timedelta(seconds=SPACING["pulsed"] * number) for number in range(len(blocks))]
        return dialects.comma_with_units(file, [(section, start, counting.SHOTS, rows)
                                                for (section, rows), start in zip(blocks, starts)])
    section, rows = blocks[0]
    dwell = counting.DWELL[file.bench]
    if file.bench == "short":
        end = file.start + timedelta(seconds=round(len(rows) * dwell * 1.2))
        return dialects.tab_with_comments(file, section, rows, dwell, end, OPERATORS[file.day])
    return dialects.semicolon_with_decimal_comma(file, section, rows, dwell, SOURCE_TEMPERATURE[file.day])


def truth_of(file, number, section, found):
    start = file.start + timedelta(seconds=SPACING[file.bench] * number)
    truth = {"file": file.name, "section": number, "day": file.day, "bench": file.bench, "beam": file.beam,
             "purpose": section.purpose, "reading": section.reading, "start": f"{start:%Y-%m-%dT%H:%M:%SZ}"}
    truth.update({key: value for key, value in (("series", file.series), ("group", file.group),
                                                ("mishap", section.mishap)) if value})
    if section.step is not None:
        truth["step"] = section.step
    if file.bench == "pulsed":
        truth["trueEnergy"] = counting.true_energy(section.reading)
    else:
        truth["truePower"] = counting.true_power(file.day, section.reading)
    if found is None:
        return truth
    phase, _, _, mean, dark, relative, h = found
    first = complex(h[0]) * complex(math.cos(phase), math.sin(phase))
    lit = mean > 0 and abs(h[0]) > 1e-12
    truth.update(visibility=digits(abs(h[0])) if lit else 0.0, meanCounts=digits(mean), darkCounts=digits(dark),
                 flux=digits(relative))
    if lit:
        truth["phase"] = digits(math.atan2(first.imag, first.real))
        truth["signedVisibility"] = digits(h[0].real)
        truth["secondHarmonic"] = digits(abs(h[1]))
    return truth


def slow_logs(seed, planned):
    """The slow log of each night: laser power as metered, chamber pressure, temperature of the hall."""
    for day in planned:
        name = f"day-{day.number}/log-{day.number}.csv"
        generator = counting.random_for(seed, name)
        begin, end = day.files[0].start, day.files[-1].start + timedelta(seconds=600)
        count = int((end - begin).total_seconds() // 60)
        noise = generator.standard_normal((count, 3))
        rows = []
        for minute in range(count):
            moment = begin + timedelta(minutes=minute)
            running = [file for file in day.files if file.start <= moment][-1]
            power = 0.0 if running.bench == "pulsed" else running.sections[0].reading
            clock = (moment + timedelta(seconds=CLOCK_OFFSET[day.number])).astimezone(SUMMER)
            rows.append((clock, power * (1 + 0.003 * noise[minute, 0]), 2.1e-8 * (1 + 0.05 * noise[minute, 1]),
                         21.4 + 0.6 * math.sin(minute / 170) + 0.03 * noise[minute, 2]))
        yield name, dialects.slow_log(rows)


def digits(value, count=9):
    return float(f"{float(value):.{count - 1}e}")


def whole_lab(seed, known=None):
    """{path: bytes} of the raw files, and the truth."""
    planned = days()
    known = known or counting.tables(planned)
    files, scans, velocities = {}, [], []
    for file, content, rows in scan_files(seed, planned, known):
        files[file.name] = content
        scans += rows
    for day in planned:
        for key in dict.fromkeys(file.beam for file in day.files if file.beam in lab.BEAMS):
            mean, deviation = lab.BEAMS[key].moments()
            first = next(file for file in day.files if file.beam == key)
            start = first.start - timedelta(minutes=25)
            for name, content in flights.traces(seed, day.number, key, start):
                files[name] = content
                velocities.append({"file": name, "beam": key, "day": day.number, "mean": digits(mean),
                                   "standardDeviation": digits(deviation)})
    for name, content in slow_logs(seed, planned):
        files[name] = content
    return files, truth_text(seed, scans, velocities)


def truth_text(seed, scans, velocities):
    compounds = [{"name": lab.FAN.label, "mass": lab.FAN.mean(0), "polarizabilityVolume": 420e-30,
                  "absorptionCrossSection": 2.5e-21, "wavelength": lab.GAMMA_GREEN},
                 {"name": lab.VANE.label, "mass": lab.VANE.mean(0), "polarizabilityVolume": 170e-30,
                  "absorptionCrossSection": 0.0, "wavelength": lab.GAMMA_GREEN},
                 {"name": lab.VANE.label, "mass": lab.VANE.mean(0), "polarizabilityVolume": 210e-30,
                  "depletionCrossSection": 2.6e-20, "wavelength": lab.GAMMA_ULTRAVIOLET},
                 {"name": lab.CLUSTER.label, "mass": lab.CLUSTER.mean(0), "massDeviation":
                     lab.CLUSTER_DEVIATION * lab.WEIGHT["Y"] * lab.DALTON,
                  "polarizabilityVolume": lab.CLUSTER_MEAN * lab.ATOM_VOLUME, "polarizabilityVolumePerAtom":
                     lab.ATOM_VOLUME, "absorptionCrossSection": lab.CLUSTER_MEAN * lab.ATOM_CROSS_SECTION,
                  "wavelength": lab.GAMMA_GREEN}]
    benches = [{"bench": bench.key, "separation": bench.separation, "contrast": bench.contrast, "period": bench.period,
                "openFraction": bench.open_fraction, "waistAcross": bench.waist, "beamHeight": bench.height,
                "darkRate": bench.dark, "deadTime": bench.dead_time} for bench in (lab.SHORT, lab.LONG)]
    benches.append({"bench": "pulsed", "period": lab.PULSED.period, "pulseSeparation": lab.PULSED.pulse_separation,
                    "contrast": lab.PULSED.contrast, "beamArea": lab.PULSED.area,
                    "outerPulseEnergy": lab.PULSED.outer_energy, "darkPerShot": lab.PULSED.dark_per_shot})
    parts = {"invented": True,
             "note": "Known truth of the demo lab, for tests only. SI units. visibility, phase: counts = dark + mean "
                     "(1 + visibility cos(2 pi x / period + phase) + ...); mean and dark counts are those expected in "
                     "one row before dead time.",
             "seed": seed, "compounds": compounds, "benches": benches,
             "calibrations": [{"what": "power meter", "days": [1, 2], "factor": lab.POWER_FACTOR[1]},
                              {"what": "power meter", "days": [3, 4], "factor": lab.POWER_FACTOR[3]},
                              {"what": "energy meter", "days": [2], "factor": lab.ENERGY_FACTOR}],
             "clockOffsets": [{"day": day, "seconds": seconds} for day, seconds in CLOCK_OFFSET.items()],
             "typedWrong": {"bench": "short", "separation": lab.SHORT_TYPED_SEPARATION, "true": lab.SHORT.separation},
             "flightDistance": flights.DISTANCE, "mishaps": mishaps(scans)}
    text = json.dumps(parts, indent=1, ensure_ascii=False)[:-2]
    for name, rows in (("velocities", velocities), ("scans", scans)):
        text += f',\n "{name}": [\n  ' + ",\n  ".join(json.dumps(row) for row in rows) + "\n ]"
    return text + "\n}\n"


def mishaps(scans):
    """What went wrong, with the files in which it shows."""
    found = {}
    for truth in scans:
        if "mishap" in truth:
            found.setdefault(truth["mishap"], []).append(truth["file"])
    found["clock change: wall clock shows the hour for the second time"] = [
        truth["file"] for truth in scans
        if truth["bench"] == "long" and shown_twice(datetime.fromisoformat(truth["start"]))]
    return [{"what": what, "files": names} for what, names in found.items()]


def one_known_value():
    """A printed remark, not a source of anything: one point against the published form of the Talbot coefficient."""
    from propagation import harmonics, patterns, phase_grating, signal, slits
    pattern, = patterns(0.5, [phase_grating(3.0, 1.0)])
    _, h = harmonics(signal(pattern, slits(0.42), slits(0.42)))
    print(f"phase 3 rad, 1 photon, L = L_T / 2, open fraction 0.42: visibility {h[0].real:.5f}; "
          "closed form with kernel 'standing mode, coherent': 0.44404")


def write(folder, files, truth):
    for name, content in files.items():
        path = folder / "raw" / name
        path.parent.mkdir(parents=True, exist_ok=True)
        path.write_bytes(content)
    (folder / "truth.json").write_bytes(truth.encode("utf-8"))


def main():
    parser = argparse.ArgumentParser(description="Makes the raw files of the invented demo lab and their truth.")
    parser.add_argument("--seed", type=int, default=SEED)
    parser.add_argument("--out", type=Path, default=Path(__file__).resolve().parent.parent)
    asked = parser.parse_args()
    one_known_value()
    files, truth = whole_lab(asked.seed)
    write(asked.out, files, truth)
    print(f"{len(files)} raw files, {sum(map(len, files.values()))} bytes, into {asked.out}")


if __name__ == "__main__":
    main()
