"""The 10-layer laminate of the bench in NumPy, float64, one thread: processor times and standard errors as JSON on standard output.

Standard input: {"thickness", "modulus", "stress", "poisson": best estimates by layer, "u_...": standard uncertainties,
"draws": number, "chunks": sizes to try}. The fastest of two layouts and all chunk sizes counts.
"""
import json
import sys
import time

import numpy

given = json.load(sys.stdin)
best = numpy.array(given["thickness"] + given["modulus"] + given["stress"])
spread = numpy.array(given["u_thickness"] + given["u_modulus"] + given["u_stress"])
softening = 1 / (1 - numpy.array(given["poisson"]))
layers = len(given["thickness"])
draws = given["draws"]


def whole(x):
    """Curvature, all layers of a sum at once."""
    h = x[:layers]
    stiffness = x[layers : 2 * layers] * softening[:, None] * h
    force = -x[2 * layers :] * h
    z = numpy.cumsum(h, axis=0) - h / 2
    stretching = stiffness.sum(0)
    plane = (stiffness * z).sum(0) / stretching
    mean = force.sum(0) / stretching
    arm = z - plane
    bending = (stiffness * (h * h / 12 + arm * arm)).sum(0)
    return -((force - stiffness * mean) * arm).sum(0) / bending


def by_layer(x):
    """Curvature, layer after layer, so that a chunk stays in the cache."""
    below = numpy.zeros(x.shape[1])
    stretching, first, forces = below.copy(), below.copy(), below.copy()
    kept = []
    for n in range(layers):
        h = x[n]
        stiffness = x[layers + n] * softening[n] * h
        force = -x[2 * layers + n] * h
        z = below + h * 0.5
        below = below + h
        stretching += stiffness
        first += stiffness * z
        forces += force
        kept.append((h, stiffness, force, z))
    plane = first / stretching
    mean = forces / stretching
    bending, moment = numpy.zeros_like(plane), numpy.zeros_like(plane)
    for h, stiffness, force, z in kept:
        arm = z - plane
        bending += stiffness * (h * h * (1 / 12) + arm * arm)
        moment += (force - stiffness * mean) * arm
    return -moment / bending


def run(curvature, chunk, count, generator):
    """Draws, their figures, and seconds for all and for the arithmetic alone."""
    out = numpy.empty(count)
    arithmetic = 0.0
    start = time.process_time()
    for low in range(0, count, chunk):
        size = min(chunk, count - low)
        x = generator.standard_normal((3 * layers, size))
        x *= spread[:, None]
        x += best[:, None]
        begin = time.process_time()
        out[low : low + size] = curvature(x)
        arithmetic += time.process_time() - begin
    return out, time.process_time() - start, arithmetic


generator = numpy.random.Generator(numpy.random.PCG64(1))
found = []
for curvature in (whole, by_layer):
    for chunk in given["chunks"]:
        for _ in range(3):
            _, total, arithmetic = run(curvature, chunk, draws // 8, generator)
            found.append((total, arithmetic, curvature, chunk))
total, _, fastest, chunk = min(found, key=lambda one: one[0])
arithmetic = min(one[1] for one in found)

begin = time.process_time()
figures, drawn, own = run(fastest, chunk, draws, generator)
mean, high = figures.mean(), numpy.quantile(figures, 0.95)
deviation = figures.std(ddof=1)
summary = time.process_time() - begin
parts = [numpy.quantile(part, 0.95) for part in figures.reshape(32, -1)]
json.dump(
    {
        "nsPerDraw": 1e9 * min(total / (draws // 8), drawn / draws),
        "nsArithmetic": 1e9 * min(arithmetic / (draws // 8), own / draws),
        "seconds": summary,
        "mean": mean,
        "high": high,
        "deviation": deviation,
        "errorOfMean": deviation / draws**0.5,
        "errorOfHigh": float(numpy.std(parts, ddof=1)) / 32**0.5,
        "layout": fastest.__name__,
        "chunk": chunk,
        "version": numpy.__version__,
    },
    sys.stdout,
)
