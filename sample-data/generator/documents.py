#!/usr/bin/python3
"""Writes lab/lab.json: what the people of the demo lab entered, in order, with time and person.

Knows the plan of the nights, never the truth: every number here is what these people believed.
"""
import json
from datetime import datetime, timedelta, timezone
from pathlib import Path

import flights
from generate import OPERATORS
from plan import CLUSTER_POWERS, ENERGIES, FAN_POWERS, SPACING, VANE_POWERS, days, local, shown_twice

VIREEN, QUILLOW, LINDMOOR = "Ottla Vireen", "Bram Quillow", "Sefa Lindmoor"
ZONE = "CET"
PROFILES = {"short": "reading-profile 1", "long": "reading-profile 2", "pulsed": "reading-profile 3"}
SETUPS = {"short": "setup 1", "long": "setup 2", "pulsed": "setup 3"}
BATCHES = {"fan": "batch 1", "vane": "batch 2", "cluster": "batch 3"}
SERIES = {"fan power, day 1": ("laser power", "W", FAN_POWERS, 1.0), "vane power, day 2":
          ("laser power", "W", VANE_POWERS, 1.8), "vane energy, day 2": ("pulse energy 2", "mJ", ENERGIES, None),
          "fan power, day 3": ("laser power", "W", FAN_POWERS, 1.0), "cluster power, day 3":
          ("laser power", "W", CLUSTER_POWERS, 0.4), "cluster power, day 4": ("laser power", "W", CLUSTER_POWERS, 0.4)}
FLIGHT_WINDOWS = {"fan, day 1": ("55 m/s", "150 m/s"), "vane, day 2": ("85 m/s", "215 m/s"),
                  "fan, day 3": ("42 m/s", "115 m/s"), "cluster, day 3": ("85 m/s", "165 m/s"),
                  "fan, day 4": ("55 m/s", "150 m/s"), "cluster, day 4": ("78 m/s", "155 m/s")}


CLUSTER_SIZES = ((288, 0.056), (294, 0.487), (300, 1.0), (306, 0.487), (312, 0.056))


class Script:
    """The steps in order; the clock runs on by half a minute from step to step unless it is set."""

    def __init__(self, begin):
        self.now, self.person, self.steps, self.counters = begin, VIREEN, [], {}
        self.judgements = {}                   # file: (name of the judgement, why a selection leaves it out)

    def at(self, moment, person):
        assert moment >= self.now, (moment, self.now)
        self.now, self.person = moment, person

    def step(self, name, **members):
        self.now += timedelta(seconds=30)
        self.steps.append({"n": len(self.steps) + 1, "at": f"{self.now:%Y-%m-%dT%H:%M:%SZ}", "person": self.person,
                           "step": name, **members})

    def record(self, *documents):
        """Records; answers the name people use for the last one, such as 'setup 2'."""
        self.step("record", documents=list(documents))
        return [self.named(document) for document in documents][-1]

    def named(self, document):
        """The name of a new thing; what corrects or comes after another keeps that one's."""
        for link in ("corrects", "after"):
            if link in document:
                return document[link] if link == "corrects" else document[link]["record"]
        kind = document["kind"]
        self.counters[kind] = self.counters.get(kind, 0) + 1
        return f"{kind} {self.counters[kind]}"


def moment(instant):
    offset = local(instant).strftime("%z")
    return {"at": f"{instant:%Y-%m-%dT%H:%M:%SZ}", "offset": f"{offset[:3]}:{offset[3:]}", "zone": ZONE}


def scan(name, section=0):
    return f"scan of {name}" + (f" section {section}" if section else "")


# ---------------------------------------------------------------- before the first night

