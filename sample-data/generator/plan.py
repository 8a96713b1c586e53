"""The four measurement days, scan by scan, in the order in which they were taken."""
from dataclasses import dataclass, field, replace
from datetime import datetime, timedelta, timezone

FAN_POWERS = (0.2, 0.4, 0.6, 0.8, 1.0, 1.2, 1.5, 1.8, 2.2, 2.7, 3.3, 4.0)
VANE_POWERS = (0.3, 0.6, 0.9, 1.2, 1.5, 1.8, 2.1, 2.4)
CLUSTER_POWERS = (0.05, 0.10, 0.15, 0.20, 0.30, 0.40, 0.50, 0.65, 0.80, 1.00)
ENERGIES = (0.05, 0.08, 0.10, 0.13, 0.16, 0.20, 0.24, 0.28, 0.33, 0.38, 0.44, 0.50)      # mJ
SUMMER, WINTER = timezone(timedelta(hours=2)), timezone(timedelta(hours=1))
CHANGE = datetime(2031, 10, 26, 1, 0, tzinfo=timezone.utc)        # 03:00 summer time becomes 02:00 winter time


@dataclass(frozen=True)
class Section:
    """One scan: what was asked of the bench and what it was taken for."""
    purpose: str
    reading: float = 0.0            # laser power (W) or pulse energy (mJ) as the meter showed it
    step: int | None = None
    level: float = 1.0              # flux against the usual one of its bench
    mishap: str = ""


@dataclass(frozen=True)
class File:
    name: str
    day: int
    bench: str                      # short, long, pulsed
    beam: str
    sections: tuple
    series: str = ""
    start: datetime | None = None
    group: str = ""                 # weak scans to be summed
    copy_of: str = ""
    phase_step: float = 0.06        # rad, how far the fringe wanders from this scan to the next


@dataclass
class Day:
    number: int
    begin: datetime
    files: list = field(default_factory=list)

    def add(self, bench, beam, purpose, reading=0.0, **more):
        scan = {key: more.pop(key) for key in ("step", "level", "mishap") if key in more}
        self.add_sections(bench, beam, [Section(purpose, reading, **scan)], **more)

    def add_sections(self, bench, beam, sections, **more):
        letters = {"short": "sb", "long": "lb", "pulsed": "pb"}[bench]
        ending = {"short": "txt", "long": "dat", "pulsed": "csv"}[bench]
        name = f"day-{self.number}/{letters}-{self.number}{len(self.files) + 1:03d}.{ending}"
        self.files.append(File(name, self.number, bench, beam, tuple(sections), **more))

    def series(self, bench, beam, name, powers, reference, downwards=False):
        """Every step between two references: A/B/A/B/…/A, A being the reference."""
        steps = list(enumerate(powers))
        for step, power in reversed(steps) if downwards else steps:
            self.add(bench, beam, "reference", reference, series=name)
            self.add(bench, beam, "signal", power, step=step, series=name)
        self.add(bench, beam, "reference", reference, series=name)

    def opening(self, bench, beam, off=2):
        self.add(bench, beam, "empty-beam")
        self.add(bench, beam, "background")
        for _ in range(off):
            self.add(bench, beam, "laser-off")


def days():
    planned = [_first(), _second(), _third(), _fourth()]
    return [replace_times(day) for day in planned]


def _first():
    day = Day(1, datetime(2031, 10, 14, 19, 40, tzinfo=SUMMER))
    day.add("short", "fan, day 1", "test", 1.0, level=0.5)
    day.add("short", "fan, day 1", "test", 1.0)
    day.opening("short", "fan, day 1", off=3)
    day.series("short", "fan, day 1", "fan power, day 1", FAN_POWERS, 1.0)
    day.add("short", "fan, day 1", "reference", 1.0, mishap="truncated")
    day.add("short", "fan, day 1", "reference", 1.0, mishap="cut in the middle of a row")
    day.series("short", "fan, day 1", "fan power, day 1", FAN_POWERS, 1.0, downwards=True)
    day.add("short", "fan, day 1", "laser-off")
    day.add("short", "fan, day 1", "reference", 1.0, copy_of=day.files[-3].name)
    return day


