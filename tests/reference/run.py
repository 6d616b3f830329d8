"""The outside check: solves the cases of cases.json apart from the engine and compares.

Call: run.py ENGINE FOLDER REPORT, where ENGINE holds the engine's answers (JSON), FOLDER takes the solver's files and
REPORT receives what passed and failed (JSON). Prints the table.
"""

import json
import sys
import time
from collections.abc import Callable
from concurrent.futures import ThreadPoolExecutor
from pathlib import Path
from typing import Any

import numpy as np

import discs
import laminates
import scans
from materials import Layer, thermal_strain
from table import Row, compare, print_rows

# Largest relative differences. The first two are exact theory on both sides; by finite elements the mesh and the
# thickness of the plate leave some 1e-4 to 2e-3.
LAMINATE, EXPANSION, SHAPE, ONSET = 1e-3, 1e-6, 1e-2, 5e-3
# How much a finer mesh may still change what is compared.
MESH = 1e-3
# Cases solved side by side, each with one thread.
AT_ONCE = 2

Case = dict[str, Any]


def expanded(layers: list[Layer]) -> list[Layer]:
    """The stack with its repeated groups written out."""
    return [layer for entry in layers for layer in (entry["of"] * entry["times"] if "times" in entry else [entry])]


def laminate_rows(case: Case, engine: Case) -> list[Row]:
    """Curvatures, strain and stresses of a stack against the 6 by 6 system, of a pair that slides against the 9 by 9 one."""
    layers, temperature = expanded(case["layers"]), case["temperature"]
    if "slidingOn" in case:
        outside = laminates.solve_sliding(layers, expanded(case["slidingOn"]), temperature)
    else:
        outside = laminates.solve(layers, temperature)
    rows = [
        ("curvature, 1/m", [engine["curvature"]], [outside.curvature]),
        ("mid-plane strain", [engine["midplaneStrain"]], [outside.midplane_strain]),
        ("stress, worst layer, Pa", engine["stress"], outside.stress),
    ]
    return [
        compare(case["name"], what, np.array(ours, float), np.array(theirs), LAMINATE) for what, ours, theirs in rows
    ]


def expansion_row(case: Case, engine: float) -> Row:
    """Silicon's thermal strain against the quadrature of its expansion."""
    outside = thermal_strain({"cte": "silicon"}, case["from"], case["to"])
    return compare(f"silicon from {case['from']:g} K to {case['to']:g} K", "strain", engine, outside, EXPANSION)


def disc_rows(folder: str, number: int, case: Case, engine: Case) -> list[Row]:
    """A stack by finite elements; curvatures along x and y each by their own size."""
    curvature, stress = discs.layered_disc(folder, number, case)
    ours = np.array(engine["stress"], float)[:, :, :2]
    return [
        compare(case["name"], "curvature, 1/m", engine["curvature"][:2], curvature, SHAPE),
        compare(case["name"], "stress, worst layer, Pa", ours, stress, SHAPE),
    ]


def wafer_rows(folder: str, number: int, case: Case, engine: Case) -> list[Row]:
    """A free wafer by finite elements, on other meshes too where the case asks for them."""
    names = ("bow along, m", "bow across, m", "parabola over 0.97 R, 1/m")
    ours = [engine[key] for key in ("bowMajor", "bowMinor", "parabolaCurvatureMajor")]
    theirs = discs.free_wafer(folder, f"wafer{number}", case, case["elements"])
    rows = [compare(case["name"], *row, SHAPE) for row in zip(names, ours, theirs, strict=True)]
    others = case.get("otherMeshes", [])
    meshes = {n: discs.free_wafer(folder, f"wafer{number}-{n}", case, n) for n in others} | {case["elements"]: theirs}
    if others:
        finest = max(meshes)
        for n in sorted(meshes):
            print(f"mesh of {case['name']}: {n:2} elements along 45 degrees, bow along {meshes[n][0]:.6e} m, ", end="")
            print(f"across {meshes[n][1]:.6e} m")
        name = f"{case['name']}: mesh {case['elements']} and {finest}"
        rows += [compare(name, what, theirs[i], meshes[finest][i], MESH) for i, what in enumerate(names)]
    return rows


def onset_rows(folder: str, number: int, case: Case, engine: float) -> list[Row]:
    """
    The load at which a free wafer begins to roll. Past it the square of the difference of the two bows grows smoothly
    from nothing, so the parabola through three loads leads back to the onset.
    """
    loads = np.array(case["linearCurvatures"])
    squares = []
    for index, load in enumerate(loads):
        job = f"onset{number}-{index}"
        along, across, _ = discs.free_wafer(folder, job, {**case, "linearCurvature": load}, case["elements"])
        squares.append(((along - across) / case["thickness"]) ** 2)
    roots = np.roots(np.polyfit(loads / loads[0], squares, 2))
    outside = float(roots[np.argmin(np.abs(roots - 1))].real) * loads[0]
    return [compare(case["name"], "linear curvature, 1/m", engine, outside, ONSET)]


def pin_rows(folder: str, number: int, case: Case, engine: Case) -> list[Row]:
    """A wafer on three pins by finite elements."""
    centre, peak_to_valley = discs.wafer_on_pins(folder, number, case)
    return [
        compare(case["name"], "centre, m", engine["centre"], centre, SHAPE),
        compare(case["name"], "peak to valley, m", engine["peakToValley"], peak_to_valley, SHAPE),
    ]


def main(engine_file: str, folder: str, report_file: str) -> None:
    """Runs every case; one that cannot be solved has failed and does not keep the others from being run."""
    began = time.monotonic()
    cases = json.loads(Path(__file__).with_name("cases.json").read_text("utf-8"))
    engine = json.loads(Path(engine_file).read_text("utf-8"))
    rows = [row for pair in zip(cases["laminates"], engine["laminates"], strict=True) for row in laminate_rows(*pair)]
    rows += [expansion_row(*pair) for pair in zip(cases["expansion"], engine["expansion"], strict=True)]
    rows += [row for pair in zip(cases["scans"], engine["scans"], strict=True) for row in scans.scan_rows(*pair)]
    rows += [row for pair in zip(cases["surfaces"], engine["surfaces"], strict=True) for row in scans.surface_rows(*pair)]
    failures = 0
    kinds: list[tuple[str, Callable[..., list[Row]]]] = [
        ("onsets", onset_rows),
        ("freeWafers", wafer_rows),
        ("layeredDiscs", disc_rows),
        ("pins", pin_rows),
    ]
    with ThreadPoolExecutor(AT_ONCE) as pool:
        jobs = [
            (case["name"], pool.submit(solve, folder, number, case, answer))
            for kind, solve in kinds
            for number, (case, answer) in enumerate(zip(cases[kind], engine[kind], strict=True))
        ]
        for name, job in jobs:
            try:
                rows += job.result()
            except Exception as error:  # whatever it is, the case has failed
                failures += 1
                print(f"{name} could not be solved: {error}")
    print_rows(rows)
    print(f"{time.monotonic() - began:.0f} s")
    passed = sum(row.passed for row in rows)
    report = {"passed": passed, "failed": len(rows) - passed + failures}
    Path(report_file).write_text(json.dumps(report), "utf-8")


if __name__ == "__main__":
    main(*sys.argv[1:])
