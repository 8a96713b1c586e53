#!/usr/bin/python3
"""Makes the demo lab anew and compares every byte with what is kept. Ends with 0 if all are the same, else 1."""
import sys
from pathlib import Path

import documents
from generate import SEED, whole_lab


def main():
    folder = Path(__file__).resolve().parent.parent
    files, truth = whole_lab(SEED)
    wanted = {f"raw/{name}": content for name, content in files.items()}
    wanted["truth.json"] = truth.encode("utf-8")
    wanted["lab/lab.json"] = documents.main().encode("utf-8")
    kept = {str(path.relative_to(folder)): path.read_bytes() for path in (folder / "raw").rglob("*") if path.is_file()}
    for name in ("truth.json", "lab/lab.json"):
        kept[name] = (folder / name).read_bytes()
    faults = [f"{name}: {fault(name, wanted, kept)}"
              for name in sorted(wanted.keys() | kept.keys()) if wanted.get(name) != kept.get(name)]
    print("\n".join(faults) if faults else f"{len(wanted)} files, all the same bytes")
    return 1 if faults else 0


def fault(name, wanted, kept):
    if name not in kept:
        return "missing"
    return "differs" if name in wanted else "not made by the generator"


if __name__ == "__main__":
    sys.exit(main())