def substances(script):
    mass = {"method": "compound.mass/1", "constants": "CODATA 2018", "charge": 0}
    script.record(
        {"kind": "compound", "identity": {"names": ["demo fan"]},
         "choices": {**mass, "composition": {"sort": "formula", "formula": "C132H54F136N4O8"}},
         "remark": "Invented compound; no such molecule is known."},
        {"kind": "compound", "identity": {"names": ["demo vane"]},
         "choices": {**mass, "composition": {"sort": "formula", "formula": "C96H42F64N4O12S2"}},
         "remark": "Invented compound; no such molecule is known."},
        {"kind": "compound", "identity": {"names": ["demo yttrium clusters"]},
         "choices": {**mass, "composition": {
             "sort": "cluster", "unit": "Y", "sizes": {"sort": "list", "shares": [
                 {"size": size, "share": share} for size, share in CLUSTER_SIZES]},
             "window": {"from": "25300 u", "to": "28000 u"}}},
         "remark": "Sizes behind the mass filter, in steps of six atoms, as a scan of the filter showed them."})
    received = moment(datetime(2031, 9, 22, 9, 30, tzinfo=timezone.utc))
    script.record(
        {"kind": "batch", "about": [{"role": "compound", "record": "compound 1"}],
         "content": {"label": "FAN-3", "cautions": ["dust", "toxic"], "acknowledged": True, "amount": "38 mg",
                     "purity": "0.96(2)", "received": received, "storage": "closed vial, dry, in the fume cupboard"},
         "identity": {"supplier": "made in the demo lab's own kitchen of formulas", "lot": "3"}},
        {"kind": "batch", "about": [{"role": "compound", "record": "compound 2"}],
         "content": {"label": "VANE-1", "cautions": ["dust", "toxic", "light-sensitive"], "acknowledged": True,
                     "amount": "21 mg", "purity": "0.98(1)", "received": received, "storage": "brown vial, dry"}},
        {"kind": "batch", "about": [{"role": "compound", "record": "compound 3"}],
         "content": {"label": "Y rod 2", "cautions": ["dust", "flammable"], "acknowledged": True,
                     "amount": "54 g", "purity": "0.999(1)", "received": received, "storage": "under argon"}})


def slit_grating(name):
    return {"sort": "material", "name": name, "period": "266.0(1) nm", "openFraction": "0.420(5)",
            "thickness": "160(10) nm"}


def green_light(waist, power):
    return {"sort": "standing-wave", "name": "light", "laser": {
        "wavelength": "532.0(1) nm", "power": power, "waistAcross": waist, "waistAlong": "20(2) um",
        "reflectivity": "1 exact", "polarization": "along-lines"}}


def short_bench(separation):
    return {"label": "short bench", "gratings": [slit_grating("first"), green_light("0.900(9) mm", "4 W"),
                                                 slit_grating("third")],
            "separations": [separation, separation], "beam": {"height": "0.20(1) mm", "width": "1.0(1) mm"},
            "detector": {"sort": "electron-impact", "responds": "flux"},
            "vacuum": {"pressure": "2.1e-8 mbar", "gas": "residual gas", "temperature": "294 K"},
            "cautions": ["class-4-laser", "oven", "vacuum", "high-voltage"], "acknowledged": True}


def benches(script):
    script.record({"kind": "setup", "content": short_bench("150.0(1) mm")})
    script.record({"kind": "setup", "content": {
        "label": "long bench", "gratings": [slit_grating("first"), green_light("1.00(1) mm", "1 W"),
                                            slit_grating("third")],
        "separations": ["980.0(2) mm", "980.0(2) mm"], "beam": {"height": "0.30(1) mm", "width": "1.0(1) mm"},
        "detector": {"sort": "electron-multiplier", "responds": "flux", "deadTime": "60(2) us",
                     "deadTimeSort": "fixed"},
        "vacuum": {"pressure": "2.1e-8 mbar", "gas": "residual gas", "temperature": "294 K"},
        "cautions": ["class-4-laser", "high-voltage", "vacuum", "dust", "gas-under-pressure"], "acknowledged": True}})
    pulse = {"wavelength": "157.63(1) nm", "pulseLength": "10 ns", "reflectivity": "1 exact"}

    def light(name, energy):
        return {"sort": "depletion", "name": name, "laser": {**pulse, "pulseEnergy": energy}}
    script.record({"kind": "setup", "content": {
        "label": "pulsed bench", "gratings": [light("first pulse", "0.445(9) mJ"), light("second pulse", "0.16 mJ"),
                                              light("third pulse", "0.445(9) mJ")],
        "separations": ["18.4(1) mm", "18.4(1) mm"], "delays": ["30.000(5) us", "30.000(5) us"],
        "detector": {"sort": "laser-ionisation", "responds": "density"},
        "cautions": ["ultraviolet-laser", "class-4-laser", "high-voltage", "vacuum", "gas-under-pressure"],
        "acknowledged": True,
        "words": [{"name": "beam profile of the pulses", "text": "flat, 8.0 square millimetres"}]}})


