import type { Working, WorkingLine } from "../../working.ts";
import { fitSurface, type SurfaceInput } from "./fit-surface.ts";
import { shapeFigures, type ShapeFigure, type ShapeFigures, type ShapeFiguresInput } from "./shape-figures.ts";
import { zernikeBasis } from "./zernike.ts";

/** Bow, best-fit bow, warp and sori of `shapeFigures` as data, in this order; `figures` where they are at hand already. */
export function shapeFiguresWorkings(i: ShapeFiguresInput, figures: ShapeFigures = shapeFigures(i)): Working[] {
  return [figures.bow, figures.bowBestFit, figures.warp, figures.sori].map((figure) => workingOf(figure, i, figures));
}

function workingOf(figure: ShapeFigure, { surface }: ShapeFiguresInput, { remarks }: ShapeFigures): Working {
  const terms: WorkingLine[] = surface.terms
    .filter(({ n, value }) => n >= 2 && value !== 0)
    .map(({ n, m, value }) => ({
      symbol: `a_${n},${m}`,
      meaning: `term of order ${n} with ${Math.abs(m)} waves around${m < 0 ? ", sine" : ""}`,
      value,
      unit: "m",
    }));
  return {
    equation: figure.name === "bow" ? "bow-three-point" : "least-squares-plane",
    inputs: [
      { symbol: "R", meaning: "radius of the fitted disk", value: surface.radius, unit: "m" },
      ...terms,
      { symbol: "u", meaning: "standard uncertainty by the scatter", value: figure.standardUncertainty, unit: "m" },
    ],
    result: {
      symbol: figure.name.startsWith("bow") ? "b" : "W",
      meaning: figure.name,
      value: figure.value,
      unit: "m",
      source: figure.source,
    },
    note: [figure.definition, ...remarks].join(" "),
  };
}

/** The fit of `fitSurface` as data: its terms, with the height at the rim along azimuth 0 over the centre as result. */
export function surfaceWorking(i: SurfaceInput): Working {
  const surface = fitSurface(i);
  const basis = zernikeBasis(surface.order);
  const [rim, centre] = [new Float64Array(surface.terms.length), new Float64Array(surface.terms.length)];
  basis.fill(1, 0, rim);
  basis.fill(0, 0, centre);
  const value = surface.terms.reduce((sum, term, k) => sum + term.value * ((rim[k] ?? 0) - (centre[k] ?? 0)), 0);
  return {
    equation: "surface-fit",
    inputs: [
      { symbol: "R", meaning: "radius of the fitted disk", value: surface.radius, unit: "m" },
      { symbol: "N", meaning: "points used", value: surface.used, unit: "1" },
      { symbol: "s", meaning: "root mean square of measured less fitted", value: surface.rms, unit: "m" },
      ...surface.terms.map(({ n, m, value: size }): WorkingLine => ({
        symbol: `a_${n},${m}`,
        meaning: `term of order ${n}, waves ${m}`,
        value: size,
        unit: "m",
      })),
    ],
    result: { symbol: "w", meaning: "rim towards the notch over the centre", value, unit: "m" },
    note: surface.remarks.join(" ") || undefined,
  };
}
