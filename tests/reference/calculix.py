"""A layered disc as an input deck of CalculiX, its run, and what it printed.

Every layer is one material whose free strain is imposed as thermal expansion: 1 K of it, from 0 to 1, so that the
expansion coefficients are the free strains themselves. Heights are z, device side up.
"""

import os
import re
import subprocess
from collections.abc import Sequence
from dataclasses import dataclass, field

import numpy as np

from disc_mesh import Solid
from materials import Array

PROGRAM = "/usr/bin/ccx"
# One run takes seconds, on a busy machine minutes; one that does not come to an end has left the stable branch. In s.
LONGEST = 900


@dataclass
class Material:
    """Stiffness (6 by 6, Pa; isotropic, or cubic with the cube axes along x, y, z), free strain along x, y and z."""

    stiffness: Array
    free_strain: tuple[float, float, float] = (0.0, 0.0, 0.0)
    density: float = 0.0

    def lines(self) -> list[str]:
        """What the deck says of it. The nine constants are those of an orthotropic material."""
        c = self.stiffness
        constants = [c[0, 0], c[0, 1], c[1, 1], c[0, 2], c[1, 2], c[2, 2], c[5, 5], c[4, 4], c[3, 3]]
        if not np.allclose(c[:3, 3:], 0, atol=1e-6 * c.max()):
            raise ValueError("the crystal's axes must be those of the disc")
        lines = ["*ELASTIC,TYPE=ORTHO", written(constants[:8]), written(constants[8:])]
        lines += ["*EXPANSION,TYPE=ORTHO", written(self.free_strain)]
        return lines + (["*DENSITY", written([self.density])] if self.density else [])


@dataclass
class Step:
    """
    One loading step: `forces` are (node, direction 1 to 3, N), `gravity` m/s2 downwards, `increment` a share of the
    step.
    """

    strained: bool = True
    forces: list[tuple[int, int, float]] = field(default_factory=list)
    gravity: float = 0.0
    increment: float = 1.0


@dataclass
class Job:
    """
    A disc to be solved. `materials` is one for each layer of `solid`, `fixed` a list of (nodes, direction) held at
    zero, `probes` elements (layer, index in it) whose stresses are wanted.
    """

    name: str
    solid: Solid
    materials: list[Material]
    fixed: list[tuple[Array, int]]
    steps: list[Step]
    nonlinear: bool = False
    probes: Sequence[tuple[int, int]] = ()


@dataclass
class Answer:
    """Displacements (nodes, 3) after the last step, m; stresses (8 integration points, 6) of each probe, Pa."""

    displacement: Array
    stresses: list[Array]


def solve(folder: str, job: Job) -> Answer:
    """Runs the solver in `folder` and reads what it printed."""
    with open(os.path.join(folder, f"{job.name}.inp"), "w", encoding="ascii") as file:
        file.write("\n".join(deck(job)) + "\n")
    # One thread for each run: the cases run side by side.
    env = {**os.environ, "OMP_NUM_THREADS": "1"}
    try:
        run = subprocess.run(
            [PROGRAM, job.name], cwd=folder, env=env, capture_output=True, text=True, timeout=LONGEST, check=False
        )
    except subprocess.TimeoutExpired as error:
        raise RuntimeError(f"{job.name}: no end after {LONGEST} s") from error
    if run.returncode != 0 or "*ERROR" in run.stdout:
        raise RuntimeError(f"{job.name}: {' '.join(run.stdout.split()[-60:])}")
    with open(os.path.join(folder, f"{job.name}.dat"), encoding="ascii") as file:
        return read(file.read(), job)


def written(values: Sequence[float]) -> str:
    """Numbers as the deck wants them."""
    return ",".join(f"{value:.12e}" for value in values)


def deck(job: Job) -> list[str]:
    """Lines of the input deck. Quadratic bricks with reduced integration, one element through each layer."""
    lines = ["*NODE,NSET=ALL"]
    lines += [f"{number},{written(place)}" for number, place in enumerate(job.solid.nodes, 1)]
    first = 1
    for layer, bricks in enumerate(job.solid.layers):
        lines.append(f"*ELEMENT,TYPE=C3D20R,ELSET=LAYER{layer}")
        for number, brick in enumerate(bricks + 1, first):
            lines += [f"{number}," + ",".join(map(str, brick[:15])) + ",", ",".join(map(str, brick[15:]))]
        first += len(bricks)
    lines += ["*ELSET,ELSET=EVERY", *(f"LAYER{layer}," for layer in range(len(job.solid.layers)))]
    for layer, material in enumerate(job.materials):
        lines += [f"*MATERIAL,NAME=M{layer}", *material.lines(), f"*SOLID SECTION,ELSET=LAYER{layer},MATERIAL=M{layer}"]
    lines.append("*BOUNDARY")
    for nodes, direction in job.fixed:
        lines += [f"{node + 1},{direction},{direction}" for node in nodes]
    lines += ["*INITIAL CONDITIONS,TYPE=TEMPERATURE", "ALL,0."]
    if job.probes:
        lines += ["*ELSET,ELSET=PROBES", *(f"{number}," for number in probe_numbers(job))]
    for number, step in enumerate(job.steps, 1):
        lines += step_lines(step, job, last=number == len(job.steps))
    return lines


def step_lines(step: Step, job: Job, last: bool) -> list[str]:
    """One step; only the last one prints."""
    lines = ["*STEP,NLGEOM,INC=1000" if job.nonlinear else "*STEP"]
    if job.nonlinear:
        # Residual forces and corrections settled far below what is compared.
        lines += ["*CONTROLS,PARAMETERS=FIELD", "1e-5,1e-4"]
    lines += ["*STATIC", f"{step.increment:.6f},1.,1e-6,{step.increment:.6f}"]
    lines += ["*TEMPERATURE", f"ALL,{1.0 if step.strained else 0.0}"]
    if job.nonlinear:
        lines.append("*CLOAD,OP=NEW")
    lines += [f"{node + 1},{direction},{newton:.12e}" for node, direction, newton in step.forces]
    if step.gravity:
        lines += ["*DLOAD", f"EVERY,GRAV,{step.gravity:.12e},0.,0.,-1."]
    if last:
        lines += ["*NODE PRINT,NSET=ALL,FREQUENCY=100000", "U"]
    if last and job.probes:
        lines += ["*EL PRINT,ELSET=PROBES,FREQUENCY=100000", "S"]
    return [*lines, "*END STEP"]


def probe_numbers(job: Job) -> list[int]:
    """The solver's numbers of the probed elements."""
    before = np.cumsum([0, *(len(bricks) for bricks in job.solid.layers)])
    return [int(before[layer]) + index + 1 for layer, index in job.probes]


def read(text: str, job: Job) -> Answer:
    """Reads the printed tables: each has a headline, an empty line and its rows."""
    moved = np.full((len(job.solid.nodes), 3), np.nan)
    stresses: list[Array] = []
    for headline, body in re.findall(r"^ (displacements|stresses)[^\n]*\n\n(.*?)(?=\n\s*\n|\Z)", text, re.S | re.M):
        rows = np.array([[float(word) for word in line.split()] for line in body.splitlines()])
        if headline == "displacements":
            moved[rows[:, 0].astype(int) - 1] = rows[:, 1:]
        else:
            stresses = [rows[rows[:, 0] == number, 2:] for number in probe_numbers(job)]
    if np.isnan(moved).any() or len(stresses) != len(job.probes):
        raise RuntimeError(f"{job.name}: the last step did not come to an end")
    return Answer(moved, stresses)