def power_scale(scale, deviation, begin, **links):
    return {"kind": "calibration", "content": {
        "what": "power-scale", "model": "calibration.scale/1", "label": "power meter of the green laser",
        "parameters": [{"name": "scale", "value": scale, "unit": "1"}], "covariance": [round(deviation**2, 12)],
        "valid": {"from": begin}}, **links}


def reading(script):
    script.record({"kind": "reading-profile", "content": {
        "label": "short bench, tab", "form": "delimited/1", "encoding": "UTF-8", "delimiter": "\t", "decimal": ".",
        "comment": "#", "skip": 1, "keySeparator": ":", "direction": "up",
        "columns": [{"axis": "position", "unit": "nm", "header": "position_nm", "positions": "set"},
                    {"channel": "counts", "number": 2, "saturation": 4095}],
        "header": [{"key": "start", "moment": "start", "required": True}, {"key": "end", "moment": "end"},
                   {"key": "points", "rows": True}, {"key": "dwell", "exposure": True, "unit": "s", "required": True},
                   {"key": "laser power", "setting": "laser power", "unit": "W", "deviation": "0.001"},
                   {"key": "operator", "personal": True}]}})
    script.record({"kind": "reading-profile", "content": {
        "label": "long bench, semicolon", "form": "delimited/1", "encoding": "ISO-8859-1", "delimiter": ";",
        "decimal": ",", "dataMarker": "Daten", "skip": 1, "keySeparator": "=", "direction": "up",
        "columns": [{"axis": "position", "unit": "um", "header": "Position / µm", "positions": "read"},
                    {"channel": "counts", "header": "Zählung"},
                    {"channel": "monitor", "header": "Monitor / V", "unit": "V", "means": "monitor"},
                    {"channel": "dark", "header": "Dunkel", "means": "dark", "highest": 5}],
        "header": [{"key": "Beginn", "moment": "start", "format": "dd.MM.yyyy HH:mm:ss", "zone": ZONE,
                    "required": True},
                   {"key": "Punkte", "rows": True},
                   {"key": "Messzeit / s", "exposure": True, "unit": "s", "required": True},
                   {"key": "Laserleistung / W", "setting": "laser power", "unit": "W",
                    "deviation": "0.001"},
                   {"key": "Quelle / °C", "setting": "source temperature", "unit": "Cel"}],
        "note": "The clock is the wall clock and changes with summer time."}})
    script.record({"kind": "reading-profile", "content": {
        "label": "pulsed bench, comma", "form": "delimited/1", "encoding": "US-ASCII", "delimiter": ",",
        "decimal": ".", "sectionMarker": "[scan", "skip": 4, "keySeparator": ",", "direction": "up",
        "columns": [{"axis": "position", "unit": "nm", "header": "position (nm)", "positions": "set"},
                    {"channel": "resonant", "header": "resonant"},
                    {"channel": "off-resonant", "header": "off-resonant", "means": "off-resonant"}],
        "header": [{"key": "start", "moment": "start", "required": True},
                   {"key": "shots", "shots": True, "required": True},
                   {"key": "pulse energy 2 (mJ)", "setting": "pulse energy 2", "unit": "mJ"}]}})


# ---------------------------------------------------------------- the nights

