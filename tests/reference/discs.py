"""The cases for finite elements: discs of solid elements, built from nothing but the case's inputs.

w         height of a surface, positive upwards          m
kappa     curvature w'', positive for a bowl             1/m
e         free strain                                    1
"""

from typing import Any

import numpy as np

from calculix import Job, Material, Step, solve
from disc_mesh import Solid, extruded, half_disc, quarter_disc
from materials import Array, cubic_matrix, isotropic_matrix, sheets, stiffness

Case = dict[str, Any]

STANDARD_GRAVITY = 9.80665
# Nodes that lie on a line, as a share of the radius.
ON_LINE = 1e-9


def quarter_supports(solid: Solid, radius: float, height: float) -> list[tuple[Array, int]]:
    """Symmetry about x = 0 and y = 0, and one node on the axis that keeps its height."""
    near = ON_LINE * radius
    return [
        (solid.where(lambda x, y, z: x < near), 1),
        (solid.where(lambda x, y, z: y < near), 2),
        (np.array([solid.nearest(0, 0, height)]), 3),
    ]


def along(solid: Solid, axis: int, height: float, radius: float) -> Array:
    """Nodes on the x axis (0) or y axis (1) at a height, from the centre outwards."""
    nodes = solid.nodes
    on_line = (np.abs(nodes[:, 1 - axis]) < ON_LINE * radius) & (np.abs(nodes[:, 2] - height) < ON_LINE * radius)
    found = np.flatnonzero(on_line)
    return found[np.argsort(nodes[found, axis])]


def wafer_matrix(case: Case) -> Array:
    """
    Stiffness of a bare wafer: silicon (001) with the cube axes along x and y where the case says so, else isotropic.
    """
    return cubic_matrix() if case.get("crystal") == "100" else isotropic_matrix(case)


def layered_disc(folder: str, number: int, case: Case) -> tuple[Array, Array]:
    """
    Small deflections of a bonded stack. Curvatures along x and y by a parabola over the inner 0.6 of the radius, away
    from the edge, and stresses (layers, lower and upper face, x and y) at the centre, Pa.
    """
    radius, layers = case["radius"], case["layers"]
    heights = np.cumsum([0.0, *(layer["thickness"] for layer in layers)])
    solid = extruded(quarter_disc(radius, case["elements"]), heights.tolist())
    materials = []
    for layer, sheet in zip(layers, sheets(layers, case["temperature"]), strict=True):
        x, y, _ = sheet.free_strain
        materials.append(Material(stiffness(layer), (x, y, x)))
    probes = [(layer, 0) for layer in range(len(layers))]
    fixed = quarter_supports(solid, radius, 0.0)
    answer = solve(folder, Job(f"stack{number}", solid, materials, fixed, [Step()], probes=probes))
    curvature = []
    for axis in (0, 1):
        line = along(solid, axis, 0.0, radius)
        line = line[solid.nodes[line, axis] < 0.6 * radius]
        squares = solid.nodes[line, axis] ** 2 / 2
        curvature.append(float(np.polyfit(squares, answer.displacement[line, 2], 1)[0]))
    return np.array(curvature), np.array([face_stresses(points) for points in answer.stresses])


def face_stresses(points: Array) -> Array:
    """
    Stresses along x and y at the lower and upper face of an element, from its 2 by 2 by 2 points, the lower ones first.
    """
    lower, upper = points[:4, :2].mean(axis=0), points[4:, :2].mean(axis=0)
    slope = np.sqrt(3) * (upper - lower) / 2
    return np.array([(lower + upper) / 2 - slope, (lower + upper) / 2 + slope])


def free_wafer(folder: str, name: str, case: Case, elements: int) -> tuple[float, float, float]:
    """
    Large deflections of a free wafer under the moments that would give it `linearCurvature`: two halves of its
    thickness with opposite free strains, kappa h/3, pull without any net force. Where the moments are equal, forces at
    the rim lead it along x first and are then taken away. Answers the bow along x and along y (centre to rim, positive
    for a bowl, m) and the least-squares parabola's curvature along x over 0.97 of the radius (1/m).
    """
    radius, half, linear = case["radius"], case["thickness"] / 2, case["linearCurvature"]
    kappa = (linear["x"], linear["y"]) if isinstance(linear, dict) else (linear, linear)
    x, y = (value * case["thickness"] / 3 for value in kappa)
    solid = extruded(quarter_disc(radius, elements), [-half, 0.0, half])
    matrix = wafer_matrix(case)
    materials = [Material(matrix, (x, y, 0.0)), Material(matrix, (-x, -y, 0.0))]
    rim_x, rim_y = solid.nearest(radius, 0, 0), solid.nearest(0, radius, 0)
    # Moment for each length of the rim, N: the scale of forces that bend the wafer.
    moment = (matrix[0, 0] + matrix[0, 1]) * case["thickness"] ** 3 / 12 * kappa[0]
    nudge = [(rim_x, 3, 0.02 * moment), (rim_y, 3, -0.02 * moment)] if kappa[0] == kappa[1] else []
    steps = [Step(forces=nudge, increment=case["increment"]), Step(increment=0.25)]
    answer = solve(folder, Job(name, solid, materials, quarter_supports(solid, radius, 0.0), steps, nonlinear=True))
    rise = answer.displacement[:, 2]
    line = along(solid, 0, 0.0, radius)
    where = solid.nodes[line, 0] + answer.displacement[line, 0]
    return rise[rim_x], rise[rim_y], parabola(where / where[-1], rise[line]) / where[-1] ** 2


def parabola(share: Array, height: Array) -> float:
    """
    Curvature of the parabola c0 + c2 x2 that fits a height, known at shares x of the radius, best over -0.97 to 0.97 in
    the mean square; times the radius squared.
    """
    even = np.polyfit(share**2, height, 6)
    # Many evenly spaced places stand for the whole line.
    squares = (0.97 * (np.arange(1000) + 0.5) / 1000) ** 2
    return 2 * float(np.polyfit(squares, np.polyval(even, squares), 1)[0])


def wafer_on_pins(folder: str, number: int, case: Case) -> tuple[float, float]:
    """
    Small deflections under its own weight on three points, one of them on x: half a wafer. Answers the height of the
    centre over the points and the peak to valley, both m.
    """
    radius, thickness, at = case["radius"], case["thickness"], case["supportRadius"]
    half = thickness / 2
    solid = extruded(half_disc(radius, case["elements"], [] if at == radius else [at]), [-half, half])
    angle = 2 * np.pi / case["count"]
    pins = np.array([solid.nearest(at, 0, 0), solid.nearest(at * np.cos(angle), at * np.sin(angle), 0)])
    mirror = solid.where(lambda x, y, z: y < ON_LINE * radius)
    fixed = [(mirror, 2), (np.array([solid.nearest(0, 0, 0)]), 1), (pins, 3)]
    material = Material(wafer_matrix(case), density=case["density"])
    steps = [Step(strained=False, gravity=STANDARD_GRAVITY)]
    rise = solve(folder, Job(f"pins{number}", solid, [material], fixed, steps)).displacement[:, 2]
    face = solid.where(lambda x, y, z: z > half * (1 - ON_LINE))
    return rise[solid.nearest(0, 0, half)], float(np.ptp(rise[face]))
