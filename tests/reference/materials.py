"""Materials and free strains, worked out apart from the engine.

c11, c12, c44   stiffness of silicon along its cube axes         Pa
Q               plane-stress stiffness, 3 by 3, engineering shear Pa
alpha           linear expansion                                  1/K
e               free strain along x, y and in shear               1
"""

from dataclasses import dataclass
from math import exp
from typing import Any

import numpy as np
from scipy.integrate import quad

# A layer of cases.json: thickness and what else the engine's own words say.
Layer = dict[str, Any]
Array = np.ndarray

# Lightly doped silicon at 25 degrees Celsius, Pa; the engine names the source.
C11, C12, C44 = 165.64e9, 63.94e9, 79.51e9
# Temperature at which the base layer is flat and free of strain, K.
ZERO = 298.15
# Index pairs of the contracted notation.
PAIRS = ((0, 0), (1, 1), (2, 2), (1, 2), (0, 2), (0, 1))


def silicon_expansion(kelvin: float) -> float:
    """Okada and Tokumaru 1984, in 1/K, 120 to 1500 K."""
    return (3.725 * (1 - exp(-5.88e-3 * (kelvin - 124))) + 5.548e-4 * kelvin) * 1e-6


def along_curve(curve: dict[str, Any], start: float, end: float) -> float:
    """
    Strain along a stated curve, by quadrature: points joined by straight lines, or a polynomial in K. Both ends lie inside.
    """

    def alpha(kelvin: float) -> float:
        if curve["kind"] == "polynomial":
            return float(np.polyval(curve["terms"][::-1], kelvin))
        return float(np.interp(kelvin, curve["temperatures"], curve["coefficients"]))

    # Kinks are told to the quadrature, which would miss them else.
    kinks = [t for t in curve.get("temperatures", []) if min(start, end) < t < max(start, end)]
    strain = float(quad(alpha, start, end, points=kinks or None, epsabs=0, epsrel=1e-12)[0])
    return strain + curve.get("shift", 0.0) * (end - start)


def thermal_strain(layer: Layer, start: float, end: float) -> float:
    """Strain of an unhindered layer from `start` to `end` (K), by quadrature for silicon."""
    if start == end:
        return 0.0
    alpha = layer.get("cte", "silicon" if "silicon" in layer else None)
    if alpha == "silicon":
        return float(quad(silicon_expansion, start, end, epsabs=0, epsrel=1e-12)[0])
    if isinstance(alpha, dict):
        return along_curve(alpha, start, end)
    if alpha is None:
        raise ValueError(f"an expansion is needed from {start} K to {end} K")
    return float(alpha) * (end - start)


def cubic_matrix() -> Array:
    """Stiffness of silicon in its cube axes, 6 by 6, Pa."""
    matrix = np.diag([C11, C11, C11, C44, C44, C44])
    matrix[:3, :3] += C12 * (1 - np.eye(3))
    return matrix


def turned_matrix(matrix: Array, angle: float) -> Array:
    """The 6 by 6 stiffness after the material was turned by `angle` (rad) about z: the fourth-rank tensor is turned."""
    tensor = np.empty((3, 3, 3, 3))
    for row, (i, j) in enumerate(PAIRS):
        for column, (k, m) in enumerate(PAIRS):
            for a, b in {(i, j), (j, i)}:
                for c, d in {(k, m), (m, k)}:
                    tensor[a, b, c, d] = matrix[row, column]
    cosine, sine = np.cos(angle), np.sin(angle)
    turn = np.array([[cosine, -sine, 0], [sine, cosine, 0], [0, 0, 1]])
    turned = np.einsum("ia,jb,kc,md,abcd->ijkm", turn, turn, turn, turn, tensor)
    return np.array([[turned[i, j, k, m] for k, m in PAIRS] for i, j in PAIRS])


def plane_stress(matrix: Array) -> Array:
    """Q of a layer whose faces are free: the stresses out of the plane are zero."""
    inside, outside = [0, 1, 5], [2, 3, 4]
    free = matrix[np.ix_(outside, outside)]
    coupling = matrix[np.ix_(inside, outside)]
    return matrix[np.ix_(inside, inside)] - coupling @ np.linalg.solve(free, coupling.T)


def isotropic_matrix(layer: Layer) -> Array:
    """Stiffness of an isotropic layer, 6 by 6, Pa, as the inverse of its compliance."""
    young, poisson = layer["youngsModulus"], layer["poissonsRatio"]
    compliance = np.diag([1.0, 1.0, 1.0, *[2 * (1 + poisson)] * 3]) / young
    compliance[:3, :3] -= poisson / young * (1 - np.eye(3))
    return np.linalg.inv(compliance)


def stiffness(layer: Layer) -> Array:
    """Stiffness of a layer in the axes x, y, z, 6 by 6, Pa."""
    if "silicon" not in layer:
        return isotropic_matrix(layer)
    start = {"100": 0.0, "110": np.pi / 4}[layer["silicon"]["direction"]]
    return turned_matrix(cubic_matrix(), layer["silicon"].get("angle", 0.0) - start)


@dataclass
class Sheet:
    """One layer as the laminate sees it: `share` of the area that is covered."""

    thickness: float
    share: float
    q: Array
    free_strain: Array


def sheets(layers: list[Layer], temperature: float) -> list[Sheet]:
    """
    The layers with their free strains at `temperature` (K): the base takes the layer to its reference temperature, the
    layer's own expansion from there on, and the stress stands for the strain that it would relax to. The base is the
    first layer that expands as silicon, else the thickest.
    """
    as_silicon = [x for x in layers if x.get("cte") == "silicon" or ("silicon" in x and "cte" not in x)]
    base = as_silicon[0] if as_silicon else max(layers, key=lambda x: x["thickness"])
    found = []
    for layer in layers:
        q = plane_stress(stiffness(layer))
        stress = layer.get("stress", 0.0)
        pulled = [stress["x"], stress["y"], 0.0] if isinstance(stress, dict) else [stress, stress, 0.0]
        reference = layer.get("referenceTemperature", ZERO)
        heated = thermal_strain(base, ZERO, reference) + thermal_strain(layer, reference, temperature)
        free = heated * np.array([1.0, 1.0, 0.0]) - np.linalg.solve(q, pulled)
        found.append(Sheet(layer["thickness"], layer.get("coverage", 1.0), q, free))
    return found