RUNS = {  # beam: sort of source, settings, cautions
    "fan, day 1": ("effusive", [("oven temperature", "742(5) K")], ["oven", "vacuum", "dust"]),
    "vane, day 2": ("effusive", [("oven temperature", "688(5) K")], ["oven", "vacuum", "dust"]),
    "vane, pulsed": ("pulsed-valve", [("valve temperature", "655(5) K"), ("gas pressure", "2.0(1) bar")],
                     ["gas-under-pressure", "vacuum", "high-voltage"]),
    "fan, day 3": ("effusive", [("oven temperature", "716(5) K")], ["oven", "vacuum", "dust"]),
    "cluster, day 3": ("sputter-aggregation", [("aggregation temperature", "-118.0(5) Cel")],
                       ["high-voltage", "vacuum", "gas-under-pressure", "cryogen", "dust"]),
    "fan, day 4": ("effusive", [("oven temperature", "742(5) K")], ["oven", "vacuum", "dust"]),
    "cluster, day 4": ("sputter-aggregation", [("aggregation temperature", "-121.5(5) Cel")],
                       ["high-voltage", "vacuum", "gas-under-pressure", "cryogen", "dust"]),
}


def run(script, beam, first, last):
    sort, settings, cautions = RUNS[beam]
    return script.record({"kind": "source-run", "about": [{"role": "batch", "record": BATCHES[beam.split(",")[0]]}],
                          "content": {"label": beam, "source": sort, "cautions": cautions, "acknowledged": True,
                                      "settings": [{"name": name, "quantity": value} for name, value in settings],
                                      "started": moment(first - timedelta(minutes=50)), "ended": moment(last)}})


def velocities(script, day, beam, run_name):
    """Two flight traces of one run; the pulsed beam's velocity is quoted."""
    about = [{"role": "run", "record": run_name}]
    if beam == "vane, pulsed":
        return [script.record({"kind": "velocity", "about": about, "content": {
            "label": "pulsed beam", "origin": "from the delay between valve and detection laser, entered by hand",
            "mean": "612(6) m/s", "spread": "18(2) m/s", "shape": "normal"}})]
    key = beam.split(",")[0]
    window = dict(zip(("from", "to"), FLIGHT_WINDOWS[beam]))
    common = {"constants": "CODATA 2018", "distance": "1480(3) mm", "detector": "flux", **window}
    law = {"shape": "shifted-flux", "background": "fitted"}
    trace = {"shape": "as-measured", "background": "outside-window"}
    columns = {"encoding": "UTF-8", "delimiter": "tab", "decimal": ".", "comment": "#", "skip": 1,
               "timeColumn": 0, "timeUnit": "ms", "countsColumn": 1}
    names = [f"day-{day}/tf-{day}-{key}-{sort}.txt" for sort in ("single", "random")]
    single = {"method": "velocity.flight-single-slot/1", **common, **law, "label": f"{beam}, one slot",
              "timeZero": "0.350(20) ms", "slotOpening": "0.40 ms", "reading": columns}
    random = {"method": "velocity.flight-pseudo-random/1", **common, **(trace if key == "vane" else law),
              "label": f"{beam}, pseudo-random",
              "timeZero": "0.000(20) ms", "binWidth": "0.25 ms exact", "direction": "forward",
              "sequence": "".join(map(str, flights.sequence())), "reading": columns}
    return [script.record({"kind": "velocity", "about": about, "inputs": [{"role": "trace", "raw": name}],
                           "choices": {**choices, "file": {"name": name.split("/")[1]}}})
            for name, choices in zip(names, (single, random))]


def log(script, day, offset):
    script.record({"kind": "monitor-log", "inputs": [{"role": "raw", "raw": f"day-{day.number}/log-{day.number}.csv"}],
                   "choices": {"method": "monitor.read/1", "constants": "CODATA 2018",
                               "file": {"name": f"log-{day.number}.csv"}, "encoding": "UTF-8", "delimiter": ",",
                               "decimal": ".", "header": True, "time": {"column": 0, "form": "iso", "offset": "+02:00"},
                               "columns": [{"column": 1, "name": "laser power", "unit": "W"},
                                           {"column": 2, "name": "chamber pressure", "unit": "mbar"},
                                           {"column": 3, "name": "hall temperature", "unit": "Cel"}],
                               "clockOffset": f"{offset}(2) s"}})


