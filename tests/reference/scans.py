"""Scans and surfaces by NumPy's and SciPy's least squares, from the heights that the engine was given."""

from typing import Any

import numpy as np
from scipy.optimize import least_squares

from materials import Array
from table import Row, compare

Case = dict[str, Any]

# Least squares on both sides: digits of doubles. Warp is sought on a grid on both sides.
FIT, WARP = 1e-8, 5e-4
BISQUARE = 4.685


def curvature_of(x: Array, z: Array) -> tuple[float, float]:
    """Curvature of the parabola through a scan, tilt taken out, and its standard uncertainty for independent scatter."""
    middle = (x[0] + x[-1]) / 2
    (c2, c1, _), covariance = np.polyfit(x - middle, z, 2, cov=True)
    return 2 * c2 / (1 + c1**2) ** 1.5, 2 * np.sqrt(covariance[0, 0]) / (1 + c1**2) ** 1.5


def followers(x: Array, z: Array) -> Array:
    """
    Points that follow one parabola: robust fits with SciPy's Cauchy loss from parabolas through the whole scan and through
    two thirds of it from either end, the one with the least median deviation, then bisquare weights with the scatter by
    the median until they settle.
    """
    t = (x - (x[0] + x[-1]) / 2) / ((x[-1] - x[0]) / 2)
    design = np.vander(t, 3)
    size = float(np.median(np.abs(np.diff(z)))) + 1e-15
    third = len(t) // 3
    parts = (slice(None), slice(third, None), slice(0, 2 * third))
    starts = [np.linalg.lstsq(design[part], z[part], rcond=None)[0] for part in parts]
    fits = [least_squares(lambda c: (design @ c - z) / size, start, loss="cauchy", max_nfev=2000).x for start in starts]
    fitted = min(fits, key=lambda c: float(np.median(np.abs(design @ c - z))))
    for _ in range(200):
        off = z - design @ fitted
        limit = BISQUARE * 1.4826 * np.median(np.abs(off))
        weight = np.where(np.abs(off) < limit, 1 - (off / limit) ** 2, 0)
        fitted = np.linalg.lstsq(design * weight[:, None], z * weight, rcond=None)[0]
    return np.abs(z - design @ fitted) <= limit


def scan_rows(case: Case, engine: Case) -> list[Row]:
    """A scan's curvature, uncertainty and fourth order, and the curvature without spikes and steps."""
    name, x, z = case["name"], np.array(engine["x"]), np.array(engine["z"])
    curvature, uncertainty = curvature_of(x, z)
    half = (x[-1] - x[0]) / 2
    quartic = np.polyfit((x - (x[0] + x[-1]) / 2) / half, z, 4)[0]
    rows = [
        compare(name, "curvature, 1/m", engine["plain"]["curvature"], curvature, FIT),
        compare(name, "its uncertainty, 1/m", engine["plain"]["standardUncertainty"], uncertainty, FIT),
        compare(name, "fourth order, m", engine["plain"]["quartic"], quartic, FIT),
    ]
    # Which points of a shape that is no parabola just count is no question of right and wrong.
    if case["quartic"] != 0:
        return rows
    keep = followers(x, z)
    robust, _ = curvature_of(x[keep], z[keep])
    return [
        *rows,
        compare(name, "robust curvature, 1/m", engine["robust"]["curvature"], robust, FIT),
        compare(name, "points left out", engine["robust"]["rejected"], float(np.sum(~keep)), 0.0),
    ]


def powers(order: int) -> list[tuple[int, int]]:
    """Powers of x and y from the second degree to `order`."""
    return [(n - k, k) for n in range(2, order + 1) for k in range(n + 1)]


def places(rings: Array) -> tuple[Array, Array, Array]:
    """Places on rings, 720 on each."""
    r, a = np.meshgrid(rings, np.linspace(0, 2 * np.pi, 720, endpoint=False))
    return (r * np.cos(a)).ravel(), (r * np.sin(a)).ravel(), r.ravel()


def height_of(shape: Array, terms: list[tuple[int, int]], x: Array, y: Array) -> Array:
    """Height of a sum of powers."""
    return np.asarray(sum(c * x**i * y**j for c, (i, j) in zip(shape, terms, strict=True)))


def surface_rows(case: Case, engine: Case) -> list[Row]:
    """A surface through scans, each at its own height and tilt, by one system in powers of x and y."""
    radius, disk = case["radius"], case["radius"] - case["edgeExclusion"]
    terms, count = powers(case["order"]), len(engine["scans"])
    rows, heights = [], []
    for k, scan in enumerate(engine["scans"]):
        s = np.array(scan["x"]) / disk
        x, y = s * np.cos(scan["azimuth"]), s * np.sin(scan["azimuth"])
        levels = np.zeros((len(s), 2 * count))
        levels[:, 2 * k], levels[:, 2 * k + 1] = 1, s
        rows.append(np.hstack([np.column_stack([x**i * y**j for i, j in terms]), levels]))
        heights.append(np.array(scan["z"]))
    design, z = np.vstack(rows), np.hstack(heights)
    solved = np.linalg.lstsq(design, z, rcond=None)[0]
    squares = float(np.sum((z - design @ solved) ** 2))
    shape = solved[: len(terms)]

    angles = np.pi + np.arange(3) * 2 * np.pi / 3
    at = min(radius - 3e-3, disk) / disk
    points = np.array([np.mean([(at * np.cos(a)) ** i * (at * np.sin(a)) ** j for a in angles]) for i, j in terms])
    covariance = np.linalg.inv(design.T @ design)[: len(terms), : len(terms)] * squares / (len(z) - design.shape[1])

    # The plane by the middles of rings, weighted by their area; highest and lowest on rings up to the rim.
    x, y, r = places((np.arange(400) + 0.5) / 400)
    plane = np.column_stack([np.ones(x.size), x, y])
    weight = np.sqrt(r)
    level = np.linalg.lstsq(plane * weight[:, None], height_of(shape, terms, x, y) * weight, rcond=None)[0]
    x, y, _ = places(np.linspace(0, 1, 401))
    deviation = height_of(shape, terms, x, y) - np.column_stack([np.ones(x.size), x, y]) @ level
    name = case["name"]
    return [
        compare(name, "rms of the fit, m", engine["rms"], np.sqrt(squares / len(z)), FIT),
        compare(name, "three-point bow, m", engine["bow"], -float(points @ shape), FIT),
        compare(name, "its uncertainty, m", engine["bowUncertainty"], float(np.sqrt(points @ covariance @ points)), FIT),
        compare(name, "warp, m", engine["warp"], float(deviation.max() - deviation.min()), WARP),
    ]