def _second():
    day = Day(2, datetime(2031, 10, 17, 21, 5, tzinfo=SUMMER))
    day.opening("short", "vane, day 2")
    day.series("short", "vane, day 2", "vane power, day 2", VANE_POWERS, 1.8)
    day.add("short", "vane, day 2", "reference", 1.8, level=30, mishap="saturated")
    day.add("short", "vane, day 2", "reference", 1.8, mishap="wrong unit")
    day.add("pulsed", "vane, pulsed", "empty-beam")
    day.add("pulsed", "vane, pulsed", "laser-off")
    for first in range(0, len(ENERGIES), 3):
        three = [Section("signal", ENERGIES[k], k) for k in range(first, first + 3)]
        day.add_sections("pulsed", "vane, pulsed", three, series="vane energy, day 2")
    for last in range(len(ENERGIES) - 1, 0, -3):
        three = [Section("signal", ENERGIES[k], k) for k in range(last, last - 3, -1)]
        day.add_sections("pulsed", "vane, pulsed", three, series="vane energy, day 2")
    for _ in range(10):
        day.add("pulsed", "vane, pulsed", "signal", 0.16, level=0.012, group="weak, day 2", phase_step=0.02)
    return day


def _third():
    day = Day(3, datetime(2031, 10, 21, 17, 30, tzinfo=SUMMER))
    day.opening("short", "fan, day 3")
    day.series("short", "fan, day 3", "fan power, day 3", FAN_POWERS, 1.0)
    day.add("short", "fan, day 3", "reference", 1.0, mishap="mode hop")
    day.series("short", "fan, day 3", "fan power, day 3", FAN_POWERS, 1.0, downwards=True)
    day.opening("long", "cluster, day 3")
    day.series("long", "cluster, day 3", "cluster power, day 3", CLUSTER_POWERS, 0.4)
    day.add("long", "cluster, day 3", "reference", 0.4, mishap="position jumps back")
    for _ in range(16):
        day.add("long", "cluster, day 3", "signal", 0.4, level=0.003, group="weak, day 3", phase_step=0.02)
    return day


def _fourth():
    day = Day(4, datetime(2031, 10, 25, 22, 30, tzinfo=SUMMER))
    day.add("short", "fan, day 4", "background")
    for _ in range(4):
        day.add("short", "fan, day 4", "reference", 1.0)
        day.add("short", "fan, day 4", "signal", 1.2)
    day.opening("long", "cluster, day 4")
    day.series("long", "cluster, day 4", "cluster power, day 4", CLUSTER_POWERS, 0.4)
    day.add("long", "cluster, day 4", "reference", 0.4, mishap="drift")
    day.add("long", "cluster, day 4", "background", mishap="light leak")
    for _ in range(3):
        day.add("long", "cluster, day 4", "reference", 0.4)
        for _ in range(4):
            day.add("long", "cluster, day 4", "signal", 0.4, level=0.003, group="weak, day 4", phase_step=0.10)
    day.add("long", "cluster, day 4", "reference", 0.4)
    return day


def replace_times(day):
    """Scans follow one another; a file of three sections takes three times as long."""
    moment = day.begin.astimezone(timezone.utc)
    timed = []
    for file in day.files:
        timed.append(replace(file, start=moment))
        moment += timedelta(seconds=len(file.sections) * SPACING[file.bench])
    day.files = timed
    return day


SPACING = {"short": 353, "long": 411, "pulsed": 287}


def shown_twice(moment):
    """Whether the wall clock shows this moment for the second time, an hour after the first."""
    return CHANGE <= moment < CHANGE + timedelta(hours=1)


def local(moment):
    """The lab's wall clock, with summer time until the night of day 4."""
    return moment.astimezone(SUMMER if moment < CHANGE else WINTER)