def series(script, name):
    varied, unit, values, reference = SERIES[name]
    digits = 2 if unit == "mJ" or max(values) <= 1 else 1
    steps = [{"quantity": f"{value:.{digits}f} {unit}"} for value in values]
    if reference is not None:
        steps.append({"quantity": f"{reference:.{digits}f} {unit}", "purpose": "reference"})
    content = {"label": name, "varied": varied, "steps": steps}
    if reference is not None:
        content["pattern"] = "A/B/A"
    bench = "pulsed" if reference is None else "long" if name.startswith("cluster") else "short"
    return script.record({"kind": "series", "about": [{"role": "setup", "record": SETUPS[bench]}], "content": content})


def place(script, day, beam, run_name, velocity_names, series_names):
    """All scans of one beam in one act; each says its purpose, and its step where it belongs to a series."""
    files = [file for file in day.files if file.beam == beam and not left_unread(file)]
    placements = []
    for file in files:
        for number, section in enumerate(file.sections):
            one = {"scan": scan(file.name, number), "purpose": section.purpose}
            if file.series and section.purpose in ("signal", "reference") and not section.mishap:
                one["series"] = series_names[file.series]
                one["step"] = section.step if section.step is not None else len(SERIES[file.series][2])
            placements.append(one)
    script.step("place", setup=SETUPS[files[0].bench], run=run_name, velocities=velocity_names, scans=placements)


def left_unread(file):
    """No scan comes of a file that is refused or is already there."""
    return bool(file.copy_of) or file.sections[0].mishap == "cut in the middle of a row"


def take_in(script, day):
    for bench, profile in PROFILES.items():
        files = [file.name for file in day.files if file.bench == bench]
        if files:
            script.step("take-in", files=files, profile=profile)


def fits(script, day, beam):
    """One fit for every fringe that stands, and one for each group of weak scans."""
    files = [file for file in day.files if file.beam == beam and not left_unread(file)]
    choices = fit_choices(files[0].bench)
    channel = "resonant" if files[0].bench == "pulsed" else "counts"
    background = [scan(file.name) for file in files if background_of(file)] or earlier_background(day, files[0].bench)
    each = [scan(file.name, number) for file in files for number, section in enumerate(file.sections)
            if section.purpose in ("signal", "reference", "laser-off") and not file.group
            and section.mishap not in WITHDRAWN and section.mishap != "drift"]
    pinned = {"background": background} if choices["background"]["sort"] == "scan" else {}
    if beam == "cluster, day 4":
        signals, around = between_references(files)
        script.step("fit", each=signals, references=around, channel=channel,
                    choices={**choices, "references": "normalised"})
        each = [one for one in each if one not in signals]
    script.step("fit", each=each, channel=channel, choices=choices, **pinned)
    drifting = [scan(file.name) for file in files if file.sections[0].mishap == "drift"]
    if drifting:
        script.step("fit", each=drifting, channel=channel, choices={**choices, "driftOrder": 1}, **pinned)
    for group in dict.fromkeys(file.group for file in files if file.group):
        together = [scan(file.name) for file in files if file.group == group]
        combine = "joint" if group == "weak, day 4" else "sum"
        script.step("fit", together=together, channel=channel, choices={**choices, "combine": combine}, **pinned)


def between_references(files):
    """Signals of the series, and for each the reference before and the one after it."""
    series_files = [file for file in files if file.series]
    places = [place for place, file in enumerate(series_files) if file.sections[0].purpose == "signal"]
    return ([scan(series_files[place].name) for place in places],
            [[scan(series_files[place - 1].name), scan(series_files[place + 1].name)] for place in places])


def earlier_background(day, bench):
    """A night without a background scan of its own takes the last one of the same bench."""
    earlier = [file for other in days() if other.number < day.number for file in other.files
               if file.bench == bench and background_of(file)]
    return [scan(earlier[-1].name)] if earlier else []


