"""Classical laminate theory by brute force: one 6 by 6 system for the strains and curvatures of the middle plane, and one of
9 by 9 for two stacks that slide on each other: a strain of its own for each, one curvature for both.

e0, e1   strain of the middle plane; strain per height          1, 1/m
curvature = -e1, positive for a bowl                             1/m
"""

from dataclasses import dataclass

import numpy as np

from materials import Array, Layer, Sheet, sheets


@dataclass
class Laminate:
    """
    Curvatures w_xx, w_yy and twist w_xy (1/m), strain of the middle plane (x, y, engineering shear), and the stress of
    each layer at its lower and upper face, (layers, 2, 3), Pa.
    """

    curvature: Array
    midplane_strain: Array
    stress: Array


def integrals(stack: list[Sheet], unit: float) -> tuple[Array, Array, list[tuple[float, float]]]:
    """Stiffness (6 by 6), load (6) and faces of the sheets about the middle of a stack, lengths in units of `unit` (m)."""
    system, load, places = np.zeros((6, 6)), np.zeros(6), []
    low = -sum(sheet.thickness for sheet in stack) / unit / 2
    for sheet in stack:
        high = low + sheet.thickness / unit
        places.append((low, high))
        # Integrals of 1, z and z squared through the layer.
        powers = [(high**n - low**n) / n for n in (1, 2, 3)]
        moments = np.array([[powers[0], powers[1]], [powers[1], powers[2]]])
        system += np.kron(moments, sheet.share * sheet.q)
        load += np.kron(moments[0], sheet.share * (sheet.q @ sheet.free_strain))
        low = high
    return system, load, places


def stresses(stack: list[Sheet], places: list[tuple[float, float]], strains: Array) -> Array:
    """Stress at the lower and upper face of each sheet, from the strain of the middle plane and its growth with height."""
    return np.array(
        [
            [sheet.q @ (strains[0] + z * strains[1] - sheet.free_strain) for z in at]
            for sheet, at in zip(stack, places, strict=True)
        ]
    )


def solve(layers: list[Layer], temperature: float) -> Laminate:
    """Solves a stack, lengths taken over its whole thickness so that the six equations are of one size."""
    stack = sheets(layers, temperature)
    whole = sum(sheet.thickness for sheet in stack)
    system, load, places = integrals(stack, whole)
    size = system.diagonal().max()
    strains = np.linalg.solve(system / size, load / size).reshape(2, 3)
    return Laminate(-strains[1] / whole * [1, 1, 0.5], strains[0], stresses(stack, places, strains))


def solve_sliding(layers: list[Layer], on_top: list[Layer], temperature: float) -> Laminate:
    """
    Solves a stack with another on top that slides without friction: neither pushes the other in the plane, both bend
    alike. Strain and stresses are those of the first.
    """
    plates = [sheets(layers, temperature), sheets(on_top, temperature)]
    whole = sum(sheet.thickness for stack in plates for sheet in stack)
    system, load, faces = np.zeros((9, 9)), np.zeros(9), []
    for n, stack in enumerate(plates):
        own, pull, places = integrals(stack, whole)
        # The strains of this plate, then the curvatures that both share.
        at = [*range(3 * n, 3 * n + 3), 6, 7, 8]
        system[np.ix_(at, at)] += own
        load[at] += pull
        faces.append(places)
    size = system.diagonal().max()
    solved = np.linalg.solve(system / size, load / size)
    strains = np.array([solved[:3], solved[6:]])
    return Laminate(-strains[1] / whole * [1, 1, 0.5], strains[0], stresses(plates[0], faces[0], strains))
