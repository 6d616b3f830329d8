"""The 10-layer laminate of the bench in NumPy, float64, one thread: processor times and standard errors as JSON on standard output.

Standard input: {"thickness", "modulus", "stress", "poisson": best estimates by layer, "u_...": standard uncertainties,
"draws": number, "tries": [layout, chunk size] each to be timed, null for every layout with "chunks" sizes, "summary": whether all
draws are to be made and summarised}. Layouts:

whole     each step for all layers at once, as one would write it down
by_layer  layer after layer, as one would write it down
in_place  layer after layer by the sums that the engine takes (`laminate-sums.ts`), every result into memory that is kept: the
          fewest operations and no allocation, as NumPy is fastest
"""
import itertools
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
# Heights count from the middle of the stack as stated, where little cancels.
bottom = -sum(given["thickness"]) / 2


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


kept = {}


def in_place(x):
    """Curvature, layer after layer by fewest operations, nothing allocated."""
    size = x.shape[1]
    if size not in kept:
        kept[size] = numpy.empty((10, size))
    below, top, stretching, first, second, forces, moment, twice, s, v = kept[size]
    below.fill(bottom)
    for sums in (stretching, first, second, forces, moment):
        sums.fill(0)
    multiply, add, subtract = numpy.multiply, numpy.add, numpy.subtract
    for n in range(layers):
        h = x[n]
        add(below, h, top)
        add(below, top, twice)
        multiply(below, top, below)
        multiply(twice, twice, v)
        subtract(v, below, v)
        multiply(x[layers + n], softening[n], s)
        multiply(s, h, s)
        add(stretching, s, stretching)
        multiply(v, s, v)
        add(second, v, second)
        multiply(s, twice, s)
        add(first, s, first)
        multiply(x[2 * layers + n], h, s)
        add(forces, s, forces)
        multiply(s, twice, s)
        add(moment, s, moment)
        below, top = top, below
    return 2 * (moment * stretching - forces * first) / (second * stretching * (4 / 3) - first * first)


def run(curvature, chunk, count, generator):
    """Draws: their figures, the last chunk of them, and the seconds that all took."""
    out = numpy.empty(count)
    drawn = numpy.empty((3 * layers, chunk))
    start = time.process_time()
    for low in range(0, count, chunk):
        size = min(chunk, count - low)
        x = drawn if size == chunk else numpy.empty((3 * layers, size))
        generator.standard_normal(out=x)
        x *= spread[:, None]
        x += best[:, None]
        out[low : low + size] = curvature(x)
    return out, drawn, time.process_time() - start


def alone(curvature, drawn, count):
    """Seconds a draw of the arithmetic alone, the same chunk again and again, as the engine's is timed."""
    chunks = count // drawn.shape[1]
    start = time.process_time()
    for _ in range(chunks):
        curvature(drawn)
    return (time.process_time() - start) / (chunks * drawn.shape[1])


generator = numpy.random.Generator(numpy.random.SFC64(1))
layouts = {layout.__name__: layout for layout in (whole, by_layer, in_place)}
found = []
for layout, chunk in given["tries"] or itertools.product(layouts, given["chunks"]):
    curvature, count = layouts[layout], draws // 8
    runs = [run(curvature, chunk, count, generator) for _ in range(3)]
    found.append(
        {
            "layout": layout,
            "chunk": chunk,
            "nsPerDraw": 1e9 * min(seconds for _, _, seconds in runs) / count,
            "nsArithmetic": 1e9 * min(alone(curvature, runs[0][1], count) for _ in range(5)),
        }
    )
answer = {"found": found, "version": numpy.__version__}
if given["summary"]:
    fastest = min(found, key=lambda one: one["nsPerDraw"])
    begin = time.process_time()
    figures = run(layouts[fastest["layout"]], fastest["chunk"], draws, generator)[0]
    mean, high = figures.mean(), numpy.quantile(figures, 0.95)
    deviation = figures.std(ddof=1)
    answer["seconds"] = time.process_time() - begin
    parts = [numpy.quantile(part, 0.95) for part in figures.reshape(32, -1)]
    answer |= {
        "mean": mean,
        "high": high,
        "errorOfMean": deviation / draws**0.5,
        "errorOfHigh": float(numpy.std(parts, ddof=1)) / 32**0.5,
    }
json.dump(answer, sys.stdout)