def background_of(file):
    wanted = "empty-beam" if file.bench == "pulsed" else "background"
    return file.sections[0].purpose == wanted and not file.sections[0].mishap


def fit_choices(bench):
    """What was asked; period and dead time come from the setup."""
    common = {"method": "fringe.poisson-likelihood/1", "constants": "CODATA 2018", "combine": "single",
              "driftOrder": 0}
    if bench == "long":
        return {**common, "deadTime": {"sort": "setup"}, "background": {"sort": "channel", "channel": "dark"}}
    return {**common, "deadTime": {"sort": "none"}, "background": {"sort": "scan"}}


# ---------------------------------------------------------------- what was judged

WITHDRAWN = {"truncated": ("truncated", "The file ends after 17 of 28 rows; the program was stopped."),
             "saturated": ("saturated", "Source far too hot; the counter stands at its upper end."),
             "wrong unit": ("wrong-unit", "Positions are micrometres, the header says nanometres."),
             "light leak": ("light-leak", "Lamp in the hall was on with the window open.")}
MASKED = {"mode hop": ("mode-hop", [[14, 27]], "The laser jumped to another mode half-way."),
          "position jumps back": ("position-fault", [[20, 31]], "The encoder lost steps from row 20 on.")}
DOUBTED = {"drift": ("drift", "Flux fell by almost half during the scan; fitted with a slope.")}


def judge(script, day):
    for file in day.files:
        mishap = file.sections[0].mishap
        target = {"role": "target", "record": scan(file.name), "reach": "record"}
        if mishap in WITHDRAWN:
            code, words = WITHDRAWN[mishap]
            content, left = {"verdict": "withdrawn", "reason": code}, "withdrawn"
        elif mishap in MASKED:
            code, points, words = MASKED[mishap]
            content = {"verdict": "masked", "reason": code, "channel": "counts", "points": points}
            left = "by-hand"
        elif mishap in DOUBTED:
            code, words = DOUBTED[mishap]
            content, left = {"verdict": "doubted", "reason": code}, "drifting"
        else:
            continue
        name = script.record({"kind": "judgement", "about": [target], "content": content, "remark": words})
        script.judgements[file.name] = (name, left)


def clock_change(script, day):
    """Scans the wall clock shows for the second time are read anew with the begin entered by hand."""
    twice = [file for file in day.files if file.bench == "long" and shown_twice(file.start)]
    if twice:
        script.record({"kind": "note", "about": [{"role": "subject", "record": SETUPS["long"]}], "content": {
            "heading": "The long bench's clock shows an hour twice tonight",
            "at": moment(twice[0].start)},
            "remark": "Its files tell no offset. Begin of the second pass is taken from the day sheet."})
        script.record(*[{"kind": "scan", "corrects": scan(file.name), "remark": "Taken after the clock was put back.",
                         "inputs": [{"role": "raw", "raw": file.name},
                                    {"role": "profile", "record": PROFILES["long"]}],
                         "choices": {"method": "scan.read/1", "constants": "CODATA 2018", "section": 0,
                                     "file": {"name": file.name.split("/")[1]}, "start": moment(file.start)}}
                        for file in twice])


def night(script, day, offset, known_series):
    end = day.files[-1].start + timedelta(seconds=SPACING[day.files[-1].bench] * len(day.files[-1].sections))
    take_in(script, day)
    clock_change(script, day)
    judge(script, day)
    for beam in dict.fromkeys(file.beam for file in day.files):
        files = [file for file in day.files if file.beam == beam]
        run_name = run(script, beam, files[0].start, min(end, files[-1].start + timedelta(minutes=10)))
        velocity_names = velocities(script, day.number, beam, run_name)
        for name in dict.fromkeys(file.series for file in files if file.series):
            known_series[name] = series(script, name)
        # the trace of the pseudo-random chopper counts far more particles; the other one stands to compare
        place(script, day, beam, run_name, velocity_names[-1:], known_series)
        fits(script, day, beam)
    log(script, day, offset)


