"""A scan file by Python's csv and NumPy's polyfit: path as argument, JSON on standard output, the shortest of three runs."""
import csv
import json
import sys
import time

import numpy


def fitted(path):
    """Curvature in 1/m and rows, 5 mm left out at either end."""
    positions, heights = [], []
    with open(path, newline="", encoding="utf-8") as file:
        rows = csv.reader(file)
        next(rows)
        for position, height in rows:
            positions.append(float(position))
            heights.append(float(height))
    x = numpy.array(positions) / 1e3
    z = numpy.array(heights) / 1e6
    inside = (x >= x.min() + 5e-3) & (x <= x.max() - 5e-3)
    return 2 * numpy.polyfit(x[inside], z[inside], 2)[0], len(positions)


found = []
for _ in range(3):
    start = time.process_time()
    curvature, rows = fitted(sys.argv[1])
    found.append(time.process_time() - start)
json.dump({"seconds": min(found), "curvature": curvature, "rows": rows}, sys.stdout)
