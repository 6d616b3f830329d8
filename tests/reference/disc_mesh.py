"""Mesh of a disc: quadratic solid elements with curved edges, one or more of them through every layer.

Seen from above a quarter is a core of n by n elements with bulged sides and two blocks of n by m elements that lead
from it to a circle; concentric rings may follow outside. All mid-edge nodes lie on the curves themselves, so the rim is
round to third order. A half is a quarter and its mirror image in the plane x = 0.

n         elements along 45 degrees of the rim
u, v      place in a block, 0 to 1
radii and heights z in m, angles in rad
"""

from collections.abc import Callable, Sequence
from dataclasses import dataclass
from functools import partial
from itertools import pairwise

import numpy as np

# Places a point of the unit square on the plane: u, v to x, y.
Block = Callable[[float, float], tuple[float, float]]

# Half-width of the core over the radius of the circle around it, and how far its sides bulge (0.5 is a circle).
CORE = 0.5
BULGE = 0.22
# A quadrilateral's nodes after a reflection, so that they run counter-clockwise again.
OTHER_WAY_ROUND = [1, 0, 3, 2, 4, 7, 6, 5]


@dataclass
class Plane:
    """Quadratic quadrilaterals: `points` (N, 2); `quads` (M, 8), four corners counter-clockwise, then the mid-edges."""

    points: np.ndarray
    quads: np.ndarray


@dataclass
class Solid:
    """
    Twenty-node bricks: `nodes` (N, 3); `layers`, for each layer its bricks (M, 20) in the solver's order of nodes.
    """

    nodes: np.ndarray
    layers: list[np.ndarray]

    def nearest(self, x: float, y: float, z: float) -> int:
        """Index of the node at a place; refuses when there is none."""
        away = np.linalg.norm(self.nodes - np.array([x, y, z]), axis=1)
        found = int(np.argmin(away))
        if away[found] > 1e-9 * np.abs(self.nodes).max():
            raise ValueError(f"no node at {x}, {y}, {z}")
        return found

    def where(self, chosen: Callable[..., np.ndarray]) -> np.ndarray:
        """Indices of the nodes for which `chosen(x, y, z)` holds."""
        return np.flatnonzero(chosen(*self.nodes.T))


def quarter_disc(radius: float, n: int, rings: Sequence[float] = ()) -> Plane:
    """The quarter x, y >= 0. `rings` are radii (m) of circles that are mesh lines, besides the rim."""
    circles = [*rings, radius]
    inner = circles[0]
    # Elements between the core and the first circle, and in each ring, about as long as they are wide.
    outward = max(1, round(n * (1 - CORE) / CORE / 1.2))
    outside = grid(partial(leading_out, inner), outward, n)
    blocks = [grid(partial(core, inner), n, n), outside, mirrored(outside)]
    for low, high in pairwise(circles):
        count = max(1, round((high - low) / (high * np.pi / 4 / n)))
        outside = grid(partial(ring, low, high), count, n)
        blocks += [outside, mirrored(outside)]
    return joined(blocks, radius)


def half_disc(radius: float, n: int, rings: Sequence[float] = ()) -> Plane:
    """The half y >= 0."""
    right = quarter_disc(radius, n, rings)
    left = Plane(right.points * [-1, 1], right.quads[:, OTHER_WAY_ROUND])
    return joined([right, left], radius)


def core(radius: float, u: float, v: float) -> tuple[float, float]:
    """A square with bulged sides, its corner u = v = 1 under 45 degrees."""
    side = CORE * radius
    return side * u * np.sqrt(1 - BULGE * v * v), side * v * np.sqrt(1 - BULGE * u * u)


def leading_out(radius: float, u: float, v: float) -> tuple[float, float]:
    """From the core's right-hand side, u = 0, to the first 45 degrees of the circle, u = 1."""
    inner, outer = core(radius, 1, v), ring(radius, radius, 0, v)
    return (1 - u) * inner[0] + u * outer[0], (1 - u) * inner[1] + u * outer[1]


def ring(low: float, high: float, u: float, v: float) -> tuple[float, float]:
    """From the circle of radius `low`, u = 0, to that of `high`, u = 1, over the first 45 degrees."""
    r = low + (high - low) * u
    return r * np.cos(v * np.pi / 4), r * np.sin(v * np.pi / 4)


def mirrored(plane: Plane) -> Plane:
    """In the line x = y."""
    return Plane(plane.points[:, ::-1], plane.quads[:, OTHER_WAY_ROUND])


def grid(block: Block, nu: int, nv: int) -> Plane:
    """A block of nu by nv elements; `block(u, v)` places the unit square."""
    across, along = 2 * nu + 1, 2 * nv + 1
    points = np.array([block(i / (2 * nu), j / (2 * nv)) for j in range(along) for i in range(across)], float)
    quads = []
    for j in range(0, 2 * nv, 2):
        for i in range(0, 2 * nu, 2):
            corners = [(i, j), (i + 2, j), (i + 2, j + 2), (i, j + 2)]
            edges = [(i + 1, j), (i + 2, j + 1), (i + 1, j + 2), (i, j + 1)]
            quads.append([row * across + column for column, row in corners + edges])
    return Plane(points, np.array(quads))


def joined(planes: list[Plane], radius: float) -> Plane:
    """Planes with nodes at the same place made one."""
    places: dict[tuple[int, ...], int] = {}
    points: list[np.ndarray] = []

    def number(point: np.ndarray) -> int:
        key = tuple(np.round(point / radius * 1e8).astype(int).tolist())
        if key not in places:
            places[key] = len(points)
            points.append(point)
        return places[key]

    quads = []
    for plane in planes:
        new = np.full(len(plane.points), -1)
        for old in np.unique(plane.quads):
            new[old] = number(plane.points[old])
        quads.append(new[plane.quads])
    return Plane(np.array(points), np.concatenate(quads))


def extruded(plane: Plane, heights: Sequence[float]) -> Solid:
    """Bricks between the `heights` (m, from the bottom up): one layer of them between any two."""
    corners = np.unique(plane.quads[:, :4])
    count = len(plane.points)
    nodes: list[tuple[float, float, float]] = []
    levels, middles = [], []

    def level(z: float, used: np.ndarray) -> np.ndarray:
        numbers = np.full(count, -1)
        numbers[used] = len(nodes) + np.arange(len(used))
        nodes.extend((*plane.points[p].tolist(), z) for p in used)
        return numbers

    everything = np.arange(count)
    for low, high in pairwise(heights):
        levels.append(level(low, everything))
        middles.append(level((low + high) / 2, corners))
    levels.append(level(heights[-1], everything))
    layers = []
    for below, middle, above in zip(levels[:-1], middles, levels[1:], strict=True):
        bottom, top, upright = below[plane.quads], above[plane.quads], middle[plane.quads[:, :4]]
        layers.append(np.hstack([bottom[:, :4], top[:, :4], bottom[:, 4:], top[:, 4:], upright]))
    return Solid(np.array(nodes), layers)