def main():
    script = Script(datetime(2031, 10, 13, 8, 0, tzinfo=timezone.utc))
    substances(script)
    benches(script)
    script.record(power_scale(0.980, 0.008, "2031-09-01T06:00:00Z"))
    reading(script)
    known_series = {}
    for day in days():
        if day.number == 3:
            script.at(datetime(2031, 10, 21, 10, 0, tzinfo=timezone.utc), QUILLOW)
            script.record(power_scale(1.035, 0.008, "2031-10-21T10:00:00Z",
                                      after={"record": "calibration 1", "from": "2031-10-21T10:00:00Z"},
                                      remark="New head on the power meter, compared with the standing one."))
        if day.number == 4:
            script.at(day.begin.astimezone(timezone.utc) - timedelta(minutes=90), LINDMOOR)
            script.record({"kind": "setup", "content": short_bench("105.0(1) mm"), "corrects": "setup 1",
                           "remark": "The separation was typed wrong; measured again with the long caliper."})
        end = day.files[-1].start + timedelta(minutes=20)
        script.at(end, OPERATORS[day.number])
        night(script, day, {1: 138, 2: 138, 3: 140, 4: 142}[day.number], known_series)
    again(script)
    results(script, script.judgements)
    lab = {"title": "demo lab", "invented": True, "dayBoundary": "06:00", "zone": ZONE,
           "persons": [{"name": name} for name in (VIREEN, QUILLOW, LINDMOOR)],
           "founded": "2031-10-13T07:55:00Z", "rawFolder": "../raw", "steps": script.steps}
    return text_of(lab)


def again(script):
    """After the correction of the setup, the power series of the short bench are fitted anew."""
    for day in days():
        for name in dict.fromkeys(file.series for file in day.files if file.bench == "short" and file.series):
            files = [file for file in day.files if file.series == name and not file.sections[0].mishap]
            background = [scan(file.name) for file in day.files if file.beam == files[0].beam and background_of(file)]
            script.step("fit", each=[scan(file.name) for file in files], again=True, channel="counts",
                        choices=fit_choices("short"), background=background)


# ---------------------------------------------------------------- what was made of it

POWER_SERIES = ("fan power, day 1", "fan power, day 3", "vane power, day 2", "cluster power, day 3",
                "cluster power, day 4")


def results(script, judgements):
    """Selections of the fits that a property rests on, with what was left out and why."""
    script.now += timedelta(hours=30)
    for name in POWER_SERIES:
        select(script, name, judgements)
    script.record(
        {"kind": "quoted", "about": [{"role": "compound", "record": "compound 1"}], "content": {
            "what": "polarizability-volume", "of": "demo fan", "quantity": "431(22) Ao3", "how": "calculated",
            "source": "Invented for the demo lab; no such calculation exists.", "conditions": "532 nm"}},
        {"kind": "quoted", "about": [{"role": "compound", "record": "compound 2"}], "content": {
            "what": "polarizability-volume", "of": "demo vane", "quantity": "176(12) Ao3", "how": "calculated",
            "source": "Invented for the demo lab; no such calculation exists.", "conditions": "532 nm"}})
    properties(script)
    figure(script)
    statements(script)


def properties(script):
    """Polarizabilities; the vane's series ends before its first maximum, so its factor is that of the bench."""
    free = {"crossSection": {"sort": "free"}, "factor": {"sort": "free"}}
    held = {"crossSection": {"sort": "none"}, "factor": {"sort": "given", "value": 0.96}}
    for selection, asked in (("selection 1", free), ("selection 2", free), ("selection 3", held),
                             ("selection 4", free)):
        script.step("property", selection=selection, choices={
            "method": "property.polarizability-power/1", "constants": "CODATA 2018", "description": "quantum",
            "powerSetting": "laser power", "bias": "noise-subtracted", "recoil": "standing-mode-coherent",
            "heightNodes": 2, **asked})


