import { at } from "../table/elements.ts";
import { dot } from "./dense.ts";
import type { DiscFunction } from "./disc-functions.ts";
import { gaussLegendre } from "./quadrature.ts";
import type { RitzSpace } from "./ritz-plate.ts";

/** Share of the radius over which a parabola is fitted. */
const FITTED = 0.97;

/** What is read off a shape: heights over the centre, curvatures times R²/(4h). A bow of K is 2 K thicknesses. */
export interface Measures {
  bow: { x: number; y: number };
  centre: { x: number; y: number };
  /** Least-squares parabola along a diameter over 0.97 R. */
  parabola: { x: number; y: number };
  /** Height of the rim averaged around it, over 2 h. */
  rim: number;
  /** Amplitude of the rim's six-fold wave over 2 h: how far the azimuth moves a three-point bow. */
  sixfold: number;
  /** Peak to valley over 2 h. */
  warp: number;
}

/** Reads shapes of one space, along the axes or turned by an angle from them. */
export type Measurer = (shape: Float64Array, turn?: number) => Measures;

export function measurer(space: RitzSpace): Measurer {
  const { functions } = space;
  const along = (turn: number) => ({ x: linesAlong(functions, turn), y: linesAlong(functions, turn + Math.PI / 2) });
  const straight = along(0);
  const rim = Float64Array.from(functions, (one) => (one.order === 0 ? heightOf(one, 1, 0) / 2 : 0));
  const sixfold = functions.map((one) => (one.order === 6 ? heightOf({ ...one, phase: "cos" }, 1, 0) / 2 : 0));
  const heights = gridOf(space);
  return (shape, turn = 0) => {
    const { x, y } = turn === 0 ? straight : along(turn);
    const read = (line: Float64Array) => dot(line, shape);
    let [lowest, highest] = [0, 0];
    for (const line of heights) {
      const value = read(line);
      lowest = Math.min(lowest, value);
      highest = Math.max(highest, value);
    }
    const wave = { cos: 0, sin: 0 };
    functions.forEach(({ phase }, n) => (wave[phase] += (sixfold[n] ?? 0) * at(shape, n)));
    return {
      bow: { x: read(x.bow), y: read(y.bow) },
      centre: { x: read(x.centre), y: read(y.centre) },
      parabola: { x: read(x.parabola), y: read(y.parabola) },
      rim: read(rim),
      sixfold: Math.hypot(wave.cos, wave.sin),
      warp: highest - lowest,
    };
  };
}

/** What is read along one direction, as rows to multiply coefficients with. A height of w thicknesses is a curvature K = w/2. */
function linesAlong(functions: readonly DiscFunction[], angle: number) {
  return {
    bow: Float64Array.from(functions, (one) => heightOf(one, 1, angle) / 2),
    centre: Float64Array.from(functions, (one) => secondAtCentre(one, angle) / 4),
    parabola: Float64Array.from(functions, (one) => fitted(one, angle)),
  };
}

/** Height over the centre, in thicknesses. */
export function heightOf({ order, phase, jet }: DiscFunction, r: number, angle: number): number {
  const [value] = jet(r * r);
  const centre = order === 0 ? jet(0)[0] : 0;
  return r ** order * value * around({ order, phase }, angle) - centre;
}

function around({ order, phase }: Pick<DiscFunction, "order" | "phase">, angle: number): number {
  return phase === "cos" ? Math.cos(order * angle) : Math.sin(order * angle);
}

function secondAtCentre({ order, phase, jet }: DiscFunction, angle: number): number {
  if (order > 2 || order === 1) return 0;
  const [value, slope] = jet(0);
  if (order === 0) return 2 * slope;
  return 2 * value * (phase === "cos" ? Math.cos(2 * angle) : Math.sin(2 * angle));
}

/** Curvature of the least-squares parabola through a diameter, over 4. */
function fitted(one: DiscFunction, angle: number): number {
  const { nodes, weights } = gaussLegendre(48);
  let sum = 0;
  for (let n = 0; n < nodes.length; n += 1) {
    const t = 2 * at(nodes, n) - 1;
    const r = FITTED * Math.abs(t);
    // Legendre's P_2 against the profile, which is even along the diameter.
    sum += at(weights, n) * 5 * ((3 * t * t - 1) / 2) * heightOf(one, r, angle);
  }
  return (sum * 3) / (FITTED * FITTED) / 4;
}

/** The grid on which the highest and lowest points are looked for: half a disc, the other half being the same. */
const RINGS = 50;
const SPOKES = 72;

/** Heights over 2 h on the grid. */
function gridOf({ functions }: RitzSpace): Float64Array[] {
  const lines: Float64Array[] = [];
  for (let ring = 1; ring <= RINGS; ring += 1) {
    const r = ring / RINGS;
    const radial = functions.map(({ order, jet }) => (r ** order * jet(r * r)[0]) / 2);
    const centre = functions.map(({ order, jet }) => (order === 0 ? jet(0)[0] / 2 : 0));
    for (let spoke = 0; spoke < SPOKES; spoke += 1) {
      const angle = (spoke * Math.PI) / SPOKES;
      lines.push(Float64Array.from(functions, (one, n) => (radial[n] ?? 0) * around(one, angle) - (centre[n] ?? 0)));
    }
  }
  return lines;
}
