"""Classical laminate theory by brute force: one 6 by 6 system for the strains and curvatures of the middle plane.

e0, e1   strain of the middle plane; strain per height          1, 1/m
curvature = -e1, positive for a bowl                             1/m
"""

from dataclasses import dataclass

import numpy as np

from materials import Array, Layer, sheets


@dataclass
class Laminate:
    """
    Curvatures w_xx, w_yy and twist w_xy (1/m), strain of the middle plane (x, y, engineering shear), and the stress of
    each layer at its lower and upper face, (layers, 2, 3), Pa.
    """

    curvature: Array
    midplane_strain: Array
    stress: Array


def solve(layers: list[Layer], temperature: float) -> Laminate:
    """Solves a stack, lengths taken over its whole thickness so that the six equations are of one size."""
    stack = sheets(layers, temperature)
    whole = sum(sheet.thickness for sheet in stack)
    system, load, places = np.zeros((6, 6)), np.zeros(6), []
    low = -0.5
    for sheet in stack:
        high = low + sheet.thickness / whole
        places.append((low, high))
        # Integrals of 1, z and z squared through the layer.
        powers = [(high**n - low**n) / n for n in (1, 2, 3)]
        moments = np.array([[powers[0], powers[1]], [powers[1], powers[2]]])
        system += np.kron(moments, sheet.share * sheet.q)
        load += np.kron(moments[0], sheet.share * (sheet.q @ sheet.free_strain))
        low = high
    size = system.diagonal().max()
    strains = np.linalg.solve(system / size, load / size).reshape(2, 3)
    stress = [
        [sheet.q @ (strains[0] + z * strains[1] - sheet.free_strain) for z in at]
        for sheet, at in zip(stack, places, strict=True)
    ]
    return Laminate(-strains[1] / whole * [1, 1, 0.5], strains[0], np.array(stress))