def figure(script):
    """Three curves of visibility against power, and the polarizability volumes beside a quoted one."""
    def curves(place):
        return [{"input": place, "series": "quantum-band", "label": "", "tone": "quantum"},
                {"input": place, "series": "quantum", "label": "matter waves", "tone": "quantum"},
                {"input": place, "series": "classical", "label": "point particles", "tone": "classical",
                 "stroke": "dashed"},
                {"input": place, "series": "points", "label": "measured", "tone": "ink", "shape": "dot"}]

    visibility = {"label": "visibility", "unit": "1", "from": 0}
    panels = [{"name": name, "heading": heading, "legend": name == "a", "y": visibility,
               "x": {"label": "laser power", "unit": "W", "from": 0, "to": greatest}, "series": curves(place)}
              for name, heading, place, greatest in (("a", "demo fan, first night", 0, 4.2),
                                                     ("b", "demo vane, short of the first maximum", 2, 2.6),
                                                     ("c", "yttrium clusters", 3, 1.1))]
    panels.append({"name": "d", "heading": "polarizability volume of demo fan", "legend": True,
                   "x": {"label": "night", "unit": "1", "from": 0, "to": 4},
                   "y": {"label": "polarizability volume", "unit": "Ao3"}, "series": [
                       {"input": 0, "series": "value", "estimate": "polarizabilityVolume", "at": 1,
                        "label": "first night", "tone": "ink", "shape": "dot"},
                       {"input": 1, "series": "value", "estimate": "polarizabilityVolume", "at": 3,
                        "label": "third night", "tone": "ink", "shape": "circle"},
                       {"input": 4, "series": "value", "label": "calculated (invented)", "tone": "quiet",
                        "stroke": "dotted"}]})
    script.record({"kind": "figure", "inputs": [
        *({"role": "series", "record": f"property {number}"} for number in range(1, 5)),
        {"role": "value", "record": "quoted 1"}],
        "choices": {"method": "figure.table/1", "constants": "CODATA 2018", "title": "Visibility against laser power",
                    "caption": "Invented data of the demo lab. Visibility against laser power with both descriptions, "
                               "and the polarizability volume of demo fan on two nights beside a calculated value.",
                    "widthMillimetres": 170, "heightMillimetres": 130, "panelsInRow": 2, "panels": panels}})


def statements(script):
    """Numbers as printed in the lab's invented paper."""
    script.record(*[{"kind": "statement", "inputs": [{"role": "of", "record": record}], "content": {
        "pointer": "/polarizabilityVolume", "printed": printed, "unit": "Ao3", "uncertainty": "combined",
        "rounding": {"sort": "decimals", "digits": 0}, "where": where}}
        for record, printed, where in (("property 1", "420(7)", "abstract of an invented paper"),
                                       ("property 3", "167(4)", "table 2 of an invented paper"))])


def select(script, name, judgements):
    files = [file for day in days() for file in day.files if file.series == name]
    beam = files[0].beam
    taken = [{"role": "taken", "record": fit(file.name)} for file in files]
    spoilt = [file for day in days() for file in day.files
              if file.beam == beam and file.sections[0].purpose == "reference" and file.name in judgements]
    because = [{"role": "because", "record": judgements[file.name][0]} for file in spoilt]
    left = [{"about": place, "reason": judgements[file.name][1], "because": len(taken) + place}
            for place, file in enumerate(spoilt)]
    script.record({"kind": "selection", "inputs": taken + because,
                   "about": [{"role": "left-out", "record": scan(file.name)} for file in spoilt],
                   "content": {"label": name, "conditions": [], "left": left,
                               "rule": f"Signals and references of the series '{name}'; no scan that was withdrawn, "
                                       "masked or doubted."}})


def fit(name):
    return f"fit of {name}"


def text_of(lab):
    """One line for each step, so that a change shows as a change of lines."""
    steps = lab.pop("steps")
    head = json.dumps(lab, indent=1, ensure_ascii=False)[:-2]
    lines = ",\n  ".join(json.dumps(step, ensure_ascii=False) for step in steps)
    return f'{head},\n "steps": [\n  {lines}\n ]\n}}\n'


if __name__ == "__main__":
    target = Path(__file__).resolve().parent.parent / "lab" / "lab.json"
    target.parent.mkdir(exist_ok=True)
    target.write_bytes(main().encode("utf-8"))
